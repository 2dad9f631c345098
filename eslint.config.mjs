import nextVitals from "eslint-config-next/core-web-vitals";
import nextTypeScript from "eslint-config-next/typescript";

/**
 * Who may import whom, shown while typing; tests/architecture/imports.test.ts proves it.
 * Of two configs for a file the later one wins whole, so each rule's list is made from parts.
 */
const appAndScreens = { group: ["@/app/*", "@/components/*"], message: "lib, db and emails know nothing of screens." };
const webBridge = { group: ["@/lib/web/*"], message: "Only app, proxy and instrumentation go over the bridge to Next." };
const mails = { group: ["@/emails/*"], message: "Queue a message instead; lib/web composes it." };
const nextAndReact = {
  group: ["next", "next/*", "react", "react-dom", "react/*", "react-dom/*"],
  message: "Next and React stay out of lib but for lib/web.",
};
const sql = {
  group: ["knex", "knex/*", "better-sqlite3"],
  message: "Only db, migrations, seeds, knexfile and scripts import the database packages; use @/db/connection.",
};
const db = { group: ["@/db/*"], message: "SQL lives in stores under lib; ask a use case instead." };
const stores = { group: ["@/lib/**/*-store"], message: "Pages and components ask use cases, never stores." };
const ourCode = { group: ["@/lib/*", "@/app/*", "@/components/*", "@/emails/*"], message: "db knows tables and nothing above them." };
const handle = {
  group: ["@/lib/web/database", "@/lib/people/lucia"],
  message: "The handle on the database stays in lib/web; use the context a use case is given.",
};

const forbid = (...patterns) => ({ "@typescript-eslint/no-restricted-imports": ["error", { patterns }] });

const syntax = [
  { selector: "ExportAllDeclaration", message: "No barrels: import from the file that has it." },
  { selector: "ExportNamedDeclaration[source]", message: "No barrels: import from the file that has it." },
  { selector: ":not(TSModuleBlock) > TSInterfaceDeclaration", message: "Use a type." },
  { selector: "TSAsExpression > TSAnyKeyword", message: "No any." },
  {
    selector: "CallExpression[callee.property.name='select'] > Literal[value='*']",
    message: "Name the columns: select('*') changes when a table does.",
  },
];
const asyncQueries = [
  {
    selector: "CallExpression[callee.object.name='knex'][callee.property.name='transaction']",
    message: "An async transaction lets other writes slip in. Use conn.transaction.",
  },
  {
    selector: "AwaitExpression > CallExpression[callee.property.name='transaction']",
    message: "No transaction spans an await. Use conn.transaction with a plain function.",
  },
  {
    selector: ":matches(AwaitExpression, ForOfStatement[await=true]) > CallExpression CallExpression[callee.name='knex']",
    message: "Knex only builds queries; run them with conn.first, conn.all or conn.run.",
  },
  {
    selector: "AwaitExpression > CallExpression[callee.name='knex']",
    message: "Knex only builds queries; run them with conn.first, conn.all or conn.run.",
  },
];

const config = [
  ...nextVitals,
  ...nextTypeScript,
  {
    ignores: [".next/**", ".data/**", ".screens/**", "next-env.d.ts", "test-results/**", "playwright-report/**", "coverage/**"],
  },
  {
    linterOptions: { noInlineConfig: true, reportUnusedDisableDirectives: "error" },
    rules: {
      eqeqeq: ["error", "always", { null: "ignore" }],
      "no-restricted-syntax": ["error", ...syntax, ...asyncQueries],
    },
  },
  {
    files: ["**/*.ts", "**/*.tsx"],
    rules: {
      "@typescript-eslint/no-explicit-any": "error",
      "@typescript-eslint/no-non-null-assertion": "error",
      "@typescript-eslint/no-unused-vars": "error",
      "@typescript-eslint/no-unused-expressions": "error",
      // import("…") in a type is how a .mjs file's types are named, so it is let be.
      "@typescript-eslint/consistent-type-imports": ["error", { disallowTypeAnnotations: false, fixStyle: "inline-type-imports" }],
    },
  },
  { files: ["lib/**/*.ts", "lib/**/*.tsx"], rules: forbid(appAndScreens, webBridge, mails, nextAndReact, sql, handle) },
  { files: ["lib/web/**"], rules: forbid(appAndScreens, sql) },
  { files: ["components/**"], rules: forbid({ group: ["@/app/*"], message: "Components know no page." }, mails, db, sql, stores, handle) },
  { files: ["emails/**"], rules: forbid(appAndScreens, webBridge, db, sql, stores, handle) },
  { files: ["app/**"], rules: forbid(mails, db, sql, stores, handle) },
  { files: ["db/**"], rules: forbid(ourCode) },
  // A mail is a whole HTML page of its own, and a test may call a use case by the name useCase.
  { files: ["emails/**"], rules: { "@next/next/no-head-element": "off" } },
  { files: ["tests/**", "lib/**"], rules: { "react-hooks/rules-of-hooks": "off" } },
  { files: ["migrations/**", "seeds/**", "scripts/**"], rules: { "no-restricted-syntax": ["error", ...syntax] } },
];

export default config;

import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { NEXT, nextEnvironment } from "./app.mjs";
import { CannotGoOn } from "./cannot-go-on.mjs";
import { untilAnswers } from "./processes.mjs";
import { inRoot } from "./root.mjs";

/** @typedef {import("./processes.mjs").Processes} Processes */

/**
 * The smallest program of the framework: one page, one route handler, nothing of ours. What our
 * pages and handlers cost is measured against it. It stands below the checkout to find its packages.
 */
const FILES = {
  "package.json": JSON.stringify({ name: "bare", private: true, type: "module" }),
  "next.config.mjs": `const config = { turbopack: { root: ${JSON.stringify(inRoot())} } };\nexport default config;\n`,
  // Of its own, or the framework takes the checkout's above it.
  "instrumentation.js": "export function register() {}\n",
  "app/layout.jsx": `export default function Layout({ children }) {
  return <html lang="en"><body>{children}</body></html>;
}
`,
  "app/page.jsx": `export const dynamic = "force-dynamic";
export default function Page() {
  return <p>Nothing.</p>;
}
`,
  "app/bare/route.js": `export const dynamic = "force-dynamic";
export function GET() {
  return Response.json({ ok: true });
}
`,
};

/**
 * Builds it, once for a version of the framework, and starts it.
 *
 * @param {Processes} processes
 * @param {number} port
 */
export async function startBareApp(processes, port) {
  const folder = inRoot(".data", "bench", "bare");
  const version = JSON.parse(readFileSync(inRoot("node_modules", "next", "package.json"), "utf8")).version;
  const note = inRoot(".data", "bench", "bare", "built-from.json");
  const wanted = JSON.stringify({ version, FILES });
  if (!existsSync(note) || readFileSync(note, "utf8") !== wanted) {
    await build(processes, folder);
    writeFileSync(note, wanted);
  }
  const app = processes.start({
    name: "bare",
    args: [inRoot(NEXT), "start", "-H", "127.0.0.1", "-p", String(port)],
    cwd: folder,
    env: nextEnvironment(),
    output: "kept",
  });
  const address = `http://127.0.0.1:${port}`;
  await untilAnswers(app, `${address}/bare`, { accept: (status) => status === 200 });
  return { page: `${address}/`, handler: `${address}/bare` };
}

/** @param {Processes} processes @param {string} folder */
async function build(processes, folder) {
  console.log("Building a bare program to compare with …");
  rmSync(folder, { recursive: true, force: true });
  for (const [name, text] of Object.entries(FILES)) {
    mkdirSync(`${folder}/${name}`.replace(/\/[^/]+$/, ""), { recursive: true });
    writeFileSync(`${folder}/${name}`, text);
  }
  const { ok, lastLines } = await processes.run({
    name: "bare",
    args: [inRoot(NEXT), "build"],
    cwd: folder,
    env: nextEnvironment(),
    output: "kept",
  });
  if (!ok) throw new CannotGoOn(`The bare program could not be built:\n${lastLines}`);
}

/** @type {import("next").NextConfig} */
const config = {
  typedRoutes: true,
  poweredByHeader: false,
  reactStrictMode: true,
  // Native or file-reading packages stay outside the bundle: they find their own files by path.
  serverExternalPackages: ["better-sqlite3", "@node-rs/argon2", "pdfkit", "nodemailer", "pino", "knex"],
  headers: async () => [
    {
      source: "/:path*",
      headers: [
        { key: "x-content-type-options", value: "nosniff" },
        { key: "referrer-policy", value: "same-origin" },
      ],
    },
  ],
  turbopack: { root: import.meta.dirname },
};

export default config;

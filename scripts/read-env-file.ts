import { existsSync } from "node:fs";

/** Next reads .env by itself; a script has to ask. What is set already wins. */
if (existsSync(".env")) process.loadEnvFile(".env");

import "./read-env-file";
import { readFileSync } from "node:fs";
import { parseArgs } from "node:util";
import { openConnection } from "../db/connection";
import { findWaiverInForce, insertWaiverText } from "../lib/waivers/waiver-store";
import { isDay } from "../lib/shared/dates";
import { readEnv } from "../lib/shared/env";
import { ok } from "../lib/shared/outcome";

// Adds the next version of the waiver. Earlier versions and their signatures stay as they are.

const { values } = parseArgs({ options: { title: { type: "string" }, file: { type: "string" }, from: { type: "string" } } });
if (!values.title || !values.file || !values.from || !isDay(values.from)) {
  console.error('Say which: npm run waiver -- --title "Agreement and release" --file waiver.txt --from 2027-01-01');
  console.error('In the file, a line that begins with "# " is a heading and a blank line ends a paragraph.');
  process.exit(1);
}

const { title, from } = values;
const body = readFileSync(values.file, "utf8").replaceAll("\r\n", "\n").trim();
const conn = openConnection(readEnv().DATABASE_FILE);
const outcome = conn.transaction(() => {
  const version = (findWaiverInForce(conn, "9999-12-31")?.version ?? 0) + 1;
  insertWaiverText(conn, { version, title, body, inForceFrom: from });
  return ok({ version });
});
conn.close();
if (outcome.ok) console.log(`Waiver version ${outcome.value.version} is in force from ${from}.`);

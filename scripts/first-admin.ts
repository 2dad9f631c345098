import "./read-env-file";
import { parseArgs } from "node:util";
import { openConnection } from "../db/connection";
import { builtInPolicy } from "../lib/cover/cover-policy";
import { insertPolicy, listPolicies } from "../lib/outings/outing-store";
import { mailInvitation } from "../lib/people/mail-links";
import { emailField, nameField } from "../lib/people/person-schema";
import { findPersonByEmail, giveRole, insertPerson } from "../lib/people/person-store";
import { readEnv } from "../lib/shared/env";
import { ok } from "../lib/shared/outcome";

// Makes the first admin of a new programme and queues the mail that lets them choose a password; puts the
// built-in cover policy in where there is none. The mail goes out when the program runs.

const { values } = parseArgs({ options: { name: { type: "string" }, email: { type: "string" } } });
const name = nameField.safeParse(values.name);
const email = emailField.safeParse(values.email);
if (!name.success || !email.success) {
  console.error('Say who: npm run admin -- --name "Your name" --email you@example.org');
  process.exit(1);
}

const conn = openConnection(readEnv().DATABASE_FILE);
const now = new Date().toISOString();
conn.transaction(() => {
  const known = findPersonByEmail(conn, email.data);
  const person = known ?? { id: insertPerson(conn, now, { name: name.data, email: email.data }), name: name.data, email: email.data };
  giveRole(conn, person.id, "admin");
  mailInvitation(conn, now, { person, role: "admin", from: "" });
  if (listPolicies(conn).length === 0) insertPolicy(conn, now, builtInPolicy);
  return ok({});
});
conn.close();
console.log(`${name.data} is an admin. The invitation is in the outbox and goes to ${email.data} when the program runs.`);

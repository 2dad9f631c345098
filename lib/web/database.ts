import { openConnection, type Connection } from "@/db/connection";
import { createLucia, type Sessions } from "@/lib/people/lucia";
import { env } from "@/lib/shared/env";

type Held = { conn: Connection; sessions: Sessions };

/** On globalThis, because development reloads modules and the handle has to stay one. */
const place = globalThis as typeof globalThis & { dunlinDatabase?: Held };

export function database(): Held {
  place.dunlinDatabase ??= open();
  return place.dunlinDatabase;
}

function open(): Held {
  const conn = openConnection(env().DATABASE_FILE);
  return { conn, sessions: createLucia(conn, env().PUBLIC_URL.startsWith("https:")) };
}

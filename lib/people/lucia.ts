import { BetterSqlite3Adapter } from "@lucia-auth/adapter-sqlite";
import { Lucia, TimeSpan, type Adapter, type DatabaseSession } from "lucia";
import type { Connection } from "@/db/connection";
import { sha256 } from "@/lib/shared/ids";

/**
 * Lucia over its SQLite adapter, on the program's one handle. Upstream calls Lucia deprecated and its
 * adapter stores session ids as they are, so it stays behind this file, and ids are hashed here:
 * a copy of the database signs nobody in.
 */
export function createLucia(conn: Connection, secureCookie: boolean) {
  const adapter = new BetterSqlite3Adapter(conn.raw, { user: "people", session: "sessions" });
  return new Lucia(hashingIds(adapter), {
    sessionExpiresIn: new TimeSpan(30, "d"),
    sessionCookie: {
      name: "dunlin_session",
      // The cookie outlives the session; the session itself lapses 30 days after it was last used.
      expires: false,
      attributes: { secure: secureCookie, sameSite: "lax", path: "/" },
    },
  });
}

export type Sessions = ReturnType<typeof createLucia>;

function hashingIds(adapter: Adapter): Adapter {
  return {
    async getSessionAndUser(id) {
      const [session, user] = await adapter.getSessionAndUser(sha256(id));
      return [session && { ...session, id }, user];
    },
    async getUserSessions(userId) {
      return adapter.getUserSessions(userId);
    },
    async setSession(session: DatabaseSession) {
      await adapter.setSession({ ...session, id: sha256(session.id) });
    },
    updateSessionExpiration: (id, expiresAt) => adapter.updateSessionExpiration(sha256(id), expiresAt),
    deleteSession: (id) => adapter.deleteSession(sha256(id)),
    deleteUserSessions: (userId) => adapter.deleteUserSessions(userId),
    deleteExpiredSessions: () => adapter.deleteExpiredSessions(),
  };
}

declare module "lucia" {
  interface Register {
    Lucia: Sessions;
    DatabaseUserAttributes: Record<never, never>;
  }
}

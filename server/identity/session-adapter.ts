import { DrizzleSQLiteAdapter } from "@lucia-auth/adapter-drizzle";
import { lte, or } from "drizzle-orm";
import type { Adapter, DatabaseSession } from "lucia";
import type { Clock } from "../clock.ts";
import type { Db } from "../db/connection.ts";
import { sessions, users } from "../db/schema/index.ts";
import { hashToken } from "./token-hash.ts";

/** Lucia compares ends with the computer's own clock; a live session always looks live to it. */
const NEVER_BY_LUCIA_MS = 60 * 60 * 1000;

/**
 * Lucia's Drizzle adapter with two changes: the database sees only SHA-256 hashes of tokens (lucia
 * itself stores them in clear), and both ends of a session, the idle one and the absolute one, are
 * judged here by the injected clock. Times of `DatabaseSession.expiresAt` are not stored: the idle
 * end comes in as the attribute `idleEndsAt`.
 */
export function createSessionAdapter(db: Db, clock: Clock): Adapter {
  const inner = new DrizzleSQLiteAdapter(db, sessions, users);
  const isOver = (session: DatabaseSession) =>
    clock.now() >= session.expiresAt.getTime() || clock.now() >= session.attributes.endsAt;

  return {
    async getSessionAndUser(token) {
      const [session, user] = await inner.getSessionAndUser(hashToken(token));
      if (session === null || user === null) return [null, null];
      if (isOver(session)) {
        await inner.deleteSession(session.id);
        return [null, null];
      }
      const attributes = { ...session.attributes, idleEndsAt: session.expiresAt.getTime() };
      return [{ ...session, id: token, attributes, expiresAt: new Date(Date.now() + NEVER_BY_LUCIA_MS) }, user];
    },
    async getUserSessions(userId) {
      const found = await inner.getUserSessions(userId);
      return found.filter((session) => !isOver(session));
    },
    async setSession(session) {
      const { idleEndsAt, ...attributes } = session.attributes;
      await inner.setSession({
        ...session,
        id: hashToken(session.id),
        expiresAt: new Date(idleEndsAt),
        attributes: attributes as DatabaseSession["attributes"],
      });
    },
    // Idle ends move by the role of the person (see `Sessions.touch`), not by lucia's one setting.
    updateSessionExpiration: () => Promise.resolve(),
    deleteSession: (token) => inner.deleteSession(hashToken(token)),
    deleteUserSessions: (userId) => inner.deleteUserSessions(userId),
    deleteExpiredSessions() {
      const now = clock.now();
      db.delete(sessions)
        .where(or(lte(sessions.expiresAt, Math.floor(now / 1000)), lte(sessions.endsAt, now)))
        .run();
      return Promise.resolve();
    },
  };
}

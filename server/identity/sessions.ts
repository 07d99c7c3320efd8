import { and, desc, eq, inArray, ne } from "drizzle-orm";
import { Lucia } from "lucia";
import type { SchoolId, UserId } from "../../shared/ids.ts";
import type { Role } from "../../shared/roles.ts";
import type { Clock } from "../clock.ts";
import { type Db, inTransaction } from "../db/connection.ts";
import { sessions, userRoles, users } from "../db/schema/index.ts";
import { createSessionAdapter } from "./session-adapter.ts";
import { getSessionLimits } from "./session-limits.ts";
import { hashToken } from "./token-hash.ts";

/** A session that has not ended, with the person as they are now: a changed role counts at once. */
export interface LiveSession {
  /** Id of the row: the hash of the token. */
  readonly sessionId: string;
  readonly userId: UserId;
  readonly displayName: string;
  readonly schoolId: SchoolId | null;
  readonly roles: readonly Role[];
  /** UTC milliseconds. */
  readonly endsAt: number;
  readonly idleEndsAt: number;
}

export interface Sessions {
  /** Starts a session and gives it with the `Set-Cookie` value; the token exists nowhere else. */
  open(userId: UserId): Promise<{ session: LiveSession; cookie: string }>;
  /** The live session that a request's Cookie header names, or null. */
  find(cookieHeader: string | undefined): Promise<LiveSession | null>;
  /** Moves the idle end: something was done. Gives the session with its new end. */
  touch(session: LiveSession): LiveSession;
  end(sessionId: string): void;
  /** Deletes rows that are over, so that the table does not grow. */
  prune(): Promise<void>;
  /** `Set-Cookie` value that makes the browser forget. */
  readonly blankCookie: string;
}

/** More sessions than anybody has devices; the oldest give way. */
const SESSIONS_PER_PERSON = 20;
/** The idle end is written at most this often: a save every few seconds needs no second write. */
const TOUCH_EVERY_MS = 30_000;

/** Ends every session of a person, but for one if named. Runs in the caller's transaction. */
export function endSessionsOf(db: Db, userId: UserId, exceptSessionId?: string): void {
  const mine = eq(sessions.userId, userId);
  db.delete(sessions)
    .where(exceptSessionId === undefined ? mine : and(mine, ne(sessions.id, exceptSessionId)))
    .run();
}

/** Sessions of signed-in people: lucia over our adapter, with ends by role (see `getSessionLimits`). */
export function createSessions(db: Db, clock: Clock, options: { isSecure: boolean }): Sessions {
  const lucia = new Lucia(createSessionAdapter(db, clock), {
    sessionCookie: {
      // The prefix makes browsers refuse the cookie unless it is Secure, for this host and for "/".
      name: options.isSecure ? "__Host-duskbell" : "duskbell-session",
      attributes: { sameSite: "lax", secure: options.isSecure, path: "/" },
    },
    getSessionAttributes: (row) => row,
    getUserAttributes: (row) => ({ schoolId: row.schoolId, displayName: row.displayName, isDisabled: row.isDisabled }),
  });

  const listRoles = (userId: string) =>
    db
      .select({ role: userRoles.role })
      .from(userRoles)
      .where(eq(userRoles.userId, userId))
      .all()
      .map((row) => row.role);

  const findByToken = async (token: string): Promise<LiveSession | null> => {
    const { session, user } = await lucia.validateSession(token);
    if (session === null || user.isDisabled) return null;
    const roles = listRoles(user.id);
    // A stricter role given after sign-in shortens the session too.
    const endsAt = Math.min(session.endsAt, session.createdAt + getSessionLimits(roles).absoluteMs);
    if (clock.now() >= endsAt) return null;
    return {
      sessionId: hashToken(token),
      userId: user.id,
      displayName: user.displayName,
      schoolId: user.schoolId,
      roles,
      endsAt,
      idleEndsAt: Math.min(session.idleEndsAt, endsAt),
    };
  };

  return {
    async open(userId) {
      const now = clock.now();
      const { absoluteMs, idleMs } = getSessionLimits(listRoles(userId));
      const { id: token } = await lucia.createSession(userId, {
        createdAt: now,
        endsAt: now + absoluteMs,
        idleEndsAt: now + idleMs,
      });
      dropOldest(db, userId);
      const session = await findByToken(token);
      if (session === null) throw new Error("A session was over when it was opened.");
      const cookie = lucia.createSessionCookie(token);
      // No Max-Age: on a shared school computer closing the browser ends it.
      delete cookie.attributes.maxAge;
      return { session, cookie: cookie.serialize() };
    },
    async find(cookieHeader) {
      const token = readToken(cookieHeader, lucia.sessionCookieName);
      return token === null ? null : findByToken(token);
    },
    touch(session) {
      const now = clock.now();
      const idleEndsAt = Math.min(now + getSessionLimits(session.roles).idleMs, session.endsAt);
      if (Math.abs(idleEndsAt - session.idleEndsAt) < TOUCH_EVERY_MS) return session;
      inTransaction(db, (tx) => {
        tx.update(sessions)
          .set({ expiresAt: Math.floor(idleEndsAt / 1000) })
          .where(eq(sessions.id, session.sessionId))
          .run();
        tx.update(users).set({ lastSeenAt: now }).where(eq(users.id, session.userId)).run();
      });
      return { ...session, idleEndsAt };
    },
    end(sessionId) {
      db.delete(sessions).where(eq(sessions.id, sessionId)).run();
    },
    prune: () => lucia.deleteExpiredSessions(),
    blankCookie: lucia.createBlankSessionCookie().serialize(),
  };
}

/** Only our own cookie is decoded: a broken one of another program on this host must not matter. */
function readToken(cookieHeader: string | undefined, name: string): string | null {
  const pair = cookieHeader?.split(";").find((part) => part.trim().startsWith(`${name}=`));
  const token = pair?.slice(pair.indexOf("=") + 1).trim();
  return token === undefined || token === "" ? null : token;
}

function dropOldest(db: Db, userId: string): void {
  const old = db
    .select({ id: sessions.id })
    .from(sessions)
    .where(eq(sessions.userId, userId))
    .orderBy(desc(sessions.createdAt))
    .all()
    .slice(SESSIONS_PER_PERSON);
  if (old.length > 0)
    db.delete(sessions)
      .where(
        inArray(
          sessions.id,
          old.map((row) => row.id),
        ),
      )
      .run();
}

import type { Lucia } from "lucia";

interface SessionAttributes {
  /** When the session ends whatever is done, UTC milliseconds. */
  endsAt: number;
  createdAt: number;
  /** When it ends if nothing is done, UTC milliseconds. */
  idleEndsAt: number;
}

interface UserAttributes {
  schoolId: string | null;
  displayName: string;
  isDisabled: boolean;
}

declare module "lucia" {
  interface Register {
    Lucia: Lucia<SessionAttributes, UserAttributes>;
    UserId: string;
    DatabaseSessionAttributes: SessionAttributes;
    DatabaseUserAttributes: UserAttributes;
  }
}

import type { SchoolId, UserId } from "../../shared/ids.ts";
import type { Role } from "../../shared/roles.ts";

/** The signed-in person of a request, put there by the session middleware. */
export interface Person {
  readonly userId: UserId;
  readonly roles: readonly Role[];
  readonly schoolId: SchoolId | null;
  readonly displayName: string;
  readonly sessionId: string;
}

declare global {
  namespace Express {
    interface Request {
      /** Undefined when nobody is signed in. */
      person?: Person;
      /** Random id of the request, in logs and in problems. */
      requestId: string;
    }
  }
}

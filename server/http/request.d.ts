import type { LiveSession } from "../identity/sessions.ts";

/** The signed-in person of a request, put there by the session middleware. */
export type Person = LiveSession;

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

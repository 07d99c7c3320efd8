import type { Clock } from "./clock.ts";
import type { Db } from "./db/connection.ts";
import { createAnswerStore } from "./http/answer-store.ts";
import { createAddressFailures } from "./identity/address-failures.ts";
import { createSessions } from "./identity/sessions.ts";
import { createSignInLimits } from "./identity/sign-in-limits.ts";

/**
 * Deletes what is over: ended sessions, forgotten failures, answers that no retry asks for any more.
 * Called at the start and every hour; late is harmless, since nothing that is over counts.
 */
export async function tidyDatabase(db: Db, clock: Clock): Promise<void> {
  await createSessions(db, clock, { isSecure: false }).prune();
  createSignInLimits(db, clock, createAddressFailures(clock)).prune();
  createAnswerStore(db, clock).prune();
}

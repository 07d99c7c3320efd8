import type { FeatureDeps } from "../../deps.ts";
import type { Actor } from "../../http/actor.ts";
import { UserIdSchema } from "../../../shared/ids.ts";
import { publishLineup } from "../../features/lineup/lineup.service.ts";
import { inTransaction } from "../connection.ts";
import { newId } from "../schema/columns.ts";
import { slots } from "../schema/index.ts";
import type { SeedDay } from "./seed-day.ts";
import type { SeededEvent } from "./seed-event.ts";
import type { SeededPeople } from "./seed-people.ts";
import { getId } from "./seed-shows.ts";
import { STAFF } from "./world/people.ts";
import { listSlots } from "./world/season.ts";

const COORDINATOR = "holm";

/** Places the scheduled shows into the season and publishes the plan, as the coordinator would. */
export function seedLineup(
  deps: FeatureDeps,
  day: SeedDay,
  people: SeededPeople,
  event: SeededEvent,
  forwardIds: ReadonlyMap<string, string>,
): void {
  inTransaction(deps.db, (tx) => {
    for (const { date, startsAt, scriptId, isPinned } of listSlots(day.today)) {
      tx.insert(slots)
        .values({
          id: newId(),
          nightId: getId(event.nightIds, date),
          startsAt,
          forwardId: getId(forwardIds, scriptId),
          isPinned,
        })
        .run();
    }
  });
  const coordinator = STAFF.find((one) => one.key === COORDINATOR);
  const actor: Actor = {
    userId: UserIdSchema.parse(getId(people.userIds, COORDINATOR)),
    roles: ["coordinator"],
    schoolId: null,
    displayName: coordinator?.displayName ?? "",
    access: [{ role: "coordinator" }],
  };
  publishLineup(deps, actor);
}

import { tonightIn } from "../../event/night-time.ts";
import type { FeatureDeps } from "../../deps.ts";
import { createSeedDay } from "./seed-day.ts";
import { seedEvent } from "./seed-event.ts";
import { seedLineup } from "./seed-lineup.ts";
import { seedPeople } from "./seed-people.ts";
import { seedProgress } from "./seed-progress.ts";
import { seedShows } from "./seed-shows.ts";
import { seedAssignments, seedWork } from "./seed-work.ts";
import { TIME_ZONE } from "./world/figures.ts";
import { demoStudent, STAFF, STUDENTS } from "./world/people.ts";

/** Students whose cards are printed: one with shows in many states, one who has begun nothing. */
const STUDENT_WITH_WORK = "7B-TARN/wren";
const CLASS_AT_ITS_START = "6C-QUILL";

/**
 * Fills an empty database with the demo world, laid around today so that there is always a tonight
 * with shows. Every script runs through the pool. Gives the lines that say how to sign in. Rejects
 * when a script comes out otherwise than expected; then the database is to be thrown away.
 */
export async function seedDemoWorld(deps: FeatureDeps): Promise<string[]> {
  const now = deps.clock.now();
  const day = createSeedDay(tonightIn(TIME_ZONE, now), TIME_ZONE, now);
  const people = await seedPeople(deps, day);
  const event = seedEvent(deps, day);
  const assignmentIds = seedAssignments(deps, day, people);
  const shows = await seedShows(deps, day, people, event, assignmentIds);
  const forwardIds = seedWork(deps, day, people, shows, assignmentIds);
  seedLineup(deps, day, people, event, forwardIds);
  seedProgress(deps, day, people);
  return listDemoSignIns();
}

/** How to sign in to the demo world as each kind of person, a line each. */
export function listDemoSignIns(): string[] {
  const beginner = STUDENTS.find((one) => one.classCode === CLASS_AT_ITS_START) ?? demoStudent(STUDENT_WITH_WORK);
  const students = [demoStudent(STUDENT_WITH_WORK), beginner].map(({ classCode, username, passphrase }) => {
    return `  student      class code ${classCode}, username ${username}, words ${passphrase.replaceAll("-", " ")}`;
  });
  const staff = ["marlow", "holm", "quist"].flatMap((key) => {
    const one = STAFF.find((each) => each.key === key);
    return one ? [`  ${one.roles.join(", ").padEnd(12)} ${one.email}, password ${one.password}`] : [];
  });
  return ["Sign in to the demo world as", ...students, ...staff];
}

import { adminContract } from "./admin.ts";
import { assignmentsContract } from "./assignments.ts";
import { authContract } from "./auth.ts";
import { classesContract } from "./classes.ts";
import { courseContract } from "./course.ts";
import { lineupContract } from "./lineup.ts";
import { markingContract } from "./marking.ts";
import { showsContract } from "./shows.ts";
import { songsContract } from "./songs.ts";
import { squareContract } from "./square.ts";

/** Every endpoint of the portal, by feature. An endpoint that is not here does not exist. */
export const contracts = {
  auth: authContract,
  classes: classesContract,
  course: courseContract,
  assignments: assignmentsContract,
  shows: showsContract,
  marking: markingContract,
  songs: songsContract,
  square: squareContract,
  lineup: lineupContract,
  admin: adminContract,
} as const;

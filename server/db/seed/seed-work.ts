import { eq } from "drizzle-orm";
import type { FeatureDeps } from "../../deps.ts";
import { type Db, inTransaction } from "../connection.ts";
import { newId } from "../schema/columns.ts";
import { assignments, comments, forwards, marks, submissionEvents, submissions } from "../schema/index.ts";
import type { SeedDay } from "./seed-day.ts";
import { type SeededPeople, teacherOf } from "./seed-people.ts";
import { getId, type SeededShow } from "./seed-shows.ts";
import { ASSIGNMENTS } from "./world/assignments.ts";
import type { DemoWork } from "./world/work.ts";

const MARKING_TIME = "19:20";
const COORDINATOR = "holm";
const SENT_BACK_AFTER_MS = 7 * 60 * 60 * 1000;

/** Adds the assignments of the classes; gives their ids by key. */
export function seedAssignments({ db }: FeatureDeps, day: SeedDay, people: SeededPeople): Map<string, string> {
  const ids = new Map(ASSIGNMENTS.map((one) => [one.key, newId()]));
  inTransaction(db, (tx) => {
    for (const one of ASSIGNMENTS) {
      const { key, classCode, setDay, dueDay, dueTime, title, brief, songId, lateRule, requirements, rubric } = one;
      tx.insert(assignments)
        .values({
          id: getId(ids, key),
          classId: getId(people.classIds, classCode),
          title,
          brief,
          songId,
          dueAt: day.at(dueDay, dueTime),
          lateRule,
          requirements,
          rubric,
          createdBy: getId(people.userIds, teacherOf(classCode)),
          createdAt: day.at(setDay, "08:30"),
        })
        .run();
    }
  });
  return ids;
}

/** Adds what was handed in: submissions with their history, comments, marks and forwards. Gives the id of the forward by script id. */
export function seedWork(
  { db }: FeatureDeps,
  day: SeedDay,
  people: SeededPeople,
  shows: readonly SeededShow[],
  assignmentIds: ReadonlyMap<string, string>,
): Map<string, string> {
  const forwardIds = new Map<string, string>();
  inTransaction(db, (tx) => {
    for (const show of shows) {
      const { work } = show;
      const last = show.versions.at(-1);
      if (work === null || work.state === "working" || last === undefined) continue;
      const submissionId = newId();
      const { state } = work;
      tx.insert(submissions)
        .values({
          id: submissionId,
          assignmentId: getId(assignmentIds, work.assignment),
          showId: show.showId,
          versionId: last.id,
          state,
          handedInAt: last.createdAt,
          isLate: work.isLate ?? false,
          hashesAgree: true,
        })
        .run();
      seedHistory(tx, day, people, show, work, submissionId);
      if (work.forward) forwardIds.set(show.script.id, seedForward(tx, day, people, show, work.forward, submissionId));
    }
  });
  return forwardIds;
}

function seedHistory(
  tx: Db,
  day: SeedDay,
  people: SeededPeople,
  { script, versions }: SeededShow,
  work: DemoWork,
  submissionId: string,
): void {
  const last = versions.at(-1);
  if (last === undefined) return;
  const [classCode = ""] = (script.authors[0] ?? "").split("/");
  const teacher = getId(people.userIds, teacherOf(classCode));
  const markedAt = day.before((work.handedInDay ?? 0) + 1, MARKING_TIME);
  for (const version of versions) {
    tx.insert(submissionEvents)
      .values({ submissionId, versionId: version.id, state: "submitted", by: version.createdBy, at: version.createdAt })
      .run();
    if (version === last) continue;
    // An earlier version was sent back that evening.
    tx.insert(submissionEvents)
      .values({
        submissionId,
        versionId: version.id,
        state: "revise",
        by: teacher,
        at: version.createdAt + SENT_BACK_AFTER_MS,
      })
      .run();
  }
  if (work.state === "revise" || work.state === "marked") {
    tx.insert(submissionEvents)
      .values({
        submissionId,
        versionId: last.id,
        state: work.state,
        by: teacher,
        at: markedAt,
        note: work.mark?.note ?? null,
      })
      .run();
  }
  for (const { by, anchor, body } of work.comments ?? []) {
    tx.insert(comments)
      .values({
        submissionId,
        versionId: last.id,
        authorId: getId(people.userIds, by),
        anchor,
        body,
        createdAt: markedAt,
      })
      .run();
  }
  if (work.mark) {
    const { levels, note } = work.mark;
    const rubric =
      tx
        .select({ rubric: assignments.rubric })
        .from(assignments)
        .innerJoin(submissions, eq(submissions.assignmentId, assignments.id))
        .where(eq(submissions.id, submissionId))
        .get()?.rubric ?? [];
    const byCriterion = Object.fromEntries(rubric.map((criterion, n) => [criterion.id, levels[n] ?? 1]));
    tx.insert(marks)
      .values({
        submissionId,
        levels: byCriterion,
        note,
        markedBy: teacher,
        savedAt: markedAt,
        releasedAt: work.state === "marked" ? markedAt : null,
      })
      .run();
  }
}

function seedForward(
  tx: Db,
  day: SeedDay,
  people: SeededPeople,
  { script, versions }: SeededShow,
  forward: NonNullable<DemoWork["forward"]>,
  submissionId: string,
): string {
  const id = newId();
  const [classCode = ""] = (script.authors[0] ?? "").split("/");
  const last = versions.at(-1);
  const forwardedAt = day.before(-1, "19:40");
  const isAnswered = forward.state !== "waiting";
  tx.insert(forwards)
    .values({
      id,
      submissionId,
      versionId: last?.id ?? "",
      note: forward.note,
      forwardedBy: getId(people.userIds, teacherOf(classCode)),
      forwardedAt,
      // "scheduled" is an approved show that stands in the lineup.
      state: forward.state === "scheduled" ? "approved" : forward.state,
      answer: forward.answer ?? null,
      ...(isAnswered && { answeredBy: getId(people.userIds, COORDINATOR), answeredAt: day.before(-1, "21:10") }),
    })
    .run();
  return id;
}

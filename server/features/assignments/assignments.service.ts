import type {
  AssignmentDetail,
  AssignmentFields,
  AssignmentSummary,
  Rubric,
} from "../../../shared/contracts/assignments.ts";
import { ProblemError } from "../../../shared/problem.ts";
import type { Clock } from "../../clock.ts";
import { type Db, inTransaction } from "../../db/connection.ts";
import { newId } from "../../db/schema/columns.ts";
import { findSong } from "../../event/song.queries.ts";
import { type Actor, assertRelation } from "../../http/actor.ts";
import { fieldProblem } from "../../work/field-problem.ts";
import { listClassRelations } from "../../work/relations.queries.ts";
import { presentAssignment, presentAssignments } from "./assignments.presenter.ts";
import {
  type AssignmentWithClass,
  getAssignment,
  hasMarks,
  hasShows,
  insertAssignment,
  listAssignments,
  listEnrolledClassIds,
  listTaughtClassIds,
  updateAssignment,
} from "./assignments.queries.ts";

interface AssignmentsDeps {
  readonly db: Db;
  readonly clock: Clock;
}

/** The assignments of the classes that the caller is in or teaches, next due first. */
export function listOwnAssignments(db: Db, actor: Actor): AssignmentSummary[] {
  const classIds = new Set<string>();
  if (actor.roles.includes("student")) for (const id of listEnrolledClassIds(db, actor.userId)) classIds.add(id);
  if (actor.roles.includes("teacher")) for (const id of listTaughtClassIds(db, actor.userId)) classIds.add(id);
  return presentAssignments(db, actor, listAssignments(db, [...classIds]));
}

/** One assignment with brief, requirements and rubric. Throws `not-found`. */
export function getAssignmentDetail(db: Db, actor: Actor, assignmentId: string): AssignmentDetail {
  const row = getRelatedAssignment(db, actor, assignmentId);
  return {
    assignment: presentAssignment(db, actor, row),
    brief: row.assignment.brief,
    requirements: row.assignment.requirements,
    rubric: row.assignment.rubric,
    teacherName: row.teacherName,
  };
}

/** Sets an assignment for a class. Throws `not-found` for a class of others, `invalid-request` naming the field. */
export function createAssignment(
  { db, clock }: AssignmentsDeps,
  actor: Actor,
  classId: string,
  fields: AssignmentFields,
): AssignmentSummary {
  return inTransaction(db, (tx) => {
    assertRelation(actor, listClassRelations(tx, actor.userId, classId));
    assertFields(tx, fields);
    if (fields.dueAt <= clock.now()) throw fieldProblem("/dueAt", "This date is over. Choose a later one.");
    const id = newId();
    insertAssignment(tx, { id, classId, ...fields, createdBy: actor.userId, createdAt: clock.now() });
    return presentAssignment(tx, actor, getAssignment(tx, id));
  });
}

/**
 * Changes an assignment. Throws `wrong-state` for another rubric once something was marked with it,
 * and for another song once a show was begun for it; `invalid-request`; `not-found`.
 */
export function changeAssignment(
  db: Db,
  actor: Actor,
  assignmentId: string,
  change: Partial<AssignmentFields>,
): AssignmentSummary {
  return inTransaction(db, (tx) => {
    const { assignment } = getRelatedAssignment(tx, actor, assignmentId);
    assertFields(tx, change);
    if (change.rubric && !isSameRubric(change.rubric, assignment.rubric) && hasMarks(tx, assignmentId)) {
      throw new ProblemError("wrong-state", {
        detail: "Something was marked with this rubric, so it stays as it is. Set a new assignment for another rubric.",
      });
    }
    if (change.songId !== undefined && change.songId !== assignment.songId && hasShows(tx, assignmentId)) {
      throw new ProblemError("wrong-state", {
        detail: "Shows were begun with this song, so it stays. Set a new assignment for another song.",
      });
    }
    const set = Object.fromEntries(Object.entries(change).filter(([, value]) => value !== undefined));
    updateAssignment(tx, assignmentId, set);
    return presentAssignment(tx, actor, getAssignment(tx, assignmentId));
  });
}

function getRelatedAssignment(db: Db, actor: Actor, assignmentId: string): AssignmentWithClass {
  const row = getAssignment(db, assignmentId);
  assertRelation(actor, listClassRelations(db, actor.userId, row.assignment.classId));
  return row;
}

function assertFields(db: Db, fields: Partial<AssignmentFields>): void {
  if (fields.songId !== undefined && !findSong(db, fields.songId))
    throw fieldProblem("/songId", "There is no such song. Choose one from the list.");
  const twice = firstRepeat((fields.rubric ?? []).map((criterion) => criterion.id));
  if (twice !== null) throw fieldProblem(`/rubric/${twice}/id`, "Two criteria have the same id.");
  const asked = firstRepeat((fields.requirements ?? []).map((requirement) => requirement.kind));
  if (asked !== null)
    throw fieldProblem(`/requirements/${asked}/kind`, "This is asked for twice. Keep one and count it up.");
}

/** Place of the first value that came before, or null. */
function firstRepeat(values: readonly string[]): number | null {
  const place = values.findIndex((value, index) => values.indexOf(value) < index);
  return place === -1 ? null : place;
}

function isSameRubric(a: Rubric, b: Rubric): boolean {
  return JSON.stringify(a) === JSON.stringify(b);
}

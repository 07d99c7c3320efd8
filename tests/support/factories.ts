import { LANGUAGE_VERSION } from "../../sandbox/timeline/model.ts";
import type { Role } from "../../shared/roles.ts";
import type { Db } from "../../server/db/connection.ts";
import { newId } from "../../server/db/schema/columns.ts";
import {
  assignments,
  beatMaps,
  classes,
  classTeachers,
  comments,
  drafts,
  enrolments,
  forwards,
  marks,
  nights,
  runs,
  schools,
  seasons,
  showAuthors,
  shows,
  showVersions,
  slots,
  songFiles,
  songs,
  squareLayouts,
  squares,
  submissionEvents,
  submissions,
  userRoles,
  users,
} from "../../server/db/schema/index.ts";
import { buildLayout, buildSong as buildBeatMap } from "../factories/small-show.ts";

/**
 * Rows for tests: `build*(db, overrides)` inserts one, valid by default, with every parent that is not
 * named, and gives the row. A test mentions only what it is about.
 */

/** When everything of a test was made, unless it says otherwise. */
const MADE_AT = Date.UTC(2026, 10, 2, 9);

let count = 0;
const next = () => ++count;

export function buildSchool(db: Db, overrides: Partial<typeof schools.$inferInsert> = {}) {
  const name = `School ${next()}`;
  return db
    .insert(schools)
    .values({ name, shortName: name, timeZone: "America/New_York", ...overrides })
    .returning()
    .get();
}

export function buildUser(db: Db, overrides: Partial<typeof users.$inferInsert> & { roles?: readonly Role[] } = {}) {
  const { roles = ["student"], ...columns } = overrides;
  const number = next();
  const isStudent = roles.includes("student");
  const user = db
    .insert(users)
    .values({
      schoolId: columns.schoolId === undefined ? buildSchool(db).id : columns.schoolId,
      displayName: `Person ${number}`,
      username: isStudent ? `person${number}` : null,
      email: isStudent ? null : `person${number}@school.example`,
      createdAt: MADE_AT,
      ...columns,
    })
    .returning()
    .get();
  for (const role of roles) db.insert(userRoles).values({ userId: user.id, role }).run();
  return user;
}

/** A class with its teachers and students; one teacher is made when none is named. */
export function buildClass(
  db: Db,
  overrides: Partial<typeof classes.$inferInsert> & {
    teacherIds?: readonly string[];
    studentIds?: readonly string[];
  } = {},
) {
  const { teacherIds, studentIds = [], ...columns } = overrides;
  const number = next();
  const row = db
    .insert(classes)
    .values({
      schoolId: columns.schoolId ?? buildSchool(db).id,
      name: `Class ${number}`,
      code: `7B-T${number}`,
      ...columns,
    })
    .returning()
    .get();
  for (const userId of teacherIds ?? [buildUser(db, { roles: ["teacher"], schoolId: row.schoolId }).id]) {
    db.insert(classTeachers).values({ classId: row.id, userId }).run();
  }
  for (const userId of studentIds) db.insert(enrolments).values({ classId: row.id, userId }).run();
  return row;
}

/** The square with one layout of two fronts, made current. */
export function buildSquare(db: Db, overrides: Partial<typeof squares.$inferInsert> = {}) {
  const squareId = overrides.id ?? newId();
  const layoutId = newId();
  db.insert(squares)
    .values({
      id: squareId,
      name: "Lantern Square",
      townName: "Quillhaven",
      eventName: "Quillhaven Winter Lights",
      timeZone: "America/New_York",
      currentLayoutId: layoutId,
      ...overrides,
    })
    .run();
  const layout = buildLayout([
    { side: "north", outlets: ["dimmer", "relay"] },
    { side: "south", outlets: ["solid-state"] },
  ]);
  return db
    .insert(squareLayouts)
    .values({ id: layoutId, squareId, number: 1, hash: `layout-${layoutId}`, layout, createdAt: MADE_AT })
    .returning()
    .get();
}

/** The current layout of the one square, made when there is none. */
export function findOrBuildLayout(db: Db) {
  return db.select().from(squareLayouts).limit(1).get() ?? buildSquare(db);
}

export function buildSong(db: Db, overrides: Partial<typeof songs.$inferInsert> = {}) {
  const songId = overrides.id ?? newId();
  const beatMapId = newId();
  const song = db
    .insert(songs)
    .values({
      id: songId,
      title: `Song ${next()}`,
      credit: "traditional, our arrangement",
      currentBeatMapId: beatMapId,
      ...overrides,
    })
    .returning()
    .get();
  db.insert(beatMaps).values({ id: beatMapId, songId, number: 1, beatMap: buildBeatMap(), createdAt: MADE_AT }).run();
  return { ...song, currentBeatMapId: beatMapId };
}

/** A show with a draft; one author is made when none is named. */
export function buildShow(
  db: Db,
  overrides: Partial<typeof shows.$inferInsert> & {
    authorIds?: readonly string[];
    source?: string;
    revision?: number;
  } = {},
) {
  const { authorIds, source = "on(square);\n", revision = 1, ...columns } = overrides;
  const show = db
    .insert(shows)
    .values({
      title: `Show ${next()}`,
      songId: columns.songId ?? buildSong(db).id,
      seed: 7,
      createdAt: MADE_AT,
      ...columns,
    })
    .returning()
    .get();
  for (const userId of authorIds ?? [buildUser(db).id])
    db.insert(showAuthors).values({ showId: show.id, userId }).run();
  db.insert(drafts).values({ showId: show.id, revision, source, savedAt: MADE_AT }).run();
  return show;
}

export function buildAssignment(db: Db, overrides: Partial<typeof assignments.$inferInsert> = {}) {
  return db
    .insert(assignments)
    .values({
      classId: overrides.classId ?? buildClass(db).id,
      title: `Assignment ${next()}`,
      brief: "Write a show for this song.",
      songId: overrides.songId ?? buildSong(db).id,
      dueAt: Date.UTC(2026, 11, 4, 21),
      lateRule: "accept-late",
      requirements: [],
      rubric: [
        {
          id: "timing",
          name: "Timing",
          levels: ["Not yet", "Nearly", "There", "Beyond"].map((name) => ({ name, text: name })),
        },
      ],
      createdBy: overrides.createdBy ?? buildUser(db, { roles: ["teacher"] }).id,
      createdAt: MADE_AT,
      ...overrides,
    })
    .returning()
    .get();
}

/** An immutable version of a show, with one good run. */
export function buildVersion(db: Db, overrides: Partial<typeof showVersions.$inferInsert> = {}) {
  const show = overrides.showId
    ? db.query.shows.findFirst({ where: (row, { eq }) => eq(row.id, overrides.showId ?? "") }).sync()
    : undefined;
  const showRow = show ?? buildShow(db);
  const song = db.query.songs.findFirst({ where: (row, { eq }) => eq(row.id, showRow.songId) }).sync();
  const author = db.query.showAuthors.findFirst({ where: (row, { eq }) => eq(row.showId, showRow.id) }).sync();
  const version = db
    .insert(showVersions)
    .values({
      showId: showRow.id,
      number: next(),
      source: "on(square);\n",
      seed: showRow.seed,
      language: LANGUAGE_VERSION,
      songId: showRow.songId,
      layoutId: findOrBuildLayout(db).id,
      beatMapId: song?.currentBeatMapId ?? "",
      createdBy: author?.userId ?? "",
      createdAt: MADE_AT,
      ...overrides,
    })
    .returning()
    .get();
  buildRun(db, version);
  return version;
}

export function buildRun(
  db: Db,
  version: typeof showVersions.$inferSelect,
  overrides: Partial<typeof runs.$inferInsert> = {},
) {
  const hash = "a".repeat(64);
  return db
    .insert(runs)
    .values({
      versionId: version.id,
      layoutId: version.layoutId,
      beatMapId: version.beatMapId,
      engine: "test",
      rulesVersion: 1,
      summary: {
        isOk: true,
        problem: null,
        hash,
        cueCount: 1,
        findings: [],
        seconds: 16,
        description: "The square lights up.",
      },
      hash,
      createdAt: MADE_AT,
      ...overrides,
    })
    .returning()
    .get();
}

/** A submission of a version, in an assignment of a class that the author is enrolled in. */
export function buildSubmission(
  db: Db,
  overrides: Partial<typeof submissions.$inferInsert> & { studentId?: string; classId?: string } = {},
) {
  const { studentId, classId, ...columns } = overrides;
  const authorId = studentId ?? buildUser(db).id;
  const inClass = classId ?? buildClass(db, { studentIds: [authorId] }).id;
  const assignmentId = columns.assignmentId ?? buildAssignment(db, { classId: inClass }).id;
  const showId = columns.showId ?? buildShow(db, { assignmentId, authorIds: [authorId] }).id;
  const versionId = columns.versionId ?? buildVersion(db, { showId }).id;
  const submission = db
    .insert(submissions)
    .values({ state: "submitted", handedInAt: MADE_AT, isLate: false, ...columns, assignmentId, showId, versionId })
    .returning()
    .get();
  db.insert(submissionEvents)
    .values({ submissionId: submission.id, versionId, state: "submitted", by: authorId, at: MADE_AT })
    .run();
  return submission;
}

export function buildComment(
  db: Db,
  overrides: Partial<typeof comments.$inferInsert> & { submissionId: string; versionId: string; authorId: string },
) {
  return db
    .insert(comments)
    .values({ anchor: { kind: "whole" }, body: "Look at the start again.", createdAt: MADE_AT, ...overrides })
    .returning()
    .get();
}

export function buildMark(
  db: Db,
  overrides: Partial<typeof marks.$inferInsert> & { submissionId: string; markedBy: string },
) {
  return db
    .insert(marks)
    .values({ levels: { timing: 3 }, note: "On the beat.", savedAt: MADE_AT, ...overrides })
    .returning()
    .get();
}

export function buildForward(db: Db, overrides: Partial<typeof forwards.$inferInsert> & { forwardedBy: string }) {
  const submission = overrides.submissionId === undefined ? buildSubmission(db, { state: "marked" }) : null;
  return db
    .insert(forwards)
    .values({
      submissionId: submission?.id ?? "",
      versionId: submission?.versionId ?? "",
      note: "Please have a look.",
      forwardedAt: MADE_AT,
      state: "waiting",
      ...overrides,
    })
    .returning()
    .get();
}

export function buildSeason(db: Db, overrides: Partial<typeof seasons.$inferInsert> = {}) {
  return db
    .insert(seasons)
    .values({
      squareId: overrides.squareId ?? findOrBuildLayout(db).squareId,
      name: "Winter 2026",
      firstDate: "2026-12-01",
      lastDate: "2026-12-24",
      times: ["18:00", "18:20", "18:40"],
      ...overrides,
    })
    .returning()
    .get();
}

export function buildNight(db: Db, overrides: Partial<typeof nights.$inferInsert> = {}) {
  return db
    .insert(nights)
    .values({
      seasonId: overrides.seasonId ?? buildSeason(db).id,
      date: "2026-12-04",
      opensAt: "17:30",
      closesAt: "21:00",
      ...overrides,
    })
    .returning()
    .get();
}

export function buildSlot(db: Db, overrides: Partial<typeof slots.$inferInsert> & { forwardId: string }) {
  return db
    .insert(slots)
    .values({ nightId: overrides.nightId ?? buildNight(db).id, startsAt: "18:00", ...overrides })
    .returning()
    .get();
}

export function buildSongFile(
  db: Db,
  overrides: Partial<typeof songFiles.$inferInsert> & { songId: string; bytes: Buffer },
) {
  return db
    .insert(songFiles)
    .values({ mediaType: "audio/midi", ...overrides })
    .returning()
    .get();
}

import { LESSONS } from "../../lessons/index.ts";
import type { MidiFile } from "../../sandbox/music/midi-file.ts";
import { writeMidi } from "../../sandbox/music/write-midi.ts";
import type { Db } from "../../server/db/connection.ts";
import { draftHistory, showAuthors, showInvitations, signInResets } from "../../server/db/schema/index.ts";
import { createSecretHasher } from "../../server/identity/secret-hasher.ts";
import type { Relation, Role } from "../../shared/roles.ts";
import {
  buildAssignment,
  buildClass,
  buildComment,
  buildForward,
  buildMark,
  buildNight,
  buildSchool,
  buildShow,
  buildSlot,
  buildSong,
  buildSongFile,
  buildSquare,
  buildSubmission,
  buildUser,
} from "../support/factories.ts";

/** Everybody who calls, by how they stand to what the student `student-own` made in the class of `teacher-own`. */
export const CALLERS = [
  "signed-out",
  "student-own",
  "student-same-class",
  "student-other-class",
  "student-other-school",
  "teacher-own-class",
  "teacher-other-class",
  "teacher-other-school",
  "coordinator",
  "admin",
] as const;
export type Caller = (typeof CALLERS)[number];
export type SignedInCaller = Exclude<Caller, "signed-out">;

export const ROLE_OF: Readonly<Record<SignedInCaller, Role>> = {
  "student-own": "student",
  "student-same-class": "student",
  "student-other-class": "student",
  "student-other-school": "student",
  "teacher-own-class": "teacher",
  "teacher-other-class": "teacher",
  "teacher-other-school": "teacher",
  coordinator: "coordinator",
  admin: "admin",
};

/** How each caller stands to the objects; `forwarded` counts for the coordinator where the object was forwarded. */
export const RELATIONS_OF: Readonly<Record<SignedInCaller, readonly Relation[]>> = {
  "student-own": ["author", "class-member"],
  "student-same-class": ["class-member", "asked"],
  "student-other-class": [],
  "student-other-school": [],
  "teacher-own-class": ["class-teacher"],
  "teacher-other-class": [],
  "teacher-other-school": [],
  coordinator: ["forwarded"],
  admin: [],
};

/** Nobody of these has any business with the objects: no answer to them may hold a byte of one. */
export const STRANGERS: ReadonlySet<Caller> = new Set<Caller>([
  "signed-out",
  "student-other-class",
  "student-other-school",
  "teacher-other-class",
  "teacher-other-school",
  "admin",
]);

/** Stands in every text of the objects. */
export const CANARY = "canary-3f9a";

export const WORDS = "acorn-lantern-river-maple";
export const PASSWORD = "seven grey geese over the ironmonger";
export const RESET_CODE = "ABCD2345";
export const USERNAME = "wren.a";
export const CLASS_CODE = "7B-TARN";

/** A song needs a score to be given: one note. */
const TUNE: MidiFile = {
  format: 1,
  ticksPerQuarter: 480,
  tempos: [{ tick: 0, microsPerQuarter: 500_000 }],
  meters: [{ tick: 0, beats: 4, unit: 4 }],
  markers: [],
  tracks: [{ name: "bells", program: 14, notes: [{ tick: 0, ticks: 480, pitch: 60, velocity: 100, channel: 0 }] }],
};

export type World = Awaited<ReturnType<typeof buildWorld>>;

/** One square, two schools, three classes; everything that an endpoint can name exists once in each state it needs. */
export async function buildWorld(db: Db, now: number) {
  const hasher = createSecretHasher();
  const [wordsHash, secretHash, codeHash] = await Promise.all([
    hasher.hash(WORDS),
    hasher.hash(PASSWORD),
    hasher.hash(RESET_CODE),
  ]);
  const layout = buildSquare(db);
  for (const id of new Set(LESSONS.map((lesson) => lesson.songId))) {
    buildSong(db, { id });
    buildSongFile(db, { songId: id, bytes: Buffer.from(writeMidi(TUNE)) });
  }
  const songId = LESSONS[0]?.songId ?? "";

  const school = buildSchool(db).id;
  const otherSchool = buildSchool(db).id;
  const student = (schoolId: string, columns: object = {}) => buildUser(db, { schoolId, ...columns }).id;
  const staff = (role: Role, schoolId: string | null) => buildUser(db, { roles: [role], schoolId, secretHash }).id;
  const people: Record<SignedInCaller, string> = {
    "student-own": student(school, { displayName: `Wren ${CANARY}`, username: USERNAME, secretHash: wordsHash }),
    "student-same-class": student(school),
    "student-other-class": student(school),
    "student-other-school": student(otherSchool),
    "teacher-own-class": staff("teacher", school),
    "teacher-other-class": staff("teacher", school),
    "teacher-other-school": staff("teacher", otherSchool),
    coordinator: staff("coordinator", null),
    admin: staff("admin", null),
  };
  const own = people["student-own"];
  const teacher = people["teacher-own-class"];

  const third = student(school);
  const members = [own, people["student-same-class"], third];
  const classId = buildClass(db, {
    schoolId: school,
    name: CANARY,
    code: CLASS_CODE,
    teacherIds: [teacher],
    studentIds: members,
  }).id;
  buildClass(db, {
    schoolId: school,
    teacherIds: [people["teacher-other-class"]],
    studentIds: [people["student-other-class"]],
  });
  buildClass(db, {
    schoolId: otherSchool,
    teacherIds: [people["teacher-other-school"]],
    studentIds: [people["student-other-school"]],
  });
  db.insert(signInResets)
    .values({ userId: own, codeHash, expiresAt: now + 600_000, madeBy: teacher })
    .run();

  const assignment = () =>
    buildAssignment(db, { classId, songId, createdBy: teacher, title: `Assignment ${CANARY}`, brief: CANARY }).id;
  const show = (authorId: string, assignmentId: string | null) => {
    const secret = authorId === own ? CANARY : "of somebody else";
    return buildShow(db, {
      songId,
      assignmentId,
      authorIds: [authorId],
      title: `Show ${secret}`,
      source: `// ${secret}\n`,
    }).id;
  };
  const work = (state: "submitted" | "marked") => {
    const assignmentId = assignment();
    const showId = show(own, assignmentId);
    return buildSubmission(db, { assignmentId, showId, studentId: own, classId, state });
  };

  const openAssignment = assignment();
  // A show of each student for the open assignment, so that a hand-in fails for nothing but access.
  const handIns = mapPeople(people, (userId) => show(userId, members.includes(userId) ? openAssignment : null));

  db.insert(draftHistory)
    .values({ showId: handIns["student-own"], revision: 1, source: CANARY, beganAt: now, savedAt: now, savedBy: own })
    .run();

  // A show for no assignment, which a second author may leave and a classmate is asked to join.
  const sharedId = show(own, null);
  db.insert(showAuthors).values({ showId: sharedId, userId: third }).run();
  db.insert(showInvitations)
    .values({ showId: sharedId, userId: people["student-same-class"], askedBy: own, askedAt: now })
    .run();

  const submitted = work("submitted");
  buildMark(db, { submissionId: submitted.id, markedBy: teacher, note: CANARY });
  // A comment of everybody's own, so that taking it back fails for nothing but access.
  const comments = mapPeople(
    people,
    (authorId) =>
      buildComment(db, { submissionId: submitted.id, versionId: submitted.versionId, authorId, body: CANARY }).id,
  );
  const marked = work("marked");
  buildMark(db, { submissionId: marked.id, markedBy: teacher, note: CANARY, releasedAt: now });
  const forward = (state: "waiting" | "approved") => {
    const { id: submissionId, versionId } = work("marked");
    return {
      versionId,
      id: buildForward(db, { submissionId, versionId, forwardedBy: teacher, state, note: CANARY }).id,
    };
  };
  const waiting = forward("waiting");
  const approved = forward("approved");
  const placed = forward("approved");
  const nightId = buildNight(db).id;
  const slotId = buildSlot(db, { nightId, forwardId: placed.id, startsAt: "18:00" }).id;

  return {
    people,
    classId,
    songId,
    layoutId: layout.id,
    assignmentId: openAssignment,
    handIns,
    showId: handIns["student-own"],
    sharedId,
    thirdId: third,
    forwardedVersionId: waiting.versionId,
    submittedId: submitted.id,
    submittedVersionId: submitted.versionId,
    markedId: marked.id,
    comments,
    waitingId: waiting.id,
    approvedId: approved.id,
    nightId,
    slotId,
  };
}

function mapPeople(
  people: Record<SignedInCaller, string>,
  make: (userId: string) => string,
): Record<SignedInCaller, string> {
  return Object.fromEntries(Object.entries(people).map(([caller, userId]) => [caller, make(userId)])) as Record<
    SignedInCaller,
    string
  >;
}

import { LESSONS } from "../../lessons/index.ts";
import { type Caller, CLASS_CODE, PASSWORD, RESET_CODE, USERNAME, WORDS, type World } from "./world.ts";

/** What a caller sends to an endpoint so that nothing but access can refuse it. */
export interface Call {
  readonly params?: object;
  readonly query?: object;
  readonly body?: object;
}

export interface Fixture {
  readonly build: (world: World, caller: Caller) => Call;
  /** The caller proves who they are, and gets what is theirs. */
  readonly provesIdentity?: boolean;
}

const call = (build: Fixture["build"]): Fixture => ({ build });
/** Whose of a thing that everybody has one of. */
const ownerFor = (caller: Caller) => (caller === "signed-out" ? "student-own" : caller);
const nothing = call(() => ({}));

const lesson = LESSONS[0];
const questionStep = lesson?.steps.find((step) => step.question !== null);
const scriptStep = lesson?.steps.find((step) => step.starter !== null);
const ofStep = (stepId: string | undefined, body: object) =>
  call(() => ({ params: { lessonId: lesson?.id, stepId }, body }));

const inClass = (body?: object) => call(({ classId }) => ({ params: { classId }, body }));
const ofAssignment = (body?: object) => call(({ assignmentId }) => ({ params: { assignmentId }, body }));
const ofShow = (body?: object) => call(({ showId }) => ({ params: { showId }, body }));
const ofShared = (body?: object) => call(({ sharedId: showId }) => ({ params: { showId }, body }));
const ofSubmitted = (body?: object) => call(({ submittedId: submissionId }) => ({ params: { submissionId }, body }));
const ofSubmittedVersion = (body: object) =>
  call(({ submittedId: submissionId, submittedVersionId: versionId }) => ({
    params: { submissionId },
    body: { ...body, versionId },
  }));
const ofMarked = (body?: object) => call(({ markedId: submissionId }) => ({ params: { submissionId }, body }));
const ofForward = (body?: object) => call(({ waitingId: forwardId }) => ({ params: { forwardId }, body }));
const ofSlot = (body?: object) => call(({ slotId }) => ({ params: { slotId }, body }));
const ofClassmate = call(({ classId, people }) => ({ params: { classId, studentId: people["student-same-class"] } }));

/** One entry an endpoint, by feature and name; an endpoint without one fails the matrix. */
export const FIXTURES: Readonly<Record<string, Fixture>> = {
  "auth.studentSignIn": {
    build: () => ({ body: { classCode: CLASS_CODE, username: USERNAME, passphrase: WORDS } }),
    provesIdentity: true,
  },
  "auth.staffSignIn": {
    build: () => ({ body: { email: "staff@school.example", password: PASSWORD } }),
    provesIdentity: true,
  },
  "auth.session": nothing,
  "auth.signOut": nothing,
  "auth.signOutEverywhere": nothing,
  "auth.changePassword": call(() => ({ body: { current: PASSWORD, next: "forty lamps above the tea room" } })),
  "auth.suggestPassphrases": nothing,
  "auth.redeemReset": {
    build: () => ({
      body: { classCode: CLASS_CODE, username: USERNAME, code: RESET_CODE, passphrase: "comet-drum-easy-finch" },
    }),
    provesIdentity: true,
  },

  "classes.list": nothing,
  "classes.get": inClass(),
  "classes.addStudents": inClass({ displayNames: ["Ada Quill"] }),
  "classes.makeCards": call(({ classId, people }) => ({
    params: { classId },
    body: { studentIds: [people["student-same-class"]] },
  })),
  "classes.resetSignIn": ofClassmate,
  "classes.removeStudent": ofClassmate,

  "course.lessons": nothing,
  "course.lesson": call(() => ({ params: { lessonId: lesson?.id } })),
  "course.answer": ofStep(questionStep?.id, { choice: 0 }),
  "course.attempt": ofStep(scriptStep?.id, { source: scriptStep?.starter }),

  "assignments.list": nothing,
  "assignments.get": ofAssignment(),
  "assignments.create": call(({ classId, songId }) => ({
    params: { classId },
    body: {
      title: "Bells",
      brief: "Light the bells.",
      songId,
      dueAt: Date.UTC(2026, 11, 18),
      lateRule: "accept-late",
      requirements: [],
      rubric: [
        { id: "timing", name: "Timing", levels: ["One", "Two", "Three", "Four"].map((name) => ({ name, text: name })) },
      ],
    },
  })),
  "assignments.update": ofAssignment({ title: "A new title" }),
  "assignments.handIn": call(({ assignmentId, handIns }, caller) => ({
    params: { assignmentId },
    body: { showId: handIns[ownerFor(caller)], revision: 1, hash: null },
  })),

  "shows.list": nothing,
  "shows.create": call(({ songId }) => ({ body: { title: "A new show", songId } })),
  "shows.get": ofShow(),
  "shows.update": ofShow({ title: "Another title" }),
  "shows.duplicate": ofShow(),
  "shows.saveDraft": ofShow({ baseRevision: 1, source: "// saved\n" }),
  "shows.history": ofShow(),
  "shows.earlierDraft": call(({ showId }) => ({ params: { showId, revision: 1 } })),
  "shows.version": call(({ forwardedVersionId: versionId }) => ({ params: { versionId } })),

  "shows.partners": ofShared(),
  "shows.askPartner": call(({ showId, thirdId: userId }) => ({ params: { showId }, body: { userId } })),
  "shows.withdrawPartner": call(({ sharedId: showId, people }) => ({
    params: { showId, userId: people["student-same-class"] },
  })),
  "shows.leave": ofShared(),
  "shows.invitations": nothing,
  "shows.answerInvitation": ofShared({ answer: "join" }),

  "marking.inbox": nothing,
  "marking.queue": ofAssignment(),
  "marking.submission": ofSubmitted(),
  "marking.comment": ofSubmitted({ anchor: { kind: "whole" }, body: "Well timed." }),
  "marking.deleteComment": call(({ comments }, caller) => ({ params: { commentId: comments[ownerFor(caller)] } })),
  "marking.saveMark": ofSubmitted({ levels: { timing: 2 }, note: "Nearly there." }),
  "marking.sendBack": ofSubmittedVersion({ note: "Look at the start again." }),
  "marking.release": ofSubmittedVersion({}),
  "marking.reopen": ofMarked(),

  "songs.list": nothing,
  "songs.get": call(({ songId }) => ({ params: { songId } })),
  "square.current": nothing,
  "square.layout": call(({ layoutId }) => ({ params: { layoutId } })),

  "lineup.forward": ofMarked({ note: "Please have a look." }),
  "lineup.forwards": nothing,
  "lineup.forwardDetail": ofForward(),
  "lineup.approve": ofForward({ note: "" }),
  "lineup.decline": ofForward({ note: "The start is too bright." }),
  "lineup.lineup": nothing,
  "lineup.place": call(({ approvedId: forwardId, nightId }) => ({ body: { forwardId, nightId, startsAt: "18:20" } })),
  "lineup.move": ofSlot({ startsAt: "18:40" }),
  "lineup.remove": ofSlot(),
  "lineup.setNight": call(({ nightId }) => ({ params: { nightId }, body: { closesAt: "21:30" } })),
  "lineup.publish": nothing,
  "lineup.programme": nothing,

  "admin.overview": nothing,
  "admin.addStaff": call(() => ({
    body: {
      displayName: "Ida Fenn",
      email: "ida@school.example",
      roles: ["coordinator"],
      schoolId: null,
      password: "seven grey geese at dusk",
    },
  })),
  "admin.setDisabled": call(({ people }) => ({
    params: { userId: people["teacher-other-school"] },
    body: { isDisabled: true },
  })),
  "admin.audit": nothing,
};

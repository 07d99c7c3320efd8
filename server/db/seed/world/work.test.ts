import { describe, expect, it } from "vitest";
import { AssignmentFieldsSchema } from "../../../../shared/contracts/assignments.ts";
import { CommentAnchorSchema } from "../../../../shared/contracts/marking.ts";
import { countText, readingGrade } from "../../../../shared/reading-grade.ts";
import { listUnmet } from "../../../../sandbox/checks/use.ts";
import { ASSIGNMENTS } from "./assignments.ts";
import { demoStudent, STAFF } from "./people.ts";
import { demoScript } from "./scripts/index.ts";
import { demoSong } from "./songs/demo-songs.ts";
import { WORK } from "./work.ts";

const assignment = (key: string) => {
  const found = ASSIGNMENTS.find((one) => one.key === key);
  if (!found) throw new RangeError(`No assignment "${key}".`);
  return found;
};

describe("assignments", () => {
  it.each(ASSIGNMENTS.map((one) => [one.title, one] as const))("%s is one that a teacher could set", (_, one) => {
    expect(AssignmentFieldsSchema.safeParse({ ...one, dueAt: Date.UTC(2026, 11, 1) }).error).toBeUndefined();
    expect(demoSong(one.songId).id).toBe(one.songId);
    expect(one.dueDay).toBeGreaterThan(one.setDay);
    expect(one.rubric).toHaveLength(4);
    expect(new Set(one.rubric.flatMap((criterion) => criterion.levels.map((level) => level.text))).size).toBe(16);
    expect(readingGrade(countText(one.brief))).toBeLessThanOrEqual(6.5);
  });

  it("come in every stage: open, due, late work taken and not taken", () => {
    expect(ASSIGNMENTS.length).toBeGreaterThanOrEqual(8);
    expect(ASSIGNMENTS.some((one) => one.dueDay > 0)).toBe(true);
    expect(new Set(ASSIGNMENTS.map((one) => one.lateRule))).toEqual(new Set(["accept-late", "closed"]));
  });
});

describe("work", () => {
  it.each(WORK.map((one) => [one.scriptId, one] as const))("%s fits its assignment", (_, one) => {
    const script = demoScript(one.scriptId);
    const given = assignment(one.assignment);
    expect(script.songId).toBe(given.songId);
    for (const key of script.authors) expect(demoStudent(key).classCode).toBe(given.classCode);
    expect(one.handedInDay === null).toBe(one.state === "working");
    expect(one.mark !== undefined).toBe(one.state === "marked");
    if (one.forward) expect(one.state).toBe("marked");
    if (one.forward?.state === "declined") expect(one.forward.answer).toBeTruthy();
    if (one.isLate) expect(one.handedInDay ?? 0).toBeGreaterThan(given.dueDay);
    else if (one.handedInDay !== null) expect(one.handedInDay).toBeLessThanOrEqual(given.dueDay);
  });

  it("has comments that point at something", () => {
    for (const one of WORK) {
      const lines = demoScript(one.scriptId).source.trimEnd().split("\n");
      for (const comment of one.comments ?? []) {
        expect(CommentAnchorSchema.safeParse(comment.anchor).success).toBe(true);
        if (comment.anchor.kind === "lines") {
          expect(comment.anchor.to, one.scriptId).toBeLessThanOrEqual(lines.length);
          expect(lines[comment.anchor.from - 1]?.trim(), one.scriptId).not.toBe("");
        }
        const isKnown = STAFF.some((person) => person.key === comment.by) || demoStudent(comment.by).key === comment.by;
        expect(isKnown).toBe(true);
      }
    }
  });

  it("is handed in once for each author and assignment", () => {
    const pairs = WORK.flatMap((one) =>
      demoScript(one.scriptId).authors.map((author) => `${one.assignment} ${author}`),
    );
    expect(new Set(pairs).size).toBe(pairs.length);
  });

  it("is in every state, and so are the forwarded shows", () => {
    expect(new Set(WORK.map((one) => one.state))).toEqual(new Set(["working", "submitted", "revise", "marked"]));
    expect(new Set(WORK.flatMap((one) => one.forward?.state ?? []))).toEqual(
      new Set(["waiting", "approved", "declined", "scheduled"]),
    );
  });

  it("meets its assignment's requirements where it was marked", () => {
    for (const one of WORK.filter((work) => work.state === "marked")) {
      const { source } = demoScript(one.scriptId);
      expect(listUnmet(source, assignment(one.assignment).requirements), one.scriptId).toEqual([]);
    }
  });
});

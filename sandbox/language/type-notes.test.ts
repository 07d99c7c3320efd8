import { describe, expect, it } from "vitest";
import { LESSONS } from "../../lessons/index.ts";
import { DEMO_SCRIPTS } from "../../server/db/seed/world/scripts/index.ts";
import { demoSong } from "../../server/db/seed/world/songs/demo-songs.ts";
import { DEMO_SQUARE } from "../../server/db/seed/world/square.ts";
import { listNames } from "../engine/tables.ts";
import { TYPE_NOTES } from "./problems/types.ts";
import { findExampleNames, REFERENCE, wordId, writeExample } from "./reference/index.ts";
import { createScriptService } from "./type-check.ts";
import { listTypeNotes } from "./type-notes.ts";

const SONG = demoSong("quillhaven-bells").beatMap;
const NAMES = listNames(DEMO_SQUARE, SONG);
const script = createScriptService(NAMES);

function notesOf(source: string) {
  script.setText(source);
  return listTypeNotes(script, NAMES).map(
    ({ code, range, sentence }) => [`${code} ${range.line}:${range.column}`, sentence] as const,
  );
}

/** Each note as a pupil meets it. */
const CASES: readonly (readonly [note: string, source: string, sentence?: string])[] = [
  ["wrong-kind 1:15", 'square.all.on("100");', '`on` needs a number here, but this is the text "100".'],
  ["wrong-kind 1:11", "repeat(4, 3);", "`repeat` needs steps to run here, but this is 3."],
  ["wrong-kind 1:16", 'square.all.and("bakery").on();', '`and` needs lights here, but this is the text "bakery".'],
  ["wrong-kind 1:20", 'song.hits("drums", 3);'],
  [
    "wrong-kind 2:6",
    "const far = [1].find((x) => x > 3);\nwait(far);",
    "`wait` needs a number here, but this is a number or nothing.",
  ],
  [
    "wrong-kind-here 2:1",
    'let level = 3;\nlevel = "high";',
    'This place is for a number, but this is the text "high".',
  ],
  ["wrong-kind-here 1:7", 'const north: Lights = "north";'],
  ["too-few-things 1:12", "square.all.fadeTo(50);", "`fadeTo` needs 2 things, but it got 1."],
  ["too-few-things 2:6", "function twice(n) { return n * 2; }\nwait(twice());"],
  ["too-many-things 1:26", "square.all.fadeTo(50, 2, 3);"],
  ["no-such-skill 1:11", "song.bars.push(3);", "A list can not do `push`."],
  ["not-to-run 2:1", "const n = 3;\nn();"],
  ["needs-call 1:5", "if (now < 4) wait(1);", "`now` is steps to run, and not what they give."],
  ["not-a-sum 1:11", "const x = square.all * 2;", "A sum needs numbers, but this is lights."],
  ["not-a-sum 1:6", 'wait("a" < 3 ? 1 : 2);'],
  ["never-the-same 1:5", 'if (square.all.box === "rely") wait(1);'],
  ["maybe-nothing 2:6", "const m = [{ beats: 1 }].find((one) => one.beats > 2);\nwait(m.beats);"],
  ["no-value-yet 2:6", "let x: number;\nwait(x);"],
  ["only-to-read 1:8", 'square.all = square.side("north");'],
  ["wants-list-here 1:17", "for (const x of 3) wait(1);"],
  ["no-answer-to-test 1:5", "if (wait(1)) wait(2);"],
  ["always-so 2:5", "function flash() { return true; }\nif (flash) wait(1);"],
  ["answer-missing 1:24", "function f(a: number): number { if (a > 1) return 2; }\nf(1);"],
  ["no-such-field 2:24", "interface Row { a: number }\nconst p: Row = { a: 1, b: 2 };"],
  ["field-missing 2:7", "interface Row { a: number }\nconst p: Row = {};"],
  ["not-sure 2:17", "class Wave { private size = 1; }\nwait(new Wave().size);"],
];

describe("type notes", () => {
  it("are all shown by a script below", () => {
    const shown = new Set(CASES.map(([note]) => note.split(" ")[0]));
    expect(Object.keys(TYPE_NOTES).filter((code) => !shown.has(code))).toEqual([]);
  });

  for (const [note, source, sentence] of CASES) {
    it(`${note}: ${source}`, () => {
      const notes = notesOf(source);
      expect(notes.map(([found]) => found)).toContain(note);
      if (sentence !== undefined) expect(notes.find(([found]) => found === note)?.[1]).toBe(sentence);
    });
  }

  it("leave what has a problem to the problem", () => {
    expect(notesOf('square.front(bakery).on("100");')).toEqual([]);
    expect(notesOf("for (const f of square.fronts) {")).toEqual([]);
  });
});

describe("right scripts", () => {
  const right = [
    ...DEMO_SCRIPTS.filter((demo) => demo.expected.runs).map((demo) => [demo.id, demo.source] as const),
    ...LESSONS.flatMap((lesson) =>
      lesson.steps.flatMap((step) =>
        step.solution === null ? [] : [[`${lesson.id} ${step.id}`, step.solution] as const],
      ),
    ),
    ...REFERENCE.map((entry) => [wordId(entry), writeExample(entry, findExampleNames(DEMO_SQUARE, SONG))] as const),
  ];

  it.each(right)("%s gets no note", (_, source) => {
    expect(notesOf(source)).toEqual([]);
  });
});

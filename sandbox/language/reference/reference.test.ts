import { describe, expect, it } from "vitest";
import { demoSong } from "../../../server/db/seed/world/songs/demo-songs.ts";
import { DEMO_SQUARE } from "../../../server/db/seed/world/square.ts";
import { BeatMapSchema } from "../../../shared/contracts/songs.ts";
import { runWell } from "../../../tests/support/run-script.ts";
import { GLOBAL_WORDS, LIGHTS_MEMBERS, SONG_MEMBERS, SQUARE_MEMBERS } from "../words.ts";
import {
  findExampleNames,
  findWord,
  listWordsIn,
  REFERENCE,
  takeFirstBars,
  WORD_GROUPS,
  wordId,
  writeExample,
} from "./index.ts";

describe("the reference", () => {
  it("has every word of the language, each once", () => {
    for (const word of GLOBAL_WORDS)
      expect(findWord("script", word) ?? (word === "console" ? findWord("console", "log") : null), word).not.toBeNull();
    for (const word of SQUARE_MEMBERS) expect(findWord("square", word), word).not.toBeNull();
    for (const word of SONG_MEMBERS) expect(findWord("song", word), word).not.toBeNull();
    for (const word of LIGHTS_MEMBERS) expect(findWord("lights", word) ?? findWord("front", word), word).not.toBeNull();
    expect(new Set(REFERENCE.map(wordId)).size).toBe(REFERENCE.length);
    expect(WORD_GROUPS.flatMap(listWordsIn)).toEqual(REFERENCE);
  });

  it.each(REFERENCE.map((entry) => [wordId(entry), entry] as const))("%s says it in 12 words or fewer", (_, entry) => {
    expect(entry.meaning.split(/\s+/).length).toBeLessThanOrEqual(12);
    expect(entry.meaning).toMatch(/^[A-Z].*\.$/);
    expect(entry.example).toContain(entry.word);
  });
});

/** As the page of words runs them. */
const EXAMPLE_BARS = 16;

describe.each(["quillhaven-bells", "lantern-waltz"])("examples with %s", (id) => {
  const song = BeatMapSchema.parse(takeFirstBars(demoSong(id).beatMap, EXAMPLE_BARS));
  const names = findExampleNames(DEMO_SQUARE, song);

  it.each(REFERENCE.map((entry) => [wordId(entry), entry] as const))(
    "%s runs and lights something",
    async (_, entry) => {
      const source = writeExample(entry, names);
      expect(source).not.toMatch(/\{\w+\}/);
      const outcome = await runWell(source, { layout: DEMO_SQUARE, song });
      expect(outcome.cueCount).toBeGreaterThan(0);
      expect(outcome.findings.filter((finding) => finding.severity !== "note")).toEqual([]);
    },
  );
});

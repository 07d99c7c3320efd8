import { describe, expect, it } from "vitest";
import { demoSong } from "../../server/db/seed/world/songs/demo-songs.ts";
import { DEMO_SQUARE } from "../../server/db/seed/world/square.ts";
import { listNames } from "../engine/tables.ts";
import {
  findDefinition,
  findHover,
  findNameFault,
  findSignature,
  listLayoutChanges,
  listOffers,
  listRenamePlaces,
} from "./assist.ts";
import { createScriptService } from "./type-check.ts";
import { FOREIGN_GLOBALS, GLOBAL_WORDS } from "./words.ts";

const script = createScriptService(listNames(DEMO_SQUARE, demoSong("quillhaven-bells").beatMap));

/** Sets a script whose `|` marks the place, and gives that place. */
function place(marked: string): number {
  script.setText(marked.replace("|", ""));
  return marked.indexOf("|");
}

describe("hover", () => {
  it("gives a word what it does, a name its kind, and other things nothing", () => {
    expect(findHover(script, place("wa|it(1);"))).toEqual({
      from: 0,
      to: 4,
      title: "wait(beats)",
      meaning: "Lets beats pass.",
      wordId: "wait",
    });
    expect(findHover(script, place('const north = square.side("north");\nno|rth.on();'))?.title).toBe(
      "const north: Fronts",
    );
    expect(findHover(script, place('square.all.col|or("red");'))?.wordId).toBe("lights-colour");
    expect(findHover(script, place("wait(1|23);"))).toBeNull();
  });
});

describe("offers", () => {
  const names = (marked: string, kind?: string) =>
    listOffers(script, place(marked))
      .filter((offer) => kind === undefined || offer.kind === kind)
      .map((offer) => offer.name);

  it("offers what a thing can do, however it came about", () => {
    const list = names("const groups = square.fronts.split(2);\ngroups[0].|");
    expect(list).toContain("fadeTo");
    expect(list).not.toContain("part");
    expect(names("for (const front of square.fronts) {\n  front.|\n}")).toContain("part");
    expect(names("song.|")).toEqual(expect.arrayContaining(["bars", "hits", "section"]));
  });

  it("offers names by what the place takes", () => {
    expect(names('square.front("|");', "name")).toContain("bakery");
    expect(names('const c = oneOf(["a"]);\nsquare.all.pulse(1, "|");', "name")).toContain("gold");
    expect(names('console.log("|");', "name")).toEqual([]);
  });

  it("offers the words and one's own names, and nothing from elsewhere", () => {
    const list = names("const north = 1;\n|");
    expect(list).toEqual(
      expect.arrayContaining([...GLOBAL_WORDS.filter((word) => word !== "console"), "north", "Math"]),
    );
    expect(list.filter((name) => Object.hasOwn(FOREIGN_GLOBALS, name))).toEqual([]);
  });
});

describe("the call around the cursor", () => {
  it("names what it takes and where one is", () => {
    const found = findSignature(script, place("square.all.fadeTo(50, |);"));
    expect(found).toMatchObject({
      label: "fadeTo(level: Level, beats: Beats)",
      active: 1,
      meaning: "Fades them to a level.",
    });
    expect(found?.parameters.map(({ from, to }) => found.label.slice(from, to))).toEqual([
      "level: Level",
      "beats: Beats",
    ]);
    expect(findSignature(script, place("wait(1);|"))).toBeNull();
  });
});

describe("names", () => {
  it("leads to where a name was made, or to the reference", () => {
    expect(findDefinition(script, place("const far = 8;\nwait(f|ar);"))).toEqual({ from: 6, to: 9 });
    expect(findDefinition(script, place("wa|it(1);"))).toEqual({ wordId: "wait" });
    expect(findDefinition(script, place("wait(|1);"))).toBeNull();
  });

  it("renames each use of one's own name, and never a word", () => {
    const at = place("const far = 8;\nwait(f|ar);\nif (far > 1) { const far = 2; wait(far); }");
    expect(listRenamePlaces(script, at).map(({ from }) => from)).toEqual([6, 20, 30]);
    expect(listRenamePlaces(script, place("wa|it(1);"))).toEqual([]);
  });

  it("says why a new name does not do", () => {
    place("const far = 8;|");
    expect(findNameFault(script, "near")).toBeNull();
    expect(findNameFault(script, "far")).toBe("The script uses far already.");
    expect(findNameFault(script, "song")).toBe("The word song has a job here already.");
    expect(findNameFault(script, "while")).toBe("The word while has a job here already.");
    expect(findNameFault(script, "2nd one")).toBe("A name starts with a letter and has no spaces.");
  });
});

describe("layout", () => {
  it("sets two spaces a pair of braces and keeps the words", () => {
    const text = "for(const f of square.fronts){\nf.on( )\n   wait(1)\n}";
    script.setText(text);
    const laid = [...listLayoutChanges(script)]
      .sort((a, b) => b.from - a.from)
      .reduce((made, change) => made.slice(0, change.from) + change.text + made.slice(change.to), text);
    expect(laid).toBe("for (const f of square.fronts) {\n  f.on()\n  wait(1)\n}");
  });
});

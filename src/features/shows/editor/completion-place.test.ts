import { describe, expect, it } from "vitest";
import { findCompletionPlace } from "./completion-place.ts";

describe("findCompletionPlace", () => {
  it.each<[string, unknown]>([
    ['square.front("', { kind: "name", names: "front", from: 14 }],
    ['square.front("tea r', { kind: "name", names: "front", from: 14 }],
    ["square.side('no", { kind: "name", names: "side", from: 13 }],
    ['x.part("', { kind: "name", names: "part", from: 8 }],
    ['song.hits("dr', { kind: "name", names: "instrument", from: 11 }],
    ['front.pulse(1, "go', { kind: "name", names: "colour", from: 16 }],
    ['front.pulse("', null],
    ['front.colour("', { kind: "name", names: "colour", from: 14 }],
    ['at(song.section("', { kind: "name", names: "section", from: 17 }],
    ['console.log("hello ', null],
    ["// square.front(", null],
    ['square.all.on(); // and "', null],
    ["square.", { kind: "member", of: "square", from: 7 }],
    ["square.all.pu", { kind: "member", of: "lights", from: 11 }],
    ["song.se", { kind: "member", of: "song", from: 5 }],
    ['song.section("chorus").b', { kind: "member", of: "section", from: 23 }],
    ['const chorus = song.section("chorus");\nat(chorus.', { kind: "member", of: "section", from: 49 }],
    ["for (const part of song.sections) {\n  part.", { kind: "member", of: "section", from: 43 }],
    ["wait(0.", null],
    ["Math.", null],
    ["wai", { kind: "word", from: 0 }],
    ["", null],
    ["square.all.on();\n  rep", { kind: "word", from: 19 }],
  ])("%j", (before, place) => {
    expect(findCompletionPlace(before)).toEqual(place);
  });
});

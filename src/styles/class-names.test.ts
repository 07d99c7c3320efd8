// @vitest-environment node
import { describe, expect, it } from "vitest";

const sources = import.meta.glob<string>("../**/*.tsx", { query: "?raw", import: "default", eager: true });

/** Classes of Tailwind's own palette, type scale, radii and shadows, which tokens.css switches off: they would silently do nothing. */
const SWITCHED_OFF =
  /(?<=["\s:])(?:(?:text|bg|border|outline|ring|fill|stroke|from|to)-(?:white|black|(?:gray|zinc|red|amber|green|blue|indigo|purple|yellow|stone|neutral)-\d{2,3})|text-(?:xs|sm|base|lg|xl|[2-9]xl)|rounded-(?:xs|sm|md|lg|xl|[2-4]xl)|shadow-(?:xs|sm|md|lg|xl|2xl)|font-(?:sans|serif))(?=["\s/])/g;

describe("class names", () => {
  it("finds a switched-off class", () => {
    expect('className="p-2 text-white"'.match(SWITCHED_OFF)).toEqual(["text-white"]);
    expect('className="text-ink hover:bg-gray-100 rounded-cut"'.match(SWITCHED_OFF)).toEqual(["bg-gray-100"]);
  });

  it("name only what the tokens define", () => {
    const found = Object.entries(sources).flatMap(([path, source]) =>
      (source.match(SWITCHED_OFF) ?? []).map((name) => `${path}: ${name}`),
    );
    expect(Object.keys(sources).length).toBeGreaterThan(30);
    expect(found).toEqual([]);
  });
});

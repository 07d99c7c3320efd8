// @vitest-environment node
import { wcagContrast } from "culori";
import { describe, expect, it } from "vitest";
import tokensCss from "./tokens.css?raw";

// Sources: WCAG 2.2, success criteria 1.4.3 (text 4.5 to 1) and 1.4.11 (borders and signs 3 to 1).
// The ratios are computed by culori, a colour library outside this project.

const TEXT_MINIMUM = 4.5;
const SIGN_MINIMUM = 3;

type Themes = readonly [light: string, dark: string];

const colours = new Map<string, Themes>();
for (const [, name, light, dark] of tokensCss.matchAll(
  /--color-([a-z-]+):\s*light-dark\((#[0-9a-f]{6}), (#[0-9a-f]{6})\);/g,
)) {
  if (name && light && dark) colours.set(name, [light, dark]);
}

/** Words on their grounds. */
const TEXT_PAIRS: Readonly<Record<string, readonly string[]>> = {
  ink: ["paper", "card", "well", "mount", "blue-tint", "lamp-tint", "spruce-tint", "rowan-tint", "glow"],
  soft: ["paper", "card", "well", "mount", "blue-tint", "lamp-tint", "rowan-tint", "spruce-tint"],
  slate: ["paper", "card", "well", "blue-tint"],
  plum: ["paper", "card", "well"],
  "lamp-ink": ["paper", "card", "well", "lamp-tint"],
  spruce: ["paper", "card", "well", "spruce-tint", "glow"],
  rowan: ["paper", "card", "well", "rowan-tint"],
  "blue-ink": ["paper", "card", "well", "blue-tint"],
  "on-main": ["main", "main-hover"],
  "on-dusk": ["dusk", "twilight", "dusk-hover", "stage", "transport", "leaf"],
  "on-dusk-soft": ["dusk", "dusk-hover", "stage", "transport"],
  "on-lamp": ["lamp", "lamp-hover"],
  // the button that destroys
  card: ["rowan"],
  "syntax-keyword": ["card", "paper", "well", "glow"],
  "syntax-string": ["card", "paper", "well", "glow"],
  "syntax-number": ["card", "paper", "well", "glow"],
  "syntax-comment": ["card", "paper", "well", "glow"],
  "syntax-object": ["card", "paper", "well", "glow"],
  "syntax-call": ["card", "paper", "well", "glow"],
  "syntax-punctuation": ["card", "paper", "well", "glow"],
};

/** Strong contrast: success criterion 1.4.6, 7 to 1. */
const STRONG_MINIMUM = 7;
const STRONG_PAIRS = Object.fromEntries(
  [...colours.keys()]
    .filter((name) => name.startsWith("strong-") && name !== "strong-ground")
    .map((name) => [name, ["strong-ground"]]),
);

/** Borders of controls, focus rings, bars and signs on their grounds. */
const SIGN_PAIRS: Readonly<Record<string, readonly string[]>> = {
  rim: ["paper", "card", "well"],
  focus: ["paper", "card", "well", "blue-tint"],
  main: ["paper", "card"],
  lamp: ["dusk", "stage", "transport", "twilight"],
  "dusk-rim": ["dusk", "dusk-hover"],
  "step-done": ["dusk"],
  card: ["spruce"],
  rowan: ["paper", "card"],
  spruce: ["paper", "card"],
};

const listPairs = (pairs: Readonly<Record<string, readonly string[]>>) =>
  Object.entries(pairs).flatMap(([front, grounds]) =>
    grounds.flatMap((ground) => (["light", "dark"] as const).map((theme) => ({ front, ground, theme }))),
  );

function contrast(front: string, ground: string, theme: "light" | "dark"): number {
  const side = theme === "light" ? 0 : 1;
  const above = colours.get(front)?.[side];
  const below = colours.get(ground)?.[side];
  if (!above || !below) throw new Error(`No token for ${front} on ${ground}`);
  return wcagContrast(above, below);
}

describe("colour tokens", () => {
  it("are read from the stylesheet", () => {
    expect(colours.size).toBeGreaterThan(45);
    expect(colours.get("lamp")).toEqual(["#f6b13d", "#f6b13d"]);
  });

  // Worked example of WCAG 2.2, definition of contrast ratio: the range is 1 to 21.
  it("are measured from 1 to 21", () => {
    expect(wcagContrast("#000000", "#ffffff")).toBeCloseTo(21, 5);
    expect(wcagContrast("#1b2138", "#1b2138")).toBeCloseTo(1, 5);
  });

  it.each(listPairs(TEXT_PAIRS))("keep words readable: $front on $ground, $theme", ({ front, ground, theme }) => {
    expect(contrast(front, ground, theme)).toBeGreaterThanOrEqual(TEXT_MINIMUM);
  });

  it.each(listPairs(STRONG_PAIRS))("are strong where asked for: $front, $theme", ({ front, ground, theme }) => {
    expect(contrast(front, ground, theme)).toBeGreaterThanOrEqual(STRONG_MINIMUM);
  });

  it.each(listPairs(SIGN_PAIRS))(
    "keep borders and signs visible: $front on $ground, $theme",
    ({ front, ground, theme }) => {
      expect(contrast(front, ground, theme)).toBeGreaterThanOrEqual(SIGN_MINIMUM);
    },
  );
});

import { readFileSync } from "node:fs";
import path from "node:path";
import type { Layout } from "../../shared/contracts/square.ts";
import { checkShow, createShowCheck } from "../../sandbox/checks/index.ts";
import { createEngine } from "../../sandbox/engine/engine.ts";
import { listLights } from "../../sandbox/square/lights.ts";
import { createCursor } from "../../sandbox/timeline/cursor.ts";
import type { Timeline } from "../../sandbox/timeline/model.ts";
import { FRAMES_PER_SECOND } from "../../sandbox/timeline/outputs.ts";
import { createTempo } from "../../sandbox/timeline/tempo.ts";
import { createNodeHost } from "../../server/runs/node-host.worker.ts";
import { demoSong } from "../../server/db/seed/world/songs/demo-songs.ts";
import { DEMO_SQUARE } from "../../server/db/seed/world/square.ts";
import { buildLayout, type OutletSketch } from "../factories/small-show.ts";
import { type Figure, timeInTurns } from "./measure.ts";

const ROUNDS = 9;
const SHOWPIECE = readFileSync(path.resolve(import.meta.dirname, "../samples/showpiece.ts"), "utf8");
/** Every light for itself, four times through the song: nothing that lights share helps the check. */
const WAVES = `const step = 60 / square.all.length;
for (let turn = 0; turn < 4; turn++) {
  square.all.inTurn(step, (light) => light.pulse(2, "gold"));
  wait(64);
}
at(song.bars, () => square.side("north").fadeTo(40, 2));
`;
/** A small edit: one front more in one bar. */
const EDIT = `at(song.bar(9), () => square.fronts[3].pulse(1, "gold"));\n`;
/** Squares of so many lights, most of them pixels of strips. */
const SIZES = [50, 500, 5000] as const;
const song = demoSong("quillhaven-bells").beatMap;

interface Shows {
  readonly layout: Layout;
  readonly before: Timeline;
  readonly after: Timeline;
}

/**
 * The whole show check of a three-minute show against sampling the same show once at the rate of the
 * boxes; the check after a small edit against the whole; and how both grow with the square.
 */
export async function benchChecks(): Promise<Figure[]> {
  const engine = createEngine(await createNodeHost());
  const run = async (layout: Layout, source: string): Promise<Timeline> => {
    const outcome = await engine.run({ source, songId: "bench", song, layout, seed: 1 });
    if (!outcome.ok) throw new Error(`The bench script does not run: ${outcome.problem.sentence}`);
    return outcome.timeline;
  };
  const figures: Figure[] = [];
  const measureShow = async (layout: Layout, source: string, name: string) => {
    const shows = { layout, before: await run(layout, source), after: await run(layout, source + EDIT) };
    figures.push(...(await measure(shows, `${name}, ${listLights(layout).length} lights`)));
  };
  await measureShow(DEMO_SQUARE, SHOWPIECE, "showpiece");
  for (const size of SIZES) await measureShow(buildSquareOf(size), WAVES, "waves");
  return [...figures, ...growth(figures)];
}

async function measure({ layout, before, after }: Shows, show: string): Promise<Figure[]> {
  const setting = { layout, song };
  const check = createShowCheck(setting);
  check(before);
  let isEdited = false;
  const times = await timeInTurns(ROUNDS, {
    whole: () => checkShow({ timeline: after, ...setting }),
    sampled: () => sampleAll(after, layout),
    edited: () => check((isEdited = !isEdited) ? after : before),
  });
  return [
    {
      name: `whole check of a three-minute show, ${show}`,
      value: times.whole,
      unit: "ms",
      against: `sampling the show once at ${FRAMES_PER_SECOND} frames a second`,
      ratio: times.whole / times.sampled,
    },
    {
      name: `check after a small edit, ${show}`,
      value: times.edited,
      unit: "ms",
      against: "the whole check",
      ratio: times.edited / times.whole,
    },
  ];
}

/** How the time for one light grows from the smallest square to the largest. */
function growth(figures: readonly Figure[]): Figure[] {
  const whole = figures.filter(({ name }) => name.startsWith("whole") && name.includes("waves"));
  const perLight = SIZES.map((size, place) => (whole[place]?.value ?? 0) / size);
  const [least = 0, most = 0] = [perLight[0], perLight.at(-1)];
  return [
    {
      name: `whole check for one light of ${SIZES.at(-1)}`,
      value: most,
      unit: "ms",
      against: `one light of ${SIZES[0]}`,
      ratio: most / least,
    },
  ];
}

function sampleAll(timeline: Timeline, layout: Layout): void {
  const cursor = createCursor(timeline, layout);
  const tempo = createTempo(song);
  for (let frame = 0; frame < tempo.endSeconds * FRAMES_PER_SECOND; frame++)
    cursor.seek(tempo.toTick(frame / FRAMES_PER_SECOND));
}

/** Four sides of fronts like those of the demo square, with as many lights as asked for. */
export function buildSquareOf(lights: number): Layout {
  const fronts = Math.max(4, Math.round(lights / 25));
  const strip = Math.round(lights / fronts) - 4;
  const outlets: readonly OutletSketch[] = [
    "relay",
    "dimmer",
    "solid-state",
    { kind: "colour", part: "windows" },
    strip,
  ];
  const sides = ["north", "east", "south", "west"] as const;
  return buildLayout(
    Array.from({ length: fronts }, (_, front) => ({
      side: sides[Math.floor((front * 4) / fronts)] ?? "west",
      outlets,
    })),
  );
}

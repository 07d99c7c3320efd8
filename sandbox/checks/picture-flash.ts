import type { Side } from "../../shared/contracts/square.ts";
import type { Finding } from "../engine/model.ts";
import { nameBar } from "../timeline/words.ts";
import { createRecall } from "./check-memory.ts";
import type { CheckContext } from "./context.ts";
import { buildFinding, linesAt } from "./finding.ts";
import { groupLights, type LightGroup } from "./light-groups.ts";
import { BLOCK_COUNT, FLASH_AREA_PIXELS, joinCells, sumBlocks, sumPixels, type PictureCells } from "./picture-area.ts";
import { isWithinSecond, listEvents, listRises } from "./rises.ts";
import { measureSides, type SideMeasure } from "./side-measures.ts";
import { countStreetFlashes } from "./street-flash.ts";

/**
 * The picture rule: what flashes on a screen that shows a side of the square. WCAG 2.2, success
 * criterion 2.3.1, on the reference picture of 1024 x 768 pixels: more than three general or three
 * red flashes in a second, over a quarter (21 824 pixels) of any block of 341 x 256 pixels, fail.
 *
 * Seven transitions that take turns are three and a half flashes and fail (technique G19), so four
 * rises in a second are too many, and so are four falls. Lit areas are those of the drawn panes and
 * lamps; changes within 20 ms add up, also of different lights. A red flash is one by the definition of 2.2 or by that of 2.1, whichever finds more: the
 * first can not judge red against black. A screen that passes does not prove that the street does.
 */
export interface PictureCount {
  readonly side: Side;
  readonly kind: "general" | "red";
  /** Most rises, or most falls, in any half-open second in any block. */
  readonly worst: number;
  /** Tick and lights of the flash that made it so many, or of the last one that counted most. */
  readonly tick: number;
  readonly lights: readonly number[];
}

/** The measures of a red flash; the worse of the two counts. */
const RED_MEASURES = ["formerRed", "currentRed"] as const;

const recallCount = createRecall<PictureCount>();

/** Gives the flash counts of the reference picture of each side that has lights: general, then red. */
export function countPictureFlashes(context: CheckContext): readonly PictureCount[] {
  return measureSides(context.layout).flatMap((measure) => countSide(context, measure));
}

function countSide(context: CheckContext, measure: SideMeasure): readonly PictureCount[] {
  const { side, cells } = measure;
  const facts = context.facts();
  const inView = context.lights.filter(({ index }) => cells.has(index));
  const told = inView.map(({ index }) => facts[index]);
  const count = (kind: PictureCount["kind"], measures: readonly ("general" | (typeof RED_MEASURES)[number])[]) =>
    recallCount(context.memory, `${side} ${kind}`, told, () => {
      const groups = groupLights(context, inView);
      const shapes = groups.map(({ lights }) => joinCells(lights.flatMap((light) => cells.get(light) ?? [])));
      const counts = measures.flatMap((of) =>
        (["rising", "falling"] as const).map((direction) =>
          countBlocks(context, { side, kind }, groups, shapes, ({ facts }) => facts[of][direction]),
        ),
      );
      return counts.reduce((worse, next) => (next.worst > worse.worst ? next : worse));
    });
  return [count("general", ["general"]), count("red", RED_MEASURES)];
}

function countBlocks(
  { rules, tempo }: CheckContext,
  what: Pick<PictureCount, "side" | "kind">,
  groups: readonly LightGroup[],
  shapes: readonly PictureCells[],
  transitionsOf: (group: LightGroup) => Float64Array,
): PictureCount {
  const transitions = listRises(groups.map(transitionsOf), tempo);
  const blocksOf = createBlockList(shapes);
  const events = listEvents(transitions, rules.flashTogetherSeconds, {
    weights: [Float64Array.from(shapes, sumPixels)],
    isEvent: ([pixels = 0], listGroups) => pixels >= FLASH_AREA_PIXELS - 1e-6 && blocksOf(listGroups()).length > 0,
  });
  let most: PictureCount = { ...what, worst: 0, tick: 0, lights: [] };
  // Flashes of each block in the second up to the event looked at.
  const inSecond = new Uint16Array(BLOCK_COUNT);
  let oldest = 0;
  for (const { tick, seconds, groups: rising } of events) {
    for (
      let event = events[oldest];
      event !== undefined && !isWithinSecond(event.seconds, seconds);
      event = events[++oldest]
    )
      for (const block of blocksOf(event.groups)) inSecond[block] = (inSecond[block] ?? 1) - 1;
    let worst = 0;
    for (const block of blocksOf(rising)) {
      inSecond[block] = (inSecond[block] ?? 0) + 1;
      worst = Math.max(worst, inSecond[block] ?? 0);
    }
    if (worst > most.worst)
      most = { ...what, worst, tick, lights: rising.flatMap((group) => groups[group]?.lights ?? []) };
  }
  return most;
}

/** Gives the blocks in which some groups light a quarter or more; each set of groups is looked at once. */
function createBlockList(shapes: readonly PictureCells[]): (groups: readonly number[]) => Uint16Array {
  const known = new Map<string, Uint16Array>();
  return (groups) => {
    const key = groups.join(",");
    const blocks =
      known.get(key) ??
      Uint16Array.from(
        sumBlocks(groups.flatMap((group) => shapes[group] ?? [])).reduce<number[]>((found, pixels, block) => {
          if (pixels >= FLASH_AREA_PIXELS) found.push(block);
          return found;
        }, []),
      );
    known.set(key, blocks);
    return blocks;
  };
}

/** Finds sides whose picture flashes too often, where the street rule did not stop them already. */
export function findPictureFlashes(context: CheckContext): Finding[] {
  const limit = context.rules.flashesPerSecond;
  const stopped = new Set(
    countStreetFlashes(context)
      .filter(({ worst }) => worst > limit)
      .map(({ side }) => side),
  );
  return countPictureFlashes(context)
    .filter(({ side, worst }) => worst > limit && !stopped.has(side))
    .map(({ side, kind, worst, tick, lights }) =>
      buildFinding(context, kind === "red" ? "picture-red-flash" : "picture-flash", {
        sentence: `On a screen the ${side} side flashes ${kind === "red" ? "red " : ""}${worst} times in one second in ${nameBar(context.song, tick)}. The most is ${limit}.`,
        hint: "Pulse on whole beats, let fewer lights pulse at once, or use fades. The event's safety officer decides.",
        measured: { value: worst, limit, unit: "flashes a second" },
        moments: [tick],
        lights,
        lines: linesAt(context, tick, lights),
      }),
    );
}

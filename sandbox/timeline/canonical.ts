import { ByteWriter } from "./bytes.ts";
import { ACTION_CODE, NO_COLOUR, type Timeline } from "./model.ts";
import { assertTimeline } from "./validate.ts";

/**
 * The bytes that a show's hash is taken of, number 1.
 *
 * `D B S H`, number; language, seed, ids of song and layout; lights and end tick; then cue by cue:
 * step from the tick before, action, selection, and only those of level, length and colour that the
 * action has. A selection is numbered by its first use; a new number is followed by its lights. So
 * the bytes say what is lit and when, and not how the timeline is stored or who wrote which line.
 */
const MARK = [0x44, 0x42, 0x53, 0x48] as const;
const FORMAT = 1;

/**
 * Gives the canonical bytes of a timeline's light section; their SHA-256 is the show's hash. Equal
 * for timelines that differ only in chains, completeness, or the order of interned selections.
 * Throws `TimelineFormatError` for a timeline that breaks its model.
 */
export function encodeCanonical(timeline: Timeline): Uint8Array {
  assertTimeline(timeline);
  const { cues, selections } = timeline;
  const out = new ByteWriter();
  for (const byte of MARK) out.byte(byte);
  out.byte(FORMAT);
  out.whole(timeline.language);
  out.fixed32(timeline.seed);
  out.id(timeline.songId);
  out.id(timeline.layoutHash);
  out.whole(timeline.lightCount);
  out.whole(timeline.endTick);
  out.whole(cues.count);
  // By content, not by index: a timeline that holds one selection twice has the same bytes.
  const numbers = new Map<string, number>();
  const numberOf = new Int32Array(selections.length).fill(-1);
  let previous = 0;
  for (let cue = 0; cue < cues.count; cue++) {
    const tick = cues.tick[cue] ?? 0;
    const action = cues.action[cue] ?? 0;
    out.whole(tick - previous);
    previous = tick;
    out.byte(action);
    writeSelection(cues.selection[cue] ?? 0);
    if (action === ACTION_CODE.on || action === ACTION_CODE.fadeTo) out.whole(cues.level[cue] ?? 0);
    if (action !== ACTION_CODE.on && action !== ACTION_CODE.off) out.whole(cues.length[cue] ?? 0);
    if (action === ACTION_CODE.pulse || action === ACTION_CODE.colour)
      out.whole(cues.colour[cue] === NO_COLOUR ? 0 : (cues.colour[cue] ?? 0) + 1);
  }
  return out.finish();

  function writeSelection(index: number): void {
    let number = numberOf[index] ?? -1;
    if (number < 0) {
      const lights = selections[index] ?? new Uint16Array(0);
      const key = lights.join(",");
      const known = numbers.get(key);
      number = known ?? numbers.size;
      numberOf[index] = number;
      if (known === undefined) {
        numbers.set(key, number);
        out.whole(number);
        out.whole(lights.length);
        for (const light of lights) out.whole(light);
        return;
      }
    }
    out.whole(number);
  }
}

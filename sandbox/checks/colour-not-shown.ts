import type { Finding } from "../engine/model.ts";
import { ACTION_CODE } from "../timeline/model.ts";
import { LinePairs } from "./by-line.ts";
import type { CheckContext } from "./context.ts";
import { buildFinding, lineOfCue } from "./finding.ts";

/**
 * Notes script lines that give a colour and never to a light that can show one. A line that reaches a
 * colour light in one of its turns is left alone: `square.all.colour(...)` is how shows are written.
 */
export function findColourNotShown(context: CheckContext): Finding[] {
  const { timeline, lights } = context;
  const { cues, selections } = timeline;
  const canShow = selections.map((selection) => selection.some((light) => lights[light]?.hasColour === true));
  const shown = new Set<number>();
  const plain: number[] = [];
  for (let cue = 0; cue < cues.count; cue++) {
    if (cues.action[cue] !== ACTION_CODE.colour) continue;
    if (canShow[cues.selection[cue] ?? 0] === true) shown.add(lineOfCue(context, cue));
    else plain.push(cue);
  }
  const pairs = new LinePairs(context);
  for (const cue of plain)
    if (!shown.has(lineOfCue(context, cue))) pairs.add(cue, -1, selections[cues.selection[cue] ?? 0] ?? []);
  return pairs.list().map((pair) =>
    buildFinding(context, "colour-not-shown", {
      sentence: "These lights can not show a colour. They stay as they are.",
      hint: 'Only boxes of the kind "colour" can: `if (front.box === "colour") { ... }`.',
      moments: pair.ticks,
      lights: pair.lights,
      lines: [pair.line],
    }),
  );
}

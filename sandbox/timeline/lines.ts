import type { Frame } from "./cursor.ts";
import type { Timeline } from "./model.ts";

/**
 * Gives a function that tells how strongly each script line is lighting the square in a frame: by
 * line number, 0 (not at all) to 1. A line counts with the brightest light that it, or a call that
 * it made, is lighting. The array is borrowed: the next call writes it again; its length is the
 * highest line number plus 1.
 */
export function createLinesLit(timeline: Timeline): (frame: Frame) => Float32Array {
  const { cues, chains } = timeline;
  let lastLine = 0;
  for (const chain of chains) for (const line of chain) lastLine = Math.max(lastLine, line);
  const byChain = new Float32Array(chains.length);
  const byLine = new Float32Array(lastLine + 1);
  const touched: number[] = [];
  return (frame) => {
    byLine.fill(0);
    for (let light = 0; light < frame.cue.length; light++) {
      const cue = frame.cue[light] ?? -1;
      if (cue < 0) continue;
      const chain = cues.chain[cue] ?? 0;
      const share = (frame.level[light] ?? 0) / 100;
      if (byChain[chain] === 0) touched.push(chain);
      if (share > (byChain[chain] ?? 0)) byChain[chain] = share;
    }
    for (const chain of touched) {
      const share = byChain[chain] ?? 0;
      for (const line of chains[chain] ?? []) if (share > (byLine[line] ?? 0)) byLine[line] = share;
      byChain[chain] = 0;
    }
    touched.length = 0;
    return byLine;
  };
}

/** Gives the script lines that wrote a cue, outermost call first; none for -1 (a dark light). */
export function linesOfCue(timeline: Timeline, cue: number): readonly number[] {
  return cue < 0 ? [] : (timeline.chains[timeline.cues.chain[cue] ?? 0] ?? []);
}

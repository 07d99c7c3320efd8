/**
 * The gentle preview: a limit on how fast any light on the stage may change.
 *
 * WCAG 2.2 calls a flash a pair of opposing changes of 10 % or more of the largest relative
 * luminance, and allows three in a second. A channel that moves at most 0.55 a second comes and goes
 * by at most 0.55 / 6 = 0.09 when it does so three times a second or faster, so no such pair is
 * left; areas only add up what their lights do. It limits what the stage shows, never the show.
 */
const LARGEST_CHANGE_PER_SECOND = 0.55;
/** After a longer pause (a hidden tab) one step counts as this long, so that nothing jumps. */
const LONGEST_STEP_SECONDS = 0.1;

/** Follows the linear colours of a frame at a gentle pace. */
export class GentleFilter {
  readonly rgb: Float32Array;

  constructor(lightCount: number) {
    this.rgb = new Float32Array(lightCount * 3);
  }

  /** Moves towards `target` by what `seconds` allow. Gives back whether the target is reached. */
  follow(target: Float32Array, seconds: number): boolean {
    const most = LARGEST_CHANGE_PER_SECOND * Math.min(Math.max(seconds, 0), LONGEST_STEP_SECONDS);
    let isReached = true;
    for (let i = 0; i < this.rgb.length; i += 1) {
      const from = this.rgb[i] ?? 0;
      const way = (target[i] ?? 0) - from;
      if (Math.abs(way) <= most) {
        this.rgb[i] = target[i] ?? 0;
      } else {
        this.rgb[i] = from + Math.sign(way) * most;
        isReached = false;
      }
    }
    return isReached;
  }

  /** Takes a frame over as it is: for the first picture, before anything moves. */
  jumpTo(target: Float32Array): void {
    this.rgb.set(target);
  }
}

import type { BrowserContext, Page } from "playwright-core";

/**
 * Listens to everything a page sends to its loudspeaker: whatever is connected to a context's
 * destination is also connected to an analyser of ours. Call before the page loads.
 */
export async function tapSound(context: BrowserContext): Promise<void> {
  await context.addInitScript(() => {
    const taps = new Map<BaseAudioContext, AnalyserNode>();
    const connect = AudioNode.prototype.connect as (this: AudioNode, ...to: unknown[]) => unknown;
    AudioNode.prototype.connect = function (this: AudioNode, ...to: unknown[]) {
      const [target] = to;
      if (target instanceof AudioDestinationNode && this.context instanceof AudioContext) {
        let tap = taps.get(this.context);
        if (!tap) {
          tap = this.context.createAnalyser();
          tap.fftSize = 8192;
          taps.set(this.context, tap);
        }
        connect.call(this, tap);
      }
      return connect.apply(this, to);
    } as typeof AudioNode.prototype.connect;
    Object.assign(window, {
      readSoundLevel: () => {
        let level = 0;
        for (const [context, tap] of taps) {
          if (context.state !== "running") continue;
          const samples = new Float32Array(tap.fftSize);
          tap.getFloatTimeDomainData(samples);
          level = Math.max(
            level,
            Math.sqrt(samples.reduce((sum, sample) => sum + sample * sample, 0) / samples.length),
          );
        }
        return level;
      },
    });
  });
}

/** Root mean square of the last 8 192 samples, 0 to 1; 0 when nothing sounds. */
export function readSoundLevel(page: Page): Promise<number> {
  return page.evaluate(() => (window as unknown as { readSoundLevel(): number }).readSoundLevel());
}

/** The loudest level in so many milliseconds. */
export async function listenFor(page: Page, milliseconds: number): Promise<number> {
  let loudest = 0;
  const end = Date.now() + milliseconds;
  while (Date.now() < end) {
    loudest = Math.max(loudest, await readSoundLevel(page));
    await page.waitForTimeout(50);
  }
  return loudest;
}

import type { Light } from "../square/lights.ts";
import type { Tracks } from "./tracks.ts";

/** What of a light decides what it does with its cues. */
export type LightTraits = Pick<Light, "hasColour" | "isSwitched">;

/**
 * Gives for each light the first in walking order that shows the same all through: of the same traits
 * and told by the same cues. A light that is like none before it leads itself. Colour cues do not
 * count for lights without colour. Linear in the entries of the tracks.
 */
export function listLeaders(lights: readonly LightTraits[], tracks: Tracks): Uint32Array {
  const leaders = new Uint32Array(lights.length);
  const byHash = new Map<number, number[]>();
  for (let light = 0; light < lights.length; light++) {
    const hash = hashOf(lights, tracks, light);
    const known = byHash.get(hash);
    const leader = known?.find((other) => areTwins(lights, tracks, light, other));
    leaders[light] = leader ?? light;
    if (leader !== undefined) continue;
    if (known === undefined) byHash.set(hash, [light]);
    else known.push(light);
  }
  return leaders;
}

interface CueRuns {
  readonly first: Uint32Array;
  readonly cue: Uint32Array;
}

const tracksOf = (traits: LightTraits | undefined, { level, pulse, colour }: Tracks): readonly CueRuns[] =>
  traits?.hasColour ? [level, pulse, colour] : [level, pulse];

/** FNV-1a over the cues of a light; lights of one hash are still compared. */
function hashOf(lights: readonly LightTraits[], tracks: Tracks, light: number): number {
  const traits = lights[light];
  let hash = traits?.hasColour ? 1 : traits?.isSwitched ? 2 : 3;
  for (const { first, cue } of tracksOf(traits, tracks)) {
    const until = first[light + 1] ?? 0;
    hash = Math.imul(hash ^ (until - (first[light] ?? 0)), 0x01_00_01_93);
    for (let entry = first[light] ?? 0; entry < until; entry++)
      hash = Math.imul(hash ^ (cue[entry] ?? 0), 0x01_00_01_93);
  }
  return hash;
}

function areTwins(lights: readonly LightTraits[], tracks: Tracks, light: number, other: number): boolean {
  const [a, b] = [lights[light], lights[other]];
  if (a?.hasColour !== b?.hasColour || a?.isSwitched !== b?.isSwitched) return false;
  return tracksOf(a, tracks).every(({ first, cue }) => {
    const [start, otherStart] = [first[light] ?? 0, first[other] ?? 0];
    const count = (first[light + 1] ?? 0) - start;
    if (count !== (first[other + 1] ?? 0) - otherStart) return false;
    for (let entry = 0; entry < count; entry++) if (cue[start + entry] !== cue[otherStart + entry]) return false;
    return true;
  });
}

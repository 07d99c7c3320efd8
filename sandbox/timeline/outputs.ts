import type { BeatMap } from "../../shared/contracts/songs.ts";
import type { BoxKind, Layout } from "../../shared/contracts/square.ts";
import { listLights, type Light } from "../square/lights.ts";
import { levelToY } from "./colour.ts";
import { createLightsCursor, type Frame } from "./cursor.ts";
import type { Timeline } from "./model.ts";
import { listOnSpans } from "./switching.ts";
import { createTempo } from "./tempo.ts";
import { buildTracks } from "./tracks.ts";

/** What a channel of a box carries: on or off, one level, or one colour of a light. */
export type ChannelUse = "switch" | "level" | "red" | "green" | "blue";

/** One value that a box is sent. */
export interface OutputChannel {
  readonly frontId: string;
  readonly boxId: string;
  readonly boxKind: BoxKind;
  readonly outlet: number;
  /** From 1, or null when the outlet is one light. */
  readonly pixel: number | null;
  readonly use: ChannelUse;
  readonly lightId: string;
  /** Index in walking order. */
  readonly light: number;
}

/** The values of all channels, frame by frame. */
export interface OutputSampler {
  /** By light in walking order; a colour light has red, green and blue, others one. */
  readonly channels: readonly OutputChannel[];
  readonly framesPerSecond: number;
  /** The last frame lies at or after the song's end and is dark. */
  readonly frameCount: number;
  /**
   * Gives the values (0 to 255) of frame `frame`, which is `frame / framesPerSecond` seconds after
   * the start of the audio. A switch is 0 or 255; a level is Y of CIE L*, so that level 50 looks half
   * as bright; colours are linear light. Borrowed: the next call writes it again.
   */
  read(frame: number): Uint8Array;
}

export const FRAMES_PER_SECOND = 40;

/** Gives the output values of a timeline at a fixed rate (1 to 1000 a second). They are what the script says: nothing is lengthened or smoothed. */
export function createOutputSampler(
  timeline: Timeline,
  layout: Layout,
  song: Pick<BeatMap, "beats">,
  framesPerSecond = FRAMES_PER_SECOND,
): OutputSampler {
  if (!(framesPerSecond >= 1 && framesPerSecond <= 1000))
    throw new RangeError(`${framesPerSecond} frames a second: it has to be 1 to 1000.`);
  const lights = listLights(layout);
  const cursor = createLightsCursor(timeline, lights, buildTracks(timeline));
  const tempo = createTempo(song);
  const channels = lights.flatMap(listChannels);
  const values = new Uint8Array(channels.length);
  return {
    channels,
    framesPerSecond,
    frameCount: Math.ceil(tempo.endSeconds * framesPerSecond) + 1,
    read(frame) {
      const sampled = cursor.seek(tempo.toTick(frame / framesPerSecond));
      channels.forEach(({ light, use }, channel) => {
        values[channel] = valueOf(sampled, light, use);
      });
      return values;
    },
  };
}

/** Gives the channels of one light: three for a colour light, else one. */
export function listChannels(light: Light): readonly OutputChannel[] {
  const uses: readonly ChannelUse[] = light.hasColour
    ? ["red", "green", "blue"]
    : light.isSwitched
      ? ["switch"]
      : ["level"];
  return uses.map((use) => ({
    frontId: light.frontId,
    boxId: light.boxId,
    boxKind: light.boxKind,
    outlet: light.outlet,
    pixel: light.pixel,
    use,
    lightId: light.id,
    light: light.index,
  }));
}

function valueOf(frame: Frame, light: number, use: ChannelUse): number {
  switch (use) {
    case "switch":
      return (frame.level[light] ?? 0) > 0 ? 255 : 0;
    case "level":
      return Math.round(255 * levelToY(frame.level[light] ?? 0));
    case "red":
      return Math.round(255 * (frame.rgb[light * 3] ?? 0));
    case "green":
      return Math.round(255 * (frame.rgb[light * 3 + 1] ?? 0));
    case "blue":
      return Math.round(255 * (frame.rgb[light * 3 + 2] ?? 0));
  }
}

/** One time on of a switched outlet. */
export interface Switching {
  readonly lightId: string;
  /** Index in walking order. */
  readonly light: number;
  /** Seconds from the start of the audio; `off` is outside. */
  readonly onAt: number;
  readonly offAt: number;
  /** Seconds on, and seconds off before the next time on (null after the last). */
  readonly onFor: number;
  readonly offFor: number | null;
  /** Index of the cue that switched it on. */
  readonly cue: number;
}

/** Gives every time on of every relay and solid-state outlet, exactly, by light and then by time. */
export function listSwitchings(timeline: Timeline, layout: Layout, song: Pick<BeatMap, "beats">): readonly Switching[] {
  const tracks = buildTracks(timeline);
  const tempo = createTempo(song);
  return listLights(layout)
    .filter((light) => light.isSwitched)
    .flatMap((light) => {
      const spans = listOnSpans(tracks, light.index);
      return spans.map(({ start, end, cue }, index) => {
        const next = spans[index + 1];
        const [onAt, offAt] = [tempo.toSeconds(start), tempo.toSeconds(end)];
        return {
          lightId: light.id,
          light: light.index,
          onAt,
          offAt,
          onFor: offAt - onAt,
          offFor: next === undefined ? null : tempo.toSeconds(next.start) - offAt,
          cue,
        };
      });
    });
}

import type { BeatMap } from "../../shared/contracts/songs.ts";
import type { Layout } from "../../shared/contracts/square.ts";
import { SIDES, type Side } from "../../shared/sides.ts";
import { listFronts, listLights } from "../square/lights.ts";
import { measureSpans, type Activity, type Movement } from "./activity.ts";
import { nameColour } from "./colour-word.ts";
import type { Timeline } from "./model.ts";
import { listSongSpans, type SongSpan } from "./spans.ts";
import { buildTracks } from "./tracks.ts";
import { joinWords } from "./words.ts";

/** A show in words, for people who can not see it. */
export interface ShowDescription {
  /** One sentence for a ribbon: "Starts dark, mostly one front after another, busiest in the second chorus." */
  readonly summary: string;
  /** A sentence for each part of the song, in order; equal neighbours are one. */
  readonly steps: readonly string[];
  /** The tick at which each step begins. */
  readonly starts: readonly number[];
}

/**
 * Gives what happens in a show, worked out from the timeline alone: which sides are lit, how they
 * move, in what colours, part by part. An incomplete timeline is described up to its last cue.
 */
export function describeShow(timeline: Timeline, layout: Layout, song: BeatMap): ShowDescription {
  const lights = listLights(layout);
  const fronts = listFronts(layout).map(({ front }) => front);
  const sides = SIDES.filter((side) => fronts.some((front) => front.side === side));
  const spans = listSongSpans(song).filter((span) => span.start < timeline.endTick);
  const activities = measureSpans(
    timeline,
    lights,
    buildTracks(timeline),
    spans.map(({ start, end }) => [start, Math.min(end, timeline.endTick)] as const),
  );
  const parts = spans.flatMap((span, index) => {
    const activity = activities[index];
    return activity === undefined
      ? []
      : [{ span, activity, words: describeActivity(activity, sides, (front) => fronts[front]?.name ?? "") }];
  });
  const joined = joinParts(parts);
  const steps = joined.map((part) => `${nameSpans(part.spans)}: ${part.words}.`);
  const starts = joined.map((part) => part.spans[0]?.start ?? 0);
  if (!timeline.isComplete) {
    steps.push("The script stopped here, so the show is not whole.");
    starts.push(parts.at(-1)?.span.end ?? 0);
  }
  return { summary: summarise(parts, timeline.isComplete), steps, starts };
}

interface Part {
  readonly span: SongSpan;
  readonly activity: Activity;
  readonly words: string;
}

/** Parts that follow each other and read the same become one. */
function joinParts(parts: readonly Part[]): readonly { readonly spans: readonly SongSpan[]; readonly words: string }[] {
  const joined: { spans: SongSpan[]; words: string }[] = [];
  for (const { span, words } of parts) {
    const last = joined.at(-1);
    if (last?.words === words) last.spans.push(span);
    else joined.push({ spans: [span], words });
  }
  return joined;
}

function nameSpans(spans: readonly SongSpan[]): string {
  const first = spans[0]?.firstBar ?? 1;
  const last = spans.at(-1)?.lastBar ?? first;
  const bars = nameBars(first, last);
  const names = [...new Set(spans.flatMap(({ name }) => name ?? []))];
  return names.length === 0 ? bars : `${bars} (${names.join(", ")})`;
}

/** Bar 0 is the pick-up. */
function nameBars(first: number, last: number): string {
  if (first === 0) return last === 0 ? "The pick-up" : `The pick-up and ${nameBars(1, last).toLowerCase()}`;
  return first === last ? `Bar ${first}` : `Bars ${first} to ${last}`;
}

/** So few fronts are called by their names. */
const FEW_FRONTS = 3;

/** What one does, and what several do. */
const MOVES: Readonly<Record<Exclude<Movement, "dark">, readonly [string, string]>> = {
  steady: ["stays lit", "stay lit"],
  "in-turn": ["lights up one front after another", "light up one front after another"],
  scattered: ["sparkles here and there", "sparkle here and there"],
  together: ["lights up all together", "light up all together"],
  fading: ["grows brighter and dims", "grow brighter and dim"],
};

function describeActivity(activity: Activity, sides: readonly Side[], nameFront: (front: number) => string): string {
  if (activity.movement === "dark") return "all is dark";
  const { who, isSeveral } = nameWho(activity, sides, nameFront);
  const [one, several] = describeMove(activity, activity.movement);
  return `${who} ${isSeveral ? several : one}${describeColours(activity)}`;
}

/** So much less than the brightest is still as bright to the eye. */
const NEARLY = 0.95;
/** Less of a change than this is not told. */
const SEEN_CHANGE = 0.05;

/** A fade that ends as bright as it gets grows; one that starts so goes dim; half the light again, or half of it gone, is enough. */
function describeMove(
  { light, lightFirst, lightLast, lightMost, fronts }: Activity,
  movement: Exclude<Movement, "dark">,
): readonly [string, string] {
  if (movement === "steady" && light < 0.3) return ["stays dimly lit", "stay dimly lit"];
  if (movement === "together" && fronts.size === 1) return ["lights up", "light up"];
  if (movement === "scattered" && fronts.size <= FEW_FRONTS) return ["lights up now and then", "light up one by one"];
  const endsBrightest = lightLast >= lightMost * NEARLY && lightLast > lightFirst + SEEN_CHANGE;
  const startsBrightest = lightFirst >= lightMost * NEARLY && lightLast < lightFirst - SEEN_CHANGE;
  if (movement === "fading" && (endsBrightest || lightLast > lightFirst * 1.5 + SEEN_CHANGE))
    return ["slowly grows brighter", "slowly grow brighter"];
  if (movement === "fading" && (startsBrightest || lightLast * 1.5 + SEEN_CHANGE < lightFirst))
    return ["slowly goes dim", "slowly go dim"];
  return MOVES[movement];
}

/** A side counts when it gives a good share of the light. */
function nameWho(
  { fronts, sides: shares }: Activity,
  sides: readonly Side[],
  nameFront: (front: number) => string,
): { readonly who: string; readonly isSeveral: boolean } {
  if (fronts.size <= FEW_FRONTS) {
    const names = joinWords([...fronts].sort((a, b) => a - b).map((front) => `"${nameFront(front)}"`));
    return {
      who: fronts.size === 1 ? `only the front ${names}` : `only the fronts ${names}`,
      isSeveral: fronts.size > 1,
    };
  }
  const lit = sides.filter((side) => (shares.get(side) ?? 0) > 0.4 / Math.max(1, sides.length));
  if (lit.length === 0) return { who: "a part of the square", isSeveral: false };
  if (lit.length === sides.length && sides.length > 1) return { who: "the whole square", isSeveral: false };
  return lit.length === 1
    ? { who: `the ${lit[0]} side`, isSeveral: false }
    : { who: `the ${joinWords(lit)} sides`, isSeveral: true };
}

function describeColours({ colours }: Activity): string {
  const shares = new Map<string, number>();
  for (const [colour, share] of colours) shares.set(nameColour(colour), (shares.get(nameColour(colour)) ?? 0) + share);
  const words = [...shares].filter(([word, share]) => share > 0.08 && word !== "black").sort((a, b) => b[1] - a[1]);
  if (words.length > 3) return ", in many colours";
  return words.length === 0 ? "" : `, in ${joinWords(words.map(([word]) => word))}`;
}

const MOSTLY: Readonly<Record<Movement, string>> = {
  dark: "mostly dark",
  steady: "mostly still",
  "in-turn": "mostly one front after another",
  scattered: "mostly sparkling",
  together: "mostly all together",
  fading: "mostly slow fades",
};

function summarise(parts: readonly Part[], isComplete: boolean): string {
  const [first] = parts;
  const last = parts.at(-1);
  if (first === undefined || last === undefined || parts.every(({ activity }) => activity.movement === "dark"))
    return "All is dark.";
  const lengths = new Map<Movement, number>();
  for (const { activity } of parts)
    lengths.set(activity.movement, (lengths.get(activity.movement) ?? 0) + activity.end - activity.start);
  const [mostly] = [...lengths].sort((a, b) => b[1] - a[1])[0] ?? ["steady"];
  const words = [
    first.activity.lightFirst < 0.02 ? "starts dark" : first.activity.lightFirst < 0.4 ? "starts dim" : "starts bright",
    MOSTLY[mostly],
  ];
  const busiest = parts.reduce((most, part) => (pace(part) > pace(most) ? part : most));
  if (parts.length > 1 && pace(busiest) > 0)
    words.push(
      `busiest in ${busiest.span.name === null ? nameSpans([busiest.span]).replace("B", "b") : `the ${busiest.span.name}`}`,
    );
  if (!isComplete) words.push("then the script stops");
  else words.push(last.activity.lightLast < 0.02 ? "dark at the end" : "lit until the end");
  const sentence = words.join(", ");
  return `${sentence.charAt(0).toUpperCase()}${sentence.slice(1)}.`;
}

/** Steps a tick: how much happens. */
const pace = ({ activity }: Part) => activity.steps / Math.max(1, activity.end - activity.start);

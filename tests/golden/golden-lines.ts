import type { RunEnd } from "../engine-hosts/ends.ts";

/** One line of the golden file: SHA-256 of the timeline, fuel, end, name. Sentences stay out of it. */
export function toLine(name: string, { timeline, fuel, end }: RunEnd): string {
  return `${timeline === "" ? "-" : timeline} ${fuel} ${end} ${name}`;
}

/** A line read back. */
export interface GoldenLine {
  readonly timeline: string;
  readonly fuel: number;
  readonly end: string;
  readonly name: string;
}

/** The parts of a line. */
export function parseLine(line: string): GoldenLine {
  const [timeline = "", fuel = "", end = "", ...name] = line.split(" ");
  return { timeline, fuel: Number(fuel), end, name: name.join(" ") };
}

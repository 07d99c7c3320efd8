import { hashText } from "../../../../../sandbox/square/stable-chance.ts";

/** What the engine must make of a script; a test runs every one of them. */
export type Expected = { readonly runs: true } | { readonly runs: false; readonly problem: string };

/** A show of the demo world as its authors wrote it. */
export interface DemoScript {
  readonly id: string;
  readonly title: string;
  readonly songId: string;
  /** Keys of students, the one who began it first. */
  readonly authors: readonly string[];
  /** The lesson whose words it gets by with. */
  readonly lesson: number;
  /** What there is to say about it, for whoever looks for an example. */
  readonly about: string;
  readonly source: string;
  /** The show's luck: 32 bits. */
  readonly seed: number;
  readonly expected: Expected;
}

type Written = Omit<DemoScript, "seed" | "expected"> & { readonly problem?: string };

/** Fills in the luck and what is expected: a script runs unless `problem` names what stops it. */
export function written({ problem, source, ...rest }: Written): DemoScript {
  return {
    ...rest,
    source: `${source.trim()}\n`,
    seed: hashText(rest.id),
    expected: problem === undefined ? { runs: true } : { runs: false, problem },
  };
}

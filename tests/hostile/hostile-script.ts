/** A script that tries to hang, fill, break or leave the engine, and how each way through ends it. */
export interface HostileScript {
  readonly name: string;
  readonly source: string;
  /** Through the whole pipeline: the code of the problem, "killed" when only ending the worker helped. */
  readonly whole: string;
  /**
   * Straight into the engine, without the checks before it: see `describeEnd` in `engine-hosts/straight-run.ts`.
   * Null where the checks are the only defence and the design says so: deep nesting ends the parser of
   * the engine, or the host's stack, before any line runs.
   */
  readonly straight: string | null;
}

/** A hostile script with its two expected ends. */
export function hostile(name: string, source: string, whole: string, straight: string | null): HostileScript {
  return { name, source, whole, straight };
}

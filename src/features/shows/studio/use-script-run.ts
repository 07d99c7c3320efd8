import { useCallback, useEffect, useMemo, useReducer, useRef } from "react";
import type { Finding, RunOutcome } from "../../../../sandbox/engine/model.ts";
import type { Timeline } from "../../../../sandbox/timeline/model.ts";
import { afterPaint } from "./after-paint.ts";
import { FIRST_RUN_STATE, reduceRun, type RunState } from "./run-model.ts";

/** A pause in the typing of this length runs the script. */
const TYPING_PAUSE_MS = 600;
/** A run that takes this long is said to be running. */
const SLOW_RUN_MS = 150;
const FAILED = "The script could not be run here. Try again.";

export interface ScriptRunOptions {
  readonly runScript: (source: string) => Promise<RunOutcome>;
  readonly checkShow: (timeline: Timeline) => Promise<readonly Finding[]>;
}

/** Whatever shows the square, as far as a run needs it. */
export interface RunStage {
  /** Shows a timeline that has not been checked yet, at once. */
  showUnchecked(timeline: Timeline): void;
}

export interface ScriptRun {
  readonly state: RunState;
  /** Runs at once. */
  readonly run: (source: string) => void;
  /** Runs after a pause in the typing. */
  readonly runSoon: (source: string) => void;
}

/**
 * Runs scripts, newest first: a run that is overtaken is forgotten. The light comes first, before the page
 * renders anew; the show check follows after the paint.
 */
export function useScriptRun({ runScript, checkShow }: ScriptRunOptions, stage: RunStage | null): ScriptRun {
  const [state, dispatch] = useReducer(reduceRun, FIRST_RUN_STATE);
  const count = useRef(0);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);

  const run = useCallback(
    (source: string) => {
      clearTimeout(timer.current);
      const number = (count.current += 1);
      // Most runs are over before a person could read that one is under way.
      const slow = setTimeout(() => dispatch({ type: "started", run: number }), SLOW_RUN_MS);
      const isNewest = () => number === count.current;
      runScript(source)
        .then(
          (outcome) => {
            if (!isNewest()) return;
            if (outcome.ok) stage?.showUnchecked(outcome.timeline);
            dispatch({ type: "finished", run: number, source, outcome });
          },
          () => isNewest() && dispatch({ type: "failed", run: number, reason: FAILED }),
        )
        .finally(() => clearTimeout(slow));
    },
    [runScript, stage],
  );
  const runSoon = useCallback(
    (source: string) => {
      clearTimeout(timer.current);
      timer.current = setTimeout(() => run(source), TYPING_PAUSE_MS);
    },
    [run],
  );

  useEffect(() => () => clearTimeout(timer.current), []);
  useEffect(() => {
    const timeline = state.onStage;
    if (!timeline) return;
    let isOvertaken = false;
    const cancel = afterPaint(() => {
      // A check that fails leaves the preview gentle: the safe side.
      checkShow(timeline).then(
        (findings) => isOvertaken || dispatch({ type: "checked", timeline, findings }),
        () => undefined,
      );
    });
    return () => {
      isOvertaken = true;
      cancel();
    };
  }, [state.onStage, checkShow]);

  return useMemo(() => ({ state, run, runSoon }), [state, run, runSoon]);
}

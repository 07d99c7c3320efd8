import { useCallback, useEffect, useMemo, useReducer, useRef } from "react";
import type { Finding, RunOutcome } from "../../../../sandbox/engine/model.ts";
import type { Timeline } from "../../../../sandbox/timeline/model.ts";
import { FIRST_RUN_STATE, reduceRun, type RunState } from "./run-model.ts";

/** A pause in the typing of this length runs the script. */
const TYPING_PAUSE_MS = 600;
const FAILED = "The script could not be run here. Try again.";

export interface ScriptRunOptions {
  readonly runScript: (source: string) => Promise<RunOutcome>;
  readonly checkShow: (timeline: Timeline) => Promise<readonly Finding[]>;
}

export interface ScriptRun {
  readonly state: RunState;
  /** Runs at once. */
  readonly run: (source: string) => void;
  /** Runs after a pause in the typing. */
  readonly runSoon: (source: string) => void;
}

/** Runs scripts, newest first: a run that is overtaken is forgotten. The show check follows after the paint. */
export function useScriptRun({ runScript, checkShow }: ScriptRunOptions): ScriptRun {
  const [state, dispatch] = useReducer(reduceRun, FIRST_RUN_STATE);
  const count = useRef(0);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);

  const run = useCallback(
    (source: string) => {
      clearTimeout(timer.current);
      const number = (count.current += 1);
      dispatch({ type: "started", run: number });
      runScript(source).then(
        (outcome) => dispatch({ type: "finished", run: number, source, outcome }),
        () => dispatch({ type: "failed", run: number, reason: FAILED }),
      );
    },
    [runScript],
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
    const afterPaint = setTimeout(() => {
      // A check that fails leaves the preview gentle: the safe side.
      checkShow(timeline).then(
        (findings) => isOvertaken || dispatch({ type: "checked", timeline, findings }),
        () => undefined,
      );
    }, 0);
    return () => {
      isOvertaken = true;
      clearTimeout(afterPaint);
    };
  }, [state.onStage, checkShow]);

  return useMemo(() => ({ state, run, runSoon }), [state, run, runSoon]);
}

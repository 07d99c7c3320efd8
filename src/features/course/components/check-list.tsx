import type { CheckResult, LessonStep } from "../../../../shared/contracts/course.ts";
import { Button } from "../../../components/button.tsx";
import { Card, CardHeader } from "../../../components/card.tsx";
import { Icon } from "../../../components/icon.tsx";
import { CodeText } from "./lesson-text.tsx";

export interface CheckListProps {
  checks: LessonStep["checks"];
  /** Of the last try; null before the first. */
  results: readonly CheckResult[] | null;
  isChecking: boolean;
  onCheck: () => void;
  /** Why this person can not check here; null when they can. */
  disabledReason: string | null;
  onShowMoment: (tick: number) => void;
  onShowLine: (line: number) => void;
}

/** What a step asks for: passed, not yet (with what was seen and one thing to try), or waiting. */
export function CheckList({
  checks,
  results,
  isChecking,
  onCheck,
  disabledReason,
  onShowMoment,
  onShowLine,
}: CheckListProps) {
  const passed = results?.filter((result) => result.state === "passed").length ?? 0;
  return (
    <Card as="section" aria-labelledby="checks">
      <CardHeader
        titleId="checks"
        title="Checks"
        detail={results === null ? `${checks.length} to pass` : `${passed} of ${checks.length} so far`}
        actions={
          <Button
            look="main"
            icon={results === null ? "check" : "turn"}
            onPress={onCheck}
            isPending={isChecking}
            disabledReason={disabledReason}
          >
            {results === null ? "Check" : "Check again"}
          </Button>
        }
      />
      <ul aria-live="polite">
        {checks.map((check) => {
          const result = results?.find((each) => each.id === check.id);
          const state = result?.state ?? "waiting";
          return (
            <li key={check.id} className="flex gap-3 border-t border-line px-4 py-3 first:border-t-0">
              {state === "passed" && <Icon name="tick" label="Passed" className="mt-0.5 size-[1.25em] text-spruce" />}
              {state === "not-yet" && (
                <Icon name="knot" label="Not yet" className="mt-0.5 size-[1.25em] text-lamp-ink" />
              )}
              {state === "waiting" && <Icon name="clock" label="Waits" className="mt-0.5 size-[1.25em] text-slate" />}
              <div className="min-w-0 flex-1">
                <p className={state === "waiting" ? "text-soft" : ""}>
                  {state === "not-yet" && <strong>Not yet: </strong>}
                  <CodeText text={check.text} />
                </p>
                {result && state === "not-yet" && (
                  <NotYet result={result} onShowMoment={onShowMoment} onShowLine={onShowLine} />
                )}
              </div>
            </li>
          );
        })}
      </ul>
    </Card>
  );
}

function NotYet({
  result,
  onShowMoment,
  onShowLine,
}: { result: CheckResult } & Pick<CheckListProps, "onShowMoment" | "onShowLine">) {
  const { seen, hint, tick, line } = result;
  return (
    <div className="mt-2 bg-lamp-tint px-3.5 py-2.5">
      {seen !== null && (
        <p>
          <CodeText text={seen} />
        </p>
      )}
      {hint !== null && (
        <p className="mt-1">
          <span className="font-semibold">Try this: </span>
          <CodeText text={hint} />
        </p>
      )}
      <div className="mt-2 flex flex-wrap gap-2 empty:hidden">
        {tick !== null && (
          <Button size="small" icon="eye" onPress={() => onShowMoment(tick)}>
            Show me the moment
          </Button>
        )}
        {line !== null && (
          <Button size="small" icon="script" onPress={() => onShowLine(line)}>
            Go to line {line}
          </Button>
        )}
      </div>
    </div>
  );
}

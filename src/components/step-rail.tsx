import { Link } from "react-router";
import { joinClasses } from "./class-names.ts";
import { Icon } from "./icon.tsx";

export interface RailStep {
  label: string;
  state: "done" | "here" | "later";
  /** Where it leads; left out, the step cannot be opened yet. */
  to?: string;
}

export interface StepRailProps {
  /** What the steps belong to, for assistive technology: "Steps of Taking turns". */
  label: string;
  steps: RailStep[];
}

const DOTS = {
  done: "border-spruce bg-spruce text-card",
  here: "border-lamp bg-lamp text-on-lamp",
  later: "border-rim text-soft",
};
const WORDS = { done: "done", here: "you are here", later: "later" };

/** The steps of a lesson in a row: done is a filled tick, here a lamp with a bar, later an outline. Narrow, the names go below the dots. */
export function StepRail({ label, steps }: StepRailProps) {
  return (
    <nav aria-label={label} className="max-w-full">
      <ol className="flex max-wide:justify-between">
        {steps.map((step, index) => (
          <li key={step.to ?? step.label} className="flex">
            {index > 0 && (
              <span aria-hidden="true" className="w-3.5 self-center border-t-2 border-rim/60 max-wide:hidden" />
            )}
            <StepEntry step={step} number={index + 1} />
          </li>
        ))}
      </ol>
    </nav>
  );
}

function StepEntry({ step, number }: { step: RailStep; number: number }) {
  const className = joinClasses(
    "relative flex min-h-14 items-center gap-2 px-3.5 text-[max(1rem,var(--text-meta))] no-underline max-wide:min-h-0 max-wide:flex-col max-wide:gap-1 max-wide:px-0 max-wide:pt-1 max-wide:pb-2.5",
    step.state === "here"
      ? "lamp-bar font-bold text-ink [--bar-drop:-1px] [--bar-height:4px] [--bar-inset:10px] max-wide:[--bar-inset:0px]"
      : "text-soft",
    step.to && "hover:text-ink",
  );
  const content = (
    <>
      <span
        className={`grid size-[26px] shrink-0 place-items-center rounded-full border-2 text-2 leading-none font-bold tabular-nums ${DOTS[step.state]}`}
      >
        {step.state === "done" ? <Icon name="check" className="size-4" /> : number}
      </span>
      {/* Seven names do not fit beside each other on a phone: there only the present one is shown. */}
      <span className={step.state === "here" ? "whitespace-nowrap" : "max-sm:sr-only"}>{step.label}</span>
      <span className="sr-only">, {WORDS[step.state]}</span>
    </>
  );
  const current = step.state === "here" ? "step" : undefined;
  return step.to ? (
    <Link to={step.to} aria-current={current} className={className}>
      {content}
    </Link>
  ) : (
    <span aria-current={current} className={className}>
      {content}
    </span>
  );
}

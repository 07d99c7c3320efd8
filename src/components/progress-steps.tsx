import { joinClasses } from "./class-names.ts";

export interface ProgressStepsProps {
  total: number;
  /** How many are done; the next one is here. */
  done: number;
  /** In words: "Step 3 of 5". */
  label: string;
  /** dusk: on a dusk sheet. paper: on paper. */
  ground?: "dusk" | "paper";
  /** Fills the line, for the words of a password; else short bars. */
  isWide?: boolean;
  className?: string;
}

const BARS = {
  dusk: { done: "bg-step-done", here: "bg-lamp", rest: "bg-step-rest" },
  paper: { done: "bg-spruce", here: "bg-lamp", rest: "bg-bar-rest" },
};

/** A few bars, one a step: for progress so short that it can be counted. */
export function ProgressSteps({ total, done, label, ground = "dusk", isWide, className }: ProgressStepsProps) {
  const bars = BARS[ground];
  return (
    <div role="img" aria-label={label} className={joinClasses("flex gap-[5px]", className)}>
      {Array.from({ length: total }, (_, index) => (
        <span
          key={index}
          className={joinClasses(
            "h-2",
            isWide ? "flex-1" : "w-[34px] shrink",
            index < done ? bars.done : index === done && !isWide ? bars.here : bars.rest,
          )}
        />
      ))}
    </div>
  );
}

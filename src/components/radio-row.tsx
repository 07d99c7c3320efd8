import { useId, type ReactNode } from "react";
import { joinClasses } from "./class-names.ts";
import { describedBy, FieldNotes } from "./field-frame.tsx";
import { Icon } from "./icon.tsx";

export interface RadioRowOption<Value extends string> {
  value: Value;
  label: ReactNode;
  /** Smaller, below the label. */
  detail?: ReactNode;
}

export interface RadioRowProps<Value extends string> {
  legend: ReactNode;
  isLegendHidden?: boolean;
  /** At the end of the legend's line: "3 of 4". */
  legendEnd?: ReactNode;
  options: RadioRowOption<Value>[];
  /** Null: nothing chosen yet. */
  value: Value | null;
  onChange: (value: Value) => void;
  hint?: ReactNode;
  error?: string | null;
  className?: string;
}

/**
 * One of a few, side by side in one cut strip, with a tick on the chosen one: the levels of a criterion,
 * a view switch. Arrow keys move the choice. Never chosen for the person beforehand where it is a judgement.
 */
export function RadioRow<Value extends string>({
  legend,
  isLegendHidden,
  legendEnd,
  options,
  value,
  onChange,
  hint,
  error,
  className,
}: RadioRowProps<Value>) {
  const id = useId();
  return (
    <fieldset
      className={joinClasses("min-w-0", className)}
      aria-invalid={error ? true : undefined}
      aria-describedby={describedBy(id, { hint, error })}
    >
      <legend
        className={isLegendHidden ? "sr-only" : "float-left mb-1.5 flex w-full items-baseline gap-2 p-0 font-bold"}
      >
        {legend}
        {legendEnd && <span className="ml-auto text-meta font-normal text-slate tabular-nums">{legendEnd}</span>}
      </legend>
      <div
        className={joinClasses(
          "clear-both grid auto-cols-fr grid-flow-col rounded-cut border-[1.5px]",
          error ? "border-rowan" : "border-rim",
        )}
      >
        {options.map((option, index) => (
          <label
            key={option.value}
            className={joinClasses(
              "relative flex min-h-[calc(var(--control)-3px)] cursor-pointer items-center justify-center gap-1.5 bg-card px-1 py-1 text-center text-meta leading-tight hover:bg-well",
              "has-checked:bg-main has-checked:font-[650] has-checked:text-on-main has-checked:hover:bg-main-hover",
              "has-focus-visible:z-10 has-focus-visible:outline-3 has-focus-visible:outline-offset-2 has-focus-visible:outline-focus",
              index > 0 && "border-l border-line",
              index === 0 && "rounded-l-[1px]",
              index === options.length - 1 && "rounded-r-[1px]",
            )}
          >
            <input
              type="radio"
              name={id}
              value={option.value}
              checked={value === option.value}
              onChange={() => onChange(option.value)}
              className="absolute inset-0 size-full cursor-pointer appearance-none opacity-0"
            />
            {value === option.value && <Icon name="check" className="size-[1.1em]" />}
            <span>
              {option.label}
              {option.detail && <span className="block text-floor font-normal opacity-90">{option.detail}</span>}
            </span>
          </label>
        ))}
      </div>
      <FieldNotes id={id} hint={hint} error={error} />
    </fieldset>
  );
}

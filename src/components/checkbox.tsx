import { useId, type ComponentPropsWithRef, type ReactNode } from "react";
import { describedBy, FieldNotes } from "./field-frame.tsx";
import { Icon } from "./icon.tsx";
import { joinClasses } from "./class-names.ts";

export interface CheckboxProps extends Omit<
  ComponentPropsWithRef<"input">,
  "className" | "style" | "children" | "type"
> {
  label: ReactNode;
  hint?: ReactNode;
  error?: string | null;
  className?: string;
}

/** One yes or no. The whole line is the target. `{...register("name")}` fits. */
export function Checkbox({ label, hint, error, className, id, ...input }: CheckboxProps) {
  const ownId = useId();
  const fieldId = id ?? ownId;
  return (
    <div className={className}>
      <label className="flex min-h-8 cursor-pointer items-start gap-2.5 py-0.5 has-disabled:cursor-not-allowed has-disabled:text-slate">
        <span className="relative mt-[0.05em] inline-grid size-6 shrink-0 place-items-center">
          <input
            {...input}
            type="checkbox"
            id={fieldId}
            aria-invalid={error ? true : undefined}
            aria-describedby={describedBy(fieldId, { hint, error })}
            className={joinClasses(
              "peer absolute inset-0 cursor-[inherit] appearance-none rounded-cut border-[1.5px] bg-card checked:border-main checked:bg-main disabled:border-dashed disabled:bg-well",
              error ? "border-rowan" : "border-rim",
            )}
          />
          <Icon
            name="check"
            className="pointer-events-none relative size-5 text-on-main opacity-0 peer-checked:opacity-100 peer-disabled:text-slate"
          />
        </span>
        <span>{label}</span>
      </label>
      <div className="pl-[34px] *:mt-0!">
        <FieldNotes id={fieldId} hint={hint} error={error} />
      </div>
    </div>
  );
}

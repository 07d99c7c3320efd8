import type { ReactNode } from "react";
import { joinClasses } from "./class-names.ts";
import { Icon } from "./icon.tsx";

/** What every form field says about itself. */
export interface FieldText {
  label: ReactNode;
  /** Keeps the label for assistive technology only; for a search box beside its icon. */
  isLabelHidden?: boolean;
  /** Below the field: what to write, in what form. */
  hint?: ReactNode;
  /** What is wrong and how to mend it. The field turns red and names it. */
  error?: string | null;
  isOptional?: boolean;
}

/** The ids a field points its aria-describedby at; undefined when there is neither hint nor error. */
export function describedBy(id: string, { hint, error }: Pick<FieldText, "hint" | "error">): string | undefined {
  return joinClasses(error && `${id}-error`, hint ? `${id}-hint` : null) || undefined;
}

export interface FieldFrameProps extends FieldText {
  id: string;
  className?: string;
  children: ReactNode;
}

/** Label above, field, then error and hint below: shared by all fields of a form. */
export function FieldFrame({
  id,
  label,
  isLabelHidden,
  hint,
  error,
  isOptional,
  className,
  children,
}: FieldFrameProps) {
  return (
    <div className={className}>
      <label htmlFor={id} className={isLabelHidden ? "sr-only" : "mb-1.5 block font-semibold"}>
        {label}
        {isOptional && <span className="font-normal text-slate"> (optional)</span>}
      </label>
      {children}
      <FieldNotes id={id} hint={hint} error={error} />
    </div>
  );
}

/** Error and hint under a field. */
export function FieldNotes({ id, hint, error }: { id: string; hint?: ReactNode; error?: string | null }) {
  return (
    <>
      {error && (
        <p id={`${id}-error`} className="mt-1.5 flex gap-1.5 text-meta font-semibold text-rowan">
          <Icon name="stop" className="mt-[0.15em] size-[1.15em]" />
          <span>{error}</span>
        </p>
      )}
      {hint && (
        <p id={`${id}-hint`} className="mt-1.5 text-meta text-slate">
          {hint}
        </p>
      )}
    </>
  );
}

/** The classes of a box one writes in. */
export function inputClass(hasError: boolean, className?: string): string {
  return joinClasses(
    "block min-h-(--control) w-full rounded-cut bg-card px-3 py-1 text-ink placeholder:text-slate placeholder:opacity-100",
    "[&[readonly]]:bg-well disabled:bg-well disabled:text-slate",
    hasError ? "border-2 border-rowan" : "border-[1.5px] border-rim",
    className,
  );
}

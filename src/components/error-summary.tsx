import { useEffect, useRef } from "react";
import { Icon } from "./icon.tsx";

export interface SummaryError {
  /** The id of the field, as given to TextField and its like. */
  fieldId: string;
  /** The field's name and what to do: "Due date: choose a day after today." */
  message: string;
}

export interface ErrorSummaryProps {
  errors: SummaryError[];
  /** Counts the attempts to send (react-hook-form's `submitCount`): at each failing one the summary takes the focus. */
  attempt: number;
  title?: string;
}

/** At the head of a form that could not be sent: every field to mend, each a link to it. Nothing at all while there are no errors. */
export function ErrorSummary({ errors, attempt, title }: ErrorSummaryProps) {
  const headingRef = useRef<HTMLHeadingElement>(null);
  const hasErrors = errors.length > 0;
  useEffect(() => {
    if (hasErrors && attempt > 0) headingRef.current?.focus();
  }, [hasErrors, attempt]);
  if (!hasErrors) return null;

  const fallbackTitle = errors.length === 1 ? "One thing to mend" : `${errors.length} things to mend`;
  return (
    <div role="alert" className="flex gap-3 rounded-r-sheet border-l-4 border-rowan bg-rowan-tint px-4 py-3">
      <Icon name="stop" className="mt-[0.1em] size-[1.3em] text-rowan" />
      <div className="min-w-0">
        <h2 ref={headingRef} tabIndex={-1} className="font-text text-body font-bold tracking-normal">
          {title ?? fallbackTitle}
        </h2>
        <ul className="mt-1 space-y-1">
          {errors.map((error) => (
            <li key={error.fieldId}>
              <a
                href={`#${error.fieldId}`}
                className="inline-block min-h-6 text-rowan"
                onClick={(event) => {
                  event.preventDefault();
                  document.getElementById(error.fieldId)?.focus();
                }}
              >
                {error.message}
              </a>
            </li>
          ))}
        </ul>
      </div>
    </div>
  );
}

import { useId, type ComponentPropsWithRef } from "react";
import { joinClasses } from "./class-names.ts";
import { describedBy, FieldFrame, inputClass, type FieldText } from "./field-frame.tsx";

export interface TextAreaProps
  extends FieldText, Omit<ComponentPropsWithRef<"textarea">, "className" | "style" | "children"> {
  className?: string;
}

/** Several lines of text; grows with its content where the browser can. Takes a ref, so `{...register("name")}` fits. */
export function TextArea({
  label,
  isLabelHidden,
  hint,
  error,
  isOptional,
  className,
  id,
  rows = 4,
  ...area
}: TextAreaProps) {
  const ownId = useId();
  const fieldId = id ?? ownId;
  return (
    <FieldFrame
      id={fieldId}
      label={label}
      isLabelHidden={isLabelHidden}
      hint={hint}
      error={error}
      isOptional={isOptional}
      className={className}
    >
      <textarea
        {...area}
        id={fieldId}
        rows={rows}
        aria-invalid={error ? true : undefined}
        aria-describedby={joinClasses(describedBy(fieldId, { hint, error }), area["aria-describedby"]) || undefined}
        className={inputClass(Boolean(error), "field-sizing-content max-h-96 min-h-20 py-2 leading-[1.4]")}
      />
    </FieldFrame>
  );
}

import { useId, type ComponentPropsWithRef, type ReactNode } from "react";
import { joinClasses } from "./class-names.ts";
import { describedBy, FieldFrame, inputClass, type FieldText } from "./field-frame.tsx";

export interface TextFieldProps
  extends FieldText, Omit<ComponentPropsWithRef<"input">, "className" | "style" | "children"> {
  /** At the end inside the box: an IconButton (show the words, clear). */
  end?: ReactNode;
  /** For codes, addresses of outlets, times. */
  isMono?: boolean;
  className?: string;
}

/** One line of text. Takes every attribute of an input and a ref, so `{...register("name")}` fits; errors come in as `error`. */
export function TextField({
  label,
  isLabelHidden,
  hint,
  error,
  isOptional,
  end,
  isMono,
  className,
  id,
  ...input
}: TextFieldProps) {
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
      <div className="relative">
        <input
          {...input}
          id={fieldId}
          aria-invalid={error ? true : undefined}
          aria-describedby={joinClasses(describedBy(fieldId, { hint, error }), input["aria-describedby"]) || undefined}
          className={inputClass(Boolean(error), joinClasses(isMono && "font-mono", Boolean(end) && "pr-12"))}
        />
        {end && <div className="absolute inset-y-0 right-0.5 flex items-center">{end}</div>}
      </div>
    </FieldFrame>
  );
}

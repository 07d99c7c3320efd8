import { useId, type ComponentPropsWithRef } from "react";
import { joinClasses } from "./class-names.ts";
import { describedBy, FieldFrame, inputClass, type FieldText } from "./field-frame.tsx";
import { Icon } from "./icon.tsx";

export interface SelectOption {
  value: string;
  label: string;
}

export interface SelectGroup {
  label: string;
  options: SelectOption[];
}

export interface SelectProps
  extends FieldText, Omit<ComponentPropsWithRef<"select">, "className" | "style" | "children"> {
  options: (SelectOption | SelectGroup)[];
  /** A first entry with an empty value: "Choose a song". */
  placeholder?: string;
  className?: string;
}

/** One of a list. The browser's own select: the phone's wheel, the keyboard's first letters and forms all work. `{...register("name")}` fits. */
export function Select({
  label,
  isLabelHidden,
  hint,
  error,
  isOptional,
  options,
  placeholder,
  className,
  id,
  ...select
}: SelectProps) {
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
        <select
          {...select}
          id={fieldId}
          aria-invalid={error ? true : undefined}
          aria-describedby={joinClasses(describedBy(fieldId, { hint, error }), select["aria-describedby"]) || undefined}
          className={inputClass(Boolean(error), "appearance-none truncate pr-9")}
        >
          {placeholder !== undefined && <option value="">{placeholder}</option>}
          {options.map((entry) =>
            "options" in entry ? (
              <optgroup key={entry.label} label={entry.label}>
                {entry.options.map((option) => (
                  <option key={option.value} value={option.value}>
                    {option.label}
                  </option>
                ))}
              </optgroup>
            ) : (
              <option key={entry.value} value={entry.value}>
                {entry.label}
              </option>
            ),
          )}
        </select>
        <Icon name="chevron-down" className="pointer-events-none absolute top-1/2 right-3 size-4 -translate-y-1/2" />
      </div>
    </FieldFrame>
  );
}

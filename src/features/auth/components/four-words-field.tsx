import { useState } from "react";
import { IconButton } from "../../../components/icon-button.tsx";
import { TextField } from "../../../components/text-field.tsx";

const WORDS = 4;

export interface FourWordsFieldProps {
  name: string;
  value: string;
  onChange: (value: string) => void;
  label?: string;
  error?: string | null;
  autoComplete?: "current-password" | "new-password";
}

/** How many words a text holds; spaces and hyphens part them. */
function countWords(text: string): number {
  return text.split(/[\s-]+/).filter((word) => word !== "").length;
}

/** Four words, with a bar that fills for each, so that a pupil sees what is missing. Hidden like any password until shown. */
export function FourWordsField({
  name,
  value,
  onChange,
  label = "Your four words",
  error,
  autoComplete = "current-password",
}: FourWordsFieldProps) {
  const [isShown, setIsShown] = useState(false);
  const count = Math.min(WORDS, countWords(value));
  return (
    <div>
      <TextField
        name={name}
        label={label}
        type={isShown ? "text" : "password"}
        value={value}
        onChange={(event) => onChange(event.target.value)}
        autoComplete={autoComplete}
        autoCapitalize="none"
        autoCorrect="off"
        spellCheck={false}
        error={error ?? null}
        end={
          <IconButton
            icon={isShown ? "lock" : "eye"}
            label={isShown ? "Hide the words" : "Show the words"}
            onPress={() => setIsShown(!isShown)}
          />
        }
      />
      <div className="mt-2 grid grid-cols-4 gap-1.5" aria-hidden="true">
        {Array.from({ length: WORDS }, (_, i) => (
          <span key={i} className={`h-2.5 ${i < count ? "bg-spruce" : "bg-line"}`} />
        ))}
      </div>
      <p className="mt-1.5 text-meta text-slate" aria-live="polite">
        {count === 0 ? "Each word fills one bar." : `${count} of ${WORDS} words`}
      </p>
    </div>
  );
}

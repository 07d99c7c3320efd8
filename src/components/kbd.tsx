import type { ReactNode } from "react";

export interface KbdProps {
  children: ReactNode;
}

/** One key of the keyboard. */
export function Kbd({ children }: KbdProps) {
  return (
    <kbd className="inline-block min-w-[1.5em] rounded-cut border border-b-2 border-rim bg-card px-1 text-center font-mono text-[0.8125em] leading-normal text-ink">
      {children}
    </kbd>
  );
}

export interface KeyHint {
  /** Pressed one or the other: ["J", "K"]. */
  keys: string[];
  does: string;
}

export interface KeyHintsProps {
  hints: KeyHint[];
  className?: string;
}

/** The keys of a page in one line at its foot. Not shown narrow: there is no keyboard. */
export function KeyHints({ hints, className }: KeyHintsProps) {
  return (
    <ul
      aria-label="Keys"
      className={`flex flex-wrap gap-x-4 gap-y-1 text-meta text-slate max-wide:hidden print:hidden ${className ?? ""}`}
    >
      {hints.map((hint) => (
        <li key={hint.does} className="flex items-baseline gap-1.5">
          <span className="flex gap-1">
            {hint.keys.map((key) => (
              <Kbd key={key}>{key}</Kbd>
            ))}
          </span>
          {hint.does}
        </li>
      ))}
    </ul>
  );
}

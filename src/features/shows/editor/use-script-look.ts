import { useState } from "react";

/** How a person likes to read scripts; kept on this computer. */
export interface ScriptLook {
  readonly isLarge: boolean;
  readonly isStrong: boolean;
  readonly setLarge: (isLarge: boolean) => void;
  readonly setStrong: (isStrong: boolean) => void;
  /** For the element that holds the script, beside `script-editor`. */
  readonly className: string;
}

const LARGE_KEY = "duskbell-script-large";
const STRONG_KEY = "duskbell-script-strong";

/** A choice that was kept, else what the system asks for. */
function useKept(key: string, standard: () => boolean): readonly [boolean, (value: boolean) => void] {
  const [value, setValue] = useState(() => {
    const kept = localStorage.getItem(key);
    return kept === null ? standard() : kept === "yes";
  });
  const keep = (next: boolean) => {
    localStorage.setItem(key, next ? "yes" : "no");
    setValue(next);
  };
  return [value, keep];
}

export function useScriptLook(): ScriptLook {
  const [isLarge, setLarge] = useKept(LARGE_KEY, () => false);
  const [isStrong, setStrong] = useKept(STRONG_KEY, () => window.matchMedia("(prefers-contrast: more)").matches);
  const className = [isLarge && "is-large", isStrong && "is-strong"].filter(Boolean).join(" ");
  return { isLarge, isStrong, setLarge, setStrong, className };
}

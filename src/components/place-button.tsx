import type { ReactNode } from "react";

export interface PlaceButtonProps {
  onPress: () => void;
  /** "line 6", "bar 21". */
  children: ReactNode;
}

/** A word in a sentence that shows its place: a line of the script, a moment of the song. */
export function PlaceButton({ onPress, children }: PlaceButtonProps) {
  return (
    <button
      type="button"
      onClick={onPress}
      className="mr-1.5 inline-flex min-h-6 items-center text-plum underline decoration-1 underline-offset-2 hover:decoration-2"
    >
      {children}
    </button>
  );
}

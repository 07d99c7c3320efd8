import { useEffect, useId, useRef, useState, type RefObject } from "react";

export interface Disclosure {
  isOpen: boolean;
  panelId: string;
  /** Goes on the element that holds both the button and the panel. */
  rootRef: RefObject<HTMLDivElement | null>;
  toggle: () => void;
  close: () => void;
}

/**
 * State of a panel that a button shows and hides. Escape closes it and gives the focus back to the
 * button, which names the panel in aria-controls; a press outside closes it; the focus may leave freely.
 */
export function useDisclosure(): Disclosure {
  const [isOpen, setIsOpen] = useState(false);
  const panelId = useId();
  const rootRef = useRef<HTMLDivElement>(null);

  useEffect(() => {
    if (!isOpen) return;
    const handleKey = (event: KeyboardEvent) => {
      if (event.key !== "Escape") return;
      setIsOpen(false);
      rootRef.current?.querySelector<HTMLElement>(`[aria-controls="${panelId}"]`)?.focus();
    };
    const handleOutside = (event: Event) => {
      if (event.target instanceof Node && !rootRef.current?.contains(event.target)) setIsOpen(false);
    };
    document.addEventListener("keydown", handleKey);
    document.addEventListener("pointerdown", handleOutside);
    document.addEventListener("focusin", handleOutside);
    return () => {
      document.removeEventListener("keydown", handleKey);
      document.removeEventListener("pointerdown", handleOutside);
      document.removeEventListener("focusin", handleOutside);
    };
  }, [isOpen, panelId]);

  return { isOpen, panelId, rootRef, toggle: () => setIsOpen((open) => !open), close: () => setIsOpen(false) };
}

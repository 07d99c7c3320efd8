import { useEffect } from "react";
import type { ShowPlayer } from "./show-player.ts";

/** What takes the Space key for itself. */
const OWN_SPACE =
  "input, textarea, select, button, a, summary, [contenteditable=true], [role=slider], [role=tab], [role=radio], [role=dialog]";

/**
 * Space plays and pauses anywhere but where it writes or presses; Escape stops from anywhere, also while
 * writing, unless it closes something (a dialog, a list of words, a search).
 */
export function usePlayKeys(player: ShowPlayer): void {
  useEffect(() => {
    const handleKey = (event: KeyboardEvent) => {
      if (event.defaultPrevented || event.ctrlKey || event.metaKey || event.altKey) return;
      const target = event.target instanceof Element ? event.target : null;
      if (event.key === " " && !target?.closest(OWN_SPACE)) {
        event.preventDefault();
        player.transport.toggle();
      }
      if (event.key === "Escape" && !target?.closest("[role=dialog], [aria-expanded=true]")) player.transport.pause();
    };
    document.addEventListener("keydown", handleKey);
    return () => document.removeEventListener("keydown", handleKey);
  }, [player]);
}

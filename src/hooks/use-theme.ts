import { useSyncExternalStore } from "react";
import { getShownTheme, subscribeToTheme } from "../lib/theme.ts";

/** The theme on screen; renders again when it changes. For canvases: everything else reads the CSS tokens. */
export function useTheme() {
  return useSyncExternalStore(subscribeToTheme, getShownTheme);
}

export type Theme = "light" | "dark";
/** `system` follows the operating system and stores nothing. */
export type ThemeChoice = Theme | "system";

/** public/theme.js reads the same key before the first paint; theme.test.ts keeps the two together. */
export const THEME_STORAGE_KEY = "duskbell-theme";

const listeners = new Set<() => void>();
const systemQuery = () => window.matchMedia("(prefers-color-scheme: dark)");

/** The choice in force: what <html> carries, else `system`. */
export function getThemeChoice(): ThemeChoice {
  const pinned = document.documentElement.dataset.theme;
  return pinned === "light" || pinned === "dark" ? pinned : "system";
}

/** The theme on screen now. */
export function getShownTheme(): Theme {
  const choice = getThemeChoice();
  if (choice !== "system") return choice;
  return systemQuery().matches ? "dark" : "light";
}

function pinTheme(choice: ThemeChoice) {
  if (choice === "system") delete document.documentElement.dataset.theme;
  else document.documentElement.dataset.theme = choice;
  listeners.forEach((listener) => listener());
}

/** Shows a theme and remembers it on this device. Where storage is closed it holds until the page is left. */
export function updateThemeChoice(choice: ThemeChoice) {
  try {
    if (choice === "system") localStorage.removeItem(THEME_STORAGE_KEY);
    else localStorage.setItem(THEME_STORAGE_KEY, choice);
  } catch {
    // Private windows may refuse storage; the choice then lasts as long as the page.
  }
  pinTheme(choice);
}

/** Calls back when the shown theme may have changed: a choice here, in another tab, or the system's. Returns the way to stop. */
export function subscribeToTheme(listener: () => void): () => void {
  const handleStorage = (event: StorageEvent) => {
    if (event.key !== THEME_STORAGE_KEY) return;
    pinTheme(event.newValue === "light" || event.newValue === "dark" ? event.newValue : "system");
  };
  const query = systemQuery();
  listeners.add(listener);
  window.addEventListener("storage", handleStorage);
  query.addEventListener("change", listener);
  return () => {
    listeners.delete(listener);
    window.removeEventListener("storage", handleStorage);
    query.removeEventListener("change", listener);
  };
}

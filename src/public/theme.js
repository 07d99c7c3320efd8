// Runs before the first paint, outside the bundle. src/lib/theme.ts owns the key and the values.
try {
  const choice = localStorage.getItem("duskbell-theme");
  if (choice === "light" || choice === "dark") document.documentElement.dataset.theme = choice;
} catch {
  // Storage can be closed by the browser: the system's theme stays.
}

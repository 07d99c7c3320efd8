/** The page's own files come first; the rest is fetched when the line is free. */
const WAIT_MS = 4000;

/**
 * Starts to keep the application's files on this computer, some seconds after the page has loaded.
 * Nothing happens where the browser has no service workers, or refuses them: then it needs a network.
 */
export function registerServiceWorker(): void {
  if (!("serviceWorker" in navigator)) return;
  const register = () =>
    setTimeout(() => void navigator.serviceWorker.register("/service-worker.js").catch(() => undefined), WAIT_MS);
  if (document.readyState === "complete") register();
  else window.addEventListener("load", register, { once: true });
}

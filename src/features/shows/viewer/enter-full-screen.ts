/** Takes the whole screen. Call from the person's own act; where it is refused the picture fills the window all the same. */
export function enterFullScreen(): void {
  // Older tablets have no such method.
  const root: { requestFullscreen?: () => Promise<void> } = document.documentElement;
  void root.requestFullscreen?.call(document.documentElement).catch(() => undefined);
}

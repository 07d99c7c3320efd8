import { useEffect } from "react";
import { useBlocker } from "react-router";
import { ConfirmDialog } from "./confirm-dialog.tsx";

export interface UnsavedGuardProps {
  /** There is something that leaving would lose. */
  isDirty: boolean;
  /** What would be lost: "The assignment is not saved." */
  what: string;
}

/** Asks before a page with unsaved changes is left, by a link, by going back, or by closing the tab. */
export function UnsavedGuard({ isDirty, what }: UnsavedGuardProps) {
  const blocker = useBlocker(
    ({ currentLocation, nextLocation }) => isDirty && currentLocation.pathname !== nextLocation.pathname,
  );
  useEffect(() => {
    if (!isDirty) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", warn);
    return () => window.removeEventListener("beforeunload", warn);
  }, [isDirty]);
  return (
    <ConfirmDialog
      isOpen={blocker.state === "blocked"}
      title="Leave without saving?"
      confirmLabel="Leave without saving"
      cancelLabel="Stay here"
      onConfirm={() => blocker.proceed?.()}
      onCancel={() => blocker.reset?.()}
    >
      <p>{what}</p>
    </ConfirmDialog>
  );
}

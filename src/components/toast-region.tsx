import { useEffect, useState, useSyncExternalStore } from "react";
import { Button } from "./button.tsx";
import { IconButton } from "./icon-button.tsx";
import { Notice } from "./notice.tsx";
import { dismissToast, listToasts, subscribeToToasts, type QueuedToast } from "./toast-queue.ts";

/** Where `showToast` messages appear: a polite live region at the foot of the window. Once, in the shell. */
export function ToastRegion() {
  const toasts = useSyncExternalStore(subscribeToToasts, listToasts);
  const [isHeld, setIsHeld] = useState(false);
  return (
    <section
      aria-label="Messages"
      className="pointer-events-none fixed inset-x-4 bottom-4 z-50 flex flex-col items-end gap-2 in-data-[toast-side=start]:items-start print:hidden"
      onPointerEnter={() => setIsHeld(true)}
      onPointerLeave={() => setIsHeld(false)}
      onFocus={() => setIsHeld(true)}
      onBlur={() => setIsHeld(false)}
    >
      <div role="status" aria-live="polite" className="contents">
        {toasts.map((toast) => (
          <ToastSlip key={toast.id} toast={toast} isHeld={isHeld} />
        ))}
      </div>
    </section>
  );
}

function ToastSlip({ toast, isHeld }: { toast: QueuedToast; isHeld: boolean }) {
  const { id, leavesAfterMs, action } = toast;
  useEffect(() => {
    // Reading time starts again when the pointer or the focus leaves the region.
    if (leavesAfterMs === null || isHeld) return;
    const timer = window.setTimeout(() => dismissToast(id), leavesAfterMs);
    return () => window.clearTimeout(timer);
  }, [id, leavesAfterMs, isHeld]);

  return (
    <div className="pointer-events-auto flex w-full max-w-[26rem] rounded-r-sheet shadow-sheet-2">
      <Notice
        tone={toast.tone ?? "ok"}
        title={toast.title}
        className="flex-1"
        end={<IconButton icon="cross" label={`Close: ${toast.title}`} size="small" onPress={() => dismissToast(id)} />}
        actions={
          action && (
            <Button
              size="small"
              onPress={() => {
                action.onPress();
                dismissToast(id);
              }}
            >
              {action.label}
            </Button>
          )
        }
      >
        {toast.detail}
      </Notice>
    </div>
  );
}

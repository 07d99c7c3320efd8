import type { PointerEvent } from "react";

/** Handlers that report where a handle is dragged to: pixels from the left edge of its parent. */
export function useDragX(onDrag: (x: number) => void) {
  return {
    onPointerDown: (event: PointerEvent<HTMLElement>) => {
      event.stopPropagation();
      event.currentTarget.setPointerCapture(event.pointerId);
    },
    onPointerMove: (event: PointerEvent<HTMLElement>) => {
      if (!event.currentTarget.hasPointerCapture(event.pointerId)) return;
      const parent = event.currentTarget.parentElement?.getBoundingClientRect();
      if (parent) onDrag(event.clientX - parent.left);
    },
  };
}

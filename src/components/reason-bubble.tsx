import { useState, type ReactNode } from "react";

const BUBBLE_WIDTH_PX = 272;

export interface ReasonBubbleProps {
  id: string;
  reason: string;
  children: ReactNode;
}

/** A control with the reason for its refusal under it, shown on hover, focus and touch. The control names `id` in aria-describedby. */
export function ReasonBubble({ id, reason, children }: ReasonBubbleProps) {
  const [side, setSide] = useState<"start" | "end">("start");
  const chooseSide = (box: DOMRect) => setSide(box.left + BUBBLE_WIDTH_PX > window.innerWidth ? "end" : "start");
  return (
    <span
      className="group/reason relative inline-flex"
      onPointerEnter={(event) => chooseSide(event.currentTarget.getBoundingClientRect())}
      onFocus={(event) => chooseSide(event.currentTarget.getBoundingClientRect())}
    >
      {children}
      <span
        id={id}
        data-side={side}
        className="hidden absolute top-full z-30 mt-1.5 w-max max-w-68 rounded-cut border border-line bg-card px-3 py-2 text-meta leading-snug font-normal whitespace-normal text-ink shadow-sheet-2 data-[side=end]:right-0 data-[side=start]:left-0 group-focus-within/reason:block group-hover/reason:block"
      >
        {reason}
      </span>
    </span>
  );
}

import type { ReactNode } from "react";
import { Tooltip as TooltipSlip, TooltipTrigger } from "react-aria-components/Tooltip";

export interface TooltipProps {
  text: ReactNode;
  placement?: "top" | "bottom" | "left" | "right";
  /** One Button or IconButton. */
  children: ReactNode;
}

/** A word under the pointer or the keyboard's focus. Never the only carrier of a fact: touch does not show it. */
export function Tooltip({ text, placement = "bottom", children }: TooltipProps) {
  return (
    <TooltipTrigger delay={500} closeDelay={80}>
      {children}
      <TooltipSlip
        placement={placement}
        offset={6}
        className="max-w-64 rounded-cut bg-main px-2.5 py-1 text-meta leading-snug text-on-main shadow-sheet-1"
      >
        {text}
      </TooltipSlip>
    </TooltipTrigger>
  );
}

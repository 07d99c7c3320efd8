import type { Side } from "../../../../shared/contracts/square.ts";
import type { SideSpan } from "../stage/side-spans.ts";

export interface SideStripProps {
  spans: readonly SideSpan[];
  side: Side;
  onLook: (side: Side) => void;
}

/** Buttons over the strip of all fronts: a press looks at that side. */
export function SideStrip({ spans, side, onLook }: SideStripProps) {
  return (
    <div role="group" aria-label="Look at a side">
      {spans.map((span) => (
        <button
          key={span.side}
          type="button"
          className="studio-strip-side"
          aria-pressed={span.side === side}
          aria-label={`Look at the ${span.side} side`}
          style={{ left: span.x - 4, width: span.width + 8 }}
          onClick={() => onLook(span.side)}
        >
          <span aria-hidden="true">{span.side}</span>
        </button>
      ))}
    </div>
  );
}

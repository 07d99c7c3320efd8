import { presentLitLight, type LitLight } from "./lit-light.ts";

export interface WhyPlace {
  readonly name: string;
  /** Null: all of it is dark. */
  readonly lit: LitLight | null;
  /** The top of the front, in CSS pixels from the stage's corner. */
  readonly x: number;
  readonly y: number;
}

export interface WhyCardProps {
  place: WhyPlace;
  /** Width of the stage: the card stays inside. */
  width: number;
  onGoToLine: (line: number) => void;
}

/** So many calls are named; a script that calls itself has more. */
const MOST_CALLERS = 3;

/** What is lit on a front, how much, the line that did it, and the lines that called it. */
export function WhyCard({ place, width, onGoToLine }: WhyCardProps) {
  const { name, lit, x, y } = place;
  const line = lit?.line ?? null;
  return (
    <div
      id="studio-why"
      className="studio-why"
      style={{ left: Math.min(Math.max(100, x), width - 100), top: Math.max(96, y - 4) }}
    >
      <b>{name}</b>
      <span>
        {lit ? presentLitLight(lit) : "all dark"}
        {line !== null && (
          <>
            {" · "}
            <LineLink line={line} onGoToLine={onGoToLine} />
          </>
        )}
        {lit?.callers.slice(0, MOST_CALLERS).map((caller, index) => (
          <span key={index}>
            {" from "}
            <LineLink line={caller} onGoToLine={onGoToLine} />
          </span>
        ))}
      </span>
    </div>
  );
}

function LineLink({ line, onGoToLine }: { line: number; onGoToLine: (line: number) => void }) {
  return (
    <button type="button" tabIndex={-1} onClick={() => onGoToLine(line)}>
      line {line}
    </button>
  );
}

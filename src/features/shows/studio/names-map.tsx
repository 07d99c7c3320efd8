import { useState } from "react";
import type { Front, Layout } from "../../../../shared/contracts/square.ts";
import { SIDES } from "../../../../shared/sides.ts";
import { listFronts } from "../../../../sandbox/square/lights.ts";
import { Button } from "../../../components/button.tsx";
import { joinClasses } from "../../../components/class-names.ts";
import { getMiniFrontPath } from "../stage/mini-front-path.ts";

const MINI = 24;

export interface NamesMapProps {
  layout: Layout;
  onInsert: (code: string) => void;
}

/** The square seen from above, as one walks round it: a front, its parts, and the code for them. */
export function NamesMap({ layout, onInsert }: NamesMapProps) {
  const fronts = listFronts(layout).map(({ front }) => front);
  const [pickedId, setPickedId] = useState(fronts[0]?.id ?? "");
  const [part, setPart] = useState<string | null>(null);
  const picked = fronts.find((front) => front.id === pickedId) ?? fronts[0];
  if (!picked) return <p className="studio-empty">This square has no fronts yet.</p>;
  const pick = (id: string) => {
    setPickedId(id);
    setPart(null);
  };
  const cell = (front: Front) => (
    <button
      key={front.id}
      type="button"
      className="studio-map-cell"
      aria-label={front.name}
      title={front.name}
      aria-pressed={front.id === picked.id}
      onClick={() => pick(front.id)}
    >
      <MiniFront front={front} />
    </button>
  );
  const code = `square.front("${picked.name}")${part ? `.part("${part}")` : ""}`;
  return (
    <div className="studio-map">
      {SIDES.map((side) => {
        const row = fronts.filter((front) => front.side === side);
        // South and west run the other way in a view from above: the walk goes round.
        const shown = side === "south" || side === "west" ? row.toReversed() : row;
        return (
          <div key={side} className={`studio-map-row is-${side}`} role="group" aria-label={`${side} side`}>
            {shown.map(cell)}
          </div>
        );
      })}
      <div className="studio-court">
        <p className="studio-court-side">
          <span>
            <b>
              {picked.side ? `${picked.side.charAt(0).toUpperCase()}${picked.side.slice(1)} side` : "In the middle"}
            </b>
            {picked.side ? ", in walking order" : ""}
          </span>
          {fronts.filter((front) => front.side === null).map(cell)}
        </p>
        <ul className="studio-court-names">
          {fronts
            .filter((front) => front.side === picked.side)
            .map((front) => (
              <li key={front.id}>
                <button
                  type="button"
                  className={joinClasses(front.id === picked.id && "is-on")}
                  aria-pressed={front.id === picked.id}
                  onClick={() => pick(front.id)}
                >
                  {front.name}
                </button>
              </li>
            ))}
        </ul>
        <div className="studio-court-parts" role="group" aria-label={`Parts of ${picked.name}`}>
          <b>{picked.name}</b> has
          {picked.boxes
            .flatMap((box) => box.outlets)
            .map((outlet) => (
              <button
                key={outlet.part}
                type="button"
                className="studio-chip"
                aria-pressed={part === outlet.part}
                onClick={() => setPart(part === outlet.part ? null : outlet.part)}
              >
                {outlet.part}
              </button>
            ))}
        </div>
        <div className="studio-slip">
          <code>
            square.<span className="syn-call">front</span>(<span className="syn-string">"{picked.name}"</span>)
            {part && (
              <>
                .<span className="syn-call">part</span>(<span className="syn-string">"{part}"</span>)
              </>
            )}
          </code>
          <Button size="small" onPress={() => onInsert(code)}>
            Put it in
          </Button>
        </div>
      </div>
    </div>
  );
}

function MiniFront({ front }: { front: Front }) {
  const { wall, openings } = getMiniFrontPath(front.silhouette, MINI);
  return (
    <svg className="mini-front" width={MINI} height={MINI} viewBox={`0 0 ${MINI} ${MINI}`} aria-hidden="true">
      <path className="mini-front-wall" d={wall} />
      <path className="mini-front-openings" d={openings} />
    </svg>
  );
}

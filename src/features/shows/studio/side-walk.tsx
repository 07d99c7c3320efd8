import { SIDES, type Side } from "../../../../shared/sides.ts";
import { Icon } from "../../../components/icon.tsx";

export interface SideWalkProps {
  side: Side;
  onWalk: (step: 1 | -1) => void;
}

/** Which side is in the window, and the way to its neighbours. */
export function SideWalk({ side, onWalk }: SideWalkProps) {
  const place = SIDES.indexOf(side);
  const neighbour = (step: number) => SIDES[(place + step + SIDES.length) % SIDES.length] ?? "north";
  return (
    <div className="studio-walk">
      <button type="button" aria-label={`Walk to the left, to the ${neighbour(-1)} side`} onClick={() => onWalk(-1)}>
        <Icon name="chevron-left" />
      </button>
      <h2 aria-live="polite">{side.charAt(0).toUpperCase() + side.slice(1)} side</h2>
      <button type="button" aria-label={`Walk to the right, to the ${neighbour(1)} side`} onClick={() => onWalk(1)}>
        <Icon name="chevron-right" />
      </button>
    </div>
  );
}

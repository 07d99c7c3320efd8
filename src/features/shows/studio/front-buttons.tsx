import type { FrontGeometry } from "../../../../sandbox/square/geometry.ts";

export interface FrontButtonsProps {
  fronts: readonly FrontGeometry[];
  onShow: (frontIndex: number) => void;
  onHide: () => void;
  /** Enter on a front: goes to the line that lights it. */
  onGo: () => void;
}

/** The fronts of the picture for the keyboard: invisible buttons over them. The pointer looks through them at the canvas. */
export function FrontButtons({ fronts, onShow, onHide, onGo }: FrontButtonsProps) {
  return (
    <div role="group" aria-label="Fronts in the picture" className="studio-fronts">
      {fronts.map((front) => (
        <button
          key={front.frontId}
          type="button"
          aria-label={`${front.name}: what is lit`}
          aria-describedby="studio-why"
          style={{ left: front.x, top: front.y, width: front.width, height: front.groundY - front.y }}
          onFocus={() => onShow(front.frontIndex)}
          onBlur={onHide}
          onClick={onGo}
        />
      ))}
    </div>
  );
}

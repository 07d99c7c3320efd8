import { useCallback, useEffect, useMemo, useRef, useState, type PointerEvent } from "react";
import type { Layout } from "../../../../shared/contracts/square.ts";
import { SIDES, type Side } from "../../../../shared/sides.ts";
import { listFronts, listLights, type Light } from "../../../../sandbox/square/lights.ts";
import { useDisposable } from "../../../hooks/use-disposable.ts";
import { useElementSize } from "../../../hooks/use-element-size.ts";
import { useMediaQuery } from "../../../hooks/use-media-query.ts";
import { sideGeometry } from "../../../../sandbox/square/geometry.ts";
import { findHit } from "../stage/hit-test.ts";
import { Picture } from "../stage/picture.ts";
import { listSideSpans } from "../stage/side-spans.ts";
import { findLitLight, type LitLight } from "./lit-light.ts";
import type { ShowPlayer } from "./show-player.ts";
import { FrontButtons } from "./front-buttons.tsx";
import { GentleButton } from "./gentle-button.tsx";
import { SideStrip } from "./side-strip.tsx";
import { SideWalk } from "./side-walk.tsx";
import { WhyCard, type WhyPlace } from "./why-card.tsx";

/** A phone shows six fronts at a time: ten would be too small to tell apart. */
const PHONE_FRONTS = 6;

export interface StageWindowProps {
  layout: Layout;
  player: ShowPlayer;
  isGentle: boolean;
  /** Why the preview is gentle by itself; null when the person may choose. */
  gentleReason: string | null;
  onGentle: (isGentle: boolean) => void;
  onGoToLine: (line: number) => void;
  /** The whole show in words, for people who can not see it. */
  description: string;
}

/** The window onto the square: one side at dusk, all sides in a strip below, and what is lit by which line. */
export function StageWindow({
  layout,
  player,
  isGentle,
  gentleReason,
  onGentle,
  onGoToLine,
  description,
}: StageWindowProps) {
  const stageRef = useRef<HTMLDivElement>(null);
  const stripRef = useRef<HTMLDivElement>(null);
  const stageBox = useRef<HTMLDivElement>(null);
  const stripBox = useRef<HTMLDivElement>(null);
  const stageSize = useElementSize(stageBox);
  const stripSize = useElementSize(stripBox);
  const [side, setSide] = useState<Side>("north");
  const [first, setFirst] = useState(0);
  const [why, setWhy] = useState<WhyPlace | null>(null);
  const lights = useMemo(() => listLights(layout), [layout]);
  const fronts = useMemo(() => listFronts(layout), [layout]);
  const isPhone = useMediaQuery("(max-width: 559px)");
  const sideLength = fronts.filter(({ front }) => front.side === side).length;

  const from = isPhone ? first : 0;
  const view = useMemo(
    () => ({ ...stageSize, first: from, ...(isPhone && { count: PHONE_FRONTS }) }),
    [stageSize, isPhone, from],
  );
  const shownFronts = useMemo(() => (view.width > 0 ? sideGeometry(layout, side, view) : []), [layout, side, view]);

  const [hasFailed, setFailed] = useState(false);
  const picture = useDisposable(() => {
    const boxes = { stage: getBox(stageRef.current), strip: getBox(stripRef.current) };
    return new Picture({ boxes, layout, onFailed: () => setFailed(true) });
  }, [layout]);

  useEffect(() => {
    if (view.width === 0) return;
    picture?.look(side, view.first);
    picture?.setStageSize({ ...view, dpr: window.devicePixelRatio || 1 });
  }, [picture, side, view]);
  useEffect(() => {
    if (stripSize.width > 0) picture?.setStripSize({ ...stripSize, dpr: window.devicePixelRatio || 1 });
  }, [picture, stripSize]);
  useEffect(() => {
    if (picture) return player.addView({ showMoment: ({ rgb }) => picture.draw(rgb) });
    return undefined;
  }, [picture, player]);

  const readLight = useCallback(
    (candidates: readonly Light[]): LitLight | null =>
      player.timeline && findLitLight(player.timeline, player.readFrame(), candidates),
    [player],
  );
  const showWhy = (frontIndex: number, light: Light | null) => {
    const shown = shownFronts.find((front) => front.frontIndex === frontIndex);
    if (!shown) return setWhy(null);
    const own = fronts[frontIndex]?.lights.flatMap((index) => lights[index] ?? []) ?? [];
    const lit = (light && readLight([light])) ?? readLight(own);
    setWhy({ name: shown.name, lit, x: shown.x + shown.width / 2, y: shown.y });
  };
  const handleMove = (event: PointerEvent<HTMLDivElement>) => {
    const box = event.currentTarget.getBoundingClientRect();
    const hit = findHit(shownFronts, event.clientX - box.left, event.clientY - box.top);
    if (hit) showWhy(hit.front.frontIndex, hit.light ? (lights[hit.light.lightIndex] ?? null) : null);
    else setWhy(null);
  };
  const handleUp = (event: PointerEvent<HTMLDivElement>) => {
    handleMove(event);
    const box = event.currentTarget.getBoundingClientRect();
    const hit = findHit(shownFronts, event.clientX - box.left, event.clientY - box.top);
    const lit = hit?.light && readLight(lights.slice(hit.light.lightIndex, hit.light.lightIndex + 1));
    // A finger first shows the card; its link goes to the line.
    if (lit?.line && event.pointerType !== "touch") onGoToLine(lit.line);
  };
  const look = (next: Side, nextFirst: number) => {
    setSide(next);
    setFirst(nextFirst);
    setWhy(null);
  };
  const walk = (step: number) => {
    const next = first + step * PHONE_FRONTS;
    if (isPhone && next > -PHONE_FRONTS && next < sideLength && !(step < 0 && first === 0)) {
      look(side, Math.min(Math.max(0, next), Math.max(0, sideLength - PHONE_FRONTS)));
      return;
    }
    look(SIDES[(SIDES.indexOf(side) + step + SIDES.length) % SIDES.length] ?? "north", 0);
  };

  return (
    <div className="studio-window" onPointerLeave={() => setWhy(null)}>
      <div ref={stageBox} className="studio-window-stage">
        <div
          ref={stageRef}
          className="studio-picture"
          role="img"
          aria-label={`${sideName(side)} of the square at dusk`}
          aria-describedby="studio-description"
          onPointerMove={handleMove}
          onPointerUp={handleUp}
        />
        <p id="studio-description" className="sr-only">
          {description}
        </p>
        {hasFailed && (
          <p role="alert" className="studio-picture-failed">
            The picture of the square can not be drawn here. Reload the page; the script and the sound go on without it.
          </p>
        )}
        <FrontButtons
          fronts={shownFronts}
          key={`${side}-${from}-${stageSize.width}`}
          onShow={(index) => showWhy(index, null)}
          onHide={() => setWhy(null)}
          onGo={() => why?.lit?.line && onGoToLine(why.lit.line)}
        />
        {why && <WhyCard place={why} width={stageSize.width} onGoToLine={onGoToLine} />}
      </div>
      <SideWalk side={side} onWalk={walk} />
      <GentleButton isGentle={isGentle} reason={gentleReason} onGentle={onGentle} />
      <div ref={stripBox} className="studio-window-strip">
        <div ref={stripRef} className="studio-picture" role="img" aria-label="All fronts of the square side by side" />
        <SideStrip
          spans={stripSize.width > 0 ? listSideSpans(layout, stripSize) : []}
          side={side}
          onLook={(next) => look(next, 0)}
        />
      </div>
    </div>
  );
}

function getBox(box: HTMLDivElement | null): HTMLDivElement {
  if (!box) throw new Error("The picture's box is not on the page.");
  return box;
}

function sideName(side: Side): string {
  return `${side.charAt(0).toUpperCase()}${side.slice(1)} side`;
}

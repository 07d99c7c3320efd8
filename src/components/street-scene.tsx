import { useEffect, useRef } from "react";
import { useElementSize } from "../hooks/use-element-size.ts";
import { usePrefersReducedMotion } from "../hooks/use-media-query.ts";
import { joinClasses } from "./class-names.ts";
import { StreetPlayer, type StreetLighting } from "./street-player.ts";

export interface StreetSceneProps {
  /** Houses in the street; `narrowFronts` of them under 460 px. */
  fronts?: number;
  narrowFronts?: number;
  /** The same seed gives the same street. */
  seed?: number;
  /** Mostly sky, with a moon and far roofs: the sign-in. */
  isTall?: boolean;
  /** slow: house after house lights up and goes dark again. one: a single lit house. none: all dark. */
  lighting?: StreetLighting;
  /** Only where the picture says something; else it is decoration and hidden from assistive technology. */
  label?: string;
  /** Gives the size: the picture fills this box. */
  className?: string;
}

const NARROW_PX = 460;

/** The street of cut-paper houses in the blue hour. Decoration; stands still under reduced motion and outside the window. */
export function StreetScene({
  fronts = 10,
  narrowFronts = 6,
  seed = 3,
  isTall = false,
  lighting = "slow",
  label,
  className,
}: StreetSceneProps) {
  const canvasRef = useRef<HTMLCanvasElement>(null);
  const { width, height } = useElementSize(canvasRef);
  const isStill = usePrefersReducedMotion();
  const count = width < NARROW_PX ? narrowFronts : fronts;

  useEffect(() => {
    const canvas = canvasRef.current;
    if (!canvas || width === 0 || height === 0) return;
    const player = new StreetPlayer(canvas, { width, height, fronts: count, seed, isTall }, lighting);
    if (isStill || lighting !== "slow") player.drawStill();
    else player.play();
    return () => player.dispose();
  }, [width, height, count, seed, isTall, lighting, isStill]);

  return (
    <div className={joinClasses("bg-sky", className)}>
      <canvas
        ref={canvasRef}
        className="block size-full"
        role={label ? "img" : undefined}
        aria-label={label}
        aria-hidden={label ? undefined : true}
      />
    </div>
  );
}

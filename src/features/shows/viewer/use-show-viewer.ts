import { useEffect, useMemo, useState } from "react";
import type { FindingOnPage } from "../../../components/finding-list.tsx";
import type { BeatMap, Score } from "../../../../shared/contracts/songs.ts";
import type { Layout } from "../../../../shared/contracts/square.ts";
import { decodeTimeline } from "../../../../sandbox/timeline/codec.ts";
import type { Timeline } from "../../../../sandbox/timeline/model.ts";
import { useDisposable } from "../../../hooks/use-disposable.ts";
import { decodeBase64 } from "../../../lib/decode-base64.ts";
import { ShowPlayer } from "../studio/show-player.ts";

export interface ShowToView {
  readonly layout: Layout;
  readonly song: BeatMap;
  readonly score: Score | null;
  /** Base64 of the binary codec, as a version carries it; null when nothing was written. */
  readonly timeline: string | null;
  readonly findings: readonly FindingOnPage[];
}

export interface ShowViewer {
  readonly player: ShowPlayer;
  readonly timeline: Timeline | null;
  readonly isGentle: boolean;
  /** Why the preview is gentle by itself; null when the person may choose. */
  readonly gentleReason: string | null;
  readonly setGentle: (isGentle: boolean) => void;
}

/** A show of the server to watch, not to change. Null until the show has come and its player is made. */
export function useShowViewer(show: ShowToView | null): ShowViewer | null {
  const { layout, song, score, timeline: encoded = null, findings = [] } = show ?? {};
  const made = useDisposable(() => {
    const player = layout && song ? new ShowPlayer({ layout, song, score: score ?? null }) : null;
    return { player, dispose: () => player?.dispose() };
  }, [layout, song, score]);
  const player = made?.player ?? null;
  const timeline = useMemo(() => (encoded === null ? null : decodeTimeline(decodeBase64(encoded))), [encoded]);
  const [wantsGentle, setGentle] = useState(() => window.matchMedia("(prefers-reduced-motion: reduce)").matches);
  const isFlashing = findings.some((finding) => finding.severity === "stop" && finding.rule.includes("flash"));
  const gentleReason = isFlashing ? "This show flashes too often." : null;
  const isGentle = wantsGentle || isFlashing;

  useEffect(() => player?.setTimeline(timeline), [player, timeline]);
  useEffect(() => player?.setGentle(isGentle), [player, isGentle]);
  return player && { player, timeline, isGentle, gentleReason, setGentle };
}

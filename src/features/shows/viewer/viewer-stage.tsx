import type { Layout } from "../../../../shared/contracts/square.ts";
import { joinClasses } from "../../../components/class-names.ts";
import { StageWindow } from "../studio/stage-window.tsx";
import "../studio/studio.css";
import type { ShowViewer } from "./use-show-viewer.ts";

export interface ViewerStageProps {
  viewer: ShowViewer;
  layout: Layout;
  description: string;
  onGoToLine: (line: number) => void;
  /** The height, as a class. */
  className: string;
}

/** The window onto the square where a show is watched: the studio's, without its mount. */
export function ViewerStage({ viewer, layout, description, onGoToLine, className }: ViewerStageProps) {
  return (
    <div
      className={joinClasses(
        "grid grid-cols-[minmax(0,1fr)] [&_.studio-window]:grid-rows-[minmax(0,1fr)_40px]! [&_.studio-window]:rounded-none! [&_.studio-window]:border-0! [&_.studio-window]:shadow-none!",
        className,
      )}
    >
      <StageWindow
        layout={layout}
        player={viewer.player}
        isGentle={viewer.isGentle}
        gentleReason={viewer.gentleReason}
        onGentle={viewer.setGentle}
        onGoToLine={onGoToLine}
        description={description}
      />
    </div>
  );
}

import { useEffect, useRef, useState } from "react";
import type { Layout } from "../../../../shared/contracts/square.ts";
import { SIDES, type Side } from "../../../../shared/sides.ts";
import { Button } from "../../../components/button.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { Notice } from "../../../components/notice.tsx";
import { Select } from "../../../components/select.tsx";
import { presentClock } from "../ribbon/song-place.ts";
import { nameFile, saveFile } from "../studio/save-script.ts";
import type { ShowPlayer } from "../studio/show-player.ts";
import { findVideoFormat, RecordingStoppedError, ShowRecorder, VIDEO_SIZE } from "./show-recorder.ts";
import "./record.css";

export interface RecordDialogProps {
  player: ShowPlayer;
  layout: Layout;
  title: string;
  /** Why the picture is gentle by itself; null when it is as the person chose. */
  gentleReason: string | null;
  onClose: () => void;
}

type Stage =
  | { readonly kind: "asking" }
  | { readonly kind: "recording"; readonly share: number }
  | { readonly kind: "done"; readonly name: string; readonly megabytes: number; readonly hasSound: boolean }
  | { readonly kind: "stopped"; readonly reason: string };

/** Records the show as a video file, with its sound, on this computer alone. */
export function RecordDialog({ player, layout, title, gentleReason, onClose }: RecordDialogProps) {
  const [side, setSide] = useState<Side>("north");
  const [stage, setStage] = useState<Stage>({ kind: "asking" });
  const [format] = useState(findVideoFormat);
  const canvasRef = useRef<HTMLCanvasElement>(null);
  const recorderRef = useRef<ShowRecorder | null>(null);
  useEffect(() => () => recorderRef.current?.dispose(), []);
  const isRecording = stage.kind === "recording";
  const { endSeconds } = player.tempo;

  const record = async () => {
    const canvas = canvasRef.current;
    if (!canvas || !format) return;
    recorderRef.current?.dispose();
    const onProgress = (share: number) =>
      setStage((now) => (now.kind === "recording" ? { kind: "recording", share } : now));
    const recorder = new ShowRecorder({ player, layout, side, format, canvas, onProgress });
    recorderRef.current = recorder;
    setStage({ kind: "recording", share: 0 });
    try {
      const video = await recorder.record();
      const name = nameFile(title, format.ending);
      saveFile(name, video);
      setStage({ kind: "done", name, megabytes: video.size / 1e6, hasSound: player.transport.state.hasSound });
    } catch (error) {
      const reason = error instanceof RecordingStoppedError ? error.message : "The sound or the picture did not start.";
      setStage({ kind: "stopped", reason });
    }
  };
  return (
    <Dialog
      isOpen
      onClose={onClose}
      isBusy={isRecording}
      title="Record a video"
      actions={
        isRecording ? (
          <Button onPress={() => recorderRef.current?.cancel()}>Cancel the recording</Button>
        ) : (
          <>
            <Button onPress={onClose}>Close</Button>
            <Button
              look="main"
              disabledReason={format ? null : "This browser can not make a video."}
              onPress={() => void record()}
            >
              {stage.kind === "asking" ? "Record" : "Record again"}
            </Button>
          </>
        )
      }
    >
      {format ? (
        <p>
          It takes as long as the song, {presentClock(endSeconds)}, and you hear it meanwhile. Keep this page in front.
          The file stays on this computer.
        </p>
      ) : (
        <Notice tone="warn" title="This browser can not make a video.">
          It has no encoder for one. The script can be saved as a file all the same, and another browser may do it.
        </Notice>
      )}
      <Select
        label="Side of the square"
        hint="All four sides are in the strip below the picture."
        value={side}
        disabled={isRecording || !format}
        onChange={(event) => setSide(SIDES.find((each) => each === event.target.value) ?? "north")}
        options={SIDES.map((each) => ({ value: each, label: `${each.charAt(0).toUpperCase()}${each.slice(1)}` }))}
      />
      <canvas
        ref={canvasRef}
        className="record-picture"
        width={VIDEO_SIZE.width}
        height={VIDEO_SIZE.height}
        role="img"
        aria-label="The picture that is recorded"
        hidden={stage.kind === "asking"}
      />
      {stage.kind === "recording" && <Progress share={stage.share} endSeconds={endSeconds} />}
      {stage.kind === "done" && (
        <Notice tone="ok" title={`${stage.name} is in your downloads, ${stage.megabytes.toFixed(1)} MB.`}>
          {!stage.hasSound && "It has no sound: this computer plays none."}
        </Notice>
      )}
      {stage.kind === "stopped" && (
        <Notice tone="warn" title="There is no video.">
          {stage.reason} You can record again.
        </Notice>
      )}
      <p className="text-soft">
        {gentleReason && `The video shows the gentle preview. ${gentleReason} `}
        Flashing light can harm people with photosensitive epilepsy. Say so before you show a video that flashes.
      </p>
    </Dialog>
  );
}

function Progress({ share, endSeconds }: { share: number; endSeconds: number }) {
  const percent = Math.round(share * 100);
  const left = presentClock(Math.ceil(endSeconds * (1 - share)));
  return (
    <div className="record-progress">
      <progress aria-label="Recorded so far" max={100} value={percent} />
      <span>{left} left</span>
    </div>
  );
}

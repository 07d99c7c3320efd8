import { useEffect, useRef, useState } from "react";
import { Dialog } from "react-aria-components/Dialog";
import { Modal, ModalOverlay } from "react-aria-components/Modal";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import type { Layout } from "../../../../shared/contracts/square.ts";
import { Button } from "../../../components/button.tsx";
import { IconButton } from "../../../components/icon-button.tsx";
import { StageWindow } from "../studio/stage-window.tsx";
import type { ShowPlayer } from "../studio/show-player.ts";
import { useTransport } from "../studio/use-transport.ts";
import "./projector.css";
import { ViewerTransport } from "./viewer-transport.tsx";

export interface ProjectorProps {
  player: ShowPlayer;
  layout: Layout;
  song: BeatMap;
  title: string;
  /** First names. */
  authors: string;
  songTitle: string;
  isGentle: boolean;
  gentleReason: string | null;
  onGentle: (isGentle: boolean) => void;
  description: string;
  onClose: () => void;
}

/** The show for the whole class: full screen where the browser allows, a title card first, then the square and the sound. */
export function Projector({ player, song, title, authors, songTitle, onClose, ...stage }: ProjectorProps) {
  const { isPlaying, isStarting } = useTransport(player);
  const [isCard, setIsCard] = useState(true);
  useFullScreenEnd(onClose);
  const isOn = isPlaying || isStarting;
  // At the end of the show its name comes back.
  const wasPlaying = useRef(false);
  useEffect(() => {
    if (wasPlaying.current && !isPlaying && player.tick >= player.tempo.endTick - 1) setIsCard(true);
    wasPlaying.current = isPlaying;
  }, [isPlaying, player]);
  const bar = useRef<HTMLDivElement>(null);
  const begin = () => {
    player.seekTick(0);
    setIsCard(false);
    player.transport.toggle();
    // The card goes with the button that was pressed.
    bar.current?.querySelector("button")?.focus();
  };
  const leave = () => {
    player.transport.pause();
    if (document.fullscreenElement) void document.exitFullscreen();
    onClose();
  };
  return (
    <ModalOverlay isOpen onOpenChange={(isOpen) => !isOpen && leave()} className="projector">
      <Modal className="projector-sheet">
        <Dialog aria-label={`${title} on the projector`} className="projector-room">
          <div className="projector-stage">
            <StageWindow {...stage} player={player} onGoToLine={() => undefined} />
            {isCard && !isOn && (
              <div className="projector-card">
                <div className="projector-card-sheet">
                  <h2>{title}</h2>
                  <p>by {authors}</p>
                  <p className="projector-song">{songTitle}</p>
                  <Button look="lamp" icon="play" autoFocus onPress={begin}>
                    Start the show
                  </Button>
                </div>
              </div>
            )}
          </div>
          <div ref={bar} className="projector-bar">
            <ViewerTransport player={player} song={song} songTitle={`${title} · ${authors}`} />
            <IconButton icon="cross" label="Leave the projector" onPress={leave} />
          </div>
        </Dialog>
      </Modal>
    </ModalOverlay>
  );
}

/** Calls back when the person leaves the full screen by the browser's own key. */
function useFullScreenEnd(onEnd: () => void): void {
  const endRef = useRef(onEnd);
  useEffect(() => {
    endRef.current = onEnd;
  });
  useEffect(() => {
    const handleChange = () => {
      if (!document.fullscreenElement) endRef.current();
    };
    document.addEventListener("fullscreenchange", handleChange);
    return () => document.removeEventListener("fullscreenchange", handleChange);
  }, []);
}

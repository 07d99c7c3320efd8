import { useDisclosure } from "../../../hooks/use-disclosure.ts";
import { Icon } from "../../../components/icon.tsx";

export interface VolumeControlProps {
  /** 0 to 1. */
  volume: number;
  /** False: this device plays no sound. */
  hasSound: boolean;
  /** The sound did not load; the next press of play tries again. */
  hasFailed: boolean;
  onVolume: (volume: number) => void;
}

/** The volume: a slider, or on narrow screens a button that opens one. */
export function VolumeControl({ volume, hasSound, hasFailed, onVolume }: VolumeControlProps) {
  const { isOpen, panelId, rootRef, toggle } = useDisclosure();
  const slider = (
    <input
      type="range"
      min={0}
      max={100}
      aria-label="Volume"
      value={Math.round(volume * 100)}
      onChange={(event) => onVolume(Number(event.target.value) / 100)}
    />
  );
  if (!hasSound || hasFailed)
    return (
      <p className="studio-volume" role="status">
        <Icon name="mute" /> {hasFailed ? "No sound came. Press play again." : "No sound here"}
      </p>
    );
  return (
    <div ref={rootRef} className="studio-volume">
      <div className="studio-volume-wide">
        <Icon name="volume" />
        {slider}
      </div>
      <button
        type="button"
        className="studio-quiet-icon studio-volume-narrow"
        aria-label="Volume"
        aria-expanded={isOpen}
        aria-controls={panelId}
        onClick={toggle}
      >
        <Icon name={volume === 0 ? "mute" : "volume"} />
      </button>
      {isOpen && (
        <div id={panelId} className="studio-volume-panel">
          {slider}
        </div>
      )}
    </div>
  );
}

import { Checkbox } from "../../../components/checkbox.tsx";
import { Icon } from "../../../components/icon.tsx";
import { useDisclosure } from "../../../hooks/use-disclosure.ts";
import { SpeedChoice } from "./speed-choice.tsx";
import type { Transport, TransportState } from "./transport-model.ts";

export interface SoundPanelProps {
  transport: Transport;
  state: TransportState;
}

/** Behind one button: metronome and count-in, and what the bar has no room for of volume and speed. */
export function SoundPanel({ transport, state }: SoundPanelProps) {
  const { isOpen, panelId, rootRef, toggle } = useDisclosure();
  const { volume, hasSound, hasFailed } = state;
  const slider = (
    <input
      type="range"
      min={0}
      max={100}
      aria-label="Volume"
      value={Math.round(volume * 100)}
      onChange={(event) => transport.setVolume(Number(event.target.value) / 100)}
    />
  );
  const isSilent = !hasSound || hasFailed;
  return (
    <div ref={rootRef} className="studio-sound">
      {isSilent ? (
        <p className="studio-sound-fault" role="status">
          <Icon name="mute" /> {hasFailed ? "No sound came. Press play again." : "No sound here"}
        </p>
      ) : (
        <div className="studio-sound-wide">{slider}</div>
      )}
      <button
        type="button"
        className="studio-quiet-icon studio-sound-button"
        aria-label="Sound and speed"
        aria-expanded={isOpen}
        aria-controls={panelId}
        onClick={toggle}
      >
        <Icon name={isSilent || volume === 0 ? "mute" : "volume"} />
      </button>
      {isOpen && (
        <div id={panelId} className="studio-sound-panel">
          {!isSilent && (
            <div className="studio-sound-row is-narrow">
              <span aria-hidden="true">Volume</span>
              {slider}
            </div>
          )}
          <div className="studio-sound-row is-phone">
            <span aria-hidden="true">Speed</span>
            <SpeedChoice rate={state.rate} onRate={(rate) => transport.setRate(rate)} />
          </div>
          <Checkbox
            label="Metronome: a tick on every beat"
            checked={state.hasMetronome}
            onChange={(event) => transport.setMetronome(event.target.checked)}
          />
          <Checkbox
            label="Count in a bar before playing"
            checked={state.hasCountIn}
            onChange={(event) => transport.setCountIn(event.target.checked)}
          />
        </div>
      )}
    </div>
  );
}

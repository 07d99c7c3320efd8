import { useId } from "react";
import { Icon } from "../../../components/icon.tsx";

export interface GentleButtonProps {
  isGentle: boolean;
  /** Why it is on by itself; null when the person may choose. */
  reason: string | null;
  onGentle: (isGentle: boolean) => void;
}

/** The switch of the gentle preview. While it is on by itself it says why and can not be switched off. */
export function GentleButton({ isGentle, reason, onGentle }: GentleButtonProps) {
  const reasonId = useId();
  const isOn = isGentle || reason !== null;
  return (
    <div className="studio-gentle">
      <button
        type="button"
        aria-pressed={isOn}
        aria-disabled={reason !== null || undefined}
        aria-describedby={reason ? reasonId : undefined}
        onClick={() => reason === null && onGentle(!isGentle)}
      >
        <Icon name="gentle" />
        Gentle preview <b>{isOn ? "on" : "off"}</b>
      </button>
      {reason && (
        <p id={reasonId} className="studio-gentle-reason">
          {reason}
        </p>
      )}
    </div>
  );
}

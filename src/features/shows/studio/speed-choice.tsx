import { Radio, RadioGroup } from "react-aria-components/RadioGroup";

const SPEEDS = [
  { rate: 0.5, sign: "½", word: "half" },
  { rate: 0.75, sign: "¾", word: "three quarters" },
  { rate: 1, sign: "full", word: "full" },
] as const;

export interface SpeedChoiceProps {
  rate: number;
  onRate: (rate: number) => void;
}

/** How fast the song runs; the pitch stays. */
export function SpeedChoice({ rate, onRate }: SpeedChoiceProps) {
  return (
    <RadioGroup
      aria-label="Speed"
      orientation="horizontal"
      value={String(rate)}
      onChange={(value) => onRate(Number(value))}
      className="studio-speed"
    >
      {SPEEDS.map((speed) => (
        <Radio key={speed.rate} value={String(speed.rate)} aria-label={speed.word} className="studio-speed-step">
          {speed.sign}
        </Radio>
      ))}
      <span className="studio-speed-word" aria-hidden="true">
        speed
      </span>
    </RadioGroup>
  );
}

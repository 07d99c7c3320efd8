import type { Evidence } from "../../../../shared/contracts/marking.ts";
import { Icon, type IconName } from "../../../components/icon.tsx";
import { PlaceButton } from "../../../components/place-button.tsx";
import { Sentence } from "../../../components/sentence.tsx";

export interface EvidenceListProps {
  evidence: readonly Evidence[];
  /** "bar 21" of a tick. */
  presentMoment: (tick: number) => string;
  onShowLine: (line: number) => void;
  onShowMoment: (tick: number) => void;
}

const SIGNS: Record<Evidence["kind"], { icon: IconName; ink: string; label: string }> = {
  tick: { icon: "check", ink: "text-spruce", label: "Found" },
  triangle: { icon: "warn", ink: "text-lamp-ink", label: "Look here" },
  info: { icon: "info", ink: "text-slate", label: "Counted" },
};
const MAX_PLACES = 3;

/** Counted facts beside a criterion, each with the lines and moments where it can be seen. */
export function EvidenceList({ evidence, presentMoment, onShowLine, onShowMoment }: EvidenceListProps) {
  if (evidence.length === 0) return null;
  return (
    <ul className="text-meta leading-[1.38] text-soft">
      {evidence.map((fact) => {
        const sign = SIGNS[fact.kind];
        return (
          <li key={fact.text} className="grid grid-cols-[17px_1fr] gap-1.5">
            <Icon name={sign.icon} label={sign.label} className={`mt-0.5 size-3.5 ${sign.ink}`} />
            <span>
              <Sentence text={fact.text} />{" "}
              <span className="whitespace-nowrap">
                {fact.lines.slice(0, MAX_PLACES).map((line) => (
                  <PlaceButton key={`line-${line}`} onPress={() => onShowLine(line)}>
                    line {line}
                  </PlaceButton>
                ))}
                {fact.moments.slice(0, MAX_PLACES).map((tick) => (
                  <PlaceButton key={`moment-${tick}`} onPress={() => onShowMoment(tick)}>
                    {presentMoment(tick)}
                  </PlaceButton>
                ))}
              </span>
            </span>
          </li>
        );
      })}
    </ul>
  );
}

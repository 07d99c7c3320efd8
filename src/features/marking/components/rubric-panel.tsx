import type { ReactNode } from "react";
import type { Criterion, Rubric } from "../../../../shared/contracts/assignments.ts";
import type { Evidence } from "../../../../shared/contracts/marking.ts";
import { joinClasses } from "../../../components/class-names.ts";
import { RadioRow } from "../../../components/radio-row.tsx";
import { LEVEL_COUNT, type Levels } from "../model/rubric.ts";
import { EvidenceList, type EvidenceListProps } from "./evidence-list.tsx";

export interface RubricPanelProps extends Omit<EvidenceListProps, "evidence"> {
  rubric: Rubric;
  levels: Levels;
  /** By criterion id, and under "" for the whole. */
  evidence: Readonly<Record<string, readonly Evidence[]>>;
  /** The criterion that the number keys set. */
  currentId: string | null;
  onCurrentChange: (criterionId: string) => void;
  onLevelChange: (criterionId: string, level: number) => void;
  /** Set when the mark is fixed: shown, not changed. */
  isFixed: boolean;
  children?: ReactNode;
}

/** The rubric with its evidence: the system counts, the teacher decides. No level is chosen beforehand. */
export function RubricPanel({
  rubric,
  levels,
  evidence,
  currentId,
  onCurrentChange,
  onLevelChange,
  isFixed,
  children,
  ...places
}: RubricPanelProps) {
  const ofWhole = evidence[""] ?? [];
  return (
    <>
      <div className="flex flex-wrap items-baseline gap-x-2 border-b border-line px-4 pt-2.5 pb-2">
        <h2 className="text-h2">Rubric</h2>
        <span className="text-meta text-slate">Evidence is counted; the mark is yours</span>
      </div>
      {children}
      {rubric.map((criterion) => (
        <div
          key={criterion.id}
          data-criterion={criterion.id}
          onFocus={() => onCurrentChange(criterion.id)}
          className={joinClasses(
            "border-b border-line px-4 pt-2 pb-2.5",
            !isFixed && currentId === criterion.id && "bg-card shadow-[inset_4px_0_0_var(--color-blue-ink)]",
          )}
        >
          <CriterionRow
            criterion={criterion}
            level={levels[criterion.id] ?? null}
            isFixed={isFixed}
            onLevelChange={(level) => onLevelChange(criterion.id, level)}
          />
          <EvidenceList evidence={evidence[criterion.id] ?? []} {...places} />
        </div>
      ))}
      {ofWhole.length > 0 && (
        <div className="px-4 py-2.5">
          <h3 className="mb-1 font-text text-body font-bold tracking-normal">The whole show</h3>
          <EvidenceList evidence={ofWhole} {...places} />
        </div>
      )}
    </>
  );
}

interface CriterionRowProps {
  criterion: Criterion;
  level: number | null;
  isFixed: boolean;
  onLevelChange: (level: number) => void;
}

function CriterionRow({ criterion, level, isFixed, onLevelChange }: CriterionRowProps) {
  const chosen = level === null ? null : criterion.levels[level - 1];
  const points = level === null ? "no level yet" : `${level} of ${LEVEL_COUNT}`;
  if (isFixed) {
    return (
      <div className="mb-1.5">
        <p className="flex items-baseline gap-2 font-bold">
          {criterion.name}
          <span className="ml-auto text-meta font-normal text-slate tabular-nums">{points}</span>
        </p>
        <p className="text-meta text-soft">
          <strong>{chosen?.name ?? "No level"}</strong>
          {chosen?.text && `: ${chosen.text}`}
        </p>
      </div>
    );
  }
  return (
    <>
      <RadioRow
        legend={criterion.name}
        legendEnd={points}
        options={criterion.levels.map((option, index) => ({ value: String(index + 1), label: option.name }))}
        value={level === null ? null : String(level)}
        onChange={(value) => onLevelChange(Number(value))}
        className="mb-1.5"
      />
      {chosen?.text && <p className="mb-1 text-meta text-slate">{chosen.text}</p>}
    </>
  );
}

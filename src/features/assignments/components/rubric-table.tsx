import type { Rubric } from "../../../../shared/contracts/assignments.ts";
import { Icon } from "../../../components/icon.tsx";

export interface RubricTableProps {
  rubric: Rubric;
  /** Level chosen by criterion id, 1 to 4; null before a mark. */
  levels: Readonly<Record<string, number>> | null;
}

/** The criteria with their four levels, the chosen one marked by a tick and a frame. Narrow, it scrolls by itself. */
export function RubricTable({ rubric, levels }: RubricTableProps) {
  return (
    <div
      className="overflow-x-auto rounded-sheet border border-line bg-card"
      // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex -- it scrolls, so the keyboard must reach it
      tabIndex={0}
      role="region"
      aria-label="Rubric"
    >
      <table className="w-full min-w-[44rem] border-collapse text-left">
        <tbody>
          {rubric.map((criterion) => (
            <tr key={criterion.id} className="border-b border-line last:border-b-0">
              <th scope="row" className="w-1/5 p-3 align-top font-semibold">
                {criterion.name}
              </th>
              {criterion.levels.map((level, i) => {
                const isChosen = levels?.[criterion.id] === i + 1;
                return (
                  <td
                    key={level.name}
                    className={`w-1/5 border-l border-line p-3 align-top ${isChosen ? "bg-spruce-tint" : ""}`}
                  >
                    <span className="flex items-center gap-1.5 font-semibold">
                      {isChosen && <Icon name="check" label="chosen" />}
                      {level.name}
                    </span>
                    <span className="text-soft">{level.text}</span>
                  </td>
                );
              })}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

import type { AuditRow } from "../../../../shared/contracts/admin.ts";
import { EmptyState } from "../../../components/empty-state.tsx";
import { Skeleton, SkeletonGroup } from "../../../components/skeleton.tsx";
import { presentTime, toLocalDate } from "../../../lib/zoned-time.ts";

export interface AuditTableProps {
  rows: readonly AuditRow[];
  timeZone: string;
}

/** What was done by whom, newest first. */
export function AuditTable({ rows, timeZone }: AuditTableProps) {
  if (rows.length === 0) {
    return (
      <EmptyState icon="history" title="Nothing is written yet" headingLevel={2}>
        Sign-ins, new accounts, cards, marks and publications are written here as they happen.
      </EmptyState>
    );
  }
  return (
    <div
      // Wider than a phone: the keyboard must be able to scroll it.
      // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex
      tabIndex={0}
      role="region"
      aria-label="Rows of the audit log"
      className="relative overflow-x-auto rounded-sheet border border-line bg-card shadow-sheet-1"
    >
      <table className="w-full border-collapse">
        <thead>
          <tr className="border-b-[1.5px] border-line text-left text-meta text-slate [&>th]:px-4 [&>th]:py-2 [&>th]:font-semibold">
            <th scope="col" className="text-right">
              No.
            </th>
            <th scope="col">When</th>
            <th scope="col">Who</th>
            <th scope="col">What</th>
            <th scope="col">On</th>
          </tr>
        </thead>
        <tbody className="divide-y divide-line">
          {rows.map((row) => (
            <tr key={row.id} className="[&>*]:px-4 [&>*]:py-1.5">
              <td className="text-right font-mono text-meta text-slate">{row.id}</td>
              <td className="font-mono text-meta whitespace-nowrap">
                {toLocalDate(row.at, timeZone)} {presentTime(row.at, timeZone)}
              </td>
              <td className="whitespace-nowrap">
                {row.actorName ?? <span className="text-slate">nobody signed in</span>}
              </td>
              <td>{row.event}</td>
              <td className="font-mono text-meta text-slate">{row.subject ?? ""}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

export function AuditSkeleton() {
  return (
    <SkeletonGroup
      label="Loading the audit log"
      className="divide-y divide-line rounded-sheet border border-line bg-card"
    >
      {["a", "b", "c", "d", "e", "f"].map((row) => (
        <div key={row} className="flex gap-8 px-4 py-3.5">
          <Skeleton className="w-32" />
          <Skeleton className="w-64" />
        </div>
      ))}
    </SkeletonGroup>
  );
}

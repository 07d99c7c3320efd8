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
    <div className="relative rounded-sheet border border-line bg-card shadow-sheet-1">
      <table className="w-full border-collapse max-wide:block">
        <thead className="max-wide:sr-only">
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
        <tbody className="divide-y divide-line max-wide:block">
          {rows.map((row) => (
            <tr
              key={row.id}
              className="max-wide:flex max-wide:flex-wrap max-wide:items-baseline max-wide:gap-x-3 max-wide:px-4 max-wide:py-2.5 wide:[&>*]:px-4 wide:[&>*]:py-1.5"
            >
              <td className="text-right font-mono text-meta text-slate">{row.id}</td>
              <td className="font-mono text-meta whitespace-nowrap">
                {toLocalDate(row.at, timeZone)} {presentTime(row.at, timeZone)}
              </td>
              <td className="whitespace-nowrap">
                {row.actorName ?? <span className="text-slate">nobody signed in</span>}
              </td>
              <td className="max-wide:order-first max-wide:w-full max-wide:font-[650]">{row.event}</td>
              <td className="font-mono text-meta break-all text-slate">{row.subject ?? ""}</td>
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

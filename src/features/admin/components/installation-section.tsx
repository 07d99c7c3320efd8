import type { AdminOverview } from "../api.ts";
import { Card, CardHeader } from "../../../components/card.tsx";
import { EmptyState } from "../../../components/empty-state.tsx";
import { Notice } from "../../../components/notice.tsx";
import { presentWhen } from "../../../lib/zoned-time.ts";
import { isBackupOld, presentBytes } from "../model/installation.ts";

export interface SchoolsSectionProps {
  schools: AdminOverview["schools"];
}

/** The schools with their size. */
export function SchoolsSection({ schools }: SchoolsSectionProps) {
  return (
    <Card as="section" aria-labelledby="schools-heading">
      <CardHeader title="Schools" titleId="schools-heading" detail={schools.length} />
      {schools.length === 0 ? (
        <EmptyState className="m-4" icon="school" title="No school yet">
          Schools are added on the command line of the installation.
        </EmptyState>
      ) : (
        <ul className="divide-y divide-line">
          {schools.map((school) => (
            <li key={school.id} className="flex flex-wrap items-baseline gap-x-4 px-4 py-2">
              <span className="font-[650]">{school.name}</span>
              <span className="ml-auto text-slate tabular-nums">
                {school.classCount === 1 ? "1 class" : `${school.classCount} classes`},{" "}
                {school.studentCount === 1 ? "1 student" : `${school.studentCount} students`}
              </span>
            </li>
          ))}
        </ul>
      )}
    </Card>
  );
}

export interface DatabaseSectionProps {
  database: AdminOverview["database"];
  timeZone: string;
  now: number;
}

/** The state of the database, and a warning when its last backup is old. */
export function DatabaseSection({ database, timeZone, now }: DatabaseSectionProps) {
  const { bytes, sqliteVersion, lastBackupAt } = database;
  return (
    <Card as="section" aria-labelledby="database-heading">
      <CardHeader title="Database" titleId="database-heading" />
      <div className="space-y-3 p-4">
        <dl className="grid grid-cols-[8rem_1fr] gap-y-1 [&_dt]:text-slate">
          <dt>Size</dt>
          <dd className="tabular-nums">{presentBytes(bytes)}</dd>
          <dt>SQLite</dt>
          <dd className="font-mono">{sqliteVersion}</dd>
          <dt>Last backup</dt>
          <dd>{lastBackupAt === null ? "never" : presentWhen(lastBackupAt, now, timeZone)}</dd>
        </dl>
        {isBackupOld(lastBackupAt, now) && (
          <Notice
            tone="warn"
            title={lastBackupAt === null ? "There is no backup yet." : "The last backup is more than a day old."}
          >
            Make one on the command line of the installation, and keep it on another computer.
          </Notice>
        )}
      </div>
    </Card>
  );
}

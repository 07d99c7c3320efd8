import { useQuery } from "@tanstack/react-query";
import { useNavigate, useParams, type LoaderFunctionArgs } from "react-router";
import { ClassIdSchema, type ClassId } from "../../shared/ids.ts";
import { NotFoundPage } from "../components/not-found-page.tsx";
import { Page } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
import { Skeleton, SkeletonGroup } from "../components/skeleton.tsx";
import { SubBand } from "../components/sub-band.tsx";
import { assignmentsQuery } from "../features/assignments/api.ts";
import { AssignmentTable, AssignmentTableSkeleton } from "../features/assignments/teacher/assignment-table.tsx";
import { classQuery } from "../features/classes/api.ts";
import { CardMaker } from "../features/classes/components/card-maker.tsx";
import { StudentTable } from "../features/classes/components/student-table.tsx";
import { useNow } from "../hooks/use-now.ts";
import { queryClient } from "../lib/query-client.ts";
import { useEventZone } from "./event-zone.ts";
import { requireSession } from "./guards.ts";

export async function loader({ request, params }: LoaderFunctionArgs) {
  await requireSession(request, "teacher");
  const classId = ClassIdSchema.safeParse(params.classId);
  if (!classId.success) throw new Response(null, { status: 404 });
  void queryClient.prefetchQuery(classQuery(classId.data));
  if (params.section === "work") void queryClient.prefetchQuery(assignmentsQuery);
  return null;
}

/** One class: its students, its work, its cards and codes. */
export function Component() {
  const { classId, section = "students" } = useParams();
  const one = useQuery(classQuery(classId as ClassId));
  if (!["students", "work", "cards"].includes(section)) return <NotFoundPage />;
  const name = one.data?.class.name ?? "Class";
  return (
    <Page title={name} density="staff" layout="full">
      <SubBand
        title={name}
        detail={one.data?.class.schoolName}
        sectionsLabel={`Sections of ${name}`}
        sections={[
          { to: `/classes/${classId}`, label: "Students", icon: "people", isExact: true },
          { to: `/classes/${classId}/work`, label: "Work", icon: "pencil", count: one.data?.class.toMarkCount },
          { to: `/classes/${classId}/cards`, label: "Cards and codes", icon: "card" },
        ]}
      />
      <div className="mx-auto w-full max-w-page px-6 pt-4 pb-10 max-wide:px-4 print:p-0">
        {section === "students" && <Students classId={classId as ClassId} />}
        {section === "work" && <Work classId={classId as ClassId} />}
        {section === "cards" && <Cards classId={classId as ClassId} />}
      </div>
    </Page>
  );
}

interface SectionProps {
  classId: ClassId;
}

const ERROR_TITLE = "The class could not be loaded.";

function Students({ classId }: SectionProps) {
  const navigate = useNavigate();
  const timeZone = useEventZone();
  const now = useNow();
  return (
    <QueryView query={useQuery(classQuery(classId))} skeleton={<ClassSkeleton />} errorTitle={ERROR_TITLE}>
      {({ class: classSummary, students, lessons }) => (
        <StudentTable
          classSummary={classSummary}
          students={students}
          lessons={lessons}
          timeZone={timeZone}
          now={now}
          onCardsMade={() => void navigate(`/classes/${classId}/cards`)}
        />
      )}
    </QueryView>
  );
}

function Work({ classId }: SectionProps) {
  const timeZone = useEventZone();
  const now = useNow();
  return (
    <QueryView
      query={useQuery(assignmentsQuery)}
      skeleton={<AssignmentTableSkeleton />}
      errorTitle="The assignments could not be loaded."
    >
      {(assignments) => (
        <AssignmentTable
          classId={classId}
          assignments={assignments.filter((assignment) => assignment.classId === classId)}
          timeZone={timeZone}
          now={now}
        />
      )}
    </QueryView>
  );
}

function Cards({ classId }: SectionProps) {
  return (
    <QueryView query={useQuery(classQuery(classId))} skeleton={<ClassSkeleton />} errorTitle={ERROR_TITLE}>
      {({ class: classSummary, students }) => <CardMaker classSummary={classSummary} students={students} />}
    </QueryView>
  );
}

function ClassSkeleton() {
  return (
    <SkeletonGroup label="Loading the class">
      <Skeleton className="mb-4 h-5 w-40" />
      <div className="divide-y divide-line rounded-sheet border border-line bg-card">
        {["first", "second", "third", "fourth", "fifth"].map((row) => (
          <div key={row} className="flex gap-8 px-4 py-3.5">
            <Skeleton className="w-28" />
            <Skeleton className="w-44" />
          </div>
        ))}
      </div>
    </SkeletonGroup>
  );
}

import { useQuery } from "@tanstack/react-query";
import { useParams, type LoaderFunctionArgs } from "react-router";
import { AssignmentIdSchema } from "../../shared/ids.ts";
import { ErrorState } from "../components/error-state.tsx";
import { Page } from "../components/page.tsx";
import { Skeleton, SkeletonGroup } from "../components/skeleton.tsx";
import { assignmentQuery } from "../features/assignments/api.ts";
import { AssignmentBrief } from "../features/assignments/components/assignment-brief.tsx";
import { submissionQuery } from "../features/marking/api.ts";
import { Feedback } from "../features/marking/components/feedback.tsx";
import { ApiProblem } from "../lib/api-client.ts";
import { queryClient } from "../lib/query-client.ts";
import { requireSession } from "./guards.ts";

function parseId(value: string | undefined) {
  const id = AssignmentIdSchema.safeParse(value);
  if (!id.success) throw new Response(null, { status: 404 });
  return id.data;
}

export async function loader({ request, params }: LoaderFunctionArgs) {
  await requireSession(request, "student");
  const query = assignmentQuery(parseId(params["assignmentId"]));
  await queryClient.ensureQueryData(query).catch((error: unknown) => {
    if (error instanceof ApiProblem && error.status === 404) throw new Response(null, { status: 404 });
  });
  return null;
}

/** One assignment as its pupil sees it: the brief, what is next, and what came back. */
export function Component() {
  const { assignmentId } = useParams();
  const assignment = useQuery(assignmentQuery(parseId(assignmentId)));
  const submissionId = assignment.data?.assignment.mine?.submissionId ?? null;
  const submission = useQuery({ ...submissionQuery(submissionId ?? ("none" as never)), enabled: submissionId !== null });
  if (assignment.isError) {
    return (
      <Page title="Assignment">
        <h1 className="mb-4">Assignment</h1>
        <ErrorState title="The assignment could not be loaded." onRetry={() => void assignment.refetch()} isRetrying={assignment.isFetching} />
      </Page>
    );
  }
  if (!assignment.data) return <AssignmentSkeleton />;
  return (
    <Page title={assignment.data.assignment.title}>
      <AssignmentBrief detail={assignment.data} feedback={submission.data ? <Feedback detail={submission.data} /> : null} />
      {submission.isError && <ErrorState title="What came back could not be loaded." onRetry={() => void submission.refetch()} isRetrying={submission.isFetching} />}
    </Page>
  );
}

function AssignmentSkeleton() {
  return (
    <Page title="Loading">
      <h1 className="sr-only">Loading the assignment</h1>
      <SkeletonGroup label="Loading the assignment" className="space-y-4">
        <Skeleton className="h-8 w-1/2" />
        <Skeleton shape="block" className="h-40" />
      </SkeletonGroup>
    </Page>
  );
}

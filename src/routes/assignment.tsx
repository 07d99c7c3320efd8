import { useQuery } from "@tanstack/react-query";
import { useParams, type LoaderFunctionArgs } from "react-router";
import { AssignmentIdSchema, type SubmissionId } from "../../shared/ids.ts";
import { Page } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
import { Skeleton, SkeletonGroup } from "../components/skeleton.tsx";
import { assignmentQuery } from "../features/assignments/api.ts";
import { AssignmentBrief } from "../features/assignments/components/assignment-brief.tsx";
import { submissionQuery } from "../features/marking/api.ts";
import { Feedback } from "../features/marking/components/feedback.tsx";
import { queryClient } from "../lib/query-client.ts";
import { requireSession } from "./guards.ts";

function parseId(value: string | undefined) {
  const id = AssignmentIdSchema.safeParse(value);
  if (!id.success) throw new Response(null, { status: 404 });
  return id.data;
}

export async function loader({ request, params }: LoaderFunctionArgs) {
  await requireSession(request, "student");
  void queryClient.prefetchQuery(assignmentQuery(parseId(params["assignmentId"])));
  return null;
}

/** One assignment as its pupil sees it: the brief, what is next, and what came back. */
export function Component() {
  const { assignmentId } = useParams();
  const assignment = useQuery(assignmentQuery(parseId(assignmentId)));
  return (
    <QueryView
      query={assignment}
      errorTitle="The assignment could not be loaded."
      skeleton={<AssignmentSkeleton />}
      frame={(message) => (
        <Page title="Assignment">
          <h1 className="mb-4">Assignment</h1>
          {message}
        </Page>
      )}
    >
      {(detail) => (
        <Page title={detail.assignment.title}>
          <AssignmentBrief
            detail={detail}
            feedback={
              detail.assignment.mine?.submissionId ? (
                <CameBack submissionId={detail.assignment.mine.submissionId} />
              ) : null
            }
          />
        </Page>
      )}
    </QueryView>
  );
}

function CameBack({ submissionId }: { submissionId: SubmissionId }) {
  return (
    <QueryView
      query={useQuery(submissionQuery(submissionId))}
      errorTitle="What came back could not be loaded."
      skeleton={
        <SkeletonGroup label="Loading what came back">
          <Skeleton shape="block" className="h-24" />
        </SkeletonGroup>
      }
    >
      {(detail) => <Feedback detail={detail} />}
    </QueryView>
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

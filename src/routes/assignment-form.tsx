import { useQuery } from "@tanstack/react-query";
import { useEffect } from "react";
import { useNavigate, useParams, type LoaderFunctionArgs } from "react-router";
import type { AssignmentDetail } from "../../shared/contracts/assignments.ts";
import { AssignmentIdSchema, ClassIdSchema, type AssignmentId, type ClassId } from "../../shared/ids.ts";
import { Page, PageHeader } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
import { Skeleton, SkeletonGroup } from "../components/skeleton.tsx";
import { showToast } from "../components/toast-queue.ts";
import { assignmentQuery, useCreateAssignment, useUpdateAssignment } from "../features/assignments/api.ts";
import { toDraft, toNewDraft } from "../features/assignments/teacher/assignment-form-model.ts";
import { AssignmentForm } from "../features/assignments/teacher/assignment-form.tsx";
import { classQuery } from "../features/classes/api.ts";
import { programmeQuery } from "../features/lineup/programme/api.ts";
import { songsQuery } from "../features/songs/api.ts";
import { useNow } from "../hooks/use-now.ts";
import { queryClient } from "../lib/query-client.ts";
import { requireSession } from "./guards.ts";

export async function loader({ request, params }: LoaderFunctionArgs) {
  await requireSession(request, "teacher");
  const isKnown =
    params.assignmentId === undefined
      ? ClassIdSchema.safeParse(params.classId).success
      : AssignmentIdSchema.safeParse(params.assignmentId).success;
  if (!isKnown) throw new Response(null, { status: 404 });
  // The form reads dates in the school's zone, so the zone must be there before it is filled.
  void queryClient.prefetchQuery(programmeQuery);
  void queryClient.prefetchQuery(songsQuery);
  return null;
}

/** Sets an assignment for a class, or changes one. */
export function Component() {
  const { classId, assignmentId } = useParams();
  return assignmentId === undefined ? (
    <NewAssignment classId={classId as ClassId} />
  ) : (
    <ChangeAssignment assignmentId={assignmentId} />
  );
}

function NewAssignment({ classId }: { classId: ClassId }) {
  const { data } = useQuery(classQuery(classId));
  const create = useCreateAssignment(classId);
  const backTo = `/classes/${classId}/work`;
  useLeaveWhenSaved(create.data?.assignment, backTo, "is set. The class sees it now.");
  return (
    <Frame title="Set an assignment" lead={data && `For ${data.class.name}, ${data.class.schoolName}`}>
      {({ zone, now, songs }) => (
        <AssignmentForm
          start={toNewDraft(now, zone)}
          check={{ zone, now }}
          songs={songs}
          saveLabel="Set the assignment"
          backTo={backTo}
          isRubricFixed={false}
          isSongFixed={false}
          isPending={create.isPending}
          isSaved={create.isSuccess}
          error={create.error}
          onSave={(fields) => create.mutate(fields)}
        />
      )}
    </Frame>
  );
}

function ChangeAssignment({ assignmentId }: { assignmentId: AssignmentId }) {
  const detail = useQuery(assignmentQuery(assignmentId));
  return (
    <Frame title="Change the assignment" lead={detail.data && `For ${detail.data.assignment.className}`}>
      {(ready) => (
        <QueryView query={detail} skeleton={<FormSkeleton />} errorTitle="The assignment could not be loaded.">
          {(loaded) => <ChangeForm detail={loaded} {...ready} />}
        </QueryView>
      )}
    </Frame>
  );
}

function ChangeForm({ detail, zone, now, songs }: Ready & { detail: AssignmentDetail }) {
  const { assignment } = detail;
  const update = useUpdateAssignment(assignment.id);
  const backTo = `/classes/${assignment.classId}/work`;
  useLeaveWhenSaved(update.data?.assignment, backTo, "is changed.");
  const { working = 0, submitted = 0, revise = 0, marked = 0 } = assignment.counts ?? {};
  const isRubricFixed = marked > 0;
  const isSongFixed = working + submitted + revise + marked > 0;
  return (
    <AssignmentForm
      start={toDraft(detail, zone)}
      check={{ zone, now, keptDue: assignment.dueAt }}
      songs={
        songs.some((song) => song.id === assignment.songId)
          ? songs
          : [...songs, { id: assignment.songId, title: assignment.songTitle, seconds: 0 }]
      }
      saveLabel="Save the changes"
      backTo={backTo}
      isRubricFixed={isRubricFixed}
      isSongFixed={isSongFixed}
      isPending={update.isPending}
      isSaved={update.isSuccess}
      error={update.error}
      onSave={({ rubric, songId, ...fields }) =>
        update.mutate({ ...fields, ...(!isRubricFixed && { rubric }), ...(!isSongFixed && { songId }) })
      }
    />
  );
}

/** Leaves in an effect: the guard must have seen that nothing is unsaved any more. */
function useLeaveWhenSaved(saved: { title: string } | undefined, backTo: string, news: string) {
  const navigate = useNavigate();
  useEffect(() => {
    if (!saved) return;
    showToast({ title: `“${saved.title}” ${news}` });
    void navigate(backTo);
  }, [saved, backTo, news, navigate]);
}

interface Ready {
  zone: string;
  now: number;
  songs: readonly { id: AssignmentDetail["assignment"]["songId"]; title: string; seconds: number }[];
}

function Frame({
  title,
  lead,
  children,
}: {
  title: string;
  lead?: string;
  children: (ready: Ready) => React.ReactNode;
}) {
  const programme = useQuery(programmeQuery);
  const songs = useQuery(songsQuery);
  const now = useNow();
  return (
    <Page title={title} density="staff" className="mx-auto max-w-page">
      <PageHeader title={title} lead={lead} />
      <QueryView query={programme} skeleton={<FormSkeleton />} errorTitle="The school's time zone could not be loaded.">
        {({ timeZone }) => (
          <QueryView query={songs} skeleton={<FormSkeleton />} errorTitle="The songs could not be loaded.">
            {(list) => children({ zone: timeZone, now, songs: list })}
          </QueryView>
        )}
      </QueryView>
    </Page>
  );
}

function FormSkeleton() {
  return (
    <SkeletonGroup label="Loading the form" className="max-w-[60rem] space-y-6">
      {["title", "song", "brief"].map((field) => (
        <div key={field}>
          <Skeleton className="mb-2 w-20" />
          <Skeleton shape="block" className="h-9" />
        </div>
      ))}
    </SkeletonGroup>
  );
}

import { useQuery } from "@tanstack/react-query";
import { useEffect, useMemo, useRef } from "react";
import { Navigate, useNavigate, useParams, type LoaderFunctionArgs } from "react-router";
import type { SubmissionDetail } from "../../shared/contracts/marking.ts";
import { AssignmentIdSchema, SubmissionIdSchema, type AssignmentId, type SubmissionId } from "../../shared/ids.ts";
import { EmptyState } from "../components/empty-state.tsx";
import { ErrorState } from "../components/error-state.tsx";
import { Page, PageHeader } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
import { ForwardButton } from "../features/lineup/forwards/forward-button.tsx";
import { queueQuery, submissionQuery } from "../features/marking/api.ts";
import { DeskSkeleton } from "../features/marking/components/desk-skeleton.tsx";
import { MarkingDesk, type MarkingDeskProps } from "../features/marking/components/marking-desk.tsx";
import { orderQueue } from "../features/marking/model/queue.ts";
import type { DeskPlayback } from "../features/marking/playback.ts";
import { ScriptView, type ScriptViewHandle } from "../features/shows/editor/script-view.tsx";
import { listActLines } from "../features/shows/studio/run-model.ts";
import { useShowViewer } from "../features/shows/viewer/use-show-viewer.ts";
import { ViewerStage } from "../features/shows/viewer/viewer-stage.tsx";
import { ViewerTransport } from "../features/shows/viewer/viewer-transport.tsx";
import { useNow } from "../hooks/use-now.ts";
import { queryClient } from "../lib/query-client.ts";
import { useEventZone } from "./event-zone.ts";
import { requireSession } from "./guards.ts";
import { useVersionShow } from "./use-version-show.ts";

export async function loader({ request, params }: LoaderFunctionArgs) {
  await requireSession(request, "teacher");
  const assignmentId = AssignmentIdSchema.safeParse(params.assignmentId);
  const submissionId = SubmissionIdSchema.optional().safeParse(params.submissionId);
  if (!assignmentId.success || !submissionId.success) throw new Response(null, { status: 404 });
  void queryClient.prefetchQuery(queueQuery(assignmentId.data));
  if (submissionId.data) void queryClient.prefetchQuery(submissionQuery(submissionId.data));
  return null;
}

/** The marking desk: one submission of an assignment's queue. Without a submission it opens the first. */
export function Component() {
  const { assignmentId, submissionId } = useParams();
  const queue = useQuery(queueQuery(assignmentId as AssignmentId));
  const frame = (message: React.ReactNode) => (
    <Page title="Marking" density="staff">
      <PageHeader title="Marking" />
      {message}
    </Page>
  );
  return (
    <QueryView
      query={queue}
      skeleton={
        <DeskPage title="Marking">
          <DeskSkeleton />
        </DeskPage>
      }
      errorTitle="The queue could not be loaded."
      frame={frame}
    >
      {({ title, className, rows }) => {
        const ordered = orderQueue(rows);
        if (submissionId !== undefined)
          return (
            <Desk
              queue={{ title, className, rows: ordered }}
              assignmentId={assignmentId as AssignmentId}
              submissionId={submissionId}
            />
          );
        const [first] = ordered;
        if (first) return <Navigate to={`/marking/${assignmentId}/${first.submissionId}`} replace />;
        return frame(
          <EmptyState icon="sent" title="Nothing is handed in yet" headingLevel={2}>
            What the class hands in for “{title}” comes here.
          </EmptyState>,
        );
      }}
    </QueryView>
  );
}

function DeskPage({ title, children }: { title: string; children: React.ReactNode }) {
  return (
    <Page title={title} density="staff" layout="full">
      {children}
    </Page>
  );
}

interface DeskProps {
  queue: MarkingDeskProps["queue"];
  assignmentId: AssignmentId;
  submissionId: SubmissionId;
}

function Desk({ queue, assignmentId, submissionId }: DeskProps) {
  const detail = useQuery(submissionQuery(submissionId));
  const navigate = useNavigate();
  const common = {
    queue,
    timeZone: useEventZone(),
    now: useNow(),
    toRow: (id: string) => `/marking/${assignmentId}/${id}`,
    onGo: (id: SubmissionId) => void navigate(`/marking/${assignmentId}/${id}`),
  };
  const title = detail.data ? `Marking: ${detail.data.submission.showTitle}` : "Marking";
  return (
    <DeskPage title={title}>
      <QueryView
        query={detail}
        skeleton={<DeskSkeleton />}
        errorTitle="This submission could not be loaded."
        frame={(message) => <div className="p-6">{message}</div>}
      >
        {(loaded) => <LoadedDesk key={submissionId} detail={loaded} {...common} />}
      </QueryView>
    </DeskPage>
  );
}

type Common = Pick<MarkingDeskProps, "queue" | "timeZone" | "now" | "toRow" | "onGo">;

/** Mark and comments are there before the picture is: the stage follows when its parts have come. */
function LoadedDesk({ detail, ...common }: Common & { detail: SubmissionDetail }) {
  const { submission, run } = detail;
  const show = useVersionShow(submission.versionId);
  const scriptRef = useRef<ScriptViewHandle>(null);
  const viewer = useShowViewer(
    show.data && {
      layout: show.data.layout,
      song: show.data.song.beatMap,
      score: show.data.song.score,
      timeline: show.data.version.timeline,
      findings: run.findings,
    },
  );
  const player = viewer?.player ?? null;
  const timeline = viewer?.timeline ?? null;
  const playback = useMemo<DeskPlayback | null>(
    () =>
      player && {
        endTick: player.tempo.endTick,
        getTick: () => player.tick,
        seekTick: (tick) => player.seekTick(tick),
        toggle: () => player.transport.toggle(),
        subscribe: (listener) => player.addView({ showMoment: ({ tick }) => listener(tick / player.tempo.endTick) }),
      },
    [player],
  );
  useEffect(() => player?.addView({ showMoment: ({ linesLit }) => scriptRef.current?.setGlow(linesLit) }), [player]);
  const actLines = useMemo(() => listActLines(timeline), [timeline]);
  const showLine = (line: number) => scriptRef.current?.showLine(line);
  const song = show.data?.song;

  return (
    <MarkingDesk
      detail={detail}
      {...common}
      playback={playback}
      timeline={timeline}
      song={song?.beatMap ?? null}
      forwarding={<Forwarding detail={detail} />}
      onShowLine={showLine}
      stage={
        show.error ? (
          <ErrorState title="The show could not be loaded." onRetry={show.retry}>
            You can still read the rubric and write the mark.
          </ErrorState>
        ) : viewer && show.data ? (
          <ViewerStage
            viewer={viewer}
            layout={show.data.layout}
            description={run.description}
            onGoToLine={showLine}
            className={STAGE_HEIGHT}
          />
        ) : (
          <div role="status" className={`${STAGE_HEIGHT} skeleton bg-stage! [--sweep:var(--color-thread-lit)]`}>
            <span className="sr-only">Loading the show</span>
          </div>
        )
      }
      transport={
        player &&
        song && (
          <ViewerTransport player={player} song={song.beatMap} songTitle={`${song.song.title}, ${song.song.credit}`} />
        )
      }
      renderScript={({ notes, markedLines, onPickLine }) =>
        show.data && (
          <ScriptView
            ref={scriptRef}
            source={show.data.version.source}
            label={`Script of version ${submission.versionNumber}`}
            actLines={actLines}
            markedLines={markedLines}
            notes={notes}
            onPickLine={onPickLine}
            // Line numbers are buttons here: 24 px from one to the next.
            className="[&_.script-reader-line]:min-h-6"
          />
        )
      }
    />
  );
}

const STAGE_HEIGHT = "h-[226px] max-wide:h-[190px]";

function Forwarding({ detail: { submission, run, forward } }: { detail: SubmissionDetail }) {
  const stops = run.findings.filter((finding) => finding.severity === "stop").length;
  const obstacle = !run.isOk
    ? "It does not run, so it can not go to the event."
    : stops > 0
      ? `${stops === 1 ? "1 stop" : `${stops} stops`} of the show check ${stops === 1 ? "is" : "are"} open. Send it back to have ${stops === 1 ? "it" : "them"} mended.`
      : submission.state !== "marked"
        ? "Release the mark first."
        : null;
  return (
    <ForwardButton
      submissionId={submission.id}
      title={submission.showTitle}
      forwardState={forward?.state ?? null}
      obstacle={obstacle}
    />
  );
}

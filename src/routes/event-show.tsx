import { useQuery } from "@tanstack/react-query";
import { useLoaderData, useParams, type LoaderFunctionArgs } from "react-router";
import { ForwardIdSchema, type ForwardId } from "../../shared/ids.ts";
import { ErrorState } from "../components/error-state.tsx";
import { Notice } from "../components/notice.tsx";
import { Page } from "../components/page.tsx";
import { PictureRibbon } from "../components/picture-ribbon.tsx";
import { QueryView } from "../components/query-view.tsx";
import { Skeleton, SkeletonGroup } from "../components/skeleton.tsx";
import { forwardQuery } from "../features/lineup/api.ts";
import { AnswerPanel } from "../features/lineup/forwards/answer-panel.tsx";
import { ForwardPage, type ForwardDetail } from "../features/lineup/forwards/forward-page.tsx";
import { OpenWorkAgain } from "../features/marking/components/open-work-again.tsx";
import { presentMoment } from "../features/marking/model/comment-place.ts";
import { usePlayKeys } from "../features/shows/studio/use-play-keys.ts";
import { useShowViewer, type ShowViewer } from "../features/shows/viewer/use-show-viewer.ts";
import { ViewerStage } from "../features/shows/viewer/viewer-stage.tsx";
import { ViewerTransport } from "../features/shows/viewer/viewer-transport.tsx";
import { useNow } from "../hooks/use-now.ts";
import { queryClient } from "../lib/query-client.ts";
import { useEventZone } from "./event-zone.ts";
import { requireSession } from "./guards.ts";
import { useVersionShow, type VersionShow } from "./use-version-show.ts";

export async function loader({ request, params }: LoaderFunctionArgs) {
  const isTeachers = new URL(request.url).pathname.startsWith("/forwarded/");
  await requireSession(request, isTeachers ? "teacher" : "coordinator");
  const forwardId = ForwardIdSchema.safeParse(params.forwardId);
  if (!forwardId.success) throw new Response(null, { status: 404 });
  void queryClient.prefetchQuery(forwardQuery(forwardId.data));
  return { isTeachers };
}

/** One forwarded show: for the coordinator to answer, for its teacher to read the answer. */
export function Component() {
  const { isTeachers } = useLoaderData<typeof loader>();
  const { forwardId } = useParams();
  const detail = useQuery(forwardQuery(forwardId as ForwardId));
  return (
    <Page title={detail.data?.forward.title ?? "Show"} density="staff" layout="full">
      <QueryView
        query={detail}
        skeleton={<ShowSkeleton />}
        errorTitle="The show could not be loaded."
        frame={(message) => <div className="p-6">{message}</div>}
      >
        {(loaded) => <LoadedShow key={loaded.forward.id} detail={loaded} isTeachers={isTeachers} />}
      </QueryView>
    </Page>
  );
}

interface ShowProps {
  detail: ForwardDetail;
  isTeachers: boolean;
}

function LoadedShow({ detail, isTeachers }: ShowProps) {
  const show = useVersionShow(detail.forward.versionId);
  if (show.data) return <WatchedShow detail={detail} isTeachers={isTeachers} show={show.data} />;
  return (
    <Frame
      detail={detail}
      isTeachers={isTeachers}
      presentMoment={() => "there"}
      onShowMoment={() => undefined}
      show={
        show.error ? (
          <ErrorState title="The show could not be loaded." onRetry={show.retry} />
        ) : (
          <SkeletonGroup label="Loading the show">
            <div className="h-[380px] skeleton bg-stage!" />
          </SkeletonGroup>
        )
      }
    />
  );
}

function WatchedShow({ detail, isTeachers, show: { version, song, layout } }: ShowProps & { show: VersionShow }) {
  const viewer = useShowViewer({
    layout,
    song: song.beatMap,
    score: song.score,
    timeline: version.timeline,
    findings: detail.findings,
  });
  return (
    <Frame
      detail={detail}
      isTeachers={isTeachers}
      presentMoment={(tick) => presentMoment(tick, song.beatMap)}
      onShowMoment={(tick) => viewer?.player.seekTick(tick)}
      show={
        <>
          {viewer ? (
            <ViewerStage
              viewer={viewer}
              layout={layout}
              description={detail.run.description}
              onGoToLine={() => undefined}
              className="h-[400px] max-wide:h-[230px]"
            />
          ) : (
            <div className="h-[400px] bg-stage" />
          )}
          <PictureRibbon
            picture={detail.forward.ribbon}
            size="marking"
            isSquare
            label={`Ribbon of ${detail.forward.title}: ${detail.run.description}`}
          />
          {viewer && <Playing viewer={viewer} song={song} />}
        </>
      }
    />
  );
}

function Playing({ viewer: { player }, song }: { viewer: ShowViewer; song: VersionShow["song"] }) {
  usePlayKeys(player);
  return <ViewerTransport player={player} song={song.beatMap} songTitle={`${song.song.title}, ${song.song.credit}`} />;
}

function Frame({
  detail,
  isTeachers,
  ...parts
}: ShowProps & Pick<React.ComponentProps<typeof ForwardPage>, "show" | "presentMoment" | "onShowMoment">) {
  const timeZone = useEventZone();
  const now = useNow();
  const { forward, run, findings } = detail;
  const stopCount = findings.filter((finding) => finding.severity === "stop").length;
  return (
    <ForwardPage
      detail={detail}
      timeZone={timeZone}
      now={now}
      back={isTeachers ? { to: "/forwarded", label: "All forwarded" } : { to: "/event/shows", label: "All shows" }}
      answer={
        isTeachers ? (
          <TeachersAnswer detail={detail} />
        ) : (
          <AnswerPanel forward={forward} stopCount={stopCount} runs={run.isOk} />
        )
      }
      {...parts}
    />
  );
}

/** What the coordinator said, and the way on: after a "no" the work can be opened again. */
function TeachersAnswer({ detail: { forward } }: { detail: ForwardDetail }) {
  if (forward.state === "waiting") return <Notice icon="clock" title="The coordinator has not answered yet." />;
  if (forward.state === "declined") {
    return (
      <div className="space-y-3">
        <Notice tone="warn" icon="turn" title="Sent back by the event.">
          {forward.answer}
        </Notice>
        <OpenWorkAgain submissionId={forward.submissionId} title={forward.title} />
      </div>
    );
  }
  return (
    <Notice
      tone="ok"
      title={
        forward.state === "scheduled"
          ? `On ${forward.slotCount === 1 ? "1 slot" : `${forward.slotCount} slots`} of the lineup.`
          : "Approved. It waits for its nights."
      }
    >
      {forward.answer}
    </Notice>
  );
}

function ShowSkeleton() {
  return (
    <SkeletonGroup
      label="Loading the show"
      className="grid grid-cols-[minmax(0,1fr)_396px] gap-4 p-6 max-wide:grid-cols-1"
    >
      <div className="h-[400px] skeleton bg-stage! [--sweep:var(--color-thread-lit)]" />
      <div className="space-y-4">
        <Skeleton shape="block" className="h-40" />
        <Skeleton shape="block" className="h-56" />
      </div>
    </SkeletonGroup>
  );
}

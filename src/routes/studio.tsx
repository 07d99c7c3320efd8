import { useQuery, useSuspenseQuery } from "@tanstack/react-query";
import { lazy, Suspense, useMemo, useState } from "react";
import { useNavigate, useParams, useSearchParams, type LoaderFunctionArgs } from "react-router";
import type { HandInResult } from "../../shared/contracts/assignments.ts";
import type { BeatMap, Score } from "../../shared/contracts/songs.ts";
import type { ShowDetail } from "../../shared/contracts/shows.ts";
import type { Layout } from "../../shared/contracts/square.ts";
import { ShowIdSchema, type ShowId } from "../../shared/ids.ts";
import { Page } from "../components/page.tsx";
import { QueryView } from "../components/query-view.tsx";
import { showToast } from "../components/toast-queue.ts";
import { assignmentQuery, useHandIn } from "../features/assignments/api.ts";
import { describeHandIn } from "../features/assignments/model/hand-in.ts";
import { sessionQuery } from "../features/auth/api.ts";
import { showQuery } from "../features/shows/api.ts";
import { useDealAgain } from "../features/shows/use-deal-again.ts";
import { useShowHistory } from "../features/shows/use-show-history.ts";
import { DraftSaver } from "../features/shows/draft-saver.ts";
import { ShowRunner } from "../features/shows/show-runner.ts";
import { StudioLoading } from "../features/shows/studio/studio-loading.tsx";
import { songQuery } from "../features/songs/api.ts";
import { layoutQuery } from "../features/square/api.ts";
import { useDisposable } from "../hooks/use-disposable.ts";
import { formatNames, HERE } from "../lib/format.ts";
import type { Shelved } from "../lib/offline-shelf.ts";
import { queryClient } from "../lib/query-client.ts";
import { presentDue } from "../lib/zoned-time.ts";
import { requireSession } from "./guards.ts";

/** Editor, stage and sound: a chunk of their own, fetched while the show, its song and its square are asked for. */
const importStudio = () => import("../features/shows/studio/studio.tsx");
importStudio().catch(() => undefined);
const Studio = lazy(async () => ({ default: (await importStudio()).Studio }));

function parseId(value: string | undefined): ShowId {
  const id = ShowIdSchema.safeParse(value);
  if (!id.success) throw new Response(null, { status: 404 });
  return id.data;
}

export async function loader({ request, params }: LoaderFunctionArgs) {
  await requireSession(request, "student");
  // Always fresh: a draft opened on an old revision would look like somebody else's version.
  await queryClient.prefetchQuery({ ...showQuery(parseId(params["showId"])), staleTime: 0 });
  return null;
}

/** A pupil's studio for one show. */
export function Component() {
  const { showId } = useParams();
  const show = useQuery(showQuery(parseId(showId)));
  return (
    <QueryView
      query={show}
      errorTitle="The show could not be loaded."
      skeleton={<StudioLoading title="Loading" />}
      frame={(message) => <StudioMessage>{message}</StudioMessage>}
    >
      {(detail) => <ShowStudio key={detail.show.id} detail={detail} />}
    </QueryView>
  );
}

function StudioMessage({ children }: { children: React.ReactNode }) {
  return (
    <Page title="Studio">
      <h1 className="mb-4">Studio</h1>
      {children}
    </Page>
  );
}

function ShowStudio({ detail }: { detail: Shelved<ShowDetail> }) {
  const song = useQuery(songQuery(detail.show.songId));
  const layout = useQuery(layoutQuery(detail.layoutId));
  const loading = <StudioLoading title={detail.show.title} />;
  const frame = (message: React.ReactNode) => <StudioMessage>{message}</StudioMessage>;
  return (
    <QueryView query={layout} errorTitle="The square could not be loaded." skeleton={loading} frame={frame}>
      {(square) => (
        <QueryView query={song} errorTitle="The song could not be loaded." skeleton={loading} frame={frame}>
          {({ song: { title, credit }, beatMap, score }) => (
            <OpenShow
              detail={detail}
              songTitle={`${title}, ${credit}`}
              layout={square.layout}
              beatMap={beatMap}
              score={score}
            />
          )}
        </QueryView>
      )}
    </QueryView>
  );
}

interface OpenShowProps {
  detail: Shelved<ShowDetail>;
  songTitle: string;
  layout: Layout;
  beatMap: BeatMap;
  score: Score;
}

function OpenShow({ detail, songTitle, layout, beatMap, score }: OpenShowProps) {
  const { show, draft, seed } = detail;
  const { data: session, dataUpdatedAt } = useSuspenseQuery(sessionQuery);
  const navigate = useNavigate();
  const openAt = usePlaceInAddress();
  const assignment = useQuery({
    ...assignmentQuery(show.assignmentId ?? "none"),
    enabled: show.assignmentId !== null,
  });
  const handIn = useHandIn(show.assignmentId ?? "none");
  const [firstSeed] = useState(seed);
  const runner = useDisposable(
    () => new ShowRunner({ songId: show.songId, song: beatMap, layout, seed: firstSeed }),
    [show.songId, beatMap, layout, firstSeed],
  );
  // Other luck is another function, so that the studio runs its script again.
  const runScript = useMemo(() => runner && ((source: string) => runner.runScript(source, seed)), [runner, seed]);
  const dealAgain = useDealAgain(show.id, seed);
  // What the server held at opening: later revisions come as answers to saves.
  // eslint-disable-next-line react-hooks/exhaustive-deps
  const saver = useMemo(() => new DraftSaver(show.id, { revision: draft.revision, source: draft.source }), [show.id]);
  const history = useShowHistory(detail);

  const handleHandIn = async (source: string) => {
    if (!runScript) throw new Error("The script can not be run yet.");
    const [revision, outcome] = await Promise.all([saver.revisionOf(source), runScript(source)]);
    const result = await handIn.mutateAsync({
      showId: show.id,
      revision,
      hash: outcome.ok ? outcome.hash : null,
      idempotencyKey: `hand-in-${show.id}-${revision}`,
    });
    showHandedIn(result, () => void navigate(`/assignments/${show.assignmentId ?? ""}`));
  };

  if (!runner || !runScript || session === null) return <StudioLoading title={show.title} />;
  const due = assignment.data ? ` · due ${presentDue(assignment.data.assignment.dueAt, HERE)}` : "";
  return (
    <Suspense fallback={<StudioLoading title={show.title} />}>
      <Studio
        title={show.title}
        context={`${show.assignmentTitle ?? "A show of your own"}${due}`}
        homeHref="/home"
        authors={formatNames(show.authors.map((name) => name.split(" ")[0] ?? name))}
        songTitle={songTitle}
        layout={layout}
        song={beatMap}
        score={score}
        runScript={runScript}
        onDealAgain={dealAgain}
        checkShow={runner.checkShow}
        drawRibbon={runner.drawRibbon}
        describeShow={runner.describeShow}
        openAt={openAt}
        draft={{
          userId: session.user.id,
          showId: show.id,
          server: detail.keptAt === undefined ? draft : null,
          remembered: draft,
          savedAt: draft.savedAt,
          transport: saver,
          signedInAt: dataUpdatedAt,
        }}
        history={history}
        onHandIn={show.assignmentId === null ? null : handleHandIn}
      />
    </Suspense>
  );
}

/** Where a link from a comment leads: `?line=12` a line of the script, `?at=3840` a moment in ticks. */
function usePlaceInAddress() {
  const [search] = useSearchParams();
  const read = (name: string) => (/^\d{1,9}$/.test(search.get(name) ?? "") ? Number(search.get(name)) : null);
  return { line: read("line"), tick: read("at") };
}

function showHandedIn(result: HandInResult, onOpen: () => void): void {
  showToast({ ...describeHandIn(result), action: { label: "See the assignment", onPress: onOpen } });
}

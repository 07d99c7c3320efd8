import { useCallback, useEffect, useMemo, useRef, useState } from "react";
import type { BeatMap, Score } from "../../../../shared/contracts/songs.ts";
import type { Layout } from "../../../../shared/contracts/square.ts";
import { useDisposable } from "../../../hooks/use-disposable.ts";
import { useMediaQuery } from "../../../hooks/use-media-query.ts";
import type { HistorySource } from "../history/use-history.ts";
import { listScriptNames } from "../editor/script-names.ts";
import { CheckPane } from "./check-pane.tsx";
import { NamesPane } from "./names-pane.tsx";
import { NotesPane } from "./notes-pane.tsx";
import { findGentleReason, listActLines, listFindings, presentRun, splitFindings } from "./run-model.ts";
import { ScriptPanel, type ScriptPanelHandle } from "./script-panel.tsx";
import { ShowPlayer } from "./show-player.ts";
import { SongColumn } from "./song-column.tsx";
import "./studio.css";
import { listShowActions } from "./show-actions.ts";
import { StudioDialogs, type OpenDialog } from "./studio-dialogs.tsx";
import { StudioHeader } from "./studio-header.tsx";
import { StudioLoading } from "./studio-loading.tsx";
import { TrayTabs, type TrayTab } from "./tray-tabs.tsx";
import { useDraft, type DraftSource } from "./use-draft.ts";
import { usePlayKeys } from "./use-play-keys.ts";
import { WordsPane } from "./words-pane.tsx";
import { useScriptRun, type ScriptRunOptions } from "./use-script-run.ts";
import { useDescription, type ShowPictures } from "./use-show-pictures.ts";

export interface StudioProps extends ScriptRunOptions, ShowPictures {
  title: string;
  /** "A show for the square · due Friday 4 December" */
  context: string;
  homeHref: string;
  /** First names of its authors: "Wren and Idris". */
  authors: string;
  /** "Ten Small Suns, our arrangement" */
  songTitle: string;
  layout: Layout;
  song: BeatMap;
  /** Null for a song without a score: no sound. */
  score: Score | null;
  draft: DraftSource;
  /** Deals new luck: another seed, another run. */
  onDealAgain: () => void;
  history: HistorySource;
  /** Hands in what is saved; null where there is nobody to hand it to. */
  onHandIn: ((source: string) => Promise<void>) | null;
  /** Where to open: a line of the script, a moment in ticks (a link from a comment). */
  openAt: { readonly line: number | null; readonly tick: number | null };
}

/** The studio: the square, the song, the script and what is to be said about it, on one screen. */
export function Studio(props: StudioProps) {
  const { layout, song, score } = props;
  const player = useDisposable(() => new ShowPlayer({ layout, song, score }), [layout, song, score]);
  const draft = useDraft(props.draft);
  if (!player || !draft.store) return <StudioLoading title={props.title} />;
  return <OpenStudio {...props} player={player} opened={draft} key={props.draft.showId} />;
}

interface OpenStudioProps extends StudioProps {
  player: ShowPlayer;
  opened: ReturnType<typeof useDraft>;
}

function OpenStudio(props: OpenStudioProps) {
  const { layout, song, player, opened, title } = props;
  const { store, state: draft } = opened;
  const [firstSource] = useState(draft.source);
  const editor = useRef<ScriptPanelHandle>(null);
  const isPhone = useMediaQuery("(max-width: 559px)");
  const [tab, setTab] = useState<TrayTab>(isPhone ? "script" : "check");
  const [dialog, setDialog] = useState<OpenDialog | null>(null);
  const [wantsGentle, setWantsGentle] = useState(() => window.matchMedia("(prefers-reduced-motion: reduce)").matches);
  const names = useMemo(() => listScriptNames(layout, song), [layout, song]);
  const { state: run, run: runNow, runSoon } = useScriptRun(props, player);
  const gentleReason = findGentleReason(run);
  const isGentle = wantsGentle || gentleReason !== null;
  const selected = !isPhone && tab === "script" ? "check" : tab;

  // The store and this agree unless the text was changed from outside: another version, another computer.
  const lastEdited = useRef(firstSource);
  // At opening, and again with other luck.
  useEffect(() => runNow(lastEdited.current), [runNow]);
  useEffect(() => player.setTimeline(run.onStage), [player, run.onStage]);
  useEffect(() => player.setGentle(isGentle), [player, isGentle]);
  usePlayKeys(player);
  const { line: openLine, tick: openTick } = props.openAt;
  useEffect(() => {
    if (openTick !== null) player.seekTick(openTick);
  }, [player, openTick]);

  const actLines = useMemo(() => listActLines(run.onStage), [run.onStage]);
  const findings = listFindings(run);
  const problem = run.outcome?.ok === false ? run.outcome.problem : null;
  const goToLine = useCallback((line: number) => {
    setTab("script");
    // On a phone the script is not on screen before the tab has changed.
    requestAnimationFrame(() => editor.current?.goToLine(line));
  }, []);
  const showMoment = (tick: number | undefined, line: number | undefined) => {
    if (tick !== undefined) player.seekTick(tick);
    if (line !== undefined) goToLine(line);
  };
  useEffect(() => {
    const source = store?.state.source ?? "";
    if (source === lastEdited.current) return;
    lastEdited.current = source;
    editor.current?.replace(source);
    runNow(source);
  }, [store, draft.source, runNow]);
  const edit = (source: string) => {
    lastEdited.current = source;
    store?.edit(source);
    runSoon(source);
  };
  const insert = (code: string) => {
    setTab("script");
    requestAnimationFrame(() => editor.current?.insert(code));
  };
  const actions = listShowActions({
    title,
    source: draft.source,
    hasStage: run.onStage !== null,
    onOpen: setDialog,
    onDealAgain: props.onDealAgain,
  });
  const description = useDescription(run.onStage, props.describeShow);
  const spoken = description ? [description.summary, ...description.steps].join(" ") : "Nothing is on stage yet.";

  const stage = { layout, song, player, isGentle, gentleReason, onGentle: setWantsGentle, description: spoken };

  return (
    <div className="studio" data-tab={selected}>
      <StudioHeader
        title={title}
        context={props.context}
        homeHref={props.homeHref}
        draft={draft}
        versions={props.history.versions}
        onLook={(id) => setDialog({ kind: "history", id })}
        onChoose={() => setDialog({ kind: "two-versions" })}
        actions={actions}
        onHandIn={props.onHandIn && (() => setDialog({ kind: "hand-in" }))}
      />
      <div className="studio-columns">
        <SongColumn {...stage} run={run} onGoToLine={goToLine} drawRibbon={props.drawRibbon} />
        <div className="studio-work">
          <div
            id="studio-pane-script"
            className="studio-script-slot"
            {...(isPhone && { role: "tabpanel", "aria-labelledby": "studio-tab-script" })}
          >
            <ScriptPanel
              ref={editor}
              source={firstSource}
              openLine={openLine}
              names={names}
              problem={problem}
              actLines={actLines}
              player={player}
              stageNote={presentStage(run.onStage !== null, problem !== null, run.isRunning)}
              isRunning={run.isRunning}
              onChange={edit}
              onRun={runNow}
              onSave={() => void store?.flush()}
            />
          </div>
          <div className="studio-tray studio-card">
            <TrayTabs
              selected={selected}
              onSelect={setTab}
              counts={{
                check: splitFindings(findings).own.length + (problem ? 1 : 0),
                notes: run.outcome?.notes.length ?? 0,
              }}
              hasScript={isPhone}
            />
            {selected !== "script" && (
              <div
                id={`studio-pane-${selected}`}
                className="studio-pane"
                role="tabpanel"
                aria-labelledby={`studio-tab-${selected}`}
                tabIndex={0}
              >
                {selected === "check" && (
                  <CheckPane
                    song={song}
                    run={run}
                    onShow={(finding) => showMoment(finding.moments[0], finding.lines[0])}
                    onShowProblem={({ range }) => goToLine(range.line)}
                  />
                )}
                {selected === "notes" && (
                  <NotesPane
                    song={song}
                    notes={run.outcome?.notes ?? []}
                    onShow={(note) => showMoment(note.tick, note.line)}
                  />
                )}
                {selected === "words" && (
                  <WordsPane description={description} onShow={(tick) => player.seekTick(tick)} />
                )}
                {selected === "names" && (
                  <NamesPane layout={layout} song={song} player={player} names={names} onInsert={insert} />
                )}
              </div>
            )}
          </div>
        </div>
      </div>
      <p className="sr-only" role="status">
        {run.isRunning ? "" : presentRun(run)}
      </p>
      <StudioDialogs
        {...stage}
        dialog={dialog}
        title={title}
        authors={props.authors}
        songTitle={props.songTitle}
        store={store}
        draft={draft}
        run={run}
        history={props.history}
        onHandIn={props.onHandIn}
        onClose={() => setDialog(null)}
      />
    </div>
  );
}

function presentStage(hasStage: boolean, hasProblem: boolean, isRunning: boolean): string {
  if (!hasStage) return hasProblem ? "Nothing on stage yet" : isRunning ? "Running" : "Not run yet";
  return hasProblem ? "On stage: your last run that worked" : "On stage: this script";
}

import { useEffect, useId, useMemo, useRef, useState, type ReactNode } from "react";
import type { RunOutcome } from "../../../../sandbox/engine/model.ts";
import type { Score } from "../../../../shared/contracts/songs.ts";
import { listFronts } from "../../../../sandbox/square/lights.ts";
import { ribbonCells } from "../../../../sandbox/timeline/ribbon.ts";
import type { Timeline } from "../../../../sandbox/timeline/model.ts";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import type { Layout } from "../../../../shared/contracts/square.ts";
import { Button } from "../../../components/button.tsx";
import { joinClasses } from "../../../components/class-names.ts";
import { Ribbon } from "../../../components/ribbon.tsx";
import { useDisposable } from "../../../hooks/use-disposable.ts";
import { listScriptNames } from "../editor/script-names.ts";
import { useAskName } from "../editor/rename-dialog.tsx";
import { ScriptEditor } from "../editor/script-editor.ts";
import { ScriptLookButton } from "../editor/script-look-button.tsx";
import { useScriptLook } from "../editor/use-script-look.ts";
import { findGentleReason, listActLines, presentRun } from "../studio/run-model.ts";
import { ShowPlayer } from "../studio/show-player.ts";
import { StageWindow } from "../studio/stage-window.tsx";
import { TransportBar } from "../studio/transport-bar.tsx";
import { useScriptRun, type ScriptRunOptions } from "../studio/use-script-run.ts";
import "../studio/studio.css";

const LESSON_ROWS = 10;
const LESSON_COLUMNS = 160;

export interface BenchHandle {
  /** Moves the playhead. */
  showMoment(tick: number): void;
  showLine(line: number): void;
  source(): string;
}

export interface ScriptBenchProps extends ScriptRunOptions {
  layout: Layout;
  song: BeatMap;
  score: Score | null;
  /** The script that the editor opens with; another value is another exercise. */
  source: string;
  onChange: (source: string) => void;
  /** What the ribbon should become; null where nothing is aimed at. */
  aim: RunOutcome | null;
  /** Back to the script as it was given; null where there is nothing to go back to. */
  onStartOver: (() => void) | null;
  onReady: (handle: BenchHandle) => void;
  /** Beside the script's head: whether it is kept. */
  status: ReactNode;
}

/** A small studio for one exercise: stage, one's own ribbon over the aim, player, script. Runs by key, by button and after a pause. */
export function ScriptBench(props: ScriptBenchProps) {
  const { layout, song, score, source, onChange, aim, onStartOver, onReady, status, runScript, checkShow } = props;
  const hintId = useId();
  const editorBox = useRef<HTMLDivElement>(null);
  const [isGentleChosen, setIsGentleChosen] = useState(false);
  const player = useDisposable(() => new ShowPlayer({ layout, song, score }), [layout, song, score]);
  const { state, run, runSoon } = useScriptRun({ runScript, checkShow }, player);
  const gentleReason = findGentleReason(state);
  const names = useMemo(() => listScriptNames(layout, song), [layout, song]);
  const look = useScriptLook();
  const { askName, dialog } = useAskName();
  const latest = useRef({ onChange, run, runSoon, askName });
  useEffect(() => {
    latest.current = { onChange, run, runSoon, askName };
  });

  const editor = useDisposable(() => {
    const parent = editorBox.current;
    if (!parent) throw new Error("The editor's element is not on the page.");
    const made: ScriptEditor = new ScriptEditor({
      parent,
      source,
      names,
      hintId,
      onChange: (text) => {
        latest.current.onChange(text);
        latest.current.runSoon(text);
      },
      onRun: () => latest.current.run(made.source),
      onSave: () => latest.current.onChange(made.source),
      askName: (request) => latest.current.askName(request),
    });
    return made;
    // The source opens the editor; what is typed later must not open it anew.
  }, [names]);

  useEffect(() => {
    if (!editor || !player) return;
    onReady({
      showMoment: (tick) => player.seekTick(tick),
      showLine: (line) => editor.goToLine(line),
      source: () => editor.source,
    });
    run(editor.source);
    return player.addView({ showMoment: ({ linesLit }) => editor.setGlow(linesLit) });
  }, [editor, player, onReady, run]);
  useEffect(() => {
    player?.setTimeline(state.onStage);
    editor?.setActLines(listActLines(state.onStage));
  }, [player, editor, state.onStage]);
  useEffect(
    () => editor?.setProblem(state.outcome && !state.outcome.ok ? state.outcome.problem : null),
    [editor, state.outcome],
  );
  useEffect(() => player?.setGentle(isGentleChosen || gentleReason !== null), [player, isGentleChosen, gentleReason]);

  return (
    <div className="studio-bench flex h-full flex-col gap-3">
      <div className="on-dusk shrink-0 overflow-hidden rounded-sheet bg-dusk">
        <div className="grid h-[clamp(13rem,33vh,22rem)]">
          {player && (
            <StageWindow
              layout={layout}
              player={player}
              isGentle={isGentleChosen || gentleReason !== null}
              gentleReason={gentleReason}
              onGentle={setIsGentleChosen}
              onGoToLine={(line) => editor?.goToLine(line)}
              description={presentRun(state)}
            />
          )}
        </div>
        <dl className="grid grid-cols-[5.5rem_1fr] items-center gap-x-3 gap-y-1 px-3 py-2">
          <RibbonRow name="Your run" timeline={state.outcome?.timeline ?? null} layout={layout} />
          {aim && <RibbonRow name="The aim" timeline={aim.timeline} layout={layout} />}
        </dl>
      </div>
      {player && (
        <TransportBar
          song={song}
          player={player}
          onToggle={() => void player.transport.toggle()}
          onToggleLoop={() => toggleLoop(player)}
        />
      )}
      <section
        aria-label="Script"
        className="flex min-h-52 flex-1 flex-col overflow-hidden rounded-sheet border border-line bg-card shadow-sheet-1"
      >
        <div className="flex flex-wrap items-center gap-3 border-b border-line px-4 py-2">
          <h2 className="text-5">Script</h2>
          <p className="min-w-0 flex-1 text-meta text-soft" role="status">
            {status} {presentRun(state)}
          </p>
          <ScriptLookButton look={look} />
          {onStartOver && (
            <Button icon="undo" onPress={onStartOver}>
              Start over
            </Button>
          )}
          <Button look="main" icon="play" onPress={() => editor && run(editor.source)} isPending={state.isRunning}>
            Run
          </Button>
        </div>
        <p id={hintId} className="sr-only">
          Control and Enter runs the script. Escape, then Tab leaves the editor.
        </p>
        <div ref={editorBox} className={joinClasses("script-editor min-h-0 flex-1 overflow-auto", look.className)} />
      </section>
      {dialog}
    </div>
  );
}

/** Loops the stretch that was chosen, else the whole song. */
function toggleLoop(player: ShowPlayer): void {
  const { isLooping, loop } = player.transport.state;
  player.transport.setLoop(loop ?? { start: 0, end: player.tempo.endTick }, !isLooping);
}

function RibbonRow({ name, timeline, layout }: { name: string; timeline: Timeline | null; layout: Layout }) {
  const cells = useMemo(
    () =>
      timeline
        ? ribbonCells(timeline, layout, {
            rows: Math.min(LESSON_ROWS, listFronts(layout).length),
            columns: LESSON_COLUMNS,
          })
        : null,
    [timeline, layout],
  );
  return (
    <>
      <dt>{name}</dt>
      <dd>
        <Ribbon
          ribbon={cells}
          size="row"
          isSquare
          label={`${name}: ${timeline ? `${timeline.cues.count} cues` : "nothing yet"}`}
        />
      </dd>
    </>
  );
}

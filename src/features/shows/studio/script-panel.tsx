import { useEffect, useId, useRef, type Ref, useImperativeHandle } from "react";
import type { Problem } from "../../../../sandbox/engine/model.ts";
import { useDisposable } from "../../../hooks/use-disposable.ts";
import { joinClasses } from "../../../components/class-names.ts";
import { Icon } from "../../../components/icon.tsx";
import { useAskName } from "../editor/rename-dialog.tsx";
import { ScriptEditor } from "../editor/script-editor.ts";
import { ScriptLookButton } from "../editor/script-look-button.tsx";
import type { ScriptNames } from "../editor/script-names.ts";
import { useScriptLook } from "../editor/use-script-look.ts";
import type { ShowPlayer } from "./show-player.ts";

/** What the rest of the studio asks of the editor. */
export interface ScriptPanelHandle {
  goToLine: (line: number) => void;
  insert: (code: string) => void;
  /** Takes another text over: a version, or what was saved elsewhere. */
  replace: (source: string) => void;
}

export interface ScriptPanelProps {
  /** The text to begin with. */
  source: string;
  /** A line to go to at opening, and again when it changes. */
  openLine: number | null;
  names: ScriptNames;
  problem: Problem | null;
  actLines: readonly number[];
  player: ShowPlayer;
  /** What is on stage, in a few words. */
  stageNote: string;
  isRunning: boolean;
  onChange: (source: string) => void;
  onRun: (source: string) => void;
  onSave: () => void;
  ref: Ref<ScriptPanelHandle>;
}

/** The script with its head: what is on stage, how it looks, Run. */
export function ScriptPanel(props: ScriptPanelProps) {
  const { source, openLine, names, problem, actLines, player, stageNote, isRunning, onChange, onRun, onSave, ref } =
    props;
  const hostRef = useRef<HTMLDivElement>(null);
  const hintId = useId();
  const look = useScriptLook();
  // The editor is made once; it calls what is current then.
  const { askName, dialog } = useAskName();
  const calls = useRef({ onChange, onRun, onSave, askName });
  useEffect(() => {
    calls.current = { onChange, onRun, onSave, askName };
  });
  const editor = useDisposable(() => {
    if (!hostRef.current) throw new Error("The editor has no place on the page.");
    const made: ScriptEditor = new ScriptEditor({
      parent: hostRef.current,
      source,
      names,
      hintId,
      onChange: (text) => calls.current.onChange(text),
      onRun: () => calls.current.onRun(made.source),
      onSave: () => calls.current.onSave(),
      askName: (request) => calls.current.askName(request),
    });
    return made;
  }, []);

  useEffect(() => {
    if (openLine !== null) editor?.goToLine(openLine);
  }, [editor, openLine]);
  useEffect(() => editor?.setNames(names), [editor, names]);
  useEffect(() => editor?.setProblem(problem), [editor, problem]);
  useEffect(() => editor?.setActLines(actLines), [editor, actLines]);
  useEffect(() => {
    if (!editor) return;
    return player.addView({ showMoment: ({ linesLit }) => editor.setGlow(linesLit) });
  }, [editor, player, actLines]);
  useImperativeHandle(ref, () => ({
    goToLine: (line) => editor?.goToLine(line),
    insert: (code) => editor?.insert(code),
    replace: (text) => editor?.replace(text),
  }));

  return (
    <section className="studio-script studio-card" aria-labelledby={`${hintId}-title`}>
      <div className="studio-script-head">
        <h2 id={`${hintId}-title`}>Script</h2>
        <p className="studio-script-state">
          <Icon name="bulb" className="size-4" />
          <span>{stageNote}</span>
        </p>
        <ScriptLookButton look={look} />
        <button
          type="button"
          className="studio-quiet-icon"
          aria-label="Lay the script out"
          aria-keyshortcuts="Shift+Alt+F"
          onClick={() => void editor?.layOut()}
        >
          <Icon name="script" />
        </button>
        <button
          type="button"
          className="studio-run"
          aria-keyshortcuts="Control+Enter"
          aria-busy={isRunning}
          onClick={() => editor && onRun(editor.source)}
        >
          <i aria-hidden="true" className={isRunning ? "is-running" : undefined} />
          Run <kbd>Ctrl Enter</kbd>
        </button>
      </div>
      <div ref={hostRef} className={joinClasses("script-editor studio-script-text", look.className)} />
      <p id={hintId} className="sr-only">
        Press Escape, then Tab, to leave the script. Control and Enter runs it. Alt and Enter, or Control and full stop,
        takes an offered fix. F1 explains the word at the cursor, F2 renames it, F8 goes to the next note, F12 to where
        it was made.
      </p>
      {dialog}
    </section>
  );
}

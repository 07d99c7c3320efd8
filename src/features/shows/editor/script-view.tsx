import { useEffect, useImperativeHandle, useMemo, useRef, type ReactNode, type Ref } from "react";
import { joinClasses } from "../../../components/class-names.ts";
import "./editor.css";
import { GlowBook } from "./glow-book.ts";
import { listScriptLines, type TextPiece } from "./script-lines.ts";

/** What a page may ask of a script on it. */
export interface ScriptViewHandle {
  /** How strongly each line (from 1) lights the square now, 0 to 1; cheap enough for every frame. */
  setGlow: (byLine: ArrayLike<number>) => void;
  /** Brings a line into view. */
  showLine: (line: number) => void;
}

export interface ScriptViewProps {
  source: string;
  /** What this script is, for assistive technology: "Script of version 3". */
  label: string;
  /** Lines that lit something: they get a bead. */
  actLines?: readonly number[];
  /** Lines to look at (of a finding or a comment). */
  markedLines?: readonly number[];
  /** Comments, notes and findings, by the line below which they stand. */
  notes?: ReadonlyMap<number, ReactNode>;
  /** Given: line numbers are buttons (to comment on the line). */
  onPickLine?: (line: number) => void;
  ref?: Ref<ScriptViewHandle>;
  className?: string;
}

/** A script to read: numbers, colours, glow lines, and what people said under its lines. */
export function ScriptView({
  source,
  label,
  actLines = [],
  markedLines = [],
  notes,
  onPickLine,
  ref,
  className,
}: ScriptViewProps) {
  const lines = useMemo(() => listScriptLines(source), [source]);
  const listRef = useRef<HTMLOListElement>(null);
  const bookRef = useRef(new GlowBook());
  const acting = useMemo(() => new Set(actLines), [actLines]);

  useEffect(() => {
    const book = new GlowBook();
    bookRef.current = book;
    for (const element of listRef.current?.querySelectorAll<HTMLElement>("[data-glow-line]") ?? [])
      book.add(Number(element.dataset["glowLine"]), element);
  }, [acting, lines]);

  const [firstMarked] = markedLines;
  useEffect(() => {
    const list = listRef.current;
    const line = firstMarked === undefined ? undefined : list?.children[firstMarked - 1];
    // Where the list scrolls by itself, what is marked is in sight from the start.
    if (list && line instanceof HTMLElement) list.scrollTop = line.offsetTop - list.offsetTop - 40;
  }, [firstMarked]);

  useImperativeHandle(ref, () => ({
    setGlow: (byLine) => bookRef.current.set(byLine),
    showLine: (line) => listRef.current?.children[line - 1]?.scrollIntoView({ block: "center" }),
  }));

  return (
    <ol ref={listRef} aria-label={label} className={joinClasses("script-editor script-reader", className)}>
      {lines.map((pieces, index) => (
        <li key={index}>
          <ScriptLine
            number={index + 1}
            pieces={pieces}
            isActing={acting.has(index + 1)}
            isMarked={markedLines.includes(index + 1)}
            onPick={onPickLine}
          />
          {notes?.get(index + 1)}
        </li>
      ))}
    </ol>
  );
}

interface ScriptLineProps {
  number: number;
  pieces: readonly TextPiece[];
  isActing: boolean;
  isMarked: boolean;
  onPick?: ((line: number) => void) | undefined;
}

function ScriptLine({ number, pieces, isActing, isMarked, onPick }: ScriptLineProps) {
  const indent = /^ */.exec(pieces[0]?.text ?? "")?.[0].length ?? 0;
  return (
    <div className={joinClasses("script-reader-line", isMarked && "is-marked")}>
      {isActing && <span className="glow-sheet" data-glow-line={number} aria-hidden="true" />}
      {onPick ? (
        <button
          type="button"
          className="script-reader-number hover:text-ink hover:underline"
          aria-label={`Line ${number}`}
          onClick={() => onPick(number)}
        >
          {number}
        </button>
      ) : (
        <span className="script-reader-number" aria-hidden="true">
          {number}
        </span>
      )}
      <span className="script-reader-bead" aria-hidden="true">
        {isActing && <span className="glow-bead" data-glow-line={number} />}
      </span>
      <code className="script-reader-text" style={{ "--indent": `${indent}ch` } as React.CSSProperties}>
        {pieces.length === 0
          ? " "
          : pieces.map((piece, i) => (
              <span key={i} className={piece.className || undefined}>
                {piece.text}
              </span>
            ))}
      </code>
    </div>
  );
}

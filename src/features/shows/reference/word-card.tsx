import "../editor/editor.css";
import { useEffect, useRef, useState } from "react";
import { wordId, type WordEntry } from "../../../../sandbox/language/reference/index.ts";
import type { RibbonCells } from "../../../../sandbox/timeline/ribbon.ts";
import { IconButton } from "../../../components/icon-button.tsx";
import { Ribbon } from "../../../components/ribbon.tsx";
import { showToast } from "../../../components/toast-queue.ts";
import { listScriptLines } from "../editor/script-lines.ts";
import type { ExampleRunner } from "./example-runner.ts";

export interface WordCardProps {
  entry: WordEntry;
  runner: ExampleRunner | null;
}

/** One word: how it is written, what it does, an example, and what the example does on the square. */
export function WordCard({ entry, runner }: WordCardProps) {
  const cardRef = useRef<HTMLElement>(null);
  const [drawn, setDrawn] = useState<RibbonCells | "none" | null>(null);
  useEffect(() => {
    const card = cardRef.current;
    if (!card || !runner) return;
    let isGone = false;
    // Sixty examples would keep a phone busy: each is run when it comes near.
    const watch = new IntersectionObserver(
      ([seen]) => {
        if (!seen?.isIntersecting) return;
        watch.disconnect();
        runner.draw(entry).then(
          (cells) => isGone || setDrawn(cells ?? "none"),
          () => undefined,
        );
      },
      { rootMargin: "400px" },
    );
    watch.observe(card);
    return () => {
      isGone = true;
      watch.disconnect();
    };
  }, [entry, runner]);

  const example = runner?.write(entry) ?? "";
  return (
    <article
      ref={cardRef}
      id={wordId(entry)}
      className="min-w-0 scroll-mt-20 rounded-sheet border border-line bg-card p-4 shadow-sheet-1 target:border-lamp-ink target:shadow-sheet-2"
    >
      <div className="flex items-start gap-3">
        <h3 className="font-mono text-4 font-bold break-words">{entry.usage}</h3>
        <IconButton
          icon="copy"
          label={`Copy the example of ${entry.word}`}
          className="-my-2 ml-auto shrink-0"
          onPress={() =>
            void navigator.clipboard.writeText(example).then(
              () => showToast({ title: "The example is copied.", detail: "Put it into a script with Ctrl and V." }),
              () =>
                showToast({
                  tone: "warn",
                  title: "The browser let nothing be copied.",
                  detail: "Mark it and copy it by hand.",
                }),
            )
          }
        />
      </div>
      <p className="mt-1 text-soft">{entry.meaning}</p>
      <div className="mt-3 rounded-cut bg-well">
        {/* A long line scrolls: the keyboard must be able to do it. */}
        <pre
          className="overflow-x-auto p-3 font-mono text-meta/relaxed"
          // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex
          tabIndex={0}
          role="group"
          aria-label={`Example of ${entry.word}`}
        >
          <code>
            {listScriptLines(example).map((pieces, line) => (
              <span key={line} className="block min-h-[1lh]">
                {pieces.map((piece, i) => (
                  <span key={i} className={piece.className || undefined}>
                    {piece.text}
                  </span>
                ))}
              </span>
            ))}
          </code>
        </pre>
      </div>
      {drawn === "none" ? (
        <p className="mt-2 text-meta text-slate">This square or song has nothing for this example.</p>
      ) : (
        <Ribbon
          ribbon={drawn}
          size="strip"
          label={`What the example of ${entry.word} lights, from the first bar to the sixteenth`}
          className="mt-2"
        />
      )}
    </article>
  );
}

import type { ReactNode } from "react";
import { Link } from "react-router";
import { joinClasses } from "./class-names.ts";

export interface ShowCardProps {
  /** A Ribbon of size `card`, or a ribbon skeleton. */
  ribbon: ReactNode;
  title: string;
  to: string;
  /** One line: with whom, how long, when saved. */
  line?: ReactNode;
  /** A Tag. */
  tag?: ReactNode;
  level?: 2 | 3;
  className?: string;
}

/** A show as a card whose whole face is the link. Goes in a list: `<ul className="grid ..."><li>`. */
export function ShowCard({ ribbon, title, to, line, tag, level = 3, className }: ShowCardProps) {
  const Heading = level === 2 ? "h2" : "h3";
  return (
    <article
      className={joinClasses(
        "box-link flex h-full flex-col rounded-sheet border border-line bg-card shadow-sheet-1 hover:shadow-sheet-2",
        className,
      )}
    >
      <div className="px-2.5 pt-2.5 max-wide:px-2 max-wide:pt-2">{ribbon}</div>
      <div className="flex flex-1 flex-col items-start gap-1.5 px-3.5 pt-2.5 pb-3 max-wide:px-2.5">
        <Heading className="text-h3">
          <Link to={to} className="text-ink no-underline after:absolute after:inset-0">
            {title}
          </Link>
        </Heading>
        {line && <p className="text-meta text-slate">{line}</p>}
        {tag}
      </div>
    </article>
  );
}

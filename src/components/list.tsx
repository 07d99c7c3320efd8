import type { ComponentPropsWithRef, ReactNode } from "react";
import { Link } from "react-router";
import { joinClasses } from "./class-names.ts";

export interface ListProps extends Omit<ComponentPropsWithRef<"ul">, "style"> {
  /** Where the order means something (a queue, a programme). */
  isOrdered?: boolean;
}

/** Rows under each other, a rule between them. */
export function List({ isOrdered, className, ...rest }: ListProps) {
  const Tag = (isOrdered ? "ol" : "ul") as "ul";
  return <Tag {...rest} className={joinClasses("divide-y divide-line", className)} />;
}

export interface ListRowProps {
  /** A picture or sign at the start: DateLeaf, icon, number. */
  lead?: ReactNode;
  title: ReactNode;
  /** The title leads there. With `isWholeRow` so does the whole row; then no other control goes inside. */
  to?: string;
  isWholeRow?: boolean;
  /** The row on screen beside the list. */
  isHere?: boolean;
  /** One line below the title. */
  line?: ReactNode;
  /** Below that, full width: a Ribbon of size `row`. */
  ribbon?: ReactNode;
  /** Before the actions: a Tag. */
  tag?: ReactNode;
  /** Buttons at the end. */
  actions?: ReactNode;
  level?: 2 | 3 | 4;
  className?: string;
}

/** One row of a list: lead, title and line, ribbon, tag, actions. Narrow, tag and actions go under the text. */
export function ListRow({
  lead,
  title,
  to,
  isWholeRow,
  isHere,
  line,
  ribbon,
  tag,
  actions,
  level = 3,
  className,
}: ListRowProps) {
  const Heading = `h${level}` as const;
  return (
    <li
      aria-current={isHere || undefined}
      className={joinClasses(
        "flex items-start gap-x-4 gap-y-2 py-3 max-wide:flex-wrap",
        isWholeRow && "box-link hover:bg-well",
        (isWholeRow || isHere) && "px-3",
        isHere && "bg-blue-tint shadow-[inset_4px_0_0_var(--color-blue-ink)]",
        className,
      )}
    >
      {lead && <div className="shrink-0">{lead}</div>}
      <div className="min-w-0 flex-1 max-wide:min-w-[60%]">
        <Heading className="text-h3">
          {to ? (
            <Link
              to={to}
              className={joinClasses(
                "text-ink no-underline hover:underline",
                isWholeRow && "after:absolute after:inset-0 hover:no-underline",
              )}
            >
              {title}
            </Link>
          ) : (
            title
          )}
        </Heading>
        {line && <p className="mt-0.5 text-meta text-slate">{line}</p>}
        {ribbon && <div className="mt-1.5">{ribbon}</div>}
      </div>
      {(tag || actions) && (
        <div className="flex shrink-0 items-center gap-4 self-center max-wide:w-full max-wide:justify-between">
          {tag}
          {actions && <div className="flex flex-wrap items-center gap-2">{actions}</div>}
        </div>
      )}
    </li>
  );
}

import type { ComponentPropsWithRef, ReactNode } from "react";
import { joinClasses } from "./class-names.ts";

export interface CardProps extends Omit<ComponentPropsWithRef<"div">, "style"> {
  /** section and aside need an `aria-label` or `aria-labelledby`. */
  as?: "div" | "section" | "aside" | "li" | "article";
  /** Two sheet edges and a foot: the next thing, what is picked up. */
  isLifted?: boolean;
  /** Margins inside; leave out where a CardHeader or rows bring their own. */
  isPadded?: boolean;
}

/** A sheet of card on the paper. */
export function Card({ as = "div", isLifted, isPadded, className, ...rest }: CardProps) {
  // One tag's props fit all of these elements; TypeScript cannot see that through a union.
  const Sheet = as as "div";
  return (
    <Sheet
      {...rest}
      className={joinClasses(
        "rounded-sheet border border-line bg-card",
        isLifted ? "shadow-sheet-2" : "shadow-sheet-1",
        isPadded && "p-4",
        className,
      )}
    />
  );
}

export interface CardHeaderProps {
  title: ReactNode;
  /** For `aria-labelledby` of the card. */
  titleId?: string;
  /** Small, after the title. */
  detail?: ReactNode;
  actions?: ReactNode;
  level?: 2 | 3;
}

/** The head of a card: title, detail, actions, over a rule. */
export function CardHeader({ title, titleId, detail, actions, level = 2 }: CardHeaderProps) {
  const Heading = level === 2 ? "h2" : "h3";
  return (
    <div className="flex flex-wrap items-center gap-x-3 gap-y-1 border-b border-line px-4 py-2">
      <Heading id={titleId} className="text-h3">
        {title}
      </Heading>
      {detail && <span className="text-meta text-slate">{detail}</span>}
      {actions && <div className="ml-auto flex flex-wrap gap-2">{actions}</div>}
    </div>
  );
}

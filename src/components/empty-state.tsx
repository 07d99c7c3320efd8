import type { ReactNode } from "react";
import { joinClasses } from "./class-names.ts";
import { Icon, type IconName } from "./icon.tsx";

export interface EmptyStateProps {
  /** What is not here yet: "No show yet". */
  title: ReactNode;
  /** What to do about it, one or two sentences. */
  children?: ReactNode;
  /** The one next action. */
  action?: ReactNode;
  /** A picture at the start: a bare Ribbon. Else the icon. */
  picture?: ReactNode;
  icon?: IconName;
  headingLevel?: 2 | 3;
  className?: string;
}

/** A place that has nothing in it yet, saying what will be here and how it comes to be. */
export function EmptyState({
  title,
  children,
  action,
  picture,
  icon = "ribbon",
  headingLevel = 3,
  className,
}: EmptyStateProps) {
  const Heading = headingLevel === 2 ? "h2" : "h3";
  return (
    <div
      className={joinClasses(
        "flex items-center gap-6 rounded-sheet border-2 border-dashed border-rim px-7 py-6 max-wide:flex-col max-wide:items-stretch max-wide:gap-4 max-wide:p-4",
        className,
      )}
    >
      {picture ? (
        <div className="w-52 shrink-0 max-wide:w-full">{picture}</div>
      ) : (
        <Icon name={icon} className="size-9 text-slate" />
      )}
      <div className="min-w-0 flex-1">
        <Heading>{title}</Heading>
        {children && <div className="mt-1 max-w-[58ch] text-soft">{children}</div>}
      </div>
      {action && <div className="shrink-0">{action}</div>}
    </div>
  );
}

import type { ReactNode } from "react";
import { joinClasses } from "./class-names.ts";

export interface SkeletonProps {
  /** line: a line of text. block: a sheet. ribbon: a strip of dusk. */
  shape?: "line" | "block" | "ribbon";
  /** Size and place, as classes: `w-40`, `h-24`. */
  className?: string;
}

/** A sheet where content will come. Hidden from assistive technology: say "Loading ..." once, beside the group, with `SkeletonGroup`. */
export function Skeleton({ shape = "line", className }: SkeletonProps) {
  return (
    <span
      aria-hidden="true"
      className={joinClasses(
        "block skeleton",
        shape === "line" && "h-[0.8em]",
        shape === "ribbon" && "h-[58px] bare-weave ribbon-ends [--sweep:var(--color-thread-lit)]",
        className,
      )}
    />
  );
}

export interface SkeletonGroupProps {
  /** "Loading your shows". */
  label: string;
  className?: string;
  children: ReactNode;
}

/** Skeletons of one thing, announced once. */
export function SkeletonGroup({ label, className, children }: SkeletonGroupProps) {
  return (
    <div role="status" aria-live="polite" className={className}>
      <span className="sr-only">{label}</span>
      {children}
    </div>
  );
}

import { useLayoutEffect, type ReactNode } from "react";
import { useDocumentTitle } from "../hooks/use-document-title.ts";
import { joinClasses } from "./class-names.ts";

export type Density = "student" | "staff";

export interface PageProps {
  /** The document's title, and the h1 where `PageHeader` repeats it. Name the thing, not the product. */
  title: string;
  /** student (and families): 17 px text, 44 px controls. staff: 14.5 px, 34 px. */
  density?: Density;
  /** column: text and cards in a centred column. public: a narrower one. staff: the window with margins. full: no margins, the page lays out itself. */
  layout?: "column" | "public" | "staff" | "full";
  className?: string;
  children: ReactNode;
}

const LAYOUTS = {
  column: "mx-auto w-full max-w-page px-6 pt-6 pb-12 max-wide:px-4 max-wide:pt-4 max-wide:pb-10",
  public: "mx-auto w-full max-w-public px-6 pt-6 pb-12 max-wide:px-4 max-wide:pt-4 max-wide:pb-10",
  staff: "w-full px-6 pt-4 pb-6 max-wide:px-4 max-wide:pb-10",
  full: "flex min-h-0 w-full flex-col",
};

/**
 * The frame of every page inside the shell: sets the document's title and the density, and gives the margins.
 * Exactly one h1 goes inside: `PageHeader`, `SubBand`, or the page's own.
 */
export function Page({
  title,
  density = "student",
  layout = density === "staff" ? "staff" : "column",
  className,
  children,
}: PageProps) {
  useDocumentTitle(title);
  // On <html>, not on a wrapper: the band and the dialogs, which live outside the page, follow it too.
  useLayoutEffect(() => {
    document.documentElement.dataset.density = density;
  }, [density]);
  return <div className={joinClasses("flex-1", LAYOUTS[layout], className)}>{children}</div>;
}

export interface PageHeaderProps {
  /** The h1. */
  title: ReactNode;
  /** One line below it. */
  lead?: ReactNode;
  /** Beside the title: a state tag. */
  tag?: ReactNode;
  /** At the end of the line: buttons. */
  actions?: ReactNode;
}

/** The head of a page with its one h1, which takes the focus when the page is navigated to. */
export function PageHeader({ title, lead, tag, actions }: PageHeaderProps) {
  return (
    <header className="mb-4 flex flex-wrap items-end gap-x-4 gap-y-2">
      <div className="min-w-0">
        <div className="flex flex-wrap items-center gap-3">
          <h1 tabIndex={-1}>{title}</h1>
          {tag}
        </div>
        {lead && <p className="mt-1 text-slate">{lead}</p>}
      </div>
      {actions && <div className="ml-auto flex flex-wrap items-center gap-2 max-wide:ml-0">{actions}</div>}
    </header>
  );
}

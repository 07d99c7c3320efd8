import type { ReactNode } from "react";
import { NavLink } from "react-router";
import { joinClasses } from "./class-names.ts";
import { Icon, type IconName } from "./icon.tsx";

export interface SubBandSection {
  to: string;
  label: string;
  icon?: IconName;
  count?: number;
  isExact?: boolean;
}

export interface SubBandProps {
  /** The page's one h1. */
  title: ReactNode;
  /** Small, after the title. */
  detail?: ReactNode;
  /** Pages beside this one; the one on screen is underlined. */
  sections?: SubBandSection[];
  sectionsLabel?: string;
  /** Between title and actions: a week or layout chooser, a state tag. */
  children?: ReactNode;
  /** At the end: buttons. */
  actions?: ReactNode;
}

/** The strip of card under the band on staff pages: h1, sections or chooser, state, actions. Goes first in a `Page layout="full"`. */
export function SubBand({ title, detail, sections, sectionsLabel = "Sections", children, actions }: SubBandProps) {
  return (
    <div className="flex flex-wrap items-stretch gap-x-6 gap-y-1 border-b border-line bg-card px-6 pt-1.5 max-wide:gap-x-4 max-wide:px-4 max-wide:pt-2 print:hidden">
      <div
        className={joinClasses(
          "flex flex-wrap items-baseline gap-x-2 self-center py-2 max-wide:w-full",
          sections && "border-line pr-4 wide:border-r",
        )}
      >
        <h1 tabIndex={-1} className="text-5">
          {title}
        </h1>
        {detail && <span className="text-meta text-slate">{detail}</span>}
      </div>
      {sections && (
        <nav aria-label={sectionsLabel} className="max-w-full overflow-x-auto">
          <ul className="flex h-full gap-6 max-wide:gap-4">
            {sections.map((section) => (
              <li key={section.to} className="flex">
                <NavLink
                  to={section.to}
                  end={section.isExact}
                  className={({ isActive }) =>
                    joinClasses(
                      "relative flex min-h-[42px] items-center gap-1.5 whitespace-nowrap no-underline hover:text-ink",
                      isActive ? "lamp-bar font-[650] text-ink [--bar-colour:var(--color-ink)]" : "text-soft",
                    )
                  }
                >
                  {section.icon && <Icon name={section.icon} />}
                  {section.label}
                  {section.count ? (
                    <span className="rounded-cut bg-well px-1.5 text-meta tabular-nums">{section.count}</span>
                  ) : null}
                </NavLink>
              </li>
            ))}
          </ul>
        </nav>
      )}
      {children && <div className="flex min-w-0 flex-wrap items-center gap-3 self-center py-1">{children}</div>}
      {actions && (
        <div className="ml-auto flex flex-wrap items-center gap-2 self-center py-1.5 max-wide:ml-0 max-wide:pb-2.5">
          {actions}
        </div>
      )}
    </div>
  );
}

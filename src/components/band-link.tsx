import { NavLink } from "react-router";
import { joinClasses } from "./class-names.ts";
import { Icon, type IconName } from "./icon.tsx";

export interface BandItem {
  to: string;
  icon: IconName;
  label: string;
  /** Things that wait there, shown as a number; 0 shows nothing. */
  count?: number;
  /** What is counted, for assistive technology: "to mark". */
  countLabel?: string;
  /** The link is "here" only on its own address, not on those below it. */
  isExact?: boolean;
}

export interface BandLinkProps {
  item: BandItem;
  isInMenu?: boolean;
  onFollow?: () => void;
}

/** One entry of the band's navigation; where it leads to the page on screen, a lamp bar lies under it. */
export function BandLink({ item, isInMenu, onFollow }: BandLinkProps) {
  return (
    <NavLink
      to={item.to}
      end={item.isExact}
      onClick={onFollow}
      className={({ isActive }) =>
        joinClasses(
          "flex items-center gap-[7px] no-underline hover:text-on-dusk",
          isInMenu
            ? "min-h-12 flex-1 border-l-4 pl-3 text-4"
            : "relative px-[13px] text-[max(0.96875rem,var(--text-meta))] [--bar-inset:13px]",
          isActive ? "font-semibold text-on-dusk" : "text-on-dusk-soft",
          isActive && (isInMenu ? "border-lamp" : "lamp-bar"),
          !isActive && isInMenu && "border-transparent",
        )
      }
    >
      <Icon name={item.icon} />
      {item.label}
      {item.count ? (
        <span className="rounded-cut bg-twilight px-1.5 py-[3px] text-[0.75rem]/none font-semibold text-on-dusk tabular-nums">
          {item.count}
          {item.countLabel && <span className="sr-only"> {item.countLabel}</span>}
        </span>
      ) : null}
    </NavLink>
  );
}

import { Button as PressButton } from "react-aria-components/Button";
import { Link } from "react-router";
import { useDisclosure } from "../hooks/use-disclosure.ts";
import { joinClasses } from "./class-names.ts";
import { Icon, type IconName } from "./icon.tsx";

export interface BandAccountLink {
  label: string;
  icon: IconName;
  /** A page, or an act; exactly one of the two. */
  to?: string;
  onPress?: () => void;
}

export interface BandAccountProps {
  name: string;
  /** Beside the name: a class ("7B"), or a role. */
  detail?: string;
  links: BandAccountLink[];
}

/** The name at the end of the band, with its menu under it. Wide only: narrow, the band's own menu holds the same links. */
export function BandAccount({ name, detail, links }: BandAccountProps) {
  const { rootRef, ...menu } = useDisclosure();
  return (
    <div ref={rootRef} className="relative max-wide:hidden">
      <PressButton
        onPress={menu.toggle}
        aria-expanded={menu.isOpen}
        aria-controls={menu.panelId}
        className="flex min-h-9 items-center gap-1.5 rounded-cut px-2 text-[max(0.9375rem,var(--text-meta))] text-on-dusk-soft hover:bg-dusk-hover hover:text-on-dusk"
      >
        {detail ? `${name} · ${detail}` : name}
        <Icon name="chevron-down" className={joinClasses("size-[0.9em]", menu.isOpen && "rotate-180")} />
      </PressButton>
      {menu.isOpen && (
        <div
          id={menu.panelId}
          className="absolute top-full right-0 mt-1 w-max min-w-56 rounded-sheet border border-dusk-line bg-dusk p-2 shadow-sheet-2"
        >
          <BandAccountPanel name={name} detail={detail} links={links} isNameHidden onDone={menu.close} />
        </div>
      )}
    </div>
  );
}

interface BandAccountPanelProps extends BandAccountProps {
  isNameHidden?: boolean;
  onDone: () => void;
}

/** The account's links as a list; closes its holder through `onDone` when one is used. */
export function BandAccountPanel({ name, detail, links, isNameHidden, onDone }: BandAccountPanelProps) {
  const row =
    "flex min-h-11 w-full items-center gap-2.5 rounded-cut px-3 text-left text-3 text-on-dusk-soft no-underline hover:bg-dusk-hover hover:text-on-dusk";
  return (
    <>
      {!isNameHidden && <p className="px-3 pb-1 font-semibold">{detail ? `${name} · ${detail}` : name}</p>}
      <ul>
        {links.map((link) => (
          <li key={link.label}>
            {link.to ? (
              <Link to={link.to} onClick={onDone} className={row}>
                <Icon name={link.icon} />
                {link.label}
              </Link>
            ) : (
              <PressButton
                className={row}
                onPress={() => {
                  onDone();
                  link.onPress?.();
                }}
              >
                <Icon name={link.icon} />
                {link.label}
              </PressButton>
            )}
          </li>
        ))}
      </ul>
    </>
  );
}

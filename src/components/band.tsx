import { Link } from "react-router";
import { useDisclosure } from "../hooks/use-disclosure.ts";
import { BandAccount, BandAccountPanel, type BandAccountProps } from "./band-account.tsx";
import { BandLink, type BandItem } from "./band-link.tsx";
import { IconButton } from "./icon-button.tsx";
import { Mark } from "./mark.tsx";
import { ThemeToggle } from "./theme-toggle.tsx";

export type { BandItem } from "./band-link.tsx";

export interface BandProps {
  /** Where the mark leads. */
  home: string;
  /** The navigation of the person's roles; empty when signed out. */
  items: BandItem[];
  /** Who is signed in and what their menu offers; left out when nobody is. */
  account?: BandAccountProps;
  /** The band ends with the page's column (students, families) or with the window (staff). */
  isWide?: boolean;
}

/** The dusk band at the top of every page but the sign-in: mark, navigation, theme, account. Narrow, the last two fold into one menu. */
export function Band({ home, items, account, isWide }: BandProps) {
  const { rootRef, ...menu } = useDisclosure();
  const hasMenu = items.length > 0 || account !== undefined;
  return (
    <header className="z-20 on-dusk bg-dusk pinked-bottom print:hidden">
      <div ref={rootRef} className={isWide ? "" : "mx-auto max-w-page"}>
        <div className="flex min-h-(--band) items-stretch gap-6 px-6 max-wide:gap-2 max-wide:px-3.5">
          <Link
            to={home}
            className="flex items-center gap-2.5 py-1 font-head text-[1.1875rem]/none font-bold tracking-[-0.02em] text-on-dusk no-underline"
          >
            <Mark />
            Duskbell
          </Link>
          {items.length > 0 && (
            <nav aria-label="Main" className="max-wide:hidden">
              <ul className="flex h-full gap-0.5">
                {items.map((item) => (
                  <li key={item.to} className="flex">
                    <BandLink item={item} />
                  </li>
                ))}
              </ul>
            </nav>
          )}
          <div className="ml-auto flex items-center gap-1">
            <ThemeToggle className="text-on-dusk-soft hover:text-on-dusk" />
            {account && <BandAccount {...account} />}
            {hasMenu && (
              <IconButton
                icon={menu.isOpen ? "cross" : "menu"}
                label="Menu"
                aria-expanded={menu.isOpen}
                aria-controls={menu.panelId}
                onPress={menu.toggle}
                className="wide:hidden"
              />
            )}
          </div>
        </div>
        {hasMenu && menu.isOpen && (
          <div id={menu.panelId} className="border-t border-dusk-line px-3.5 pt-2 pb-4 wide:hidden">
            <nav aria-label="Main">
              <ul>
                {items.map((item) => (
                  <li key={item.to} className="flex">
                    <BandLink item={item} isInMenu onFollow={menu.close} />
                  </li>
                ))}
              </ul>
            </nav>
            {account && (
              <div className="mt-2 border-t border-dusk-line pt-3">
                <BandAccountPanel {...account} onDone={menu.close} />
              </div>
            )}
          </div>
        )}
      </div>
    </header>
  );
}

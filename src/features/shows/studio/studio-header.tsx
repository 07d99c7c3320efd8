import { Link } from "react-router";
import { Button } from "../../../components/button.tsx";
import { Menu, type MenuAction } from "../../../components/menu.tsx";
import { ThemeToggle } from "../../../components/theme-toggle.tsx";
import type { DraftState } from "../drafts/draft-model.ts";
import type { KeptText } from "../history/kept-text.ts";
import { SaveMenu } from "./save-menu.tsx";

export interface StudioHeaderProps {
  title: string;
  context: string;
  homeHref: string;
  draft: DraftState;
  versions: readonly KeptText[];
  /** Opens the history at a text; null at the newest. */
  onLook: (id: string | null) => void;
  onChoose: () => void;
  /** What is done seldom: full screen, files, luck. */
  actions: MenuAction[];
  /** Null where there is nobody to hand it to. */
  onHandIn: (() => void) | null;
}

/** The studio's own head: the way home, the show's name, the save state in words, Hand in. */
export function StudioHeader({
  title,
  context,
  homeHref,
  draft,
  versions,
  onLook,
  onChoose,
  actions,
  onHandIn,
}: StudioHeaderProps) {
  return (
    <header className="studio-head">
      <Link to={homeHref} className="studio-brand" aria-label="Duskbell, home">
        <svg viewBox="0 0 32 32" width="30" height="30" aria-hidden="true">
          <path className="studio-brand-roof" d="M3 29V14.5h3V11h3V7.5h3.2V4h7.6v3.500H23V11h3v3.500h3V29Z" />
          <path
            className="studio-brand-bell"
            d="M16 10.2c3.3 0 4.7 2.4 4.800 5.400.1 2.900.9 4.400 2.400 5.600H8.800c1.500-1.200 2.300-2.700 2.400-5.600.1-3 1.500-5.400 4.800-5.400Zm-2.100 12.300h4.200a2.100 2.100 0 0 1-4.200 0Z"
          />
        </svg>
        <span>Duskbell</span>
      </Link>
      <div className="studio-title">
        <h1>{title}</h1>
        <p>{context}</p>
      </div>
      <SaveMenu draft={draft} versions={versions} onLook={onLook} onChoose={onChoose} />
      <ThemeToggle className="studio-theme" />
      <Menu label="More for this show" isIconOnly actions={actions} className="studio-more" />
      {onHandIn && (
        <Button icon="sent" onPress={onHandIn}>
          Hand in
        </Button>
      )}
    </header>
  );
}

import { useEffect, useState } from "react";
import type { RibbonCells } from "../../../../sandbox/timeline/ribbon.ts";
import { Button } from "../../../components/button.tsx";
import { joinClasses } from "../../../components/class-names.ts";
import { Icon, type IconName } from "../../../components/icon.tsx";
import { Ribbon } from "../../../components/ribbon.tsx";
import { useDisclosure } from "../../../hooks/use-disclosure.ts";
import type { DraftState } from "../drafts/draft-model.ts";
import { presentSaveStatus, type SaveStatus } from "../drafts/save-status.ts";

/** A version that was handed in or kept, as the list shows it. */
export interface StudioVersion {
  readonly id: string;
  /** "Version 3" */
  readonly title: string;
  /** "today, 10:14" */
  readonly when: string;
  readonly ribbon: RibbonCells | null;
}

export interface SaveMenuProps {
  draft: DraftState;
  versions: readonly StudioVersion[];
  /** Texts that were put aside when another was chosen; on this computer only. */
  asides: readonly StudioVersion[];
  /** The menu is opening: time to read what it shows. */
  onOpen: () => void;
  onLook: (version: StudioVersion) => void;
  /** Opens the choice between two versions. */
  onChoose: () => void;
}

const ICONS: { readonly [T in SaveStatus["tone"]]: IconName } = { calm: "check", busy: "turn", careful: "warn" };
/** The words "20 seconds ago" grow older by themselves. */
const AGE_MS = 5000;

/** The save state, always in words; it opens to the reason and to earlier versions. */
export function SaveMenu({ draft, versions, asides, onOpen, onLook, onChoose }: SaveMenuProps) {
  const { isOpen, panelId, rootRef, toggle, close } = useDisclosure();
  const [now, setNow] = useState(() => Date.now());
  useEffect(() => {
    const timer = setInterval(() => setNow(Date.now()), AGE_MS);
    return () => clearInterval(timer);
  }, []);
  const { label, detail, tone } = presentSaveStatus(draft, Math.max(now, draft.savedAt ?? 0));
  const isChoice = label === "Two versions";
  const look = (version: StudioVersion) => {
    close();
    onLook(version);
  };
  const handleToggle = () => {
    if (!isOpen) onOpen();
    toggle();
  };
  return (
    <div ref={rootRef} className="studio-save">
      <button
        type="button"
        className={joinClasses("studio-save-button", `is-${tone}`)}
        aria-expanded={isOpen}
        aria-controls={panelId}
        onClick={handleToggle}
      >
        <Icon name={ICONS[tone]} />
        <span className="studio-save-words">
          {label}
          {tone === "calm" && <span className="studio-save-age"> {detail}</span>}
        </span>
        <Icon name="chevron-down" className="size-4" />
      </button>
      <span className="sr-only" role="status">
        {tone === "careful" ? `${label}. ${detail}` : ""}
      </span>
      {isOpen && (
        <div id={panelId} className="studio-sheet">
          {tone !== "calm" && <p className="studio-sheet-detail">{detail}</p>}
          {isChoice && (
            <Button
              look="main"
              size="small"
              onPress={() => {
                close();
                onChoose();
              }}
            >
              Choose
            </Button>
          )}
          <h2>Earlier versions</h2>
          {versions.length === 0 ? (
            <p className="studio-empty">None yet. Each time you hand in, a version is kept here.</p>
          ) : (
            <VersionList versions={versions} onLook={look} />
          )}
          {asides.length > 0 && (
            <>
              <h2>Put aside on this computer</h2>
              <VersionList versions={asides} onLook={look} />
            </>
          )}
        </div>
      )}
    </div>
  );
}

function VersionList({
  versions,
  onLook,
}: {
  versions: readonly StudioVersion[];
  onLook: (version: StudioVersion) => void;
}) {
  return (
    <ul>
      {versions.map((version) => (
        <li key={version.id}>
          <Ribbon ribbon={version.ribbon} label="" size="strip" />
          <div>
            <b>{version.title}</b>
            <span>{version.when}</span>
          </div>
          <Button look="quiet" size="small" onPress={() => onLook(version)}>
            Look
          </Button>
        </li>
      ))}
    </ul>
  );
}

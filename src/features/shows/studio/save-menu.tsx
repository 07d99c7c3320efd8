import { useEffect, useState } from "react";
import { Button } from "../../../components/button.tsx";
import { joinClasses } from "../../../components/class-names.ts";
import { Icon, type IconName } from "../../../components/icon.tsx";
import { Ribbon } from "../../../components/ribbon.tsx";
import { useDisclosure } from "../../../hooks/use-disclosure.ts";
import type { DraftState } from "../drafts/draft-model.ts";
import type { KeptText } from "../history/kept-text.ts";
import { presentSaveStatus, type SaveStatus } from "../drafts/save-status.ts";

export interface SaveMenuProps {
  draft: DraftState;
  /** What was handed in, newest first. */
  versions: readonly KeptText[];
  /** Opens the history at a text; null at the newest. */
  onLook: (id: string | null) => void;
  /** Opens the choice between two versions. */
  onChoose: () => void;
}

const ICONS: { readonly [T in SaveStatus["tone"]]: IconName } = { calm: "check", busy: "turn", careful: "warn" };
/** The words "20 seconds ago" grow older by themselves. */
const AGE_MS = 5000;

/** The save state, always in words; it opens to the reason and to earlier versions. */
export function SaveMenu({ draft, versions, onLook, onChoose }: SaveMenuProps) {
  const { isOpen, panelId, rootRef, toggle, close } = useDisclosure();
  const [now, setNow] = useState(() => Date.now());
  useEffect(() => {
    const timer = setInterval(() => setNow(Date.now()), AGE_MS);
    return () => clearInterval(timer);
  }, []);
  const { label, detail, tone } = presentSaveStatus(draft, Math.max(now, draft.savedAt ?? 0));
  const isChoice = label === "Two versions";
  const look = (id: string | null) => {
    close();
    onLook(id);
  };
  return (
    <div ref={rootRef} className="studio-save">
      <button
        type="button"
        className={joinClasses("studio-save-button", `is-${tone}`)}
        aria-expanded={isOpen}
        aria-controls={panelId}
        onClick={toggle}
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
          <h2>Handed in</h2>
          {versions.length === 0 ? (
            <p className="studio-empty">Nothing yet. Each time you hand in, a version is kept here.</p>
          ) : (
            <ul>
              {versions.map((version) => (
                <li key={version.id}>
                  <Ribbon ribbon={version.ribbon} label="" size="strip" />
                  <div>
                    <b>{version.title}</b>
                    <span>{version.when}</span>
                  </div>
                  <Button look="quiet" size="small" onPress={() => look(version.id)}>
                    Look
                  </Button>
                </li>
              ))}
            </ul>
          )}
          <Button icon="history" size="small" onPress={() => look(null)}>
            History: all earlier texts
          </Button>
        </div>
      )}
    </div>
  );
}

import { useRef, type KeyboardEvent } from "react";
import { Icon, type IconName } from "../../../components/icon.tsx";
import { joinClasses } from "../../../components/class-names.ts";

export const TRAY_TABS = ["script", "check", "notes", "names", "words"] as const;
export type TrayTab = (typeof TRAY_TABS)[number];

const LOOKS: { readonly [T in TrayTab]: { readonly word: string; readonly icon: IconName } } = {
  script: { word: "Script", icon: "script" },
  check: { word: "Check", icon: "tick" },
  notes: { word: "Notes", icon: "pencil" },
  names: { word: "Names", icon: "street" },
  words: { word: "In words", icon: "note" },
};

export interface TrayTabsProps {
  selected: TrayTab;
  onSelect: (tab: TrayTab) => void;
  /** Numbers behind the words; 0 shows none. */
  counts: { readonly [T in TrayTab]?: number };
  /** On a phone the script is a tab like the others. */
  hasScript: boolean;
}

/** Script, Check, Notes, Names, In words: one at a time. Left and right arrows move. */
export function TrayTabs({ selected, onSelect, counts, hasScript }: TrayTabsProps) {
  const ref = useRef<HTMLDivElement>(null);
  const tabs = TRAY_TABS.filter((tab) => hasScript || tab !== "script");
  const handleKey = (event: KeyboardEvent) => {
    const place = tabs.indexOf(selected);
    const steps: Record<string, number> = {
      ArrowRight: place + 1,
      ArrowLeft: place - 1,
      Home: 0,
      End: tabs.length - 1,
    };
    const next = steps[event.key];
    if (next === undefined) return;
    const tab = tabs[(next + tabs.length) % tabs.length] ?? selected;
    onSelect(tab);
    ref.current?.querySelector<HTMLElement>(`#studio-tab-${tab}`)?.focus();
    event.preventDefault();
  };
  return (
    <div ref={ref} className="studio-tabs" role="tablist" aria-label="Help for this script">
      {tabs.map((tab) => (
        <button
          key={tab}
          type="button"
          role="tab"
          id={`studio-tab-${tab}`}
          aria-selected={tab === selected}
          aria-controls={`studio-pane-${tab}`}
          tabIndex={tab === selected ? 0 : -1}
          className={joinClasses("studio-tab", tab === selected && "is-selected")}
          onClick={() => onSelect(tab)}
          onKeyDown={handleKey}
        >
          <Icon name={LOOKS[tab].icon} />
          {LOOKS[tab].word}
          {counts[tab] ? <span className="studio-count">{counts[tab]}</span> : null}
        </button>
      ))}
    </div>
  );
}

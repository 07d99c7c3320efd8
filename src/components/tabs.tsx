import type { ReactNode } from "react";
import { Tab, TabList, TabPanel, Tabs as TabSet } from "react-aria-components/Tabs";
import { Icon, type IconName } from "./icon.tsx";

export interface TabItem {
  id: string;
  label: string;
  icon?: IconName;
  /** A number after the word; 0 shows nothing. */
  count?: number;
  content: ReactNode;
}

export interface TabsProps {
  /** What the tabs choose between, for assistive technology. */
  label: string;
  tabs: TabItem[];
  /** Given: the chosen tab is the caller's (keep it in the URL). Left out: the tabs' own. */
  selectedId?: string;
  onSelect?: (id: string) => void;
  className?: string;
}

/** Views of one thing, one at a time. Left and right arrows move; only the chosen panel is in the page. Pages beside each other are SubBand sections, not tabs. */
export function Tabs({ label, tabs, selectedId, onSelect, className }: TabsProps) {
  return (
    <TabSet className={className} selectedKey={selectedId} onSelectionChange={(key) => onSelect?.(String(key))}>
      <TabList aria-label={label} className="flex gap-6 overflow-x-auto overflow-y-hidden border-b-[1.5px] border-line">
        {tabs.map((tab) => (
          <Tab
            key={tab.id}
            id={tab.id}
            className="relative flex min-h-(--control) cursor-pointer items-center gap-2 py-1 font-semibold whitespace-nowrap text-slate focus-visible:-outline-offset-3 hover:text-ink selected:text-ink selected:lamp-bar selected:[--bar-colour:var(--color-ink)]"
          >
            {tab.icon && <Icon name={tab.icon} />}
            {tab.label}
            {tab.count ? <span className="rounded-cut bg-well px-1.5 text-meta tabular-nums">{tab.count}</span> : null}
          </Tab>
        ))}
      </TabList>
      {tabs.map((tab) => (
        <TabPanel key={tab.id} id={tab.id} className="pt-5">
          {tab.content}
        </TabPanel>
      ))}
    </TabSet>
  );
}

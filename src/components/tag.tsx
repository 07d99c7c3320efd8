import type { ReactNode } from "react";
import { joinClasses } from "./class-names.ts";
import { Icon, type IconName } from "./icon.tsx";

type Tone = "blue" | "amber" | "green" | "red" | "plain";

const TONES: Record<Tone, string> = {
  blue: "bg-blue-tint text-blue-ink",
  amber: "bg-lamp-tint text-lamp-ink",
  green: "bg-spruce-tint text-spruce",
  red: "bg-rowan-tint text-rowan",
  plain: "bg-well text-soft",
};

const STATES = {
  working: { tone: "blue", icon: "pencil", word: "Working" },
  submitted: { tone: "blue", icon: "sent", word: "Submitted" },
  revise: { tone: "amber", icon: "turn", word: "Revise" },
  marked: { tone: "green", icon: "tick", word: "Marked" },
  waiting: { tone: "amber", icon: "clock", word: "Waiting" },
  approved: { tone: "green", icon: "tick", word: "Approved" },
  declined: { tone: "red", icon: "cross", word: "Declined" },
  scheduled: { tone: "green", icon: "calendar", word: "Scheduled" },
  ok: { tone: "green", icon: "check", word: "Ready" },
  note: { tone: "blue", icon: "info", word: "Note" },
  warn: { tone: "amber", icon: "warn", word: "Look here" },
  stop: { tone: "red", icon: "stop", word: "Stop" },
  plain: { tone: "plain", icon: "info", word: "" },
} satisfies Record<string, { tone: Tone; icon: IconName; word: string }>;

export type TagState = keyof typeof STATES;

export interface TagProps {
  state: TagState;
  /** Another icon than the state's own. */
  icon?: IconName;
  className?: string;
  /** Another word than the state's own ("On the square" for scheduled). `plain` needs one. */
  children?: ReactNode;
}

/** The state of a thing as icon and word on an arrow-cut slip. Never a button, never colour alone. */
export function Tag({ state, icon, className, children }: TagProps) {
  const look = STATES[state];
  return (
    <span
      className={joinClasses(
        "inline-flex w-max max-w-full items-center gap-1.5 py-1 pr-3.5 pl-2 text-meta leading-tight font-semibold whitespace-nowrap arrow-cut",
        TONES[look.tone],
        className,
      )}
    >
      <Icon name={icon ?? look.icon} className="size-[1.1em]" />
      {children ?? look.word}
    </span>
  );
}

import type { ReactNode } from "react";
import { joinClasses } from "./class-names.ts";
import { Icon, type IconName } from "./icon.tsx";

export type NoticeTone = "info" | "ok" | "warn" | "stop";

const TONES: Record<NoticeTone, { box: string; ink: string; icon: IconName }> = {
  info: { box: "border-blue-ink bg-blue-tint", ink: "text-blue-ink", icon: "info" },
  ok: { box: "border-spruce bg-spruce-tint", ink: "text-spruce", icon: "tick" },
  warn: { box: "border-lamp-ink bg-lamp-tint", ink: "text-lamp-ink", icon: "warn" },
  stop: { box: "border-rowan bg-rowan-tint", ink: "text-rowan", icon: "stop" },
};

export interface NoticeProps {
  tone?: NoticeTone;
  icon?: IconName;
  /** What happened, one sentence. */
  title: ReactNode;
  /** What it means, and what can be done. */
  children?: ReactNode;
  /** Buttons. */
  actions?: ReactNode;
  /** In the corner: an IconButton that closes it. */
  end?: ReactNode;
  /** `alert` interrupts, `status` waits its turn; leave it out for what was there when the page came. */
  role?: "alert" | "status";
  className?: string;
}

/** A message in the page: 4 px edge, icon, bold sentence, meaning, action. For what concerns the place it stands in; passing news is a toast. */
export function Notice({ tone = "info", icon, title, children, actions, end, role, className }: NoticeProps) {
  const look = TONES[tone];
  return (
    <div
      role={role}
      className={joinClasses("flex gap-3 rounded-r-sheet border-l-4 px-4 py-3 text-ink", look.box, className)}
    >
      <Icon name={icon ?? look.icon} className={`mt-[0.1em] size-[1.3em] ${look.ink}`} />
      <div className="min-w-0 flex-1">
        <p className="font-bold">{title}</p>
        {children && <div className="mt-0.5 max-w-[62ch] space-y-2">{children}</div>}
        {actions && <div className="mt-2.5 flex flex-wrap gap-2">{actions}</div>}
      </div>
      {end && <div className="-my-1.5 -mr-2.5 shrink-0">{end}</div>}
    </div>
  );
}

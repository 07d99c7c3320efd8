import { joinClasses } from "./class-names.ts";

/**
 * main: the ink block, the page's own action. lamp: the one next action on dusk, never two on a page.
 * plain: the rest. quiet: plum text, lesser acts. ghost: on dusk. stop: what cannot be undone, in a confirmation.
 */
export type ButtonLook = "main" | "lamp" | "plain" | "quiet" | "ghost" | "stop";
/** normal: 44 px for students, 34 for staff (the page's density decides). small: 34 and 28. large: 48. */
export type ButtonSize = "small" | "normal" | "large";

const LOOKS: Record<ButtonLook, string> = {
  main: "border-main bg-main text-on-main hover:border-main-hover hover:bg-main-hover",
  lamp: "border-lamp bg-lamp text-on-lamp hover:border-lamp-hover hover:bg-lamp-hover",
  plain: "border-rim bg-card text-ink hover:bg-well",
  quiet: "border-transparent text-plum hover:bg-well",
  ghost: "border-dusk-rim text-on-dusk hover:bg-dusk-hover",
  stop: "border-rowan bg-rowan text-card hover:brightness-110",
};
const REFUSED: Record<"paper" | "dusk", string> = {
  paper: "cursor-not-allowed border-dashed border-rim text-slate",
  dusk: "cursor-not-allowed border-dashed border-dusk-rim text-on-dusk-soft",
};
const SIZES: Record<ButtonSize, string> = {
  small: "min-h-(--control-small) px-3 py-0.5 text-meta",
  normal: "min-h-(--control) px-(--control-x) py-1",
  large: "min-h-12 px-6 py-2 text-4",
};

export interface ButtonClassOptions {
  look: ButtonLook;
  size: ButtonSize;
  isRefused?: boolean;
  isIconOnly?: boolean;
  className?: string;
}

/** The classes of a button or of a link that looks like one. */
export function buttonClass({ look, size, isRefused, isIconOnly, className }: ButtonClassOptions): string {
  return joinClasses(
    "inline-flex shrink-0 items-center justify-center gap-2 rounded-cut border-[1.5px] font-semibold leading-[1.15] whitespace-nowrap no-underline select-none",
    "active:translate-y-px",
    isRefused ? REFUSED[look === "ghost" || look === "lamp" ? "dusk" : "paper"] : LOOKS[look],
    SIZES[size],
    isIconOnly && "aspect-square px-0!",
    className,
  );
}

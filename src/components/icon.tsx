import { ICON_SHAPES, type IconName } from "./icon-paths.ts";

export type { IconName } from "./icon-paths.ts";

export interface IconProps {
  name: IconName;
  /** Only for an icon that stands without a word; else it is hidden from assistive technology. */
  label?: string;
  className?: string;
}

/** One icon of the set, 1.25 em high, in the colour of its text. An icon goes with a word, or carries a label. */
export function Icon({ name, label, className = "size-[1.25em]" }: IconProps) {
  const { sheet, cut, solid } = ICON_SHAPES[name];
  return (
    <svg
      viewBox="0 0 24 24"
      className={`shrink-0 ${className}`}
      fill="none"
      stroke="currentColor"
      strokeWidth="1.75"
      strokeLinecap="square"
      strokeLinejoin="miter"
      strokeMiterlimit="3"
      role={label ? "img" : undefined}
      aria-label={label}
      aria-hidden={label ? undefined : true}
    >
      {sheet && <path d={sheet} fill="currentColor" fillOpacity="0.2" stroke="none" />}
      {solid && <path d={solid} fill="currentColor" stroke="none" />}
      {cut && <path d={cut} />}
    </svg>
  );
}

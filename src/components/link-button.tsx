import type { ReactNode, Ref } from "react";
import { Link, type LinkProps } from "react-router";
import { buttonClass, type ButtonLook, type ButtonSize } from "./button-styles.ts";
import { Icon, type IconName } from "./icon.tsx";

export interface LinkButtonProps extends Omit<LinkProps, "className" | "style" | "children"> {
  look?: ButtonLook;
  size?: ButtonSize;
  icon?: IconName;
  iconEnd?: IconName;
  className?: string;
  ref?: Ref<HTMLAnchorElement>;
  children: ReactNode;
}

/** A link to a page that looks like a button. Where several on a page read the same ("Look"), give each an `aria-label` that names its thing. */
export function LinkButton({
  look = "plain",
  size = "normal",
  icon,
  iconEnd,
  className,
  children,
  ...link
}: LinkButtonProps) {
  return (
    <Link {...link} className={buttonClass({ look, size, className })}>
      {icon && <Icon name={icon} />}
      {children}
      {iconEnd && <Icon name={iconEnd} />}
    </Link>
  );
}

import { useId, type Ref } from "react";
import { Button as PressButton, type ButtonProps as PressButtonProps } from "react-aria-components/Button";
import { joinClasses } from "./class-names.ts";
import { Icon, type IconName } from "./icon.tsx";
import { ReasonBubble } from "./reason-bubble.tsx";

export interface IconButtonProps extends Omit<
  PressButtonProps,
  "children" | "className" | "style" | "isDisabled" | "aria-label" | "ref"
> {
  icon: IconName;
  /** The word for it, always: assistive technology reads it. */
  label: string;
  /** `lamp` is the play button on dusk; `bare` takes the colour around it. */
  look?: "bare" | "lamp" | "rim";
  size?: "small" | "normal";
  /** For a switch: whether it is on. The label then names the state, not the act. */
  isPressed?: boolean;
  disabledReason?: string | null;
  className?: string;
  ref?: Ref<HTMLButtonElement>;
}

const LOOKS = {
  bare: "rounded-cut hover:bg-[rgb(130_145_200/0.18)]",
  lamp: "rounded-full bg-lamp text-on-lamp hover:bg-lamp-hover",
  rim: "rounded-cut border-[1.5px] border-rim bg-card hover:bg-well",
};

/** A button that is only an icon: for acts everybody knows from their place (play, close, previous). Put a Tooltip round the rarer ones. */
export function IconButton({
  icon,
  label,
  look = "bare",
  size = "normal",
  isPressed,
  disabledReason,
  className,
  ...press
}: IconButtonProps) {
  const reasonId = useId();
  const isRefused = Boolean(disabledReason);
  const button = (
    <PressButton
      {...press}
      {...(isRefused && { onPress: undefined, onClick: undefined, type: "button" as const })}
      aria-label={label}
      aria-pressed={isPressed}
      aria-disabled={isRefused || undefined}
      aria-describedby={isRefused ? reasonId : press["aria-describedby"]}
      className={joinClasses(
        "inline-grid aspect-square shrink-0 place-items-center active:translate-y-px",
        size === "small" ? "min-h-(--control-small) min-w-(--control-small)" : "min-h-(--control) min-w-(--control)",
        LOOKS[look],
        isRefused && "cursor-not-allowed opacity-60",
        className,
      )}
    >
      <Icon name={icon} />
    </PressButton>
  );
  if (!disabledReason) return button;
  return (
    <ReasonBubble id={reasonId} reason={disabledReason}>
      {button}
    </ReasonBubble>
  );
}

import { useId, type ReactNode, type Ref } from "react";
import { Button as PressButton, type ButtonProps as PressButtonProps } from "react-aria-components/Button";
import { buttonClass, type ButtonLook, type ButtonSize } from "./button-styles.ts";
import { joinClasses } from "./class-names.ts";
import { Icon, type IconName } from "./icon.tsx";
import { ReasonBubble } from "./reason-bubble.tsx";

export interface ButtonProps extends Omit<PressButtonProps, "children" | "className" | "style" | "isDisabled" | "ref"> {
  look?: ButtonLook;
  size?: ButtonSize;
  icon?: IconName;
  iconEnd?: IconName;
  /** Why it cannot be used now, as a sentence. The button stays in the tab order, says the reason, and does nothing. */
  disabledReason?: string | null;
  /** Id of text on the page that already says the reason; then no bubble is shown. */
  reasonId?: string;
  /** The act is under way: a turning mark beside the word, further presses do nothing. */
  isPending?: boolean;
  className?: string;
  ref?: Ref<HTMLButtonElement>;
  children: ReactNode;
}

/**
 * A button with a word on it. `onPress` for the act, `type="submit"` inside a form. Looks and sizes: button-styles.ts.
 * Never disable without a reason; where the work of a press takes time, pass `isPending`.
 */
export function Button({
  look = "plain",
  size = "normal",
  icon,
  iconEnd,
  disabledReason,
  reasonId,
  className,
  children,
  ...press
}: ButtonProps) {
  const ownReasonId = useId();
  const isRefused = Boolean(disabledReason ?? reasonId);
  const shown = press.isPending ? "turn" : icon;
  const button = (
    <PressButton
      {...press}
      {...(isRefused && {
        onPress: undefined,
        onPressStart: undefined,
        onPressEnd: undefined,
        onClick: undefined,
        type: "button" as const,
      })}
      aria-disabled={isRefused || undefined}
      aria-describedby={
        joinClasses(press["aria-describedby"], reasonId ?? (disabledReason ? ownReasonId : null)) || undefined
      }
      className={buttonClass({
        look,
        size,
        isRefused,
        className: joinClasses(press.isPending && "cursor-progress", className),
      })}
    >
      {shown && <Icon name={shown} className={joinClasses("size-[1.25em]", press.isPending && "animate-turn")} />}
      {children}
      {iconEnd && <Icon name={iconEnd} />}
    </PressButton>
  );
  if (!disabledReason || reasonId) return button;
  return (
    <ReasonBubble id={ownReasonId} reason={disabledReason}>
      {button}
    </ReasonBubble>
  );
}

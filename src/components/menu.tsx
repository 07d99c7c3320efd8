import { Menu as MenuList, MenuItem, MenuTrigger } from "react-aria-components/Menu";
import { Popover } from "react-aria-components/Popover";
import { Text } from "react-aria-components/Text";
import { Button } from "./button.tsx";
import type { ButtonLook, ButtonSize } from "./button-styles.ts";
import { joinClasses } from "./class-names.ts";
import { Icon, type IconName } from "./icon.tsx";
import { IconButton } from "./icon-button.tsx";

export interface MenuAction {
  id: string;
  label: string;
  icon?: IconName;
  onAction: () => void;
  /** stop: it destroys something (and opens a confirmation). */
  tone?: "plain" | "stop";
  /** Why it cannot be used now; shown under the label. */
  disabledReason?: string | null;
}

export interface MenuProps {
  /** The word on the button; with `isIconOnly` its name for assistive technology. */
  label: string;
  icon?: IconName;
  isIconOnly?: boolean;
  look?: ButtonLook;
  size?: ButtonSize;
  actions: MenuAction[];
  className?: string;
}

/** A button with a list of further acts: for what is used seldom. Arrow keys, first letters and Escape work. */
export function Menu({ label, icon, isIconOnly, look = "plain", size = "normal", actions, className }: MenuProps) {
  return (
    <MenuTrigger>
      {isIconOnly ? (
        <IconButton
          icon={icon ?? "more"}
          label={label}
          size={size === "small" ? "small" : "normal"}
          className={className}
        />
      ) : (
        <Button look={look} size={size} icon={icon} iconEnd="chevron-down" className={className}>
          {label}
        </Button>
      )}
      <Popover
        placement="bottom start"
        offset={4}
        className="min-w-(--trigger-width) rounded-sheet border border-line bg-card p-1.5 text-body text-ink shadow-sheet-2"
      >
        <MenuList
          className="max-h-80 overflow-y-auto outline-none"
          disabledKeys={actions.filter((action) => action.disabledReason).map((action) => action.id)}
        >
          {actions.map((action) => (
            <MenuItem
              key={action.id}
              id={action.id}
              textValue={action.label}
              onAction={action.onAction}
              className={joinClasses(
                "flex min-h-[max(var(--control-small),2rem)] cursor-pointer items-center gap-2.5 rounded-cut px-3 py-1 outline-none focus:bg-blue-tint focus:text-blue-ink focus-visible:outline-3 focus-visible:-outline-offset-2 focus-visible:outline-focus disabled:cursor-not-allowed disabled:text-slate",
                action.tone === "stop" && "text-rowan focus:bg-rowan-tint focus:text-rowan",
              )}
            >
              {action.icon && <Icon name={action.icon} />}
              <span>
                <Text slot="label">{action.label}</Text>
                {action.disabledReason && (
                  <Text slot="description" className="block text-meta">
                    {action.disabledReason}
                  </Text>
                )}
              </span>
            </MenuItem>
          ))}
        </MenuList>
      </Popover>
    </MenuTrigger>
  );
}

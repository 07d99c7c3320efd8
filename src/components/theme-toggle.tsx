import { useTheme } from "../hooks/use-theme.ts";
import { updateThemeChoice } from "../lib/theme.ts";
import { IconButton } from "./icon-button.tsx";

export interface ThemeToggleProps {
  className?: string;
}

/** Switches between the light and the dark theme and remembers it on this device. */
export function ThemeToggle({ className }: ThemeToggleProps) {
  const theme = useTheme();
  const next = theme === "dark" ? "light" : "dark";
  return (
    <IconButton
      icon="half"
      label="Dark theme"
      isPressed={theme === "dark"}
      onPress={() => updateThemeChoice(next)}
      className={className}
    />
  );
}

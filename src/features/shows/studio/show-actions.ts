import type { MenuAction } from "../../../components/menu.tsx";
import { enterFullScreen } from "../viewer/enter-full-screen.ts";
import { saveScript } from "./save-script.ts";
import type { OpenDialog } from "./studio-dialogs.tsx";

/** Words that ask for luck. */
const LUCK = /\b(?:roll|chance|oneOf|shuffled|random)\b/;

export interface ShowActionsOptions {
  readonly title: string;
  readonly source: string;
  readonly hasStage: boolean;
  readonly onOpen: (dialog: OpenDialog) => void;
  readonly onDealAgain: () => void;
}

/** What can be done with a show besides writing it: the class, files, luck. */
export function listShowActions({ title, source, hasStage, onOpen, onDealAgain }: ShowActionsOptions): MenuAction[] {
  const needsStage = hasStage ? null : "Nothing is on stage yet.";
  return [
    {
      id: "projector",
      label: "Full screen for the class",
      icon: "external",
      disabledReason: needsStage,
      onAction: () => {
        enterFullScreen();
        onOpen({ kind: "projector" });
      },
    },
    {
      id: "record",
      label: "Record a video",
      icon: "play",
      disabledReason: needsStage,
      onAction: () => onOpen({ kind: "record" }),
    },
    {
      id: "deal",
      label: "Deal again",
      icon: "swap",
      disabledReason: LUCK.test(source) ? null : "This script uses no luck: no roll, chance, oneOf or shuffled.",
      onAction: onDealAgain,
    },
    {
      id: "file",
      label: "Save the script as a file",
      icon: "download",
      onAction: () => saveScript(title, source),
    },
  ];
}

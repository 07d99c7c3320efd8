/** What a key does on the marking desk. */
export type DeskAction =
  | { readonly kind: "next" | "previous" | "comment" | "play" | "release" | "keys" }
  | { readonly kind: "level"; readonly level: number };

/** The keys as the desk explains them. */
export const DESK_KEYS: readonly {
  readonly keys: readonly string[];
  readonly does: string;
  readonly short: string | null;
}[] = [
  { keys: ["J"], does: "Next in the queue", short: "next" },
  { keys: ["K"], does: "Previous in the queue", short: "previous" },
  { keys: ["1", "2", "3", "4"], does: "Level of the marked criterion, then on to the next criterion", short: "level" },
  { keys: ["C"], does: "Comment on the moment that is playing", short: "comment here" },
  { keys: ["Space"], does: "Play and pause", short: "play" },
  { keys: ["G"], does: "Release the mark", short: "release" },
  { keys: ["?"], does: "Show these keys", short: "all keys" },
];

const ACTIONS: Readonly<Record<string, DeskAction>> = {
  j: { kind: "next" },
  k: { kind: "previous" },
  c: { kind: "comment" },
  g: { kind: "release" },
  "?": { kind: "keys" },
  "1": { kind: "level", level: 1 },
  "2": { kind: "level", level: 2 },
  "3": { kind: "level", level: 3 },
  "4": { kind: "level", level: 4 },
};

const WRITES =
  "input:not([type=radio]):not([type=checkbox]):not([type=range]), textarea, select, [contenteditable=true], [role=dialog], [role=alertdialog], [role=menu]";
const TAKES_SPACE = `${WRITES}, button, a, input, summary, [role=button]`;

/** The act that a key press asks for, or null: keys are text inside fields, and Space belongs to a button that has the focus. */
export function parseDeskKey(
  event: Pick<KeyboardEvent, "key" | "ctrlKey" | "metaKey" | "altKey" | "target">,
): DeskAction | null {
  if (event.ctrlKey || event.metaKey || event.altKey) return null;
  const target = event.target instanceof Element ? event.target : null;
  if (event.key === " ") return target?.closest(TAKES_SPACE) ? null : { kind: "play" };
  if (target?.closest(WRITES)) return null;
  return ACTIONS[event.key.toLowerCase()] ?? null;
}

/**
 * The script that a new show starts with: it runs as it stands, lights something and is short enough
 * to be read at once.
 */
export function firstScript(songTitle: string): string {
  return [
    `// A show for "${songTitle}". Press Run and watch the square.`,
    "// Then change a number or a colour and run it again.",
    'square.all.pulse(4, "gold");',
    "",
  ].join("\n");
}

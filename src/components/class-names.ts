/** Joins class names with spaces, leaving out what is empty or false. */
export function joinClasses(...names: (string | false | null | undefined)[]): string {
  return names.filter(Boolean).join(" ");
}

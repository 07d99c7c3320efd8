/**
 * Tells whether most of an earlier text is still there: what both share at their start and at their end is
 * half of the earlier one or more. An edit anywhere passes; a script that was deleted or replaced does not.
 */
export function isSameText(earlier: string, later: string): boolean {
  const most = Math.min(earlier.length, later.length);
  let start = 0;
  while (start < most && earlier[start] === later[start]) start++;
  let end = 0;
  while (end < most - start && earlier[earlier.length - 1 - end] === later[later.length - 1 - end]) end++;
  return (start + end) * 2 >= earlier.length;
}

/** Longer than this, only what comes first is read at once. */
const mostAtOnce = 150;

/**
 * A long text as its first sentence and the rest of it; the whole and "" when it is short or one sentence. A full stop
 * before a figure or a small letter, as in "No. 6", ends nothing.
 */
export function shortAndRest(text: string): { readonly short: string; readonly rest: string } {
  if (text.length <= mostAtOnce) return { short: text, rest: "" };
  const end = /[.!?]”? (?=[\p{Lu}“])/u.exec(text);
  if (end === null) return { short: text, rest: "" };
  const at = end.index + end[0].length;
  return { short: text.slice(0, at).trimEnd(), rest: text.slice(at) };
}

/** Class names joined by spaces; what is false, null or empty is left out. */
export function cx(...names: readonly (string | false | null | undefined)[]): string {
  return names.filter(Boolean).join(" ");
}

/** A reason to stop that the person at the terminal can mend: it is printed as its words alone, without a stack. */
export class Problem extends Error {}

/**
 * The code of a system error ("ENOENT", "EADDRINUSE"), or undefined for anything else that was thrown.
 * @param {unknown} error
 * @returns {string | undefined}
 */
export function errorCode(error) {
  return error instanceof Error && "code" in error ? String(error.code) : undefined;
}

/** Whether two values hold the same plain data: objects and lists are compared by what is in them. */
export function isSame(a: unknown, b: unknown): boolean {
  if (Object.is(a, b)) return true;
  if (typeof a !== "object" || typeof b !== "object" || a === null || b === null) return false;
  if (Array.isArray(a) !== Array.isArray(b)) return false;
  const keys = Object.keys(a);
  if (keys.length !== Object.keys(b).length) return false;
  return keys.every(
    (key) => key in b && isSame((a as Record<string, unknown>)[key], (b as Record<string, unknown>)[key]),
  );
}

/** `thing` with some fields set; `thing` itself when they hold those values already. */
export function withFields<T extends object>(thing: T, fields: Partial<T>): T {
  const next = { ...thing, ...fields };
  return isSame(thing, next) ? thing : next;
}

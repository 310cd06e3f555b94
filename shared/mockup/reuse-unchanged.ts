/**
 * `next` with every part that equals its counterpart in `previous` replaced by that very part, so that what was computed
 * of it can be found again. For plain data: objects, lists, texts, numbers, booleans and null. List items are matched by
 * their `id` or `key` where they have one, else by place.
 */
export function reuseUnchanged<T>(previous: unknown, next: T): T {
  if (isSameData(previous, next)) return previous as T;
  if (!isPart(next) || !isPart(previous) || Array.isArray(previous) !== Array.isArray(next)) return next;
  if (Array.isArray(next) && Array.isArray(previous)) {
    const counterpart = counterpartsIn(previous);
    return next.map((item, index) => reuseUnchanged(counterpart(item, index), item)) as T;
  }
  return Object.fromEntries(Object.keys(next).map((key) => [key, reuseUnchanged(previous[key], next[key])])) as T;
}

type Part = object & Record<string, unknown>;

const isPart = (value: unknown): value is Part => typeof value === "object" && value !== null;

function isSameData(a: unknown, b: unknown): boolean {
  if (Object.is(a, b)) return true;
  if (!isPart(a) || !isPart(b)) return false;
  if (Array.isArray(a))
    return Array.isArray(b) && a.length === b.length && a.every((item, index) => isSameData(item, b[index]));
  if (Array.isArray(b)) return false;
  let keys = 0;
  for (const key in a) {
    keys += 1;
    if (!isSameData(a[key], b[key])) return false;
  }
  return keys === Object.keys(b).length;
}

function counterpartsIn(previous: readonly unknown[]): (item: unknown, index: number) => unknown {
  const named = new Map<unknown, unknown>();
  for (const item of previous) {
    const name = nameOf(item);
    if (name !== undefined) named.set(name, item);
  }
  return (item, index) => {
    const name = nameOf(item);
    return name === undefined ? previous[index] : named.get(name);
  };
}

function nameOf(item: unknown): unknown {
  return isPart(item) ? (item.id ?? item.key) : undefined;
}

import type { Shift } from "./shifts.ts";

const nowhere: Shift = { dx: 0, dy: 0 };
/** Far less than is seen, mm: what adding up leaves. */
const hairMm = 1e-6;

/** What moved between two sets of shifts, all of it by the same distance; null when there are several distances. */
export function movedTogether(
  before: ReadonlyMap<string, Shift>,
  after: ReadonlyMap<string, Shift>,
): { readonly ids: ReadonlySet<string>; readonly by: Shift } | null {
  const ids = new Set<string>();
  let by = nowhere;
  for (const id of new Set([...before.keys(), ...after.keys()])) {
    const [from, to] = [before.get(id) ?? nowhere, after.get(id) ?? nowhere];
    const own = { dx: to.dx - from.dx, dy: to.dy - from.dy };
    if (isSame(own, nowhere)) continue;
    if (ids.size === 0) by = own;
    else if (!isSame(own, by)) return null;
    ids.add(id);
  }
  return { ids, by };
}

const isSame = (a: Shift, b: Shift) => Math.abs(a.dx - b.dx) < hairMm && Math.abs(a.dy - b.dy) < hairMm;

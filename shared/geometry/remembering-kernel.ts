import type { Kernel } from "./kernel.ts";
import type { Region } from "./path.ts";

/** A kernel that keeps what it computed for the very same rings and objects, as long as each run asks for it again. */
export type RememberingKernel = Kernel & {
  /** Begins a run: what the run before did not ask for is forgotten. */
  readonly startRun: () => void;
};

/**
 * Answers again what was asked before about the very same objects, so that a run after a small change costs what changed.
 * Nothing that was handed in may be altered afterwards; what is given back is shared.
 */
export function rememberingKernel(kernel: Kernel): RememberingKernel {
  const ids = new WeakMap<object, number>();
  let nextId = 0;
  let fresh = new Map<string, unknown>();
  let previous = new Map<string, unknown>();

  const idOf = (thing: object): number => {
    const known = ids.get(thing);
    if (known !== undefined) return known;
    nextId += 1;
    ids.set(thing, nextId);
    return nextId;
  };
  // An empty list is empty whoever made it; any other is told by its rings, so that joined lists are known again.
  const ringsOf = (region: Region): string => region.map(idOf).join(" ");
  const kept = <T>(key: string, make: () => T): T => {
    const store = fresh.has(key) ? fresh : previous.has(key) ? previous : null;
    const value = store === null ? make() : (store.get(key) as T);
    if (store !== fresh) fresh.set(key, value);
    return value;
  };

  return {
    union: (region, rule) => kept(`u${rule} ${ringsOf(region)}`, () => kernel.union(region, rule)),
    intersect: (a, b) => kept(`i ${ringsOf(a)}|${ringsOf(b)}`, () => kernel.intersect(a, b)),
    difference: (a, b) => kept(`d ${ringsOf(a)}|${ringsOf(b)}`, () => kernel.difference(a, b)),
    offset: (region, distanceMm, join) =>
      kept(`o${join} ${distanceMm} ${ringsOf(region)}`, () => kernel.offset(region, distanceMm, join)),
    strokeOutline: kernel.strokeOutline,
    remember: (of, what, make) => kept(`${what} ${of.map(idOf).join(" ")}`, make),
    startRun: () => {
      previous = fresh;
      fresh = new Map();
    },
  };
}

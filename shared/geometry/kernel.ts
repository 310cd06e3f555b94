import type { Region } from "./path.ts";

export type FillRule = "evenodd" | "nonzero";
export type Join = "round" | "mitre";
export type Cap = "butt" | "round" | "square";

/**
 * Polygon booleans and offsets in mm, on a grid of 0.001 mm. The kernel is WebAssembly that must load first
 * (server/artwork and src/lib load it), so the pure modules take it as an argument.
 * Every result is a set of non-crossing rings to be read by the even-odd rule. Empty in, empty out.
 */
export type Kernel = {
  /** Joins all rings of `region`, read by `rule`, into non-crossing rings. */
  readonly union: (region: Region, rule: FillRule) => Region;
  readonly intersect: (a: Region, b: Region) => Region;
  readonly difference: (a: Region, b: Region) => Region;
  /** Grows (positive) or shrinks (negative) a region that went through `union` before. Arc tolerance 0.01 mm, mitre limit 4. */
  readonly offset: (region: Region, distanceMm: number, join: Join) => Region;
  /** The area an open or closed line covers when drawn with a pen of `widthMm`. Points marked `smooth` are joined round whatever the join. */
  readonly strokeOutline: (
    line: readonly { readonly x: number; readonly y: number; readonly smooth?: boolean }[],
    options: { closed: boolean; widthMm: number; join: Join | "bevel"; cap: Cap; mitreLimit: number },
  ) => Region;
  /** A kernel that remembers gives back what was made before of the very same objects under the same name. */
  readonly remember?: <T>(of: readonly object[], what: string, make: () => T) => T;
};

/** What `make` gives, or what it gave before where the kernel remembers. Whatever it depends on must stand in `of` or `what`. */
export function remembered<T>(kernel: Kernel, of: readonly object[], what: string, make: () => T): T {
  return kernel.remember ? kernel.remember(of, what, make) : make();
}

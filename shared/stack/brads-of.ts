import { type Kernel, remembered } from "../geometry/kernel.ts";
import type { Point } from "../geometry/path.ts";
import type { MockupDocument } from "../mockup/document.ts";
import { type BradMap, bradMap, bradSpacing } from "../slats/brad-map.ts";
import type { SlatLayout } from "../slats/slat-layout.ts";
import type { Outcome } from "../units/outcome.ts";

/** Everything that is screwed through a sign's slats: its standoffs, and the wall's fixings where they pass the board. */
export function screwPlaces({ layers, hanging }: Pick<MockupDocument, "layers" | "hanging">): Point[] {
  const standoffs = layers.flatMap(({ hold }) => (hold.kind === "standoff" ? hold.holes : []));
  const passes = hanging.kind === "screwed through" || hanging.kind === "through standoffs";
  return [...standoffs, ...(passes ? hanging.points : [])].map(({ x, y }) => ({ x, y }));
}

/** Where the brads of a sign's slats go: they keep off the trim line by `trim`, and give way to screws by `barrel`, mm. */
export function bradsOf(
  document: Pick<MockupDocument, "layers" | "hanging">,
  layout: SlatLayout,
  { trim, barrel }: { readonly trim: number; readonly barrel: number },
  kernel: Kernel,
): Outcome<BradMap> {
  const places = screwPlaces(document);
  const what = `brads ${trim} ${barrel} ${places.map(({ x, y }) => `${x} ${y}`).join(", ")}`;
  return remembered(kernel, [layout], what, () => bradMap(layout, places, kernel, { ...bradSpacing, trim, barrel }));
}

import { usualOffsetMm } from "#shared/hardware/standoff-parts.ts";
import type { Acrylic, Adhesive, Hardware, Hold, Layer, MockupDocument, Piece } from "#shared/mockup/document.ts";
import { nameOf } from "../limits.ts";
import { propose, type Site } from "../propose-holes.ts";

/** How a new layer is to be held: what it is bonded or let in with, or what it stands on. */
export type HoldChoice =
  | { readonly kind: "bond" | "pocket"; readonly adhesive: Adhesive }
  | { readonly kind: "standoff"; readonly hardware: Hardware };

export type NewLayer = {
  readonly name: string;
  readonly stock: Acrylic;
  readonly thickness: number;
  readonly hold: HoldChoice;
};

/** A layer from what was chosen for it. Hole ids are made from `id`. */
export function newLayer(
  { name, stock, thickness, hold }: NewLayer,
  { key, pieces, id, ...where }: { key: string; pieces: Piece[]; id: string; document: MockupDocument; site: Site },
): Layer {
  const bare: Layer = {
    key,
    name: nameOf(name) ?? `Layer ${key}`,
    stock,
    thickness,
    hold: startOfHold(hold, thickness),
    locate: usualLocate[hold.kind],
    marked: "not stated",
    pieces,
    hidden: false,
    locked: false,
  };
  if (hold.kind !== "standoff" || bare.hold.kind !== "standoff") return bare;
  return { ...bare, hold: { ...bare.hold, holes: propose(bare, { hardware: hold.hardware, id, ...where }) } };
}

/** How the hand finds the place of a layer that is held so, until the maker says otherwise. */
const usualLocate = { bond: "none", pocket: "pocket", standoff: "hole pattern" } as const;

/** Half its thickness, in half millimetres: deep enough to hold, and it still stands out of what it is let into. */
const usualPocketDepthMm = (thickness: number): number => Math.max(0.5, Math.round(thickness) / 2);
const usualClearanceMm = 0.1;

/** The hold that a choice begins with; a standoff layer without holes yet. */
export function startOfHold(choice: HoldChoice, thickness: number): Hold {
  switch (choice.kind) {
    case "bond":
      return { kind: "bond", adhesive: choice.adhesive, tack: null };
    case "pocket":
      return {
        kind: "pocket",
        adhesive: choice.adhesive,
        depth: usualPocketDepthMm(thickness),
        clearance: usualClearanceMm,
        cut: "engraved",
        bitRadius: 0,
      };
    case "standoff":
      return { kind: "standoff", hardware: choice.hardware, offset: usualOffsetMm(choice.hardware), holes: [] };
  }
}

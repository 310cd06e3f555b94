import { usualOffsetMm } from "#shared/hardware/standoff-parts.ts";
import type { Acrylic, Adhesive, Hardware, Layer, MockupDocument, Piece } from "#shared/mockup/document.ts";
import { nameOf } from "../limits.ts";
import { propose, type Site } from "../propose-holes.ts";

/** How a new layer is to be held: what it is bonded with, or what it stands on. */
export type HoldChoice =
  | { readonly kind: "bond"; readonly adhesive: Adhesive }
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
    hold:
      hold.kind === "bond"
        ? { kind: "bond", adhesive: hold.adhesive, tack: null }
        : { kind: "standoff", hardware: hold.hardware, offset: usualOffsetMm(hold.hardware), holes: [] },
    locate: hold.kind === "bond" ? "none" : "hole pattern",
    marked: "not stated",
    pieces,
    hidden: false,
  };
  if (hold.kind === "bond" || bare.hold.kind !== "standoff") return bare;
  return { ...bare, hold: { ...bare.hold, holes: propose(bare, { hardware: hold.hardware, id, ...where }) } };
}

import type { Acrylic, Adhesive, CapStud, Hold, Layer, Piece } from "#shared/mockup/document.ts";
import { nameOf } from "../limits.ts";
import { propose } from "../propose-holes.ts";

/** How a new layer is to be held: what it is bonded with, or what it stands on. */
export type HoldChoice =
  | { readonly kind: "bond"; readonly adhesive: Adhesive }
  | { readonly kind: "standoff"; readonly hardware: CapStud };

export type NewLayer = {
  readonly name: string;
  readonly stock: Acrylic;
  readonly thickness: number;
  readonly hold: HoldChoice;
};

/** A layer from what was chosen for it. Hole ids are made from `id`. */
export function newLayer(key: string, { name, stock, thickness, hold }: NewLayer, pieces: Piece[], id: string): Layer {
  const bare: Layer = {
    key,
    name: nameOf(name) ?? `Layer ${key}`,
    stock,
    thickness,
    hold:
      hold.kind === "bond"
        ? hold
        : { kind: "standoff", hardware: hold.hardware, offset: hold.hardware.barrelLength, holes: [] },
    locate: hold.kind === "bond" ? "none" : "hole pattern",
    pieces,
    hidden: false,
  };
  if (hold.kind === "bond") return bare;
  const held: Hold = {
    kind: "standoff",
    hardware: hold.hardware,
    offset: hold.hardware.barrelLength,
    holes: propose(bare, { hardware: hold.hardware, id }),
  };
  return { ...bare, hold: held };
}

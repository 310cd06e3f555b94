import type { Acrylic, MockupDocument, Slats, Wood } from "#shared/mockup/document.ts";
import { orreryBooks } from "./orrery-books.ts";

const wood = (name: string, colour: string): Wood => ({ ...orreryBooks().backer.stock, name, colour });
export const pine = wood("Eastern white pine", "#E6CFA4");
export const walnut = wood("Black walnut", "#5C4033");
const ply = wood("Birch plywood", "#DCC9A0");

/** Pine slats of 38 mm at 45 degrees, mitred to a spine. */
export const chevron: Slats = {
  stock: pine,
  thickness: 8,
  pattern: "spine",
  angle: 45,
  slatWidth: 38,
  gap: 0,
  spineWidth: 38,
  spineOffset: 0,
  start: { kind: "corner" },
  direction: "up",
  overhang: 30,
};

/** "Orrery Books" on slats over 12 mm plywood, bare wood; with another sign's parts where they are given. */
export function slatSign(slats: Partial<Slats> = {}, rest: Partial<MockupDocument> = {}): MockupDocument {
  const sign = orreryBooks();
  return {
    ...sign,
    backer: { ...sign.backer, stock: ply, thickness: 12, slats: { ...chevron, ...slats }, finish: [] },
    ...rest,
  };
}

/** A walnut frame round it, 18 mm wide. */
export const walnutFrame: NonNullable<MockupDocument["frame"]> = { stock: walnut, width: 18, depth: 24, mitred: true };

/** A framed sign on slats, its disc, rings, sun and letters each of another look: opaque, mirror, frosted and clear. */
export function everyLook(): MockupDocument {
  const sign = slatSign({ gap: 3 }, { frame: walnutFrame });
  const looks: Readonly<Record<string, Partial<Acrylic>>> = {
    C: { look: "mirror", colour: "#C79A3A" },
    D: { look: "frosted" },
    E: { look: "clear", colour: "#E4EEF0" },
    G: { look: "mirror", colour: "#C4C8CC" },
  };
  const layers = sign.layers.map((layer) => ({ ...layer, stock: { ...layer.stock, ...looks[layer.key] } }));
  return { ...sign, layers };
}

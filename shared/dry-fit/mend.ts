import type { Acrylic, Adhesive, Hardware, Layer, Piece, Screw, Slats } from "../mockup/document.ts";
import type { LayerSplit } from "../mockup/split-layer.ts";

/** One change of the document. Coordinates and lengths mm. */
export type MendStep =
  | { readonly kind: "hole diameter"; readonly layerKey: string; readonly holeId: string; readonly diameter: number }
  | {
      readonly kind: "hole place";
      readonly layerKey: string;
      readonly holeId: string;
      readonly x: number;
      readonly y: number;
    }
  | { readonly kind: "fixed hole"; readonly layerKey: string; readonly holeId: string }
  | { readonly kind: "offset"; readonly layerKey: string; readonly offset: number }
  | { readonly kind: "hardware"; readonly layerKey: string; readonly hardware: Hardware; readonly offset: number }
  | { readonly kind: "screw"; readonly layerKey: string; readonly screw: Screw }
  | { readonly kind: "adhesive"; readonly layerKey: string; readonly adhesive: Adhesive }
  | { readonly kind: "tack"; readonly layerKey: string; readonly tack: Adhesive | null }
  | { readonly kind: "locate"; readonly layerKey: string; readonly locate: Layer["locate"] }
  | { readonly kind: "marked"; readonly layerKey: string; readonly marked: Layer["marked"] }
  | { readonly kind: "stock"; readonly layerKey: string; readonly stock: Acrylic }
  | { readonly kind: "thickness"; readonly layerKey: string; readonly thickness: number }
  | { readonly kind: "pocket"; readonly layerKey: string; readonly depth: number; readonly clearance: number }
  | { readonly kind: "move pieces"; readonly pieceIds: readonly string[]; readonly dx: number; readonly dy: number }
  | { readonly kind: "drop pieces"; readonly pieceIds: readonly string[] }
  | { readonly kind: "reads"; readonly pieceId: string; readonly reads: string }
  /** Puts parts in the place of a piece, cut out of it where it lies. Their ids are new. */
  | {
      readonly kind: "split piece";
      readonly pieceId: string;
      readonly parts: readonly Pick<Piece, "id" | "path" | "placement">[];
    }
  | { readonly kind: "slat start"; readonly start: Slats["start"] }
  | { readonly kind: "frame depth"; readonly depth: number }
  /** Takes the pieces out of their layer into a new one of the same stock next to it, bonded when an adhesive is given. */
  | ({ readonly kind: "split layer" } & LayerSplit);

/** What a press does about a finding: one entry in the history, whatever its steps. */
export type Mend = { readonly label: string; readonly steps: readonly MendStep[] };

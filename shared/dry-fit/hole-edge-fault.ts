import { isShorter } from "../geometry/tolerance.ts";
import { holeEdge } from "../hardware/hole-edge.ts";
import { passesPanel } from "../hardware/standoff-parts.ts";
import type { Hole } from "../mockup/document.ts";
import type { PieceFigures } from "../stack/figures.ts";
import { holdsPiece } from "../stack/held-piece.ts";
import type { Limits } from "./limits.ts";
import type { StandoffLayer } from "./standoff-layers.ts";

/** What is wrong with a standoff's place in its piece, measures in mm. */
export type HoleEdgeFault =
  | { readonly kind: "in no piece" }
  | {
      readonly kind: "centre" | "web" | "pad";
      readonly hasMm: number;
      readonly needsMm: number;
      readonly piece: PieceFigures;
    };

/**
 * What is wrong with a standoff's place in the piece it holds: a hole too near an edge or another hole, a hidden stud
 * whose foot looks out beside the panel, or a place where it holds nothing. An edge grip needs only to reach the edge.
 */
export function holeEdgeFault(
  { hold, layer, pieces }: Pick<StandoffLayer, "hold" | "layer" | "pieces">,
  hole: Hole,
  limits: Limits,
): HoleEdgeFault | null {
  const { hardware } = hold;
  if (hardware.kind === "edgeGrip") {
    return pieces.some(({ region }) => holdsPiece(hardware, region, hole)) ? null : { kind: "in no piece" };
  }
  const others = hold.holes.filter((other) => other.id !== hole.id);
  for (const piece of pieces) {
    const edge = holeEdge(hole, piece.region, others);
    if (!edge) continue;
    if (!passesPanel(hardware)) {
      const needsMm = hardware.barrelDiameter / 2;
      return isShorter(edge.centreMm, needsMm) ? { kind: "pad", hasMm: edge.centreMm, needsMm, piece } : null;
    }
    const nearest = limits.edgeDiameters * hole.diameter;
    const web = limits.webThicknesses * layer.thickness;
    if (isShorter(edge.centreMm, nearest)) return { kind: "centre", hasMm: edge.centreMm, needsMm: nearest, piece };
    if (isShorter(edge.webMm, web)) return { kind: "web", hasMm: edge.webMm, needsMm: web, piece };
    return null;
  }
  return { kind: "in no piece" };
}

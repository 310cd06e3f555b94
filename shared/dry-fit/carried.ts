import { regionAreaMm2 } from "../geometry/area.ts";
import { boxesOverlap } from "../geometry/box.ts";
import { regionContains } from "../geometry/contains.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Layer } from "../mockup/document.ts";
import type { PieceFigures } from "../stack/figures.ts";
import type { RuleInput } from "./rule.ts";
import { layersWithFigures } from "./words.ts";

/** What a piece weighs with everything on it, and how high that lies, mm above the back of the board. */
export type Carried = { readonly massG: number; readonly heightMm: number };

/**
 * What each piece carries, itself included, by its id. What lies on several things weighs on the highest of them, and of
 * pieces of one layer on the one that it covers most of.
 */
export function carriedMasses(input: Pick<RuleInput, "document" | "figures" | "kernel">): ReadonlyMap<string, Carried> {
  const layers = layersWithFigures(input).map(({ layer, pieces }) => ({
    layer,
    pieces: pieces.map(({ figures }) => figures),
  }));
  const carried = new Map<string, Carried>();
  const add = (id: string, more: Carried) => {
    const { massG, heightMm } = carried.get(id) ?? { massG: 0, heightMm: 0 };
    const sum = massG + more.massG;
    carried.set(id, {
      massG: sum,
      heightMm: sum > 0 ? (massG * heightMm + more.massG * more.heightMm) / sum : more.heightMm,
    });
  };
  for (const { layer, pieces } of layers.toReversed()) {
    for (const piece of pieces) {
      add(piece.pieceId, { massG: piece.massG, heightMm: (piece.bottom.nominal + piece.top.nominal) / 2 });
      const below = layers.find((other) => other.layer.key === piece.restsOn[0]);
      const carrier = below && carrierOf(piece, layer, below.pieces, input.kernel);
      if (carrier) add(carrier.pieceId, carried.get(piece.pieceId) ?? { massG: 0, heightMm: 0 });
    }
  }
  return carried;
}

function carrierOf(
  piece: PieceFigures,
  { hold }: Layer,
  below: readonly PieceFigures[],
  kernel: Kernel,
): PieceFigures | null {
  const near = below.filter((other) => boxesOverlap(other.box, piece.box));
  if (near.length <= 1) return near[0] ?? null;
  const onIt = (other: PieceFigures): number =>
    hold.kind === "standoff"
      ? hold.holes.filter((hole) => regionContains(other.region, hole)).length
      : regionAreaMm2(kernel.intersect(piece.region, other.region));
  const shares = near.map((other) => ({ other, share: onIt(other) }));
  return shares.reduce((most, one) => (one.share > most.share ? one : most)).other;
}

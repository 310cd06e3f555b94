import type { Surface } from "../bonds/adhesive-families.ts";
import { backSurface, woodSurface } from "../bonds/surfaces.ts";
import { lengthsEqual } from "../geometry/tolerance.ts";
import type { Hold, Layer, MockupDocument, Piece } from "../mockup/document.ts";
import type { PieceFigures } from "../stack/figures.ts";
import type { RuleInput } from "./rule.ts";
import { layersWithFigures } from "./words.ts";

/** A hold that glues. */
export type GluedHold = Exclude<Hold, { kind: "standoff" }>;
export type GluedLayer = Layer & { readonly hold: GluedHold };
export type PieceWithFigures = { readonly piece: Piece; readonly figures: PieceFigures };

/** Pieces of a layer that are glued to one thing under it; `under` is null for the backer. */
export type Joint = { readonly under: Layer | null; readonly pieces: readonly PieceWithFigures[] };
export type JoinedLayer = { readonly layer: GluedLayer; readonly joints: readonly Joint[] };

/**
 * Layers that are bonded or let in, each with what its pieces are glued to, from the wall outward. A piece across two
 * things of one height is in both joints; one that covers nothing, or lies on nothing, in none.
 */
export function joinedLayers(input: Pick<RuleInput, "document" | "figures">): JoinedLayer[] {
  const { document, figures } = input;
  const tops = new Map<string, number[]>([["A", [figures.backerTop.nominal]]]);
  for (const { layerKey, top } of figures.pieces) tops.set(layerKey, [...(tops.get(layerKey) ?? []), top.nominal]);
  return layersWithFigures(input).flatMap(({ layer, pieces }): JoinedLayer[] => {
    if (!isGlued(layer)) return [];
    const depth = layer.hold.kind === "pocket" ? layer.hold.depth : 0;
    const byKey = new Map<string, PieceWithFigures[]>();
    for (const one of pieces) {
      if (one.figures.areaMm2 === 0) continue;
      const face = one.figures.bottom.nominal + depth;
      for (const key of one.figures.restsOn) {
        if (!tops.get(key)?.some((top) => lengthsEqual(top, face))) continue;
        byKey.set(key, [...(byKey.get(key) ?? []), one]);
      }
    }
    const joints = [...byKey].map(([key, glued]) => ({ under: layerOf(document, key), pieces: glued }));
    return joints.length > 0 ? [{ layer, joints }] : [];
  });
}

export function isGlued(layer: Layer): layer is GluedLayer {
  return layer.hold.kind !== "standoff";
}

const layerOf = (document: MockupDocument, key: string): Layer | null =>
  document.layers.find((layer) => layer.key === key) ?? null;

/** The two surfaces that an adhesive meets. What a pocket is cut into is bare, whatever its face has on it. */
export function surfacesOf(
  layer: GluedLayer,
  under: Layer | null,
  { backer }: Pick<MockupDocument, "backer">,
): readonly [Surface, Surface] {
  const finish = layer.hold.kind === "pocket" ? [] : backer.finish;
  return [backSurface(layer.stock), under ? "acrylic" : woodSurface(finish)];
}

/** The pieces of several joints, each once, though it lie on two things. */
export function piecesOf(joints: readonly Joint[]): PieceWithFigures[] {
  return [...new Map(joints.flatMap(({ pieces }) => pieces).map((one) => [one.piece.id, one])).values()];
}

/** What glues a layer, in the order it goes on. */
export function adhesivesOf({ hold }: GluedLayer): GluedHold["adhesive"][] {
  return hold.kind === "bond" && hold.tack ? [hold.tack, hold.adhesive] : [hold.adhesive];
}

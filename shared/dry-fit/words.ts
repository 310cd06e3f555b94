import type { Layer, Piece } from "../mockup/document.ts";
import type { PieceFigures } from "../stack/figures.ts";
import type { RuleInput } from "./rule.ts";

/** Layers with their pieces and the pieces' figures, in document order. */
export function layersWithFigures(input: Pick<RuleInput, "document" | "figures">): {
  readonly layer: Layer;
  readonly level: number;
  readonly pieces: readonly { piece: Piece; figures: PieceFigures }[];
}[] {
  const byId = new Map(input.figures.pieces.map((figures) => [figures.pieceId, figures]));
  return input.document.layers.map((layer, level) => ({
    layer,
    level,
    pieces: layer.pieces.flatMap((piece) => {
      const figures = byId.get(piece.id);
      return figures ? [{ piece, figures }] : [];
    }),
  }));
}

/** A piece in a sentence: its name, or its layer's. */
export function pieceWords(layer: Layer, piece: Piece): string {
  return piece.name ? `${piece.name} (${layer.key})` : `A piece of ${layer.key}, ${layer.name},`;
}

export const layerWords = (layer: Layer): string => `${layer.key}, ${layer.name}`;

export const percentWords = (share: number): string => `${Number((share * 100).toFixed(1))} %`;

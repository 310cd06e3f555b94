import { penumbraMm, shadowDirection, shadowOffsetMm, sigmaOfWidth } from "#shared/drawing/light.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { Figures } from "#shared/stack/figures.ts";

/** A shadow as a canvas throws it: moved by dx, dy and blurred, all mm. `blur` is twice sigma, as canvases count it. */
export type CastShadow = { readonly dx: number; readonly dy: number; readonly blur: number };

/**
 * A rough shadow for each shown piece, on what it stands over, for the time in which it is dragged. The true ones, cut per
 * level, come with the next picture.
 */
export function castShadows(document: MockupDocument, figures: Figures): ReadonlyMap<string, CastShadow> {
  const { light } = document.presentation;
  const fall = shadowDirection(light);
  const rises = new Map(
    document.layers
      .filter(({ hidden, stock }) => !hidden && stock.look !== "clear")
      .map(({ key, hold }) => [key, hold.kind === "standoff" ? hold.offset : 0]),
  );
  return new Map(
    figures.pieces.flatMap(({ pieceId, layerKey, bottom, top }): [string, CastShadow][] => {
      const rise = rises.get(layerKey);
      if (rise === undefined) return [];
      const height = top.nominal - bottom.nominal + rise;
      const away = shadowOffsetMm(height, light);
      const { along, across } = penumbraMm(height, light);
      return [[pieceId, { dx: fall.x * away, dy: fall.y * away, blur: sigmaOfWidth(along) + sigmaOfWidth(across) }]];
    }),
  );
}

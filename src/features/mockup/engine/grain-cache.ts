import type { DisplayList, Item } from "#shared/drawing/display-list.ts";
import { faceColour } from "#shared/drawing/face-colour.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { faceStock } from "#shared/stack/backer.ts";

type Texture = { readonly pngBase64: string };

export type GrainCache = {
  readonly find: (document: MockupDocument) => Texture | undefined;
  /** Takes the grain out of a picture that was made of a document. */
  readonly keep: (document: MockupDocument, elevation: DisplayList) => void;
};

/** The grain of the board that was drawn last: it costs half of a picture and changes only with the board. */
export function createGrainCache(): GrainCache {
  let kept: { readonly name: string; readonly texture: Texture } | null = null;
  return {
    find: (document) => (kept?.name === nameOf(document) ? kept.texture : undefined),
    keep: (document, elevation) => {
      const texture = grainIn(elevation.items);
      if (texture) kept = { name: nameOf(document), texture };
    },
  };
}

/** All that the grain depends on. */
function nameOf({ board, backer }: MockupDocument): string {
  return [
    board.width,
    board.height,
    faceColour(backer),
    faceStock(backer).name,
    backer.grainTurn,
    JSON.stringify(backer.slats),
  ].join("|");
}

/** The image that is clipped to the board, right after the board itself; undefined when the picture has none. */
function grainIn(items: readonly Item[]): Texture | undefined {
  for (const [index, item] of items.entries()) {
    if (item.kind === "group") {
      const within = grainIn(item.items);
      if (within) return within;
    }
    const next = items[index + 1];
    if (item.kind !== "path" || item.id !== "board" || next?.kind !== "clip") continue;
    return next.items.find((face) => face.kind === "image");
  }
  return undefined;
}

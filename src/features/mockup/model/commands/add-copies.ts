import type { Hole, Layer, Lettering, MockupDocument, Piece } from "#shared/mockup/document.ts";
import { mostHoles, mostLettering, mostPieces } from "../limits.ts";
import { fitDiameters, type Site } from "../propose-holes.ts";
import { holesWithin, type Motion, movableOf, movedHole, placementAfter } from "./piece-motion.ts";

export type Copies = {
  readonly pieceIds: readonly string[];
  /** One for each copy of them all. */
  readonly motions: readonly Motion[];
  /** Ids of pieces, holes and lettering are made from it. */
  readonly id: string;
  readonly withHoles: boolean;
  readonly site: Site;
};

/** The ids of the pieces of one copy of as many pieces, counted from 0. */
export function idsOfCopy(id: string, copy: number, count: number): string[] {
  return Array.from({ length: count }, (_, index) => `${id}-${copy * count + index + 1}`);
}

/**
 * Adds copies of pieces to their own layers, over the pieces that are there, each copy moved by its motion. A copied letter
 * gets words of its own, so that either can be set anew alone. Standoff holes in the pieces are copied if so wished; none
 * of the copies is the fixed one. Pieces of locked layers are not copied. Nothing happens when the copies are more than a
 * document takes, one would lie further off than it can, or they were made before.
 */
export function addCopies(document: MockupDocument, copies: Copies): MockupDocument {
  const { motions, id } = copies;
  const pieceIds = movableOf(document, copies.pieceIds);
  if (pieceIds.length === 0 || motions.length === 0) return document;
  const chosen = new Set(pieceIds);
  const words = motions.map((_, copy) => copiedWords(document, chosen, `${id}-l${copy + 1}`));
  const lettering = [...document.lettering, ...words.flatMap((one) => [...one.values()])];
  if (lettering.length > mostLettering) return document;

  const ids = motions.map((_, copy) => {
    const own = idsOfCopy(id, copy, pieceIds.length);
    return new Map(pieceIds.map((of, index) => [of, own[index] ?? of]));
  });
  const made = new Set(ids.flatMap((one) => [...one.values()]));
  if (document.layers.some(({ pieces }) => pieces.some((piece) => made.has(piece.id)))) return document;
  let isTooMuch = false;
  const layers = document.layers.map((layer) => {
    const originals = layer.locked ? [] : layer.pieces.filter((piece) => chosen.has(piece.id));
    if (originals.length === 0) return layer;
    const added = motions.flatMap((motion, copy) =>
      originals.map((piece): Piece | null => {
        const placement = placementAfter(piece.placement, motion);
        const copyId = ids[copy]?.get(piece.id);
        return placement && copyId !== undefined
          ? { ...piece, id: copyId, placement, source: sourceOfCopy(piece, words[copy]) }
          : null;
      }),
    );
    const pieces = [...layer.pieces, ...added.filter((piece) => piece !== null)];
    isTooMuch ||= pieces.length > mostPieces || added.includes(null);
    const next = withCopiedHoles({ ...layer, pieces }, layer, copies);
    isTooMuch ||= next.hold.kind === "standoff" && next.hold.holes.length > mostHoles;
    return withFitDiameters(next, layer, document, copies.site);
  });
  return isTooMuch ? document : { ...document, layers, lettering };
}

/** New words for a copy, by the id of those that its letters were of. */
export function copiedWords(
  { layers, lettering }: Pick<MockupDocument, "layers" | "lettering">,
  pieceIds: ReadonlySet<string>,
  id: string,
): ReadonlyMap<string, Lettering> {
  const used = new Set(
    layers.flatMap(({ pieces }) =>
      pieces.flatMap((piece) =>
        pieceIds.has(piece.id) && piece.source.kind === "lettering" ? [piece.source.letteringId] : [],
      ),
    ),
  );
  return new Map(
    lettering
      .filter((entry) => used.has(entry.id))
      .map((entry, index) => [entry.id, { ...entry, id: `${id}-${index + 1}` }]),
  );
}

/** A letter's copy is of the copied words. */
export function sourceOfCopy({ source }: Piece, words: ReadonlyMap<string, Lettering> | undefined): Piece["source"] {
  if (source.kind !== "lettering") return source;
  return { ...source, letteringId: words?.get(source.letteringId)?.id ?? source.letteringId };
}

/** Holes that were added since get diameters with play. */
export function withFitDiameters(layer: Layer, before: Layer, document: MockupDocument, site: Site): Layer {
  if (layer.hold.kind !== "standoff" || before.hold.kind !== "standoff") return layer;
  const had = before.hold.holes.length;
  if (layer.hold.holes.length === had) return layer;
  const fitted = fitDiameters(layer.hold, { document, site });
  return { ...layer, hold: { ...layer.hold, holes: [...layer.hold.holes.slice(0, had), ...fitted.slice(had)] } };
}

function withCopiedHoles(layer: Layer, before: Layer, { pieceIds, motions, id, withHoles }: Copies): Layer {
  if (!withHoles || before.hold.kind !== "standoff" || layer.hold.kind !== "standoff") return layer;
  const within = holesWithin(before, new Set(pieceIds));
  const originals = before.hold.holes.filter((hole) => within.has(hole.id));
  const made = motions.flatMap((motion, copy) =>
    originals.map(
      (hole, index): Hole => ({
        ...movedHole(hole, motion),
        id: `${id}-${layer.key}h${copy * originals.length + index + 1}`,
        fixed: false,
      }),
    ),
  );
  return { ...layer, hold: { ...layer.hold, holes: [...before.hold.holes, ...made] } };
}

import { distanceToRegionEdgeMm, regionContains } from "../geometry/contains.ts";
import { flattenPath } from "../geometry/flatten.ts";
import { placePath } from "../geometry/placement.ts";
import { carriesWords } from "./carries-words.ts";
import type { Hole, Layer, MockupDocument, Piece } from "./document.ts";
import { emptyDocument } from "./empty-document.ts";

/** What of an earlier sign another one like it begins with. */
export type AnotherLike = {
  /** The earlier sign is the same client's. Nothing that the client gave, or that follows from it, leaves the client. */
  readonly sameClient: boolean;
  /** With its artwork, pieces of it and what was made of them; of the same client only. The artwork's new id by its old one. */
  readonly artwork: ReadonlyMap<string, string> | null;
  /** The earlier sign's words, title and client: names that carry one of them are not taken over. */
  readonly words: readonly string[];
  /** A new id each time. */
  readonly newId: () => string;
};

/**
 * A document of the same format, stack and hardware without the earlier sign's words: board, backer, slats, frame, hanging,
 * quantity, light, layers with stock, thickness and hold, and plates. Lettering goes, artwork unless it comes along, and with
 * them margin plates, worked pieces and an outline of the board that may follow them; holes stay where a piece does. What was
 * stated of the earlier wall (its photo, its colour, what its fixing carries) goes too. All ids are new.
 */
export function anotherLike(document: MockupDocument, options: AnotherLike): MockupDocument {
  const { board, presentation, hanging, backer } = document;
  const isOwnOutline = board.outline.kind !== "path" || comesAlong(options) !== null;
  const plain = emptyDocument({ backer: backer.stock });
  return {
    version: document.version,
    board: isOwnOutline ? board : { ...board, outline: { kind: "rectangle" } },
    hanging: { ...hanging, carriesKg: null },
    quantity: document.quantity,
    backer,
    frame: document.frame,
    layers: document.layers.map((layer) => layerLike(layer, options)),
    lettering: [],
    presentation: { ...plain.presentation, light: presentation.light, viewingDistance: presentation.viewingDistance },
  };
}

/** The artwork that may come along: never another client's, whatever was asked. */
const comesAlong = ({ sameClient, artwork }: AnotherLike): AnotherLike["artwork"] => (sameClient ? artwork : null);

function layerLike(layer: Layer, options: AnotherLike): Layer {
  const pieces = layer.pieces.flatMap((piece) => pieceLike(piece, options));
  const { hold } = layer;
  const allCame = pieces.length === layer.pieces.length;
  return {
    ...layer,
    name: nameLike(layer, options),
    hold: hold.kind === "standoff" ? { ...hold, holes: holesLike(hold, { pieces, allCame, options }) } : hold,
    pieces,
    hidden: false,
    locked: false,
  };
}

/** A layer that bears its sheet's name goes on doing so; another client's layers bear no name that was given for the first. */
function nameLike({ key, name, stock }: Layer, { sameClient, words }: AnotherLike): string {
  if (name === stock.name) return name;
  return sameClient && !carriesWords(name, words) ? name : `Layer ${key}`;
}

function pieceLike(piece: Piece, options: AnotherLike): Piece[] {
  const artwork = comesAlong(options);
  const { source } = piece;
  const name = options.sameClient && !carriesWords(piece.name, options.words) ? piece.name : "";
  const moved = (ids: readonly string[]) => ids.map((id) => artwork?.get(id) ?? id);
  switch (source.kind) {
    case "plate":
      return isPlainShape(piece) ? [{ ...piece, id: options.newId(), name: name || "Plate", reads: "" }] : [];
    case "artwork":
      if (!artwork) return [];
      return [
        {
          ...piece,
          id: options.newId(),
          name,
          source: { ...source, artworkId: artwork.get(source.artworkId) ?? source.artworkId },
        },
      ];
    case "margin":
    case "worked":
      // Of lettering alone they follow the old words.
      if (!artwork || source.artworkIds.length === 0) return [];
      return [{ ...piece, id: options.newId(), name, source: { ...source, artworkIds: moved(source.artworkIds) } }];
    case "lettering":
      return [];
  }
}

/** A rectangle, rounded or not, an ellipse: no more than eight pieces of outline and no opening. */
function isPlainShape({ path }: Piece): boolean {
  return path.length === 1 && (path[0]?.segments.length ?? 0) <= 8;
}

/** Where all pieces came along all holes do; else those in one that did, and edge grips whose barrel touches one. */
function holesLike(
  { holes, hardware }: Extract<Layer["hold"], { kind: "standoff" }>,
  { pieces, allCame, options }: { pieces: readonly Piece[]; allCame: boolean; options: AnotherLike },
): Hole[] {
  const regions = pieces.map(({ path, placement }) => flattenPath(placePath(path, placement)));
  const beside = hardware.kind === "edgeGrip" ? hardware.barrelDiameter : 0;
  const isHeld = (hole: Hole) =>
    regions.some((region) => regionContains(region, hole) || distanceToRegionEdgeMm(region, hole) <= beside);
  const kept = pieces.length === 0 ? [] : allCame ? holes : holes.filter(isHeld);
  const hasFixed = kept.some(({ fixed }) => fixed);
  return kept.map((hole, index) => ({ ...hole, id: options.newId(), fixed: hasFixed ? hole.fixed : index === 0 }));
}

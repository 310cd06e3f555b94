import { countOf } from "../mockup/change.ts";
import type { Hardware, Layer, Piece } from "../mockup/document.ts";
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

/** A piece at the head of a sentence: its name, or its layer's. */
export function pieceWords(layer: Layer, piece: Piece): string {
  return piece.name ? `${piece.name} (${layer.key})` : `A piece of ${layer.key}, ${layer.name},`;
}

/** How many names a finding gives before it only counts. */
const mostNames = 3;

/** Names of pieces in a sentence, the first few and how many more; empty when none has a name. */
export function namesWords(pieces: readonly Pick<Piece, "name">[]): string {
  const names = pieces.map(({ name }) => name).filter((name) => name !== "");
  const said = names.slice(0, mostNames);
  const more = pieces.length - said.length;
  return said.length === 0 || more === 0 ? said.join(", ") : `${said.join(", ")} and ${more} more`;
}

/** The same within a sentence, where no comma may follow. */
export function pieceWordsWithin(layer: Layer, piece: Piece): string {
  return piece.name ? pieceWords(layer, piece) : `a piece of ${layerWords(layer)}`;
}

/** Pieces of one layer at the head of a sentence: "Letter 1 (G)", "5 pieces of G, Lettering (Ring 1, Ring 2 and 3 more)". */
export function piecesWords(layer: Layer, pieces: readonly { readonly piece: Piece }[]): string {
  const [first] = pieces;
  if (first && pieces.length === 1) return pieceWords(layer, first.piece);
  const names = namesWords(pieces.map(({ piece }) => piece));
  return `${pieces.length} pieces of ${layerWords(layer)}${names === "" ? "" : ` (${names})`}`;
}

/** A waiting time as people say it: "15 minutes", "1.25 hours", "24 hours", "3 days". */
export function hoursWords(hours: number): string {
  if (hours < 1) return countOf(Math.round(hours * 60), "minute");
  if (hours > 48) return countOf(Number((hours / 24).toFixed(1)), "day");
  return countOf(Number(hours.toFixed(hours < 10 ? 2 : 0)), "hour");
}

export const layerWords = (layer: Layer): string => `${layer.key}, ${layer.name}`;

export const percentWords = (share: number): string => `${Number((share * 100).toFixed(1))} %`;

/** What of a standoff goes into the wood, in a sentence. */
export const fixingWords = (hardware: Hardware): string =>
  hardware.kind === "blindStud" ? `the stud of ${hardware.name}` : `${hardware.screw.name} in ${hardware.name}`;

/** A force to a tenth of a newton. */
export const newtonWords = (force: number): string => `${Number(force.toFixed(1))} N`;

import type { Limits } from "../dry-fit/limits.ts";
import type { Path } from "../geometry/path.ts";
import { placePath } from "../geometry/placement.ts";
import { rectanglePath } from "../geometry/shapes.ts";
import type { AcrylicStock, Stock } from "../materials/stock.ts";
import type { Acrylic, Layer, MockupDocument, Piece } from "../mockup/document.ts";
import type { NestingRequest, SheetPiece, StockSheet } from "../sheets/nesting.ts";
import { formatLength } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import type { ShopSaws } from "./shop-saws.ts";

/** Everything that is cut from one sheet material of one thickness. */
export type SheetTask = {
  readonly id: string;
  readonly title: string;
  readonly stock: Acrylic;
  readonly thicknessMm: number;
  readonly request: NestingRequest;
  /** Whether the sheets are those counted in stock, or the size that is usually bought. */
  readonly sheetsAreCounted: boolean;
  /** What is bought when the counted sheets are too few. */
  readonly usualSheet: StockSheet;
};

/** Units of search: some five seconds a material in a workshop's computer, less where there is little to try. */
const mostEffort = 5;
const effortACopy = 1 / 6;

/** What has to be cut from sheets, material by material in the order of the layers. Layers without pieces ask for nothing. */
export function sheetTasks({
  document,
  stock,
  limits,
  saws,
  unit,
}: {
  readonly document: MockupDocument;
  readonly stock: Stock;
  readonly limits: Limits;
  readonly saws: ShopSaws;
  readonly unit: LengthUnit;
}): SheetTask[] {
  const groups = new Map<string, { layer: Layer; pieces: SheetPiece[] }>();
  for (const layer of document.layers) {
    const id = `${layer.stock.name}, ${layer.stock.process}, ${layer.thickness}`;
    const group = groups.get(id) ?? { layer, pieces: [] };
    group.pieces.push(...layer.pieces.map((piece, index) => sheetPiece(layer, piece, index, document.quantity)));
    if (group.pieces.length > 0) groups.set(id, group);
  }
  return [...groups].map(([id, { layer, pieces }]) => {
    const entry = entryOf(stock.acrylics, layer.stock);
    const counted = (entry?.sheets ?? []).filter(
      ({ thicknessMm, quantity }) => thicknessMm === layer.thickness && quantity !== 0,
    );
    return {
      id,
      title: `${layer.stock.name}, ${formatLength(layer.thickness, unit)}${unit === "mm" ? " mm" : ""}`,
      stock: layer.stock,
      thicknessMm: layer.thickness,
      sheetsAreCounted: counted.length > 0,
      usualSheet: usualSheet(saws),
      request: {
        pieces,
        stock: counted.length > 0 ? counted.map(sheetInStock) : [usualSheet(saws)],
        rules: {
          marginMm: saws.sheetMarginMm,
          kerfMm: limits.pieceKerfMm,
          spacingMm: saws.sheetSpacingMm,
          bed: { widthMm: limits.bedWidthMm, heightMm: limits.bedHeightMm, larger: "split" },
          leastOffcutMm: saws.leastOffcutMm,
        },
        seed: 1,
        effort: Math.min(mostEffort, effortACopy * pieces.reduce((sum, { quantity }) => sum + quantity, 0)),
      },
    };
  });
}

function sheetPiece(layer: Layer, piece: Piece, index: number, quantity: number): SheetPiece {
  const isMarked = layer.marked !== "not stated";
  return {
    id: piece.id,
    name: piece.name || `${layer.key}${index + 1}`,
    path: uprightPath(piece),
    quantity,
    turns: { kind: "free" },
    // What is marked for one face is cut with that face up.
    mayMirror: !layer.stock.facesDiffer && !isMarked,
  };
}

/** The piece in its own plane at its own size, as it faces the viewer. */
function uprightPath({ path, placement }: Piece): Path {
  return placePath(path, { ...placement, x: 0, y: 0, turn: 0 });
}

const entryOf = (acrylics: readonly AcrylicStock[], { stockId, name }: Acrylic): AcrylicStock | undefined =>
  acrylics.find(({ acrylic }) => stockId !== null && acrylic.stockId === stockId) ??
  acrylics.find(({ acrylic }) => acrylic.name === name);

function sheetInStock({ widthMm, heightMm, quantity }: AcrylicStock["sheets"][number], index: number): StockSheet {
  return {
    id: `stock-${index + 1}`,
    name: "Sheet in stock",
    path: rectanglePath({ x: 0, y: 0, width: widthMm, height: heightMm }),
    quantity,
    grainTurn: 0,
    isOffcut: false,
  };
}

function usualSheet({ usualSheetWidthMm, usualSheetHeightMm }: ShopSaws): StockSheet {
  return {
    id: "usual",
    name: "Sheet as bought",
    path: rectanglePath({ x: 0, y: 0, width: usualSheetWidthMm, height: usualSheetHeightMm }),
    quantity: null,
    grainTurn: 0,
    isOffcut: false,
  };
}

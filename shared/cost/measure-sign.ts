import { supportOf } from "../dry-fit/under.ts";
import { regionAreaMm2, regionPerimeterMm } from "../geometry/area.ts";
import { regionContains } from "../geometry/contains.ts";
import type { Kernel } from "../geometry/kernel.ts";
import { passesPanel } from "../hardware/standoff-parts.ts";
import type { Acrylic, Adhesive, Coat, Hardware, Layer, MockupDocument, Wood } from "../mockup/document.ts";
import { glueArea, usualSpreadGPerM2 } from "../slats/glue-area.ts";
import { faceRegion, slatsOf } from "../stack/backer.ts";
import { bradsOf } from "../stack/brads-of.ts";
import type { Figures, PieceFigures } from "../stack/figures.ts";
import { boardRegion } from "../stack/piece-region.ts";
import { measureStrips, type StripMeasure } from "./measure-strips.ts";

/** What goes into one sign, whatever it costs. Areas mm², lengths mm; equal things are added up. */
export type SignMeasures = {
  /** Outlines of the pieces, their openings not counted; `cutMm` is every edge and every hole for hardware. */
  readonly sheets: readonly {
    readonly stock: Acrylic;
    readonly thicknessMm: number;
    readonly areaMm2: number;
    readonly cutMm: number;
  }[];
  /** The plank, or the substrate under slats. */
  readonly board: {
    readonly stock: Wood;
    readonly thicknessMm: number;
    readonly areaMm2: number;
    readonly outlineMm: number;
    readonly isRectangle: boolean;
  };
  readonly strips: readonly StripMeasure[];
  readonly pocketsMm2: { readonly routed: number; readonly engraved: number };
  readonly standoffs: readonly { readonly hardware: Hardware; readonly count: number }[];
  readonly hanging: MockupDocument["hanging"]["kind"];
  readonly brads: number;
  /** `beadMm` of a tack, `areaMm2` of what is glued all over. */
  readonly bonds: readonly { readonly adhesive: Adhesive; readonly areaMm2: number; readonly beadMm: number }[];
  /** Slats and spine as they are laid, before trimming. */
  readonly woodGlueMm2: number;
  /** What of the board is seen, and what is put on it. */
  readonly faceMm2: number;
  readonly coats: readonly Coat[];
  readonly pieces: number;
  readonly slats: number;
  readonly framePieces: number;
};

/** A tack is laid in dots: so much bead a piece, mm. Our choice. */
export const tackBeadMm = 20;

type Measured = {
  readonly document: MockupDocument;
  readonly figures: Figures;
  readonly kernel: Kernel;
  /** How far brads keep from the trim line and from barrels, mm, as the shop's dry fit has it. */
  readonly brads: { readonly trim: number; readonly barrel: number };
};

/** Quantities of one sign. Slats and frames that can't be laid are left out: the dry fit says so. Arithmetic on the outlines. */
export function measureSign(given: Measured): SignMeasures {
  const { document, figures, kernel } = given;
  const { board, backer, hanging } = document;
  const byLayer = document.layers.map((layer) => figures.pieces.filter(({ layerKey }) => layerKey === layer.key));
  const piecesOf = (level: number): readonly PieceFigures[] => byLayer[level] ?? [];
  const region = boardRegion(board, kernel);
  const laid = slatsOf(document, kernel);
  const glue = laid?.ok ? glueArea(laid.value) : null;
  const brads = laid?.ok ? bradsOf(document, laid.value, given.brads, kernel) : null;
  const { strips, framePieces } = measureStrips(document, kernel);
  return {
    sheets: measureSheets(document.layers, piecesOf),
    board: {
      stock: backer.stock,
      thicknessMm: backer.thickness,
      areaMm2: regionAreaMm2(region),
      outlineMm: regionPerimeterMm(region),
      isRectangle: board.outline.kind === "rectangle",
    },
    strips,
    pocketsMm2: measurePockets(document.layers, piecesOf, kernel),
    standoffs: countStandoffs(document.layers),
    hanging: hanging.kind,
    brads: brads?.ok ? brads.value.brads.length : 0,
    bonds: measureBonds(given, piecesOf),
    woodGlueMm2: glue?.ok ? (glue.value.massG / usualSpreadGPerM2) * 1e6 : 0,
    faceMm2: regionAreaMm2(faceRegion(document, kernel)),
    coats: backer.finish,
    pieces: figures.pieces.length,
    slats: laid?.ok ? laid.value.slats.length : 0,
    framePieces,
  };
}

type PiecesOf = (level: number) => readonly PieceFigures[];

function measureSheets(layers: readonly Layer[], piecesOf: PiecesOf): SignMeasures["sheets"] {
  const groups = new Map<string, SignMeasures["sheets"][number]>();
  for (const [level, { stock, thickness, hold }] of layers.entries()) {
    const pieces = piecesOf(level);
    if (pieces.length === 0) continue;
    const id = `${stock.stockId ?? ""} ${stock.name} ${stock.process} ${thickness}`;
    const group = groups.get(id) ?? { stock, thicknessMm: thickness, areaMm2: 0, cutMm: 0 };
    const holes = hold.kind === "standoff" && passesPanel(hold.hardware) ? hold.holes : [];
    const drilled = holes.reduce(
      (sum, hole) => sum + Math.PI * hole.diameter * pieces.filter(({ region }) => regionContains(region, hole)).length,
      0,
    );
    groups.set(id, {
      ...group,
      areaMm2: sumOf(pieces, ({ areaMm2 }) => areaMm2, group.areaMm2),
      cutMm: sumOf(pieces, ({ perimeterMm }) => perimeterMm, group.cutMm + drilled),
    });
  }
  return [...groups.values()];
}

function measurePockets(layers: readonly Layer[], piecesOf: PiecesOf, kernel: Kernel): SignMeasures["pocketsMm2"] {
  const sums = { routed: 0, engraved: 0 };
  for (const [level, { hold }] of layers.entries()) {
    if (hold.kind !== "pocket") continue;
    const grown = piecesOf(level).flatMap(({ region }) => kernel.offset(region, hold.clearance, "round"));
    sums[hold.cut] += regionAreaMm2(kernel.union(grown, "nonzero"));
  }
  return sums;
}

function countStandoffs(layers: readonly Layer[]): SignMeasures["standoffs"] {
  const counts = new Map<string, { hardware: Hardware; count: number }>();
  for (const { hold } of layers) {
    if (hold.kind !== "standoff" || hold.holes.length === 0) continue;
    const { hardware } = hold;
    const screw = hardware.kind === "blindStud" ? "" : hardware.screw.name;
    const id = `${hardware.stockId ?? ""} ${hardware.name} ${screw}`;
    counts.set(id, { hardware, count: (counts.get(id)?.count ?? 0) + hold.holes.length });
  }
  return [...counts.values()];
}

/** Faces that are glued: of a bonded piece what lies on its support, of one that is let in all of it. */
function measureBonds(given: Measured, piecesOf: PiecesOf): SignMeasures["bonds"] {
  const { document, kernel } = given;
  const sums = new Map<string, SignMeasures["bonds"][number]>();
  const add = (adhesive: Adhesive, areaMm2: number, beadMm: number) => {
    const id = `${adhesive.stockId ?? ""} ${adhesive.name}`;
    const before = sums.get(id) ?? { adhesive, areaMm2: 0, beadMm: 0 };
    sums.set(id, { adhesive, areaMm2: before.areaMm2 + areaMm2, beadMm: before.beadMm + beadMm });
  };
  for (const [level, { hold }] of document.layers.entries()) {
    const pieces = piecesOf(level);
    if (hold.kind === "standoff" || pieces.length === 0) continue;
    const glued = (piece: PieceFigures) =>
      hold.kind === "pocket"
        ? piece.areaMm2
        : regionAreaMm2(kernel.intersect(piece.region, supportOf(given, level, piece)));
    add(hold.adhesive, sumOf(pieces, glued), 0);
    if (hold.kind === "bond" && hold.tack) add(hold.tack, 0, pieces.length * tackBeadMm);
  }
  return [...sums.values()];
}

const sumOf = <T>(list: readonly T[], value: (one: T) => number, start = 0): number =>
  list.reduce((sum, one) => sum + value(one), start);

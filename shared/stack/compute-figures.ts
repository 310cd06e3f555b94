import { regionAreaMm2, regionCentroid, regionPerimeterMm } from "../geometry/area.ts";
import { type Kernel, remembered } from "../geometry/kernel.ts";
import { nodeCount } from "../geometry/node-count.ts";
import { smallestBox } from "../geometry/smallest-box.ts";
import { frontHeightMm } from "../hardware/standoff-parts.ts";
import { sheetBand } from "../materials/sheet-tolerance.ts";
import type { Layer, MockupDocument } from "../mockup/document.ts";
import { type Banded, bandHighest, bandLowest, bandSum, exactly } from "../units/banded.ts";
import type { Figures, LayerFigures, PieceFigures } from "./figures.ts";
import { computeMasses } from "./masses.ts";
import { backerTopOf, rise, type StandingPiece, standPieces } from "./stand-pieces.ts";

/**
 * Every figure of a sign: heights with their bands, areas, masses, depth. The document must have passed its schema;
 * then every figure is finite. An empty layer has the heights a piece lying on the backer would have. Figures are of
 * one sign, whatever the quantity. Hardware is counted but not weighed: its density is not stated.
 */
export function computeFigures(document: MockupDocument, kernel: Kernel): Figures {
  const standing = standPieces(document, kernel);
  const masses = computeMasses(document, standing, kernel);
  const backerTop = backerTopOf(document);
  const pieces = standing.map((one) => pieceFigures(one, masses.pieces.get(one.piece.id) ?? 0, kernel));
  const layers = document.layers.map((layer) => layerFigures(layer, pieces, backerTop));
  const depth =
    bandHighest([backerTop, exactly(document.frame?.depth ?? 0), ...standing.map(topWithFront)]) ?? backerTop;
  return {
    backerTop,
    backerMassG: masses.backer,
    layers,
    pieces,
    hardwareCount: document.layers.reduce(
      (count, { hold }) => count + (hold.kind === "standoff" ? hold.holes.length : 0),
      0,
    ),
    massG: layers.reduce((sum, layer) => sum + layer.massG, masses.backer),
    depth,
    offWall: bandSum(depth, exactly(document.hanging.gap)),
  };
}

function pieceFigures(one: StandingPiece, massG: number, kernel: Kernel): PieceFigures {
  const { x, y } = one.piece.placement;
  const { region } = one;
  const measures = remembered(kernel, region, "measures", () => ({
    centroid: regionCentroid(region),
    areaMm2: regionAreaMm2(region),
    perimeterMm: regionPerimeterMm(region),
    smallestBox: smallestBox(region),
  }));
  return {
    pieceId: one.piece.id,
    layerKey: one.layer.key,
    region,
    ...measures,
    box: one.box ?? { x, y, width: 0, height: 0 },
    centroid: measures.centroid ?? { x, y },
    nodes: nodeCount(one.piece.path),
    restsOn: one.restsOn,
    bottom: one.bottom,
    top: one.top,
    massG,
  };
}

function layerFigures(layer: Layer, all: readonly PieceFigures[], backerTop: Banded): LayerFigures {
  const pieces = all.filter((piece) => piece.layerKey === layer.key);
  const onBacker = bandSum(backerTop, rise(layer.hold));
  return {
    key: layer.key,
    name: layer.name,
    pieces: pieces.length,
    bottom: bandLowest(pieces.map((piece) => piece.bottom)) ?? onBacker,
    top:
      bandHighest(pieces.map((piece) => piece.top)) ??
      bandSum(onBacker, sheetBand(layer.stock.process, layer.thickness)),
    massG: pieces.reduce((sum, piece) => sum + piece.massG, 0),
  };
}

/** The front of a standoff lies on the face of the piece it holds, or reaches round its edge. */
function topWithFront({ layer, holes, base, top }: StandingPiece): Banded {
  if (layer.hold.kind !== "standoff" || holes.length === 0) return top;
  const { hardware } = layer.hold;
  const front = frontHeightMm(hardware, top.nominal - base.nominal) - (top.nominal - base.nominal);
  return bandSum(top, exactly(front));
}

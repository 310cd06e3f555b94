import { boxOfRegion } from "../geometry/box.ts";
import { regionContains } from "../geometry/contains.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Box, Path, Region } from "../geometry/path.ts";
import { pathOfRegion } from "../geometry/path-of-region.ts";
import { placePath } from "../geometry/placement.ts";
import { circlePath } from "../geometry/shapes.ts";
import type { Acrylic, Layer, MockupDocument } from "../mockup/document.ts";
import type { Figures } from "../stack/figures.ts";
import type { Item } from "./display-list.ts";
import { type Cylinder, discRegion, drawFront, type PlacedStandoff } from "./hardware.ts";
import { mixColours } from "./palette.ts";
import { shadowItem } from "./shadow.ts";
import type { Caster } from "./shadow-sweep.ts";

/** One thing of the picture: what draws it, what it covers and between which heights it stands. */
type Solid = {
  readonly layerKey: string;
  readonly items: readonly Item[];
  readonly region: Region;
  readonly bottom: number;
  readonly top: number;
  readonly castsShadow: boolean;
};

const lookOpacity: Readonly<Record<Acrylic["look"], number>> = { opaque: 1, mirror: 1, frosted: 0.82, clear: 0.3 };

/** Streaks across a mirrored piece, which has no colour of its own to be known by. */
function mirrorStreaks(path: Path, box: Box): Item {
  const streak = (from: number, width: number): Item => {
    const left = box.x + box.width * from;
    const shift = box.height * 0.6;
    const right = left + box.width * width;
    const bottom = box.y + box.height;
    const corners = [
      { x: left + shift, y: box.y },
      { x: right + shift, y: box.y },
      { x: right - shift, y: bottom },
      { x: left - shift, y: bottom },
    ] as const;
    return {
      kind: "path",
      path: [{ start: corners[0], segments: corners.slice(1).map((to) => ({ kind: "line" as const, to })) }],
      fill: "#FFFFFF",
      opacity: 0.3,
    };
  };
  return { kind: "clip", clip: path, items: [streak(0.12, 0.16), streak(0.36, 0.05), streak(0.68, 0.1)] };
}

function drawPiece(id: string, layer: Layer, path: Path, box: Box, lineMm: number): Item[] {
  const { colour, look } = layer.stock;
  const body: Item = {
    kind: "path",
    id,
    path,
    fill: look === "mirror" ? mixColours(colour, "#FFFFFF", 0.18) : colour,
    ...(lookOpacity[look] < 1 ? { opacity: lookOpacity[look] } : {}),
  };
  const edge: Item = { kind: "path", path, stroke: { colour: mixColours(colour, "#14110D", 0.45), widthMm: lineMm } };
  return [body, ...(look === "mirror" ? [mirrorStreaks(path, box)] : []), edge];
}

function pieceSolids(document: MockupDocument, figures: Figures, lineMm: number): Solid[] {
  return document.layers.flatMap((layer) => {
    if (layer.hidden) return [];
    const holes = layer.hold.kind === "standoff" ? layer.hold.holes : [];
    return layer.pieces.flatMap((piece): Solid[] => {
      const known = figures.pieces.find(({ pieceId }) => pieceId === piece.id);
      if (!known) return [];
      const bored = holes.filter((hole) => regionContains(known.region, hole));
      const path = [
        ...placePath(piece.path, piece.placement),
        ...bored.flatMap((hole) => circlePath(hole, hole.diameter / 2)),
      ];
      return [
        {
          layerKey: layer.key,
          items: drawPiece(piece.id, layer, path, known.box, lineMm),
          region: known.region,
          bottom: known.bottom.nominal,
          top: known.top.nominal,
          castsShadow: layer.stock.look !== "clear",
        },
      ];
    });
  });
}

function standoffSolids(standoff: PlacedStandoff, light: { azimuth: number }, lineMm: number): Solid[] {
  const { layerKey, hole, barrel, front } = standoff;
  const solid = ({ diameter, from, to }: Cylinder, items: readonly Item[]): Solid => ({
    layerKey,
    items,
    region: discRegion(hole, diameter),
    bottom: from,
    top: to,
    castsShadow: true,
  });
  return [solid(barrel, []), ...(front ? [solid(front, drawFront(standoff, light, lineMm))] : [])];
}

/** Heights that differ by less than this are one level. */
const levelStepMm = 0.01;

function levelsOf(solids: readonly Solid[]): Solid[][] {
  const levels: Solid[][] = [];
  // Sorting keeps the document's order among equals, so the same document gives the same picture.
  for (const solid of [...solids].sort((a, b) => a.top - b.top)) {
    const last = levels.at(-1);
    if (last?.[0] && solid.top - last[0].top < levelStepMm) last.push(solid);
    else levels.push([solid]);
  }
  return levels;
}

/** Neighbours of one layer share a group that carries the layer's name. */
function groupedByLayer(solids: readonly Solid[]): Item[] {
  const groups: { layerKey: string; items: Item[] }[] = [];
  for (const { layerKey, items } of solids) {
    const last = groups.at(-1);
    if (last?.layerKey === layerKey) last.items.push(...items);
    else groups.push({ layerKey, items: [...items] });
  }
  return groups
    .filter(({ items }) => items.length > 0)
    .map(({ layerKey, items }) => ({ kind: "group", id: `layer:${layerKey}`, x: 0, y: 0, scale: 1, items }));
}

export type SignInput = {
  readonly document: MockupDocument;
  readonly figures: Figures;
  readonly kernel: Kernel;
  readonly standoffs: readonly PlacedStandoff[];
  /** Width of the fine edge around each piece. */
  readonly lineMm: number;
};

/**
 * All that stands before the backer, lowest first, each level followed by the shadow that falls on it. The backer's own picture and shadow
 * come from `board`. Everything is in the board's own mm.
 */
export function drawSolids(
  input: SignInput,
  board: { readonly box: Box; readonly outline: Path; readonly items: readonly Item[] },
): Item[] {
  const { document, figures, kernel, standoffs, lineMm } = input;
  const { light } = document.presentation;
  const solids = [
    ...pieceSolids(document, figures, lineMm),
    ...standoffs.flatMap((standoff) => standoffSolids(standoff, light, lineMm)),
  ];
  const casters: Caster[] = solids.filter(({ castsShadow }) => castsShadow);
  const shadowOn = (level: number, clip: Path, receivers: readonly Box[]): Item[] => {
    const shadow = shadowItem({
      light,
      level,
      receivers,
      casters: casters.filter(({ top }) => top > level + levelStepMm),
    });
    return shadow ? [{ kind: "clip", clip, items: [shadow] }] : [];
  };
  const items: Item[] = [...board.items, ...shadowOn(figures.backerTop.nominal, board.outline, [board.box])];
  for (const level of levelsOf(solids)) {
    items.push(...groupedByLayer(level));
    const regions = level.filter((solid) => solid.items.length > 0).map(({ region }) => region);
    const surface = kernel.union(regions.flat(), "nonzero");
    const receivers = regions.map(boxOfRegion).filter((box) => box !== null);
    items.push(...shadowOn(level[0]?.top ?? 0, pathOfRegion(surface), receivers));
  }
  return items;
}

const wallStrength = 0.26;

/** The board's own shadow on the wall behind it; nothing when it lies flat against the wall and throws none. */
export function drawWallShadow({ document, figures, standoffs }: SignInput, board: Path, wall: Box): Item[] {
  const { light } = document.presentation;
  const level = -document.hanging.gap;
  const pieces = figures.pieces.filter(({ layerKey }) =>
    document.layers.some(({ key, hidden }) => key === layerKey && !hidden),
  );
  const casters: Caster[] = [
    { region: flattenPath(board), bottom: 0, top: figures.backerTop.nominal },
    ...pieces.map(({ region, bottom, top }) => ({ region, bottom: bottom.nominal, top: top.nominal })),
    ...standoffs.flatMap(({ hole, front }) =>
      front ? [{ region: discRegion(hole, front.diameter), bottom: front.from, top: front.to }] : [],
    ),
  ];
  const shadow = shadowItem({ light, level, receivers: [wall], casters, strength: wallStrength });
  return shadow ? [shadow] : [];
}

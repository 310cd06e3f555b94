import { boxOfRegion } from "../geometry/box.ts";
import { regionContains } from "../geometry/contains.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Box, Path, Region } from "../geometry/path.ts";
import { pathOfRegion } from "../geometry/path-of-region.ts";
import { placePath } from "../geometry/placement.ts";
import { circlePath } from "../geometry/shapes.ts";
import type { MockupDocument } from "../mockup/document.ts";
import type { Figures } from "../stack/figures.ts";
import { drawAcrylic } from "./acrylic-look.ts";
import type { Item } from "./display-list.ts";
import { type Cylinder, discRegion, drawFront, type PlacedStandoff } from "./hardware.ts";
import { shadowItem } from "./shadow.ts";
import type { Caster } from "./shadow-sweep.ts";

/** One thing of the picture: what draws it, what it covers and between which heights it stands. */
type Solid = {
  /** Null for what belongs to no layer. */
  readonly layerKey: string | null;
  readonly items: readonly Item[];
  readonly region: Region;
  readonly bottom: number;
  readonly top: number;
  readonly castsShadow: boolean;
};

function pieceSolids(document: MockupDocument, figures: Figures, lineMm: number): Solid[] {
  const { light } = document.presentation;
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
          items: drawAcrylic({
            id: piece.id,
            path,
            box: known.box,
            stock: layer.stock,
            thicknessMm: layer.thickness,
            light,
            lineMm,
          }),
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
  const groups: { layerKey: string | null; items: Item[] }[] = [];
  for (const { layerKey, items } of solids) {
    const last = groups.at(-1);
    if (last?.layerKey === layerKey) last.items.push(...items);
    else groups.push({ layerKey, items: [...items] });
  }
  return groups
    .filter(({ items }) => items.length > 0)
    .flatMap(({ layerKey, items }): Item[] =>
      layerKey === null ? items : [{ kind: "group", id: `layer:${layerKey}`, x: 0, y: 0, scale: 1, items }],
    );
}

export type SignInput = {
  readonly document: MockupDocument;
  readonly figures: Figures;
  readonly kernel: Kernel;
  readonly standoffs: readonly PlacedStandoff[];
  /** Width of the fine edge around each piece. */
  readonly lineMm: number;
  /** The frame round the board with its picture; null without one. */
  readonly frame: { readonly region: Region; readonly items: readonly Item[] } | null;
};

/** A frame stands on the wall's side of everything and reaches to its depth, in front of the board's face or behind it. */
function frameSolids({ document, frame }: SignInput): Solid[] {
  if (!frame || !document.frame) return [];
  return [{ ...frame, layerKey: null, bottom: 0, top: document.frame.depth, castsShadow: true }];
}

/** What is seen of one height: its things, and the shadow that falls on them. */
export type DrawnLevel = { readonly topMm: number; readonly items: readonly Item[] };

type DrawnBoard = { readonly box: Box; readonly outline: Path; readonly items: readonly Item[] };

/** All that stands before the backer, as `drawLevels` draws it. */
export function drawSolids(input: SignInput, board: DrawnBoard): Item[] {
  return drawLevels(input, board).flatMap(({ items }) => items);
}

/**
 * The backer and all that stands before it, lowest first, each level followed by the shadow that falls on it. The backer's own picture comes
 * from `board`; it is the first level. Everything is in the board's own mm, heights from the back of the board.
 */
export function drawLevels(input: SignInput, board: DrawnBoard): DrawnLevel[] {
  const { document, figures, kernel, standoffs, lineMm } = input;
  const { light } = document.presentation;
  const solids = [
    ...frameSolids(input),
    ...pieceSolids(document, figures, lineMm),
    ...standoffs.flatMap((standoff) => standoffSolids(standoff, light, lineMm)),
  ];
  const body: Caster = { region: flattenPath(board.outline), bottom: 0, top: figures.backerTop.nominal };
  const casters: Caster[] = [body, ...solids.filter(({ castsShadow }) => castsShadow)];
  const shadowOn = (level: number, clip: Path, receivers: readonly Box[]): Item[] => {
    const shadow = shadowItem({
      light,
      level,
      receivers,
      casters: casters.filter(({ top }) => top > level + levelStepMm),
    });
    return shadow ? [{ kind: "clip", clip, items: [shadow] }] : [];
  };
  const face = figures.backerTop.nominal;
  const drawn: DrawnLevel[] = [{ topMm: face, items: [...board.items, ...shadowOn(face, board.outline, [board.box])] }];
  for (const level of levelsOf(solids)) {
    const regions = level.filter((solid) => solid.items.length > 0).map(({ region }) => region);
    const surface = kernel.union(regions.flat(), "nonzero");
    const receivers = regions.map(boxOfRegion).filter((box) => box !== null);
    const topMm = level[0]?.top ?? 0;
    drawn.push({ topMm, items: [...groupedByLayer(level), ...shadowOn(topMm, pathOfRegion(surface), receivers)] });
  }
  return drawn;
}

const wallStrength = 0.26;

/** The board's own shadow on the wall behind it; nothing when it lies flat against the wall and throws none. */
export function drawWallShadow(sign: SignInput, board: Path, wall: Box): Item[] {
  const { document, figures, standoffs } = sign;
  const { light } = document.presentation;
  const level = -document.hanging.gap;
  const pieces = figures.pieces.filter(({ layerKey }) =>
    document.layers.some(({ key, hidden }) => key === layerKey && !hidden),
  );
  const casters: Caster[] = [
    { region: flattenPath(board), bottom: 0, top: figures.backerTop.nominal },
    ...frameSolids(sign),
    ...pieces.map(({ region, bottom, top }) => ({ region, bottom: bottom.nominal, top: top.nominal })),
    ...standoffs.flatMap(({ hole, front }) =>
      front ? [{ region: discRegion(hole, front.diameter), bottom: front.from, top: front.to }] : [],
    ),
  ];
  const shadow = shadowItem({ light, level, receivers: [wall], casters, strength: wallStrength });
  return shadow ? [shadow] : [];
}

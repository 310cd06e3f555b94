import type { Box } from "../geometry/path.ts";
import { rectanglePath } from "../geometry/shapes.ts";
import type { MockupDocument } from "../mockup/document.ts";
import type { Figures } from "../stack/figures.ts";
import { formatLength } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import { drawBalloon, drawLeader } from "./balloon.ts";
import { dimensionRowMm, drawDimensions, fineLineMm, outlineMm, type PaperScale } from "./dimensions.ts";
import type { DisplayList, Item } from "./display-list.ts";
import { boardPlaneId } from "./elevation.ts";
import { type PlacedStandoff, placedStandoffs } from "./hardware.ts";
import { graphite, ink, mixColours, sheetWhite } from "./palette.ts";
import { capHeightShare, smallTextMm, textWidthMm } from "./type.ts";

export type SectionInput = {
  readonly document: MockupDocument;
  readonly figures: Figures;
  readonly unit: LengthUnit;
  /** Millimetres of the sign that make one on paper, as in the elevation: heights of both views are at one scale. */
  readonly paperScale: PaperScale;
  /** How much larger depth is drawn than height: 1 on paper, where both are true; more on a screen, which says so. */
  readonly depthScale: number;
};

/** What of one layer shows from the side: boxes of depth by height, joined where pieces overlap. */
type Slab = { readonly key: string; readonly colour: string; readonly box: Box };

const wallHatchMm = 3.4;
const wallGapMm = 1.2;
const labelPitchMm = 7;
/** The first label stays this far below the board's upper edge: its heading must not rise into the dimensions. */
const leastLabelMm = 3;

function slabsOf({ document, figures, depthScale }: SectionInput): Slab[] {
  return document.layers.flatMap((layer): Slab[] => {
    if (layer.hidden) return [];
    const own = figures.pieces
      .filter(({ layerKey }) => layerKey === layer.key)
      .sort((a, b) => a.bottom.nominal - b.bottom.nominal || a.box.y - b.box.y);
    const slabs: { key: string; colour: string; box: { x: number; y: number; width: number; height: number } }[] = [];
    for (const { box, bottom, top } of own) {
      const x = bottom.nominal * depthScale;
      const width = (top.nominal - bottom.nominal) * depthScale;
      const last = slabs.at(-1)?.box;
      if (last && Math.abs(last.x - x) < 0.01 && Math.abs(last.width - width) < 0.01 && box.y <= last.y + last.height) {
        last.height = Math.max(last.height, box.y + box.height - last.y);
      } else
        slabs.push({ key: layer.key, colour: layer.stock.colour, box: { x, y: box.y, width, height: box.height } });
    }
    return slabs;
  });
}

function box(x: number, y: number, width: number, height: number): Box {
  return { x, y, width, height };
}

function drawWall({ document, depthScale, paperScale }: SectionInput): Item[] {
  const mm = (paper: number) => paper * paperScale;
  const x = -document.hanging.gap * depthScale;
  const over = mm(4);
  const [top, bottom] = [-over, document.board.height + over];
  const strokes: Item[] = [];
  for (let y = top + mm(wallHatchMm); y <= bottom; y += mm(2)) {
    const points = [
      { x, y: y - mm(wallHatchMm) },
      { x: x - mm(wallHatchMm * 0.8), y },
    ];
    strokes.push({ kind: "line", points, stroke: { colour: graphite, widthMm: mm(fineLineMm * 0.7) } });
  }
  const face = [
    { x, y: top },
    { x, y: bottom },
  ];
  return [...strokes, { kind: "line", points: face, stroke: { colour: ink, widthMm: mm(outlineMm) } }];
}

/** The backer cut across: pale, with the year rings a cut board shows. */
function drawBacker({ document, figures, depthScale, paperScale }: SectionInput): Item[] {
  const { height } = document.board;
  const width = figures.backerTop.nominal * depthScale;
  const { colour } = document.backer.stock;
  const outline = rectanglePath(box(0, 0, width, height));
  const line = { colour: mixColours(colour, "#6B4A1F", 0.45), widthMm: fineLineMm * 0.6 * paperScale };
  const rings: Item[] = [];
  for (let y = -width; y < height + width; y += 3.4 * paperScale) {
    const points = [0, 0.25, 0.5, 0.75, 1].map((share) => ({
      x: width * share,
      y: y + width * 0.9 * (share - share ** 2),
    }));
    rings.push({ kind: "line", points, stroke: line });
  }
  return [
    { kind: "path", id: "board", path: outline, fill: colour },
    { kind: "clip", clip: outline, items: rings },
    { kind: "path", path: outline, stroke: { colour: ink, widthMm: fineLineMm * 1.4 * paperScale } },
  ];
}

/** Standoffs at one height hide one another: of each height one is drawn. */
function drawStandoffs(
  standoffs: readonly PlacedStandoff[],
  { depthScale, paperScale }: SectionInput,
): { barrels: Item[]; caps: Item[] } {
  const heights = new Set<string>();
  const barrels: Item[] = [];
  const caps: Item[] = [];
  for (const { hole, layerKey, hardware, foot, panelBack, panelFace, capTop } of standoffs) {
    const name = `${layerKey} ${hole.y.toFixed(1)}`;
    if (heights.has(name)) continue;
    heights.add(name);
    const metal = (from: number, to: number, diameter: number): Item => ({
      kind: "path",
      id: `hole:${hole.id}`,
      path: rectanglePath(box(from * depthScale, hole.y - diameter / 2, (to - from) * depthScale, diameter)),
      fill: mixColours(hardware.finish, "#FFFFFF", 0.25),
      stroke: { colour: ink, widthMm: fineLineMm * paperScale },
    });
    if (panelBack > foot) barrels.push(metal(foot, panelBack, hardware.barrelDiameter));
    caps.push(metal(panelFace, capTop, hardware.capDiameter));
  }
  return { barrels, caps };
}

/** Moves places that want to be nearer than `pitch` apart, keeping their order and staying near where they were, none below `least`. */
export function spreadPlaces(
  wanted: readonly number[],
  { pitch, least }: { readonly pitch: number; readonly least: number },
): number[] {
  const places: number[] = [];
  for (const place of wanted) places.push(Math.max(place, (places.at(-1) ?? Number.NEGATIVE_INFINITY) + pitch));
  const shift =
    places.reduce((sum, place, index) => sum + place - (wanted[index] ?? place), 0) / Math.max(1, places.length);
  return places.map((place) => place - Math.min(shift, (places[0] ?? 0) - least));
}

type Label = { readonly key: string; readonly text: string; readonly foot: { readonly x: number; readonly y: number } };

function labelsOf(input: SectionInput, slabs: readonly Slab[]): Label[] {
  const { document, figures, unit, depthScale } = input;
  const top = (mm: number) => formatLength(mm, unit);
  const backer: Label = {
    key: "A",
    text: top(figures.backerTop.nominal),
    foot: {
      x: figures.backerTop.nominal * depthScale * 0.5,
      y: document.board.height - Math.min(8 * input.paperScale, document.board.height * 0.06),
    },
  };
  const feet: number[] = [];
  const layers = figures.layers.flatMap((layer): Label[] => {
    const slab = slabs
      .filter(({ key }) => key === layer.key)
      .sort((a, b) => b.box.x + b.box.width - a.box.x - a.box.width)[0]?.box;
    if (!slab) return [];
    // Leaders to layers of one middle would run into one point.
    const heights = footShares.map((share) => slab.y + slab.height * share);
    const clear = heights.find((y) => feet.every((foot) => Math.abs(foot - y) > 2.5 * input.paperScale));
    const y = clear ?? slab.y + slab.height / 2;
    feet.push(y);
    return [{ key: layer.key, text: top(layer.top.nominal), foot: { x: slab.x + slab.width * 0.6, y } }];
  });
  return [...layers, backer].sort((a, b) => a.foot.y - b.foot.y || (a.key < b.key ? -1 : 1));
}

const footShares = [0.5, 0.25, 0.75, 0.1, 0.9, 0.4, 0.6];

const labelTitle = "Top at";

/**
 * The stack from the side, wall at the left and viewer at the right: every layer at its height above the back of the board, with its
 * key and its top; depths dimensioned above and below. The board's height is at the elevation's scale.
 */
export function drawSection(input: SectionInput): DisplayList {
  const { document, figures, unit, paperScale, depthScale } = input;
  const mm = (paper: number) => paper * paperScale;
  const { height } = document.board;
  const standoffs = placedStandoffs(document, figures);
  const slabs = slabsOf(input);
  const metal = drawStandoffs(standoffs, input);
  const bodies = [...slabs]
    .sort((a, b) => a.box.x + a.box.width - b.box.x - b.box.width)
    .map(
      ({ key, colour, box: slab }): Item => ({
        kind: "path",
        id: `layer:${key}`,
        path: rectanglePath(slab),
        fill: colour,
        stroke: { colour: mixColours(colour, "#14110D", 0.6), widthMm: fineLineMm * paperScale },
      }),
    );
  const deepest = figures.depth.nominal;
  const depthText = (mmDeep: number) => formatLength(mmDeep, unit);
  const above = [
    { from: 0, to: figures.backerTop.nominal, thing: 0 },
    ...standoffs
      .filter(
        ({ foot, panelBack }, index) =>
          panelBack > foot && standoffs.findIndex((other) => other.layerKey === standoffs[index]?.layerKey) === index,
      )
      .map(({ foot, panelBack }) => ({ from: foot, to: panelBack, thing: 0 })),
  ];
  const below = [
    ...(document.hanging.gap > 0 ? [{ from: -document.hanging.gap, to: 0, thing: height + mm(4) }] : []),
    { from: -document.hanging.gap, to: deepest, thing: height + mm(4) },
  ];
  const labels = labelsOf(input, slabs);
  const places = spreadPlaces(
    labels.map(({ foot }) => foot.y),
    { pitch: mm(labelPitchMm), least: mm(leastLabelMm) },
  );
  // Lettering stands to the right of these short steps: whatever ends farther right goes in the nearer row, clear of it.
  const byReach = (a: { to: number }, b: { to: number }) => b.to - a.to;
  const under = Math.max(height + mm(4), (places.at(-1) ?? 0) + mm(2));
  const dimensions = [
    ...above.sort(byReach).map((step, index) => ({ ...step, at: -mm(dimensionRowMm * (index + 1)) })),
    ...below.sort(byReach).map((step, index) => ({ ...step, at: under + mm(dimensionRowMm * (index + 1)) })),
  ].map(({ from, to, at, thing }) => ({
    axis: "x" as const,
    from: from * depthScale,
    to: to * depthScale,
    at,
    thing,
    text: depthText(to - from),
    overflow: "after" as const,
  }));
  const balloonX = deepest * depthScale + mm(9);
  const textX = balloonX + mm(4.4);
  const keys = labels.flatMap(({ key, text, foot }, index): Item[] => {
    const y = places[index] ?? foot.y;
    return [
      ...drawLeader([foot, { x: balloonX - mm(2.9), y }], paperScale),
      ...drawBalloon(key, { x: balloonX, y }, paperScale),
      {
        kind: "text",
        text,
        at: { x: textX, y: y + mm((smallTextMm * capHeightShare) / 2) },
        sizeMm: mm(smallTextMm),
        font: "sans",
        colour: ink,
        align: "left",
      },
    ];
  });
  const heading: Item = {
    kind: "text",
    text: labelTitle,
    at: { x: balloonX - mm(2.9), y: (places[0] ?? 0) - mm(5.4) },
    sizeMm: mm(smallTextMm),
    font: "sans",
    colour: graphite,
    align: "left",
  };
  const items = [
    ...drawWall(input),
    ...drawBacker(input),
    ...metal.barrels,
    ...bodies,
    ...metal.caps,
    drawDimensions(dimensions, { id: "dimension:depth", paperScale, ground: sheetWhite }),
    ...keys,
    heading,
  ];
  const widest = Math.max(
    ...labels.map(({ text }) => textX + mm(textWidthMm(text, "sans", smallTextMm) + 1)),
    balloonX + mm(textWidthMm(labelTitle, "sans", smallTextMm)),
    ...dimensions.map(({ to, text }) => to + mm(textWidthMm(text, "serif", smallTextMm) + 7)),
  );
  const left = document.hanging.gap * depthScale + mm(wallHatchMm + wallGapMm + 3);
  const top = mm(Math.max(dimensionRowMm * above.length + 5, 8));
  const lowest = under + mm(dimensionRowMm * below.length + 2.5);
  return {
    widthMm: left + widest,
    heightMm: top + lowest,
    items: [{ kind: "group", id: boardPlaneId, x: left, y: top, scale: 1, items }],
  };
}

import type { Box } from "../geometry/path.ts";
import { rectanglePath } from "../geometry/shapes.ts";
import type { MockupDocument } from "../mockup/document.ts";
import type { Figures } from "../stack/figures.ts";
import type { BandWording } from "../units/format-band.ts";
import type { LengthUnit } from "../units/length.ts";
import { fineLineMm, outlineMm, type PaperScale } from "./dimensions.ts";
import type { Item } from "./display-list.ts";
import type { Cylinder, PlacedStandoff } from "./hardware.ts";
import { graphite, ink, mixColours } from "./palette.ts";

export type SectionInput = {
  readonly document: MockupDocument;
  readonly figures: Figures;
  readonly unit: LengthUnit;
  /** Millimetres of the sign that make one on paper, as in the elevation: heights of both views are at one scale. */
  readonly paperScale: PaperScale;
  /** How much larger depth is drawn than height: 1 on paper, where both are true; more on a screen, which says so. */
  readonly depthScale: number;
  /** Whether tops are lettered with the bands that the sheets' tolerances leave; nominal when not said. */
  readonly heights?: BandWording;
};

/** What of one layer shows from the side: boxes of depth by height, joined where pieces overlap. */
export type Slab = { readonly key: string; readonly colour: string; readonly box: Box };

/** Length of the hatching's strokes behind the wall's face. */
export const wallHatchMm = 3.4;

/** What every shown layer looks like from the side, in the document's order. */
export function slabsOf({ document, figures, depthScale }: SectionInput): Slab[] {
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

export function drawWall({ document, depthScale, paperScale }: SectionInput): Item[] {
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
export function drawBacker({ document, figures, depthScale, paperScale }: SectionInput): Item[] {
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
export function drawStandoffs(
  standoffs: readonly PlacedStandoff[],
  { depthScale, paperScale }: SectionInput,
): { barrels: Item[]; caps: Item[] } {
  const heights = new Set<string>();
  const barrels: Item[] = [];
  const caps: Item[] = [];
  for (const { hole, layerKey, hardware, barrel, front } of standoffs) {
    const name = `${layerKey} ${hole.y.toFixed(1)}`;
    if (heights.has(name)) continue;
    heights.add(name);
    const metal = ({ diameter, from, to }: Cylinder): Item => ({
      kind: "path",
      id: `hole:${hole.id}`,
      path: rectanglePath(box(from * depthScale, hole.y - diameter / 2, (to - from) * depthScale, diameter)),
      fill: mixColours(hardware.finish, "#FFFFFF", 0.25),
      stroke: { colour: ink, widthMm: fineLineMm * paperScale },
    });
    if (barrel.to > barrel.from) barrels.push(metal(barrel));
    if (front) caps.push(metal(front));
  }
  return { barrels, caps };
}

/** The layers, nearest to the wall first, so that what stands farther out is drawn over it. */
export function drawSlabs(slabs: readonly Slab[], paperScale: PaperScale): Item[] {
  return [...slabs]
    .sort((a, b) => a.box.x + a.box.width - b.box.x - b.box.width)
    .map(({ key, colour, box: slab }) => ({
      kind: "path",
      id: `layer:${key}`,
      path: rectanglePath(slab),
      fill: colour,
      stroke: { colour: mixColours(colour, "#14110D", 0.6), widthMm: fineLineMm * paperScale },
    }));
}

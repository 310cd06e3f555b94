import type { Box } from "../geometry/path.ts";
import { rectanglePath } from "../geometry/shapes.ts";
import { drivenOf } from "../hardware/driven-of.ts";
import { screwReach } from "../hardware/screw-reach.ts";
import type { MockupDocument } from "../mockup/document.ts";
import type { Figures } from "../stack/figures.ts";
import { signBox } from "../stack/sign-box.ts";
import { exactly } from "../units/banded.ts";
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
  const whole = signBox(document);
  const [top, bottom] = [whole.y - over, whole.y + whole.height + over];
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

/** What of a standoff is in the wood, dashed since wood hides it: as thick as it is, to its point or the bottom of its hole; null for none. */
function drawReach(standoff: PlacedStandoff, { document, depthScale, paperScale }: SectionInput): Item | null {
  const { hole, hardware, layerKey, barrel, front } = standoff;
  const layer = document.layers.find(({ key }) => key === layerKey);
  if (layer?.hold.kind !== "standoff") return null;
  const stack = exactly(front ? front.from - barrel.to : 0);
  const reach = screwReach(drivenOf(hardware, { stack, offset: layer.hold.offset }));
  if (!reach.ok || reach.value.point.nominal <= 0) return null;
  const radius = ("screw" in hardware ? hardware.screw.diameter : hardware.studDiameter) / 2;
  const foot = barrel.from * depthScale;
  const point = (barrel.from - reach.value.point.nominal) * depthScale;
  // A screw's point is about as long as it is thick; a stud ends square.
  const shoulder = Math.min(foot, point + ("screw" in hardware ? 2 * radius * depthScale : 0));
  const tip = "screw" in hardware ? 0 : radius;
  return {
    kind: "line",
    points: [
      { x: foot, y: hole.y - radius },
      { x: shoulder, y: hole.y - radius },
      { x: point, y: hole.y - tip },
      { x: point, y: hole.y + tip },
      { x: shoulder, y: hole.y + radius },
      { x: foot, y: hole.y + radius },
    ],
    stroke: {
      colour: ink,
      widthMm: fineLineMm * 0.8 * paperScale,
      dashMm: [0.9 * paperScale, 0.5 * paperScale],
    },
  };
}

/** Standoffs at one height hide one another: of each height one is drawn. */
export function drawStandoffs(
  standoffs: readonly PlacedStandoff[],
  input: SectionInput,
): { inWood: Item[]; barrels: Item[]; caps: Item[] } {
  const { depthScale, paperScale } = input;
  const heights = new Set<string>();
  const barrels: Item[] = [];
  const caps: Item[] = [];
  const inWood: Item[] = [];
  for (const standoff of standoffs) {
    const { hole, layerKey, hardware, barrel, front } = standoff;
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
    const reach = drawReach(standoff, input);
    if (reach) inWood.push(reach);
    if (barrel.to > barrel.from) barrels.push(metal(barrel));
    if (front) caps.push(metal(front));
  }
  return { inWood, barrels, caps };
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

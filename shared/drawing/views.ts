import type { Kernel } from "../geometry/kernel.ts";
import type { MockupDocument } from "../mockup/document.ts";
import type { Figures } from "../stack/figures.ts";
import type { LengthUnit } from "../units/length.ts";
import { preferredScales, type Scale } from "../units/scales.ts";
import type { Item } from "./display-list.ts";
import { boardOriginOf, drawElevation } from "./elevation.ts";
import { dimensionMargins } from "./elevation-dimensions.ts";
import { graphite } from "./palette.ts";
import { drawSection } from "./section.ts";
import { textItem } from "./text-item.ts";
import { textWidthMm } from "./type.ts";

export type ViewsInput = {
  readonly document: MockupDocument;
  readonly figures: Figures;
  readonly kernel: Kernel;
  readonly unit: LengthUnit;
};

const headingMm = 10;
const betweenMm = 7;

type Size = { readonly widthMm: number; readonly heightMm: number };

/** Room on paper that the headed elevation and section take side by side at a scale, boards level. */
function viewsSize({ document, figures, unit }: Omit<ViewsInput, "kernel">, factor: number): Size {
  const paperScale = 1 / factor;
  const margins = dimensionMargins({ document, figures, unit, paperScale });
  const section = drawSection({ document, figures, unit, paperScale, depthScale: 1 });
  const above = boardOriginOf(section)?.y ?? 0;
  const top = Math.max(margins.top, above);
  const bottom = Math.max(margins.bottom + document.board.height, section.heightMm - above);
  const width = margins.left + document.board.width + margins.right + section.widthMm;
  return { widthMm: width * factor + betweenMm, heightMm: (top + bottom) * factor + headingMm };
}

/** The largest preferred scale, up to full size, at which both views fit (ISO 5455); the smallest there is when none does. */
export function scaleOfViews(input: Omit<ViewsInput, "kernel">, room: Size): { scale: Scale; fits: boolean } {
  const scales = preferredScales(input.unit).filter(({ factor }) => factor <= 1);
  const found = scales.find(({ factor }) => {
    const size = viewsSize(input, factor);
    return size.widthMm <= room.widthMm && size.heightMm <= room.heightMm;
  });
  const smallest = scales.at(-1) ?? { name: "1:1000", factor: 0.001 };
  return { scale: found ?? smallest, fits: found !== undefined };
}

/** The elevation with the section at its right, boards level, in a room on paper; what room is left goes around them evenly. */
export function drawViews(
  input: ViewsInput,
  scale: Scale,
  room: { readonly x: number; readonly y: number } & Size,
): Item[] {
  const paperScale = 1 / scale.factor;
  const { document, figures, unit } = input;
  const elevation = drawElevation({ ...input, dimensions: true, paperScale, wall: false });
  const section = drawSection({ document, figures, unit, paperScale, depthScale: 1 });
  const elevationTop = boardOriginOf(elevation)?.y ?? 0;
  const sectionTop = boardOriginOf(section)?.y ?? 0;
  const size = viewsSize(input, scale.factor);
  const spareX = Math.max(0, room.widthMm - size.widthMm);
  const spareY = Math.max(0, room.heightMm - size.heightMm);
  const board = room.y + headingMm + spareY / 2 + Math.max(elevationTop, sectionTop) * scale.factor;
  const elevationX = room.x + spareX / 3;
  const sectionX = elevationX + elevation.widthMm * scale.factor + betweenMm + spareX / 3;
  const view = (list: typeof elevation, id: string, x: number, top: number): Item => ({
    kind: "group",
    id,
    x,
    y: board - top * scale.factor,
    scale: scale.factor,
    items: list.items,
  });
  const heading = (text: string, after: string, x: number): Item[] => [
    textItem(text, { x, y: room.y + 5.5 }, { font: "serif-bold", sizeMm: 4.2 }),
    ...(after === ""
      ? []
      : [textItem(after, { x: x + textWidthMm(text, "serif-bold", 4.2) + 3, y: room.y + 5.5 }, { colour: graphite })]),
  ];
  return [
    ...heading("Front elevation", scale.name, room.x),
    ...heading("Section", "", sectionX),
    view(elevation, "elevation", elevationX, elevationTop),
    view(section, "section", sectionX, sectionTop),
  ];
}

import type { Box, Point } from "../geometry/path.ts";
import { rectanglePath } from "../geometry/shapes.ts";
import { slatsAtSpine } from "../slats/slats-at-spine.ts";
import { signBox } from "../stack/sign-box.ts";
import { fineLineMm } from "./dimensions.ts";
import type { Colour, Item } from "./display-list.ts";
import { ink, mixColours } from "./palette.ts";
import type { SectionInput } from "./section-bodies.ts";

/** A part of the backer cut across. */
type Cut = {
  readonly box: Box;
  readonly colour: Colour;
  readonly id?: string;
  /** How far its year rings bulge, a share of its depth; less than nothing bulges downwards. */
  readonly bulge: number;
};

/** Paper between the year rings of a plank, and of thinner parts. */
const ringMm = { plank: 3.4, thin: 1.9 } as const;
const steps = [0, 0.25, 0.5, 0.75, 1] as const;

/** Wood cut across: its own colour, with the year rings a cut board shows. */
function drawCut({ box, colour, id, bulge }: Cut, ringPitch: number, paperScale: number): Item[] {
  const { x, y, width, height } = box;
  const line = { colour: mixColours(colour, "#6B4A1F", 0.45), widthMm: fineLineMm * 0.6 * paperScale };
  const rings: Item[] = [];
  for (let at = y - width; at < y + height + width; at += ringPitch * paperScale) {
    const points = steps.map(
      (share): Point => ({
        x: x + width * share,
        y: at + 4 * bulge * width * (share - share ** 2),
      }),
    );
    rings.push({ kind: "line", points, stroke: line });
  }
  const outline = rectanglePath(box);
  return [
    { kind: "path", ...(id === undefined ? {} : { id }), path: outline, fill: colour },
    { kind: "clip", clip: outline, items: rings },
    { kind: "path", path: outline, stroke: { colour: ink, widthMm: fineLineMm * 1.4 * paperScale } },
  ];
}

/** Slats cut right beside the spine, each with rings of its own; the end-cut ones at the board's edges too. */
function drawSlats({ document, figures, depthScale, paperScale }: SectionInput): Item[] {
  const { board, backer } = document;
  const { slats } = backer;
  if (!slats) return [];
  const x = backer.thickness * depthScale;
  const width = figures.backerTop.nominal * depthScale - x;
  if (width <= 0) return [];
  return slatsAtSpine(board, slats).flatMap(({ strip, from, to }) =>
    drawCut(
      {
        box: { x, y: from, width, height: to - from },
        colour: slats.stock.colour,
        bulge: strip % 2 === 0 ? 0.3 : -0.3,
      },
      ringMm.thin,
      paperScale,
    ),
  );
}

/** The backer cut across: a plank, or a substrate with its slats. */
export function drawBacker(input: SectionInput): Item[] {
  const { document, figures, depthScale, paperScale } = input;
  const { stock, thickness, slats } = document.backer;
  const width = (slats ? thickness : figures.backerTop.nominal) * depthScale;
  const body: Cut = {
    id: "board",
    box: { x: 0, y: 0, width, height: document.board.height },
    colour: stock.colour,
    bulge: 0.225,
  };
  return [...drawCut(body, slats ? ringMm.thin : ringMm.plank, paperScale), ...drawSlats(input)];
}

/** The frame: its upper and lower piece cut across, and what of an upright is seen beyond the face. */
export function drawFrame({ document, figures, depthScale, paperScale }: SectionInput): Item[] {
  const { board, frame } = document;
  const whole = signBox(document);
  if (!frame || whole.height <= board.height) return [];
  const { colour } = frame.stock;
  const width = frame.depth * depthScale;
  const face = figures.backerTop.nominal * depthScale;
  const beyond: Item[] =
    width > face
      ? [
          {
            kind: "path",
            path: rectanglePath({ x: face, y: 0, width: width - face, height: board.height }),
            fill: mixColours(colour, "#FFFFFF", 0.35),
            stroke: { colour: ink, widthMm: fineLineMm * 0.7 * paperScale },
          },
        ]
      : [];
  const cut = (y: number, height: number, bulge: number) =>
    drawCut({ box: { x: 0, y, width, height }, colour, bulge }, ringMm.thin, paperScale);
  const below = whole.y + whole.height - board.height;
  return [...beyond, ...cut(whole.y, -whole.y, 0.3), ...cut(board.height, below, -0.3)];
}

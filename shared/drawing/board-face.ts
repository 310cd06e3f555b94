import type { Kernel } from "../geometry/kernel.ts";
import type { Box, Path } from "../geometry/path.ts";
import type { MockupDocument } from "../mockup/document.ts";
import { faceStock, slatsOf } from "../stack/backer.ts";
import { outlineMm, type PaperScale } from "./dimensions.ts";
import type { Colour, Item } from "./display-list.ts";
import { faceColour } from "./face-colour.ts";
import { seedOfText } from "./noise.ts";
import { mixColours } from "./palette.ts";
import { drawSlatFace } from "./slat-face.ts";
import { woodGrain } from "./wood-grain.ts";

export type BoardFace = {
  readonly document: MockupDocument;
  readonly kernel: Kernel;
  readonly paperScale: PaperScale;
  /** A PNG of a plank's face in place of the generated grain. */
  readonly texture?: { readonly pngBase64: string } | undefined;
};

/** The line round a thing of wood. */
export const woodEdge = (wood: Colour, paperScale: PaperScale) => ({
  colour: mixColours(wood, "#2A1E0C", 0.68),
  widthMm: outlineMm * 0.9 * paperScale,
});

/** Width of the fine line along a joint between two pieces of wood, mm of paper. */
export const jointLineMm = 0.12;

/** The backer from the front: a plank with its grain, or slats as they lie. Slats that can't be laid are drawn as a plank of their wood. */
export function drawBoardFace(face: BoardFace, box: Box, outline: Path): Item[] {
  const { document, kernel, paperScale } = face;
  const colour = faceColour(document.backer);
  const slats = slatsOf(document, kernel);
  const drawn = slats?.ok
    ? drawSlatFace({ document, kernel, layout: slats.value, box, outline, lineMm: jointLineMm * paperScale })
    : drawPlank(face, box, outline);
  return [...drawn, { kind: "path", path: outline, stroke: woodEdge(colour, paperScale) }];
}

function drawPlank({ document, texture }: BoardFace, box: Box, outline: Path): Item[] {
  const colour = faceColour(document.backer);
  const face: Item = texture
    ? { kind: "image", box, pngBase64: texture.pngBase64 }
    : woodGrain(box, colour, seedOfText(faceStock(document.backer).name), document.backer.grainTurn);
  return [
    { kind: "path", id: "board", path: outline, fill: colour },
    { kind: "clip", clip: outline, items: [face] },
  ];
}

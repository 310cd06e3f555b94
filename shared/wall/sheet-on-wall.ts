import type { WallPhoto } from "../mockup/document.ts";
import { paperOf } from "../units/paper.ts";
import type { Quad } from "./quad.ts";

type Sheet = Pick<WallPhoto, "paper" | "lies">;

/** Width and height of a taped sheet in mm as it hangs: A4 after ISO 216, Letter after ANSI/ASME Y14.1 (8½ × 11 in). */
export function sheetSizeMm({ paper, lies }: Sheet): { readonly width: number; readonly height: number } {
  const size = paperOf(paper);
  if (!size) throw new Error(`The list of papers has no ${paper}.`);
  const { widthMm, heightMm } = size;
  return lies === "upright" ? { width: widthMm, height: heightMm } : { width: heightMm, height: widthMm };
}

/** The sheet's corners on the wall in mm, x right and y down from its middle. */
export function sheetCornersMm(sheet: Sheet): Quad {
  const { width, height } = sheetSizeMm(sheet);
  const [x, y] = [width / 2, height / 2];
  return [
    { x: -x, y: -y },
    { x, y: -y },
    { x, y },
    { x: -x, y },
  ];
}

import type { Point } from "../geometry/path.ts";
import type { Colour, Font, Item } from "./display-list.ts";
import { ink } from "./palette.ts";
import { smallTextMm } from "./type.ts";

type TextStyle = {
  readonly font?: Font;
  readonly sizeMm?: number;
  readonly colour?: Colour;
  readonly align?: "left" | "middle" | "right";
};

/** A line of lettering on paper; small, ink and sans unless said otherwise. */
export function textItem(text: string, at: Point, style: TextStyle = {}): Item {
  const { font = "sans", sizeMm = smallTextMm, colour = ink, align = "left" } = style;
  return { kind: "text", text, at, sizeMm, font, colour, align };
}

/** A straight line on paper. */
export function lineItem(from: Point, to: Point, widthMm: number, colour: Colour = ink): Item {
  return { kind: "line", points: [from, to], stroke: { colour, widthMm } };
}

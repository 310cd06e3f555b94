import type { Box, Path, Point } from "../geometry/path.ts";
import { pathTransform, translateMatrix } from "../geometry/transform.ts";
import type { Acrylic } from "../mockup/document.ts";
import type { Colour, Item } from "./display-list.ts";
import { type Light, shadowDirection } from "./light.ts";
import { mirrorImage } from "./mirror-image.ts";
import { mixColours } from "./palette.ts";

export type AcrylicFace = {
  readonly id: string;
  readonly path: Path;
  readonly box: Box;
  readonly stock: Pick<Acrylic, "colour" | "look">;
  readonly thicknessMm: number;
  readonly light: Pick<Light, "azimuth">;
  /** Width of the fine line round the piece. */
  readonly lineMm: number;
};

const white: Colour = "#FFFFFF";
const black: Colour = "#14110D";

/** How each look is drawn: what shows through the body, and how bright and dark the edges towards and from the light are. */
const looks = {
  opaque: { body: 1, paler: 0, bright: 0.34, dark: 0.3 },
  frosted: { body: 0.88, paler: 0.1, bright: 0.3, dark: 0.12 },
  clear: { body: 0.16, paler: 0.1, bright: 0.8, dark: 0.34 },
  mirror: { body: 1, paler: 0.18, bright: 0.7, dark: 0.36 },
} as const;

/**
 * A piece of acrylic from the front. Opaque: its colour with a bright edge towards the light and a dark one away from it; frosted: softer, a
 * little of the ground showing; clear: the ground with bright edges; mirror: a room's reflection in grades.
 */
export function drawAcrylic(face: AcrylicFace): Item[] {
  const { id, path, stock, lineMm } = face;
  const look = looks[stock.look];
  const body: Item = {
    kind: "path",
    id,
    path,
    fill: mixColours(stock.colour, white, look.paler),
    ...(look.body < 1 ? { opacity: look.body } : {}),
  };
  const edge: Item = {
    kind: "path",
    path,
    stroke: { colour: mixColours(stock.colour, black, stock.look === "clear" ? 0.3 : 0.45), widthMm: lineMm },
  };
  return [body, { kind: "clip", clip: path, items: [...insideOf(face), ...edgesOf(face)] }, edge];
}

/** What is seen in the face itself, before its edges. */
function insideOf({ path, box, stock, thicknessMm, lineMm }: AcrylicFace): Item[] {
  const rim = (widthMm: number, opacity: number): Item => ({
    kind: "path",
    path,
    stroke: { colour: white, widthMm },
    opacity,
  });
  const thick = edgeMm(thicknessMm, lineMm);
  switch (stock.look) {
    case "opaque":
      return [];
    case "mirror":
      return [{ kind: "image", box, pngBase64: mirrorImage(stock.colour) }];
    case "frosted":
      // Light that comes in by the edges glows near them.
      return [rim(thick * 9, 0.1), rim(thick * 5.5, 0.12), rim(thick * 3, 0.14)];
    case "clear":
      return [gleam(box), rim(thick * 2.6, 0.42)];
  }
}

/** How wide a polished edge shows: a part of the sheet's thickness, and never less than can be seen. */
const edgeMm = (thicknessMm: number, lineMm: number) => Math.max(lineMm * 1.1, thicknessMm * 0.16);

/** What of the piece lies within a shift of its edges towards the light, and away from it. */
function edgesOf({ path, stock, thicknessMm, light, lineMm }: AcrylicFace): Item[] {
  const away = shadowDirection({ ...light, elevation: 45, angularSize: 0 });
  const wide = edgeMm(thicknessMm, lineMm) + lineMm / 2;
  const look = looks[stock.look];
  // Even-odd with its own shifted copy, clipped to the piece, leaves what the copy does not cover.
  const crescent = (by: number, fill: Colour, opacity: number): Item => ({
    kind: "path",
    path: [...path, ...pathTransform(path, translateMatrix(away.x * by, away.y * by))],
    fill,
    opacity,
  });
  return [
    crescent(wide, mixColours(stock.colour, white, 0.72), look.bright),
    crescent(-wide, mixColours(stock.colour, black, 0.8), look.dark),
  ];
}

/** A faint light across a clear sheet, by which one sees that there is one. */
function gleam({ x, y, width, height }: Box): Item {
  const lean = height * 0.35;
  const band = (from: number, share: number): readonly Point[] => {
    const left = x + (width + lean) * from;
    const right = left + (width + lean) * share;
    return [
      { x: left, y },
      { x: right, y },
      { x: right - lean, y: y + height },
      { x: left - lean, y: y + height },
    ];
  };
  return {
    kind: "path",
    path: [band(0.2, 0.2), band(0.46, 0.06)].map(([start = { x, y }, ...rest]) => ({
      start,
      segments: rest.map((to) => ({ kind: "line" as const, to })),
    })),
    fill: white,
    opacity: 0.14,
  };
}

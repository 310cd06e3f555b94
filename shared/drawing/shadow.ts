import { boxGrow, boxIntersection, boxOfPoints, boxUnion } from "../geometry/box.ts";
import type { Box } from "../geometry/path.ts";
import { base64OfBytes } from "./base64.ts";
import type { Item } from "./display-list.ts";
import { type Light, penumbraMm, shadowDirection, shadowOffsetMm, sigmaOfWidth } from "./light.ts";
import { blurMask, emptyMask, keepDarker, type Mask, maskAt } from "./mask.ts";
import { alphaPng } from "./png.ts";
import { type Caster, type Frame, inFrame, sweptMask, windowOf } from "./shadow-sweep.ts";

export type ShadowOptions = {
  readonly light: Light;
  /** Height of the surface that receives the shadow, above the back of the board. */
  readonly level: number;
  /** Boxes of what lies at that height; the shadow is made for where casters reach into them. */
  readonly receivers: readonly Box[];
  readonly casters: readonly Caster[];
  /** Opacity of a full shadow, 0 to 1; a wall far behind gets more of the room's light than the board. */
  readonly strength?: number;
};

/** Shadows are warm and never black: what they darken is still lit by the room. */
export const shadowColour = "#1A1208";
/** How much of the light is the lamp's own, where the sign hides it. Looked for by eye on pale pine. */
export const boardStrength = 0.42;

/** Opacities come in steps this large (at most 1.3 grey levels on the sheet): the same rows again pack better than noise in the last bit. */
const alphaStep = 3;

const finestMm = 25.4 / 72;
const coarsestMm = 25.4 / 50;
const mostCells = 1_500_000;
/** Of the mask in the light's axes, which holds the blur's margin too: a soft light far before the board makes that many times the picture. */
const mostMaskCells = 12_000_000;

/** A blur that spreads over so many cells looks no smoother in finer ones. */
const cellsOfSigma = 20;

/**
 * The size of a cell in mm: half the least blur, between 72 and 50 to the inch; coarser when that blur is wide
 * or the picture would be too large.
 */
function cellMm(box: Box, leastSigma: number): number {
  const wanted = Math.min(coarsestMm, Math.max(finestMm, leastSigma / 2));
  return Math.max(wanted, leastSigma / cellsOfSigma, Math.sqrt((box.width * box.height) / mostCells));
}

/** Casters that reach above the level, by their height over it, so that each height is blurred once. */
function castersByTop({ casters, level }: ShadowOptions): Map<number, Caster[]> {
  const groups = new Map<number, Caster[]>();
  for (const caster of casters) {
    if (caster.top - level <= 1e-6 || caster.region.length === 0) continue;
    const top = Math.round(caster.top * 1000) / 1000;
    groups.set(top, [...(groups.get(top) ?? []), caster]);
  }
  return groups;
}

/** The shadow on one level as a mask in the light's own axes; null when nothing falls on the receiver. */
function levelMask(options: ShadowOptions): { frame: Frame; mask: Mask; reach: Box } | null {
  const { light, level, receivers } = options;
  const groups = castersByTop(options);
  const sigmas = [...groups.keys()].map((top) => {
    const width = penumbraMm(top - level, light);
    return { top, along: sigmaOfWidth(width.along), across: sigmaOfWidth(width.across) };
  });
  const most = Math.max(0, ...sigmas.map(({ along }) => along));
  const fall = shadowDirection(light);
  // Where shadows can lie at all, on the board: every caster moved by its sweep, and three sigma more, on what receives them.
  const touched = [...groups.values()].flat().flatMap(({ region, bottom, top }) => {
    const box = boxOfPoints(region.flat());
    if (!box) return [];
    const moved = [Math.max(bottom - level, 0), top - level].map((height) => {
      const distance = shadowOffsetMm(height, light);
      return { ...box, x: box.x + fall.x * distance, y: box.y + fall.y * distance };
    });
    const swept = boxUnion(moved);
    return swept ? receivers.map((receiver) => boxIntersection(boxGrow(swept, 3 * most), receiver)) : [];
  });
  const reach = boxUnion(touched.filter((box) => box !== null && box.width > 0 && box.height > 0));
  if (!reach) return null;
  const axes = { along: fall, across: { x: -fall.y, y: fall.x } };
  const corners = [0, 1, 2, 3].map((corner) =>
    inFrame(axes, {
      x: reach.x + (corner % 2) * reach.width,
      y: reach.y + (corner < 2 ? 0 : 1) * reach.height,
    }),
  );
  const turned = boxOfPoints(corners) ?? reach;
  const coarse = Math.sqrt(((turned.width + 6 * most) * (turned.height + 6 * most)) / mostMaskCells);
  const cell = Math.max(coarse, cellMm(reach, Math.min(...sigmas.map(({ across }) => across))));
  const margin = 3 * most + 2 * cell;
  const box = {
    x: turned.x - margin,
    y: turned.y - margin,
    width: turned.width + 2 * margin,
    height: turned.height + 2 * margin,
  };
  const frame: Frame = { ...axes, box, cell };
  const darkest = emptyMask(Math.ceil(box.width / cell), Math.ceil(box.height / cell));
  for (const { top, along, across } of sigmas) {
    const group = groups.get(top) ?? [];
    const window = windowOf(group, options, frame, darkest, 3 * along + 2 * cell);
    if (window.columns <= 0 || window.rows <= 0) continue;
    const origin = { x: box.x + window.column * cell, y: box.y + window.row * cell };
    const part = { ...frame, box: { ...origin, width: window.columns * cell, height: window.rows * cell } };
    const mask = sweptMask(group, options, part, window);
    blurMask(mask, along / cell, across / cell);
    keepDarker(darkest, mask, window.column, window.row);
  }
  return { frame, mask: darkest, reach };
}

/** The shadow on one level as opacities on the board's own axes; null when there is none to see. Deterministic. */
export function shadowPlane(
  options: ShadowOptions,
): { box: Box; width: number; height: number; pixels: Uint8Array } | null {
  const made = levelMask(options);
  if (!made) return null;
  const { frame, mask, reach } = made;
  const width = Math.ceil(reach.width / frame.cell);
  const height = Math.ceil(reach.height / frame.cell);
  const pixels = new Uint8Array(width * height);
  let darkest = 0;
  for (let row = 0; row < height; row += 1) {
    const start = inFrame(frame, { x: reach.x + 0.5 * frame.cell, y: reach.y + (row + 0.5) * frame.cell });
    // One cell to the right on the board is one step of the unit vector (along.x, across.x) in the light's axes.
    let x = (start.x - frame.box.x) / frame.cell;
    let y = (start.y - frame.box.y) / frame.cell;
    for (let column = 0; column < width; column += 1) {
      const alpha = Math.round((255 / alphaStep) * Math.min(1, maskAt(mask, x, y))) * alphaStep;
      pixels[row * width + column] = alpha;
      if (alpha > darkest) darkest = alpha;
      x += frame.along.x;
      y += frame.across.x;
    }
  }
  const box = { x: reach.x, y: reach.y, width: width * frame.cell, height: height * frame.cell };
  return darkest === 0 ? null : { box, width, height, pixels };
}

/** The shadow on one level as an image item, the same for every painter; null when there is none to see. */
export function shadowItem(options: ShadowOptions): Extract<Item, { kind: "image" }> | null {
  const plane = shadowPlane(options);
  if (!plane) return null;
  const png = alphaPng(plane, shadowColour);
  return { kind: "image", box: plane.box, pngBase64: base64OfBytes(png), opacity: options.strength ?? boardStrength };
}

import { boxGrow, boxIntersection, boxOfPoints, boxUnion } from "../geometry/box.ts";
import type { Box, Point, Region } from "../geometry/path.ts";
import { base64OfBytes } from "./base64.ts";
import type { Item } from "./display-list.ts";
import { type Light, penumbraMm, shadowDirection, shadowOffsetMm, sigmaOfWidth } from "./light.ts";
import { addSpan, blurMask, emptyMask, keepDarker, type Mask, maskAt } from "./mask.ts";
import { alphaPng } from "./png.ts";

/** Something that stands in the light: its outline on the board and where it starts and ends above the back of the board. */
export type Caster = { readonly region: Region; readonly bottom: number; readonly top: number };

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
const shadowColour = "#1A1208";
/** How much of the light is the lamp's own, where the sign hides it. Looked for by eye on pale pine. */
const boardStrength = 0.42;

/** Opacities come in steps this large (at most 1.3 grey levels on the sheet): the same rows again pack better than noise in the last bit. */
const alphaStep = 3;

const finestMm = 25.4 / 72;
const coarsestMm = 25.4 / 50;
const mostCells = 1_500_000;
/** Rows are sampled this many times a cell, columns exactly. */
const samplesPerRow = 4;

/** The size of a cell in mm: half the least blur, between 72 and 50 to the inch, coarser when the picture would be too large. */
function cellMm(box: Box, leastSigma: number): number {
  const wanted = Math.min(coarsestMm, Math.max(finestMm, leastSigma / 2));
  return Math.max(wanted, Math.sqrt((box.width * box.height) / mostCells));
}

type Frame = { readonly along: Point; readonly across: Point; readonly box: Box; readonly cell: number };

const inFrame = ({ along, across }: Frame, { x, y }: Point): Point => ({
  x: x * along.x + y * along.y,
  y: x * across.x + y * across.y,
});

type Edge = { readonly top: number; readonly bottom: number; readonly x: number; readonly slope: number };

/** Edges of a region in the light's own axes, in cells, without the level ones. */
function edgesOf(region: Region, frame: Frame): Edge[] {
  const toCells = (point: Point): Point => {
    const turned = inFrame(frame, point);
    return { x: (turned.x - frame.box.x) / frame.cell, y: (turned.y - frame.box.y) / frame.cell };
  };
  return region.flatMap((polygon) => {
    const points = polygon.map(toCells);
    return points.flatMap((to, index): Edge[] => {
      const from = points.at(index - 1) ?? to;
      if (from.y === to.y) return [];
      const [upper, lower] = from.y < to.y ? [from, to] : [to, from];
      const slope = (lower.x - upper.x) / (lower.y - upper.y);
      return [{ top: upper.y, bottom: lower.y, x: upper.x, slope }];
    });
  });
}

/** Where sample rows cross the edges of one caster, for the rows it reaches only. */
function crossingsByRow(edges: readonly Edge[], rows: number): { first: number; crossings: number[][] } {
  const rowAfter = (y: number) => Math.min(rows, Math.max(0, Math.ceil(y * samplesPerRow - 0.5)));
  const first = edges.reduce((least, { top }) => Math.min(least, rowAfter(top)), rows);
  const end = edges.reduce((most, { bottom }) => Math.max(most, rowAfter(bottom)), 0);
  const crossings: number[][] = Array.from({ length: Math.max(0, end - first) }, () => []);
  for (const edge of edges) {
    for (let row = rowAfter(edge.top); row < rowAfter(edge.bottom); row += 1) {
      crossings[row - first]?.push(edge.x + edge.slope * ((row + 0.5) / samplesPerRow - edge.top));
    }
  }
  return { first, crossings };
}

type Span = { readonly from: number; readonly to: number };

function spansJoined(spans: Span[]): Span[] {
  const joined: { from: number; to: number }[] = [];
  for (const span of spans.sort((a, b) => a.from - b.from)) {
    const last = joined.at(-1);
    if (last && span.from <= last.to) last.to = Math.max(last.to, span.to);
    else joined.push({ ...span });
  }
  return joined;
}

/** The part of the frame's grid one group of casters can darken: it blurs that part and nothing else. */
type Window = { readonly column: number; readonly row: number; readonly columns: number; readonly rows: number };

function windowOf(
  casters: readonly Caster[],
  options: ShadowOptions,
  frame: Frame,
  grid: Mask,
  reachMm: number,
): Window {
  const corners = casters.flatMap(({ region, bottom, top }) => {
    const box = boxOfPoints(region.flat().map((point) => inFrame(frame, point)));
    if (!box) return [];
    const [near, far] = [Math.max(bottom - options.level, 0), top - options.level].map((height) =>
      shadowOffsetMm(height, options.light),
    );
    return [
      { x: box.x + (near ?? 0) - reachMm, y: box.y - reachMm },
      { x: box.x + box.width + (far ?? 0) + reachMm, y: box.y + box.height + reachMm },
    ];
  });
  const box = boxOfPoints(corners) ?? frame.box;
  const within = (value: number, most: number) => Math.min(most, Math.max(0, value));
  const column = within(Math.floor((box.x - frame.box.x) / frame.cell), grid.columns);
  const row = within(Math.floor((box.y - frame.box.y) / frame.cell), grid.rows);
  const right = within(Math.ceil((box.x + box.width - frame.box.x) / frame.cell), grid.columns);
  const bottom = within(Math.ceil((box.y + box.height - frame.box.y) / frame.cell), grid.rows);
  return { column, row, columns: right - column, rows: bottom - row };
}

/**
 * The casters that end at one height, swept from where they start (or from the receiver, if they start below it) to their top. The
 * light falls along the rows, so the sweep only makes each span of a row longer: it is exact.
 */
function sweptMask(casters: readonly Caster[], options: ShadowOptions, frame: Frame, { columns, rows }: Window): Mask {
  const mask = emptyMask(columns, rows);
  const sampleRows = rows * samplesPerRow;
  const spans: Span[][] = Array.from({ length: sampleRows }, () => []);
  for (const caster of casters) {
    const near = shadowOffsetMm(Math.max(caster.bottom - options.level, 0), options.light) / frame.cell;
    const far = shadowOffsetMm(caster.top - options.level, options.light) / frame.cell;
    const { first, crossings: rowsCrossed } = crossingsByRow(edgesOf(caster.region, frame), sampleRows);
    for (const [row, crossings] of rowsCrossed.entries()) {
      crossings.sort((a, b) => a - b);
      for (let index = 0; index + 1 < crossings.length; index += 2) {
        spans[first + row]?.push({ from: (crossings[index] ?? 0) + near, to: (crossings[index + 1] ?? 0) + far });
      }
    }
  }
  for (const [row, list] of spans.entries()) {
    for (const { from, to } of spansJoined(list)) {
      addSpan(mask, Math.floor(row / samplesPerRow), from, to, 1 / samplesPerRow);
    }
  }
  return mask;
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
  const cell = cellMm(reach, Math.min(...sigmas.map(({ across }) => across)));
  const axes = { along: fall, across: { x: -fall.y, y: fall.x } };
  const corners = [0, 1, 2, 3].map((corner) =>
    inFrame(
      { ...axes, box: reach, cell },
      {
        x: reach.x + (corner % 2) * reach.width,
        y: reach.y + (corner < 2 ? 0 : 1) * reach.height,
      },
    ),
  );
  const turned = boxOfPoints(corners) ?? reach;
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

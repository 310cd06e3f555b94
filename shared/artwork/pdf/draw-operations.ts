import type { Box } from "../../geometry/path.ts";
import { pathToText } from "../../geometry/path-text.ts";
import { rectanglePath } from "../../geometry/shapes.ts";
import { type Matrix, matrixMultiply } from "../../geometry/transform.ts";
import { artworkLimits } from "../limits.ts";
import { ArtworkRefused } from "../refusals.ts";
import type { WarningCode } from "../warnings.ts";
import { beginGroup, endGroup, type OpenGroup } from "./draw-groups.ts";
import { drawPath, paintArea } from "./draw-path.ts";
import { drawText } from "./draw-text.ts";
import type { GraphicsState } from "./graphics-state.ts";
import { colourOf, isRecord, matrixOf, numberAt, numbersOf } from "./operands.ts";
import { paintOfShading, paintOfTiling } from "./paint-of-pattern.ts";
import { rectangleOf } from "./path-data.ts";
import type { PdfOperation, PdfPage } from "./pdf-page.ts";
import type { Outline, SvgWriter } from "./svg-writer.ts";

/** What is kept while a page's content is followed. */
export type PageWalk = {
  readonly page: PdfPage;
  readonly pageBox: Box;
  readonly writer: SvgWriter;
  readonly warnings: Set<WarningCode>;
  state: GraphicsState;
  readonly saved: GraphicsState[];
  readonly groups: OpenGroup[];
  /** For each open stretch of marked content whether it shows. */
  readonly content: boolean[];
  /** The rule of the clip that the next path becomes. */
  clipRule: Outline["rule"] | null;
  /** Glyphs that become a clip when the text ends. */
  textClip: Outline[];
  /** The mask that was drawn last and that the next graphics state may take up. */
  pendingMask: string | null;
  depth: number;
};

type Step = (walk: PageWalk, args: readonly unknown[]) => void;

/** Follows operations one after the other and writes what they paint. Unknown ones paint nothing. */
export function drawOperations(walk: PageWalk, operations: readonly PdfOperation[]): void {
  if (walk.depth > artworkLimits.depth) throw new ArtworkRefused("svg.too-deep");
  walk.depth += 1;
  for (const { name, args } of operations) {
    const step = steps[name] ?? (name.startsWith("paint") ? leaveOut : null);
    if (step) step(walk, args);
    else drawText(walk, name, args, drawOperations);
  }
  walk.depth -= 1;
}

/** Whether what is painted now shows: no layer round it is hidden. */
export const isShown = ({ content }: PageWalk): boolean => content.every(Boolean);

const leaveOut: Step = (walk) => {
  if (!isShown(walk)) return;
  walk.warnings.add("image.left-out");
  for (const group of walk.groups) group.hasPicture = true;
};

const steps: Readonly<Record<string, Step>> = {
  save: (walk) => void walk.saved.push({ ...walk.state }),
  restore: (walk) => {
    walk.state = walk.saved.pop() ?? walk.state;
  },
  transform: (walk, args) => {
    const matrix = matrixOf(args);
    if (matrix) walk.state.matrix = matrixMultiply(walk.state.matrix, matrix);
  },
  setLineWidth: ({ state }, args) => {
    state.lineWidth = Math.abs(numberAt(args, 0, state.lineWidth));
  },
  setLineCap: ({ state }, args) => {
    state.cap = numberAt(args, 0);
  },
  setLineJoin: ({ state }, args) => {
    state.join = numberAt(args, 0);
  },
  setMiterLimit: ({ state }, args) => {
    state.mitreLimit = numberAt(args, 0, 10);
  },
  setDash: (walk, args) => setDash(walk.state, args),
  setGState: (walk, args) => {
    for (const entry of Array.isArray(args[0]) ? args[0] : []) if (Array.isArray(entry)) setParameter(walk, entry);
  },
  setFillRGBColor: ({ state }, args) => {
    state.fill = plain(args[0]);
  },
  setStrokeRGBColor: ({ state }, args) => {
    state.stroke = plain(args[0]);
  },
  setFillTransparent: ({ state }) => {
    state.fill = null;
  },
  setStrokeTransparent: ({ state }) => {
    state.stroke = null;
  },
  setFillColorN: (walk, args) => {
    walk.state.fill = patternOf(walk, args);
  },
  setStrokeColorN: (walk, args) => {
    walk.state.stroke = patternOf(walk, args);
  },
  clip: (walk) => {
    walk.clipRule = "nonzero";
  },
  eoClip: (walk) => {
    walk.clipRule = "evenodd";
  },
  constructPath: drawPath,
  shadingFill: (walk, args) => {
    const colour = typeof args[0] === "string" ? paintOfShading(walk.page.shading(args[0]), walk.warnings) : null;
    const everywhere = { data: pathToText(rectanglePath(walk.pageBox)), rule: "nonzero", matrix: identity } as const;
    paintArea(walk, everywhere, { fill: colour, stroke: null });
  },
  paintSolidColorImageMask: (walk) => {
    const { matrix, fill } = walk.state;
    paintArea(walk, { data: "M0 0H1V1H0Z", rule: "nonzero", matrix }, { fill, stroke: null });
  },
  paintFormXObjectBegin: (walk, args) => {
    walk.saved.push({ ...walk.state });
    const matrix = matrixOf(args[0]);
    if (matrix) walk.state.matrix = matrixMultiply(walk.state.matrix, matrix);
    clipToBox(walk, numbersOf(args[1]), walk.state.matrix);
  },
  paintFormXObjectEnd: (walk) => {
    walk.state = walk.saved.pop() ?? walk.state;
  },
  beginGroup: (walk, args) => {
    const group = isRecord(args[0]) ? args[0] : {};
    beginGroup(walk, group);
    const matrix = matrixOf(group.matrix);
    clipToBox(walk, numbersOf(group.bbox), matrix ? matrixMultiply(walk.state.matrix, matrix) : walk.state.matrix);
  },
  endGroup,
  setCharWidthAndBounds: () => undefined,
  beginMarkedContent: ({ content }) => void content.push(true),
  beginMarkedContentProps: (walk, [tag, group]) => {
    const shows = tag !== "OC" || walk.page.isVisible(group);
    if (!shows) walk.warnings.add("pdf.layer-hidden");
    walk.content.push(shows);
  },
  endMarkedContent: ({ content }) => void content.pop(),
};

const identity: Matrix = { a: 1, b: 0, c: 0, d: 1, e: 0, f: 0 };

const plain = (value: unknown): GraphicsState["fill"] => {
  const colour = colourOf(value);
  return colour ? { colour, alpha: 1 } : null;
};

function patternOf(walk: PageWalk, args: readonly unknown[]): GraphicsState["fill"] {
  if (args[0] === "TilingPattern") return paintOfTiling(args, walk.warnings);
  return paintOfShading(typeof args[1] === "string" ? walk.page.shading(args[1]) : null, walk.warnings);
}

function setDash(state: GraphicsState, args: readonly unknown[]): void {
  const dashes = numbersOf(args[0]);
  // Dashes of no length at all, or below nothing, mean a line without any (ISO 32000-1, 8.4.3.6).
  state.dashes = dashes.every((dash) => dash >= 0) && dashes.some((dash) => dash > 0) ? dashes : [];
  state.dashOffset = numberAt(args, 1);
}

function setParameter(walk: PageWalk, [key, value]: readonly unknown[]): void {
  const { state } = walk;
  const one = [value];
  switch (key) {
    case "LW":
      state.lineWidth = numberAt(one, 0, state.lineWidth);
      break;
    case "LC":
      state.cap = numberAt(one, 0);
      break;
    case "LJ":
      state.join = numberAt(one, 0);
      break;
    case "ML":
      state.mitreLimit = numberAt(one, 0, 10);
      break;
    case "D":
      if (Array.isArray(value)) setDash(state, value);
      break;
    case "Font":
      if (Array.isArray(value)) drawText(walk, "setFont", value, drawOperations);
      break;
    case "CA":
      state.strokeAlpha = numberAt(one, 0, 1);
      break;
    case "ca":
      state.fillAlpha = numberAt(one, 0, 1);
      break;
    case "BM":
      state.isBlended = value !== "source-over";
      break;
    case "SMask":
      state.mask = value === true ? walk.pendingMask : null;
      walk.pendingMask = null;
      break;
  }
}

function clipToBox(walk: PageWalk, box: readonly number[], matrix: Matrix): void {
  const [x0, y0, x1, y1] = box;
  if (x0 === undefined || y0 === undefined || x1 === undefined || y1 === undefined) return;
  const packed = [0, x0, y0, 1, x1, y0, 1, x1, y1, 1, x0, y1, 4];
  walk.state.clip = walk.writer.clipTo(
    walk.state.clip,
    [
      {
        data: pathToText(rectanglePath({ x: x0, y: y0, width: x1 - x0, height: y1 - y0 }), 5),
        rule: "nonzero",
        matrix,
      },
    ],
    rectangleOf(packed, matrix),
  );
}

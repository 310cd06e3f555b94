import { type Matrix, matrixMultiply, scaleMatrix, translateMatrix } from "../geometry/transform.ts";
import type { WarningCode } from "./warnings.ts";

export type SizeAttributes = {
  readonly width?: string;
  readonly height?: string;
  readonly viewBox?: string;
  readonly aspect?: string;
};

export type ViewBox = readonly [x: number, y: number, width: number, height: number];

/** The drawing's frame: its true size, and the map from its user units to mm with the frame's corner at 0, 0. */
export type Viewport = {
  readonly widthMm: number;
  readonly heightMm: number;
  readonly toMm: Matrix;
  readonly warning: Extract<WarningCode, "size.guessed" | "size.rescaled"> | null;
};

const mmPerPx = 25.4 / 96;
/** CSS absolute lengths (CSS Values and Units 4, section 6.2). A plain number is a px: it says nothing of a true size. */
const mmPerUnit: Readonly<Record<string, number>> = {
  mm: 1,
  cm: 10,
  q: 0.25,
  in: 25.4,
  pt: 25.4 / 72,
  pc: 25.4 / 6,
  px: mmPerPx,
  "": mmPerPx,
};
/** Sizes beyond these come from a page set in another unit, not from a sign. */
const smallestMm = 1;
const largestMm = 10_000;
const fittedMm = 300;

/**
 * The frame from the root's attributes as written and the view box the reader settled on (which stands in when the file
 * has none). Null when a given width or height is zero or negative. A missing width or height follows from the other by
 * the view box's proportions.
 */
export function viewportOf(size: SizeAttributes, settled: ViewBox): Viewport | null {
  const width = readLength(size.width);
  const height = readLength(size.height);
  if ((width && width.mm <= 0) || (height && height.mm <= 0)) return null;
  const [x, y, boxWidth, boxHeight] = readViewBox(size.viewBox) ?? settled;

  let widthMm = width?.mm ?? (height ? (height.mm * boxWidth) / boxHeight : boxWidth * mmPerPx);
  let heightMm = height?.mm ?? (width ? (width.mm * boxHeight) / boxWidth : boxHeight * mmPerPx);
  const longest = Math.max(widthMm, heightMm);
  const known = width?.isTrue ?? height?.isTrue ?? false;
  let warning: Viewport["warning"] = known ? null : "size.guessed";
  if (longest < smallestMm || longest > largestMm) {
    widthMm *= fittedMm / longest;
    heightMm *= fittedMm / longest;
    warning = "size.rescaled";
  }

  const fitX = widthMm / boxWidth;
  const fitY = heightMm / boxHeight;
  const [align = "xMidYMid", meetOrSlice] = (size.aspect ?? "")
    .trim()
    .split(/\s+/)
    .filter((word) => word !== "defer");
  if (align === "none") {
    return { widthMm, heightMm, toMm: matrixMultiply(scaleMatrix(fitX, fitY), translateMatrix(-x, -y)), warning };
  }
  const scale = meetOrSlice === "slice" ? Math.max(fitX, fitY) : Math.min(fitX, fitY);
  const spareX = (widthMm - boxWidth * scale) * share(align.slice(1, 4));
  const spareY = (heightMm - boxHeight * scale) * share(align.slice(5, 8));
  const toMm = matrixMultiply(
    translateMatrix(spareX, spareY),
    matrixMultiply(scaleMatrix(scale), translateMatrix(-x, -y)),
  );
  return { widthMm, heightMm, toMm, warning };
}

/** The four numbers of a view box with a positive width and height; null otherwise. */
export function readViewBox(viewBox: string | undefined): ViewBox | null {
  const numbers = (viewBox ?? "")
    .trim()
    .split(/[\s,]+/)
    .map(Number);
  const [x, y, width, height] = numbers;
  if (numbers.length !== 4 || !numbers.every(Number.isFinite)) return null;
  if (x === undefined || y === undefined || width === undefined || height === undefined) return null;
  return width > 0 && height > 0 ? [x, y, width, height] : null;
}

function readLength(text: string | undefined): { readonly mm: number; readonly isTrue: boolean } | null {
  const match = /^\s*([+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?)\s*([a-z]*)\s*$/i.exec(text ?? "");
  const unit = match?.[2]?.toLowerCase() ?? "";
  const perUnit = mmPerUnit[unit];
  const number = Number(match?.[1]);
  // Shares of a page and lengths in letters have no size of their own.
  if (!match || perUnit === undefined || !Number.isFinite(number)) return null;
  return { mm: number * perUnit, isTrue: unit !== "" && unit !== "px" };
}

const share = (word: string) => (word === "Min" ? 0 : word === "Max" ? 1 : 0.5);

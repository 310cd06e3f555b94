import type { PageWalk } from "./draw-operations.ts";
import type { GraphicsState, PdfPaint } from "./graphics-state.ts";
import { pathData, rectangleOf } from "./path-data.ts";
import { type Outline, pathElement } from "./svg-writer.ts";

/** pdf.js' numbers of the operators that end a path, and what each paints. */
const endings: Readonly<Record<number, { readonly fill: Outline["rule"] | null; readonly strokes: boolean }>> = {
  20: { fill: null, strokes: true },
  21: { fill: null, strokes: true },
  22: { fill: "nonzero", strokes: false },
  23: { fill: "evenodd", strokes: false },
  24: { fill: "nonzero", strokes: true },
  25: { fill: "evenodd", strokes: true },
  26: { fill: "nonzero", strokes: true },
  27: { fill: "evenodd", strokes: true },
  94: { fill: "nonzero", strokes: false },
};

/** Paints a path as its ending says, and makes it the clip of what follows when it was announced to be one. */
export function drawPath(walk: PageWalk, args: readonly unknown[]): void {
  const packed: unknown = Array.isArray(args[1]) ? args[1][0] : null;
  const { clipRule, state } = walk;
  walk.clipRule = null;
  // A clip without a path leaves what was there: readers differ only in files that are at fault.
  if (!(packed instanceof Float32Array)) return;
  const data = pathData(packed);
  if (data === null) {
    walk.warnings.add("number.unreadable");
    return;
  }
  const ending = endings[typeof args[0] === "number" ? args[0] : -1];
  const { matrix } = state;
  if (ending) {
    const outline = { data, rule: ending.fill ?? "nonzero", matrix } as const;
    paintArea(walk, outline, {
      fill: ending.fill ? state.fill : null,
      stroke: ending.strokes ? state.stroke : null,
    });
  }
  if (clipRule)
    state.clip = walk.writer.clipTo(state.clip, [{ data, rule: clipRule, matrix }], rectangleOf(packed, matrix));
}

/** Writes one outline in the paints given, with the pen of the graphics state, or one `penScale` times as wide. */
export function paintArea(
  walk: PageWalk,
  outline: Outline,
  { fill, stroke, penScale = 1 }: { fill: PdfPaint; stroke: PdfPaint; penScale?: number },
): void {
  const { state, writer, warnings } = walk;
  const lines = stroke && state.lineWidth === 0 ? null : stroke;
  if (!walk.content.every(Boolean)) return;
  if (stroke && !lines) warnings.add("pdf.hairline");
  if (!fill && !lines) return;
  writer.countPath();
  if (state.isBlended) warnings.add("blend.ignored");
  const attributes = [
    paintAttributes("fill", fill, state.fillAlpha),
    `fill-rule="${outline.rule}"`,
    ...(lines ? [paintAttributes("stroke", lines, state.strokeAlpha), pen(state, penScale)] : []),
  ];
  writer.draw(pathElement(outline, attributes.join(" ")), { clip: state.clip, mask: state.mask });
}

function paintAttributes(kind: "fill" | "stroke", paint: PdfPaint, alpha: number): string {
  if (!paint) return `${kind}="none"`;
  const opacity = paint.alpha * Math.max(0, Math.min(1, alpha));
  return opacity < 1 ? `${kind}="${paint.colour}" ${kind}-opacity="${opacity}"` : `${kind}="${paint.colour}"`;
}

function pen({ lineWidth, cap, join, mitreLimit, dashes, dashOffset }: GraphicsState, scale: number): string {
  const dashed =
    dashes.length === 0
      ? ""
      : ` stroke-dasharray="${dashes.map((dash) => dash * scale).join(" ")}" stroke-dashoffset="${dashOffset * scale}"`;
  const ends = ["butt", "round", "square"][cap] ?? "butt";
  const corners = ["miter", "round", "bevel"][join] ?? "miter";
  return `stroke-width="${lineWidth * scale}" stroke-linecap="${ends}" stroke-linejoin="${corners}" stroke-miterlimit="${Math.max(1, mitreLimit)}"${dashed}`;
}

import { cubicOfQuadratic } from "../geometry/cubic-of-quadratic.ts";
import type { Path, Point, Segment } from "../geometry/path.ts";
import type { GlyphStep } from "./open-face.ts";

/**
 * A glyph's outline in mm about its own origin on the line, y down: font units times `mmPerUnit`, moved by `shift` (font units).
 * Quadratics become the very same curves as cubics. The rings overlap where the font's do and are to be read by the nonzero rule.
 */
export function glyphPath(
  outline: readonly GlyphStep[],
  { mmPerUnit, shift }: { readonly mmPerUnit: number; readonly shift: Point },
): Path {
  const rings: { start: Point; segments: Segment[] }[] = [];
  let at: Point = { x: 0, y: 0 };
  for (const { kind, numbers } of outline) {
    const point = (index: number): Point => ({
      x: ((numbers[2 * index] ?? 0) + shift.x) * mmPerUnit,
      y: -((numbers[2 * index + 1] ?? 0) + shift.y) * mmPerUnit,
    });
    const segments = rings.at(-1)?.segments;
    if (kind === "close") continue;
    if (kind === "move") {
      at = point(0);
      rings.push({ start: at, segments: [] });
    } else if (kind === "line") {
      segments?.push({ kind: "line", to: point(0) });
      at = point(0);
    } else if (kind === "quadratic") {
      segments?.push(cubicOfQuadratic(at, point(0), point(1)));
      at = point(1);
    } else {
      segments?.push({ kind: "cubic", c1: point(0), c2: point(1), to: point(2) });
      at = point(2);
    }
  }
  return rings.filter(({ segments }) => segments.length > 1);
}

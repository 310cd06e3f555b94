import { boxOfPath, boxOfPoints, boxUnion } from "../geometry/box.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { FillRule, Kernel } from "../geometry/kernel.ts";
import type { Box, Path, Region } from "../geometry/path.ts";
import { pathFromText } from "../geometry/path-text.ts";
import { identityMatrix, type Matrix, matrixMultiply, pathTransform } from "../geometry/transform.ts";
import type { ArtworkBudget } from "./budget.ts";
import { transformOf } from "./svg-element.ts";
import type { WarningCode } from "./warnings.ts";
import type { XmlElement } from "./xml-text.ts";

/** What every step of the walk through a drawing needs. */
export type WalkContext = {
  readonly kernel: Kernel;
  readonly byId: ReadonlyMap<string, XmlElement>;
  readonly warnings: Set<WarningCode>;
  readonly budget: ArtworkBudget;
};

/** Shapes that reach farther than this on the working plane are beyond the kernel's grid and beyond sense. */
const farthestMm = 100_000;

/** The area a path element fills on the working plane. Empty, with a warning, when it reaches too far outside. */
export function fillRegion(element: XmlElement, rule: FillRule, matrix: Matrix, context: WalkContext): Region {
  const path = pathTransform(pathOf(element), matrix);
  if (!isNear(path)) {
    context.warnings.add("shape.too-far");
    return [];
  }
  const flat = flattenPath(path);
  context.budget.countVertices(flat.reduce((sum, ring) => sum + ring.length, 0));
  return context.kernel.union(flat, rule);
}

/** Whether all points of a path, handles too, lie where the kernel can work with them. */
export function isNear(path: Path): boolean {
  const near = (value: number) => Math.abs(value) <= farthestMm;
  return path.every(({ start, segments }) =>
    [start, ...segments.flatMap((s) => (s.kind === "line" ? [s.to] : [s.c1, s.c2, s.to]))].every(
      ({ x, y }) => near(x) && near(y),
    ),
  );
}

/** The path of an element's `d`; empty when it has none that can be read. */
export function pathOf(element: XmlElement): Path {
  return pathFromText(element.attributes.d ?? "") ?? [];
}

/** The box around all shapes of an element in its own user space, strokes left aside, hidden shapes included (SVG 2, 8.10). */
export function objectBox(element: XmlElement, matrix: Matrix = identityMatrix): Box | null {
  if (element.name === "path") return boxOfPath(pathTransform(pathOf(element), matrix));
  if (element.name === "image") {
    const [x, y, width, height] = ["x", "y", "width", "height"].map((name) => Number(element.attributes[name] ?? 0));
    if (x === undefined || y === undefined || !width || !height) return null;
    return boxOfPoints(
      pathTransform(
        [{ start: { x, y }, segments: [{ kind: "line", to: { x: x + width, y: y + height } }] }],
        matrix,
      ).flatMap((ring) => [ring.start, ...ring.segments.map(({ to }) => to)]),
    );
  }
  return boxUnion(element.children.map((child) => objectBox(child, matrixMultiply(matrix, transformOf(child)))));
}

/** The map from the unit square to a box; null when the box has no width or height. */
export function boxMatrix(box: Box | null): Matrix | null {
  return box && box.width > 0 && box.height > 0
    ? { a: box.width, b: 0, c: 0, d: box.height, e: box.x, f: box.y }
    : null;
}

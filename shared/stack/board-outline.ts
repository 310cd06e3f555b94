import { boxOfPath } from "../geometry/box.ts";
import type { Path } from "../geometry/path.ts";
import { ellipsePath, rectanglePath, roundedRectanglePath } from "../geometry/shapes.ts";
import { matrixMultiply, pathTransform, scaleMatrix, translateMatrix } from "../geometry/transform.ts";
import type { Board } from "../mockup/document.ts";

/**
 * The board's outline on the board, mm: its box is width by height from the upper left corner, whatever its kind. A radius
 * of more than half the shorter side rounds that side off; a path is stretched to the measures.
 */
export function boardPath({ outline, width, height }: Board): Path {
  const box = { x: 0, y: 0, width, height };
  switch (outline.kind) {
    case "rectangle":
      return rectanglePath(box);
    case "rounded":
      return roundedRectanglePath(box, Math.min(outline.radius, width / 2, height / 2));
    case "ellipse":
      return ellipsePath({ x: width / 2, y: height / 2 }, width / 2, height / 2);
    case "path": {
      const drawn = boxOfPath(outline.path);
      if (!drawn || drawn.width === 0 || drawn.height === 0) return rectanglePath(box);
      const stretch = scaleMatrix(width / drawn.width, height / drawn.height);
      return pathTransform(outline.path, matrixMultiply(stretch, translateMatrix(-drawn.x, -drawn.y)));
    }
  }
}

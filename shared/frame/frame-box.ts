import { boxOfPath, boxOfPoints } from "../geometry/box.ts";
import type { Box, Path } from "../geometry/path.ts";
import { frameCorners } from "./frame-corners.ts";
import { outerCorners } from "./lay-out-frame.ts";

/** The box of a board with a frame of this width round it; the board's own where a frame can't go round its outline. */
export function frameBox(outline: Path, width: number): Box {
  const corners = frameCorners(outline);
  const outer = corners.ok ? boxOfPoints(outerCorners(corners.value, width)) : null;
  return outer ?? boxOfPath(outline) ?? { x: 0, y: 0, width: 0, height: 0 };
}

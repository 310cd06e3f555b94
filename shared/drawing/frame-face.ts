import type { Frame } from "../frame/lay-out-frame.ts";
import { type Kernel, remembered } from "../geometry/kernel.ts";
import type { Box } from "../geometry/path.ts";
import { pathOfRegion } from "../geometry/path-of-region.ts";
import type { MockupDocument } from "../mockup/document.ts";
import { jointLineMm, woodEdge } from "./board-face.ts";
import type { PaperScale } from "./dimensions.ts";
import type { Item } from "./display-list.ts";
import { latticeValue, seedOfText } from "./noise.ts";
import { type GrainStrip, stripGrain } from "./strip-grain.ts";

/** Tones of a frame's pieces in turn: close enough to be one plank's, far enough to see where one ends. */
const memberTones = [5, 3, 4] as const;

/** A frame's pieces as strips of grain, each along its own edge of the board. */
export function stripsOfFrame({ members }: Frame, woodName: string): GrainStrip[] {
  const start = seedOfText(woodName);
  return members.map(({ outline, from, to }, index) => ({
    region: [outline],
    axis: { from, to },
    // The last piece of an odd frame meets the first again, so it takes the tone between.
    tone: memberTones[index === members.length - 1 && index % 2 === 0 ? 2 : index % 2] ?? memberTones[2],
    seed: Math.floor(latticeValue(start + index, 4, 29) * 1_000_000),
  }));
}

/** A frame from the front: grain along each of its pieces, fine lines where they meet, a firm one round it. */
export function drawFrameFace({
  document,
  frame,
  kernel,
  box,
  paperScale,
}: {
  readonly document: MockupDocument;
  readonly frame: Frame;
  readonly kernel: Kernel;
  readonly box: Box;
  readonly paperScale: PaperScale;
}): Item[] {
  const stock = document.frame?.stock;
  if (!stock) return [];
  const grain = remembered(kernel, [frame, stock], "frame grain", () =>
    stripGrain(box, stripsOfFrame(frame, stock.name), stock.colour),
  );
  const pieces = pathOfRegion(frame.members.map(({ outline }) => outline));
  const edge = woodEdge(stock.colour, paperScale);
  return [
    { kind: "path", id: "frame", path: pieces, fill: stock.colour },
    { kind: "clip", clip: pieces, items: [grain] },
    { kind: "path", path: pieces, stroke: { ...edge, widthMm: jointLineMm * 1.5 * paperScale } },
    { kind: "path", path: pathOfRegion([frame.outer]), stroke: edge },
  ];
}

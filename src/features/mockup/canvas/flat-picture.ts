import type { Canvas, FabricObject } from "fabric/es";
import { boxIntersection, boxUnion } from "#shared/geometry/box.ts";
import type { Box } from "#shared/geometry/path.ts";
import type { Shift } from "../model/shifts.ts";
import { flatRuns } from "./flat-runs.ts";
import type { Painted } from "./paint-items.ts";

/** A run as one bitmap with its corner in pixels of the canvas; without a bitmap its objects are drawn themselves. */
type Flat = {
  readonly moves: boolean;
  readonly bitmap: { readonly element: HTMLCanvasElement; readonly x: number; readonly y: number } | null;
  readonly objects: readonly FabricObject[];
};

/** What moves is flattened over its edges out of the window, up to so many windows large. */
const mostWindows = 4;

/** A picture flattened for one look at it: what rests and what moves as a few bitmaps, which cost little to draw again. */
export class FlatPicture {
  readonly moving: ReadonlySet<string>;
  /** Where everything lay when it was flattened. */
  readonly base: ReadonlyMap<string, Shift>;
  readonly #canvas: Canvas;
  readonly #flats: readonly Flat[];

  /** The objects must lie where `base` has them. */
  constructor(
    canvas: Canvas,
    painted: readonly Painted[],
    { base, moving }: { readonly base: ReadonlyMap<string, Shift>; readonly moving: ReadonlySet<string> },
  ) {
    this.#canvas = canvas;
    this.base = base;
    this.moving = moving;
    const seen = painted.filter(({ object }) => object.visible);
    const named = seen.map(({ id, layer }) => ({ id: id?.replace(/^hole:/, "") ?? null, layer }));
    this.#flats = flatRuns(named, moving).map(({ moves, places }) => {
      const objects = places.flatMap((place) => seen[place]?.object ?? []);
      return { moves, bitmap: this.#flatten(objects, moves), objects };
    });
  }

  /** Draws it with what moves moved by a distance, mm, to whole pixels. */
  draw(context: CanvasRenderingContext2D, by: Shift): void {
    const scale = this.#canvas.viewportTransform[0] * this.#canvas.getRetinaScaling();
    for (const { moves, bitmap, objects } of this.#flats) {
      context.save();
      if (bitmap === null) {
        if (moves) context.translate(by.dx, by.dy);
        drawAll(this.#canvas, context, objects);
      } else {
        const [x, y] = moves ? [Math.round(by.dx * scale), Math.round(by.dy * scale)] : [0, 0];
        context.setTransform(1, 0, 0, 1, 0, 0);
        if (bitmap.element.width > 0) context.drawImage(bitmap.element, bitmap.x + x, bitmap.y + y);
      }
      context.restore();
    }
  }

  /** Gives the memory of the bitmaps back at once. */
  free(): void {
    for (const { bitmap } of this.#flats) if (bitmap) bitmap.element.width = 0;
  }

  #flatten(objects: readonly FabricObject[], moves: boolean): Flat["bitmap"] {
    const canvas = this.#canvas;
    const retina = canvas.getRetinaScaling();
    const [scale, , , , left, top] = canvas.viewportTransform;
    const window = { x: 0, y: 0, width: canvas.width * retina, height: canvas.height * retina };
    const around = boxUnion(objects.map(boxWithShadow));
    const inPixels = around && {
      x: (around.x * scale + left) * retina,
      y: (around.y * scale + top) * retina,
      width: around.width * scale * retina,
      height: around.height * scale * retina,
    };
    const kept = inPixels && (moves ? inPixels : boxIntersection(inPixels, window));
    const element = document.createElement("canvas");
    element.width = 0;
    if (kept === null) return { element, x: 0, y: 0 };
    if (kept.width * kept.height > mostWindows * window.width * window.height) return null;
    const [x, y] = [Math.floor(kept.x) - 1, Math.floor(kept.y) - 1];
    element.width = Math.ceil(kept.x + kept.width) + 1 - x;
    element.height = Math.ceil(kept.y + kept.height) + 1 - y;
    const context = element.getContext("2d");
    if (context === null) return null;
    context.setTransform(scale * retina, 0, 0, scale * retina, left * retina - x, top * retina - y);
    drawAll(canvas, context, objects);
    return { element, x, y };
  }
}

/** Draws objects whether or not they would be seen in the window. */
function drawAll(canvas: Canvas, context: CanvasRenderingContext2D, objects: readonly FabricObject[]): void {
  const { skipOffscreen } = canvas;
  canvas.skipOffscreen = false;
  for (const object of objects) object.render(context);
  canvas.skipOffscreen = skipOffscreen;
}

function boxWithShadow(object: FabricObject): Box {
  const { left: x, top: y, width, height } = object.getBoundingRect();
  const { shadow } = object;
  const grow = shadow ? 1.5 * shadow.blur + Math.max(Math.abs(shadow.offsetX), Math.abs(shadow.offsetY)) : 0;
  return { x: x - grow, y: y - grow, width: width + 2 * grow, height: height + 2 * grow };
}

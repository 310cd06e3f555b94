import { FabricObject } from "fabric/es";
import { boxOfPath } from "#shared/geometry/box.ts";
import type { Path } from "#shared/geometry/path.ts";

/**
 * Objects drawn only inside a path, even-odd. fabric's own clip paths go through a cached bitmap of the object, which is
 * slow for large pictures and soft when one looks closer.
 */
export class ClippedItems extends FabricObject {
  static override type = "ClippedItems";
  readonly #outline: Path2D;
  readonly #items: readonly FabricObject[];
  readonly #middle: { readonly x: number; readonly y: number };

  constructor(clip: Path, outlineData: string, items: readonly FabricObject[]) {
    const box = boxOfPath(clip) ?? { x: 0, y: 0, width: 0, height: 0 };
    const middle = { x: box.x + box.width / 2, y: box.y + box.height / 2 };
    super({
      left: middle.x,
      top: middle.y,
      width: box.width,
      height: box.height,
      strokeWidth: 0,
      objectCaching: false,
      selectable: false,
      evented: false,
    });
    this.#outline = new Path2D(outlineData);
    this.#items = items;
    this.#middle = middle;
  }

  override _render(context: CanvasRenderingContext2D): void {
    context.translate(-this.#middle.x, -this.#middle.y);
    context.clip(this.#outline, "evenodd");
    for (const item of this.#items) item.render(context);
  }
}

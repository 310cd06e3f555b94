import { FabricObject } from "fabric/es";
import { pathData } from "#shared/drawing/path-data.ts";
import type { Board } from "#shared/mockup/document.ts";
import { boardPath } from "#shared/stack/board-outline.ts";
import { seenSpacingMm } from "../model/ruler-steps.ts";

/** A grid on a board, and the colour of its wood, which says whether dark or pale lines are seen. */
export type Grid = { readonly board: Board; readonly gridMm: number; readonly wood: string };

/** Lines nearer than this on the screen would be a grey veil. */
const leastPx = 5;

/** Faint lines over the wood, a pixel wide at every look, each fifth a little stronger. */
export class GridLines extends FabricObject {
  static override type = "GridLines";
  readonly #grid: Grid;
  readonly #outline: Path2D;

  constructor(grid: Grid) {
    const { width, height } = grid.board;
    super({
      left: width / 2,
      top: height / 2,
      width,
      height,
      strokeWidth: 0,
      objectCaching: false,
      selectable: false,
      evented: false,
    });
    this.#grid = grid;
    this.#outline = new Path2D(pathData(boardPath(grid.board)));
  }

  override render(context: CanvasRenderingContext2D): void {
    const { board, gridMm, wood } = this.#grid;
    const scale = this.canvas?.viewportTransform[0] ?? 1;
    const spacing = seenSpacingMm(gridMm, scale, leastPx);
    context.save();
    context.clip(this.#outline, "evenodd");
    context.lineWidth = 1 / scale;
    context.strokeStyle = isDark(wood) ? "#FFFFFF" : "#1F1D1A";
    for (const isFifth of [false, true]) {
      context.globalAlpha = isFifth ? 0.3 : 0.15;
      context.beginPath();
      for (let index = 1; index * spacing < Math.max(board.width, board.height); index += 1) {
        if ((index % 5 === 0) !== isFifth) continue;
        const at = index * spacing;
        if (at < board.width) {
          context.moveTo(at, 0);
          context.lineTo(at, board.height);
        }
        if (at < board.height) {
          context.moveTo(0, at);
          context.lineTo(board.width, at);
        }
      }
      context.stroke();
    }
    context.restore();
  }
}

/** By the middle of its channels. */
function isDark(colour: string): boolean {
  const channels = [1, 3, 5].map((at) => Number.parseInt(colour.slice(at, at + 2), 16));
  return channels.reduce((sum, one) => sum + one, 0) / 3 < 110;
}

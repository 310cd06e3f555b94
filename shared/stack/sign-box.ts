import { frameBox } from "../frame/frame-box.ts";
import type { Box } from "../geometry/path.ts";
import type { MockupDocument } from "../mockup/document.ts";
import { boardPath } from "./board-outline.ts";

/** The whole sign from the front, on the board's plane: its body and the frame round it, so it may begin left of and above 0. */
export function signBox({ board, frame }: Pick<MockupDocument, "board" | "frame">): Box {
  const body = { x: 0, y: 0, width: board.width, height: board.height };
  return frame ? frameBox(boardPath(board), frame.width) : body;
}

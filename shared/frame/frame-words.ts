import { formatLengthWithUnit } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import type { OutOfRange } from "../units/outcome.ts";

/** Why a frame can't go round a board, in a sentence that says what to change. */
export function frameRefusalWords({ field, value, range }: OutOfRange, unit: LengthUnit): string {
  const mm = (length: number) => formatLengthWithUnit(length, unit);
  const degrees = (angle: number) => `${Math.round(angle * 10) / 10}°`;
  switch (field) {
    case "curvedEdges":
      return "A frame is made of straight pieces, and this board has round edges. Leave the frame off, or choose a board with corners.";
    case "outlines":
      return "A frame goes round one outline, and this board has holes or several parts.";
    case "frameCorners":
      return `A frame has ${range.least} to ${range.most} corners, and this board has ${value}.`;
    case "sharpestCorner":
      return `A corner of ${degrees(value)} is too sharp for a mitre: ${degrees(range.least)} at least.`;
    case "widestCorner":
      return `A corner of ${degrees(360 - value)} between two parts of the board is too narrow for a frame.`;
    case "buttedCorners":
      return "Butted corners need a rectangular board. Choose mitred ones.";
    case "framePiece":
    case "frameOverlap":
      return "The frame's pieces run into each other: choose a narrower frame.";
    case "overallWidth":
    case "overallHeight":
      return `Nothing is left inside the frame: the sign must be ${mm(range.least)} at least each way.`;
    case "frameWidth":
      return `The frame's width must lie between ${mm(range.least)} and ${mm(range.most)}.`;
    case "frameDepth":
      return `The frame's depth must lie between ${mm(range.least)} and ${mm(range.most)}.`;
    default:
      return `A measure of the frame must lie between ${mm(range.least)} and ${mm(range.most)}.`;
  }
}

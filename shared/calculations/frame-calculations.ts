import { frameBradNeededMm, frameBradSpacing, frameBrads } from "../frame/frame-brads.ts";
import { frameCover } from "../frame/frame-cover.ts";
import { bodyInFrame, layOutFrame } from "../frame/lay-out-frame.ts";
import { rectanglePath } from "../geometry/shapes.ts";
import { type CalculationGroup, present, resultOf, worked } from "./calculation.ts";

const board = rectanglePath({ x: 0, y: 0, width: 600, height: 400 });
const practice = { text: "Common practice", status: "common practice" } as const;

export const frameCalculations: CalculationGroup = {
  title: "Frames",
  calculations: [
    {
      id: "frame",
      title: "A mitred frame",
      formula:
        "Outside = body + 2 w. Long point outside, short point inside; each mitre halves its corner. True when both diagonals are √(W² + H²).",
      source: { text: "Plane geometry", status: "calculated" },
      limits: "Straight edges only: a board with round edges has no frame.",
      example: (kernel) => {
        const width = 20;
        const { members, diagonals } = resultOf(layOutFrame(board, { width, mitred: true }, kernel));
        const upper = present(members[0]);
        return worked(
          [
            ["Body", "600 × 400", "mm"],
            ["Frame", width, "mm"],
          ],
          [
            ["Long point", upper.longPoint, "mm"],
            ["Short point", upper.shortPoint, "mm"],
            ["Saw setting", upper.settings[0], "°"],
            ["Diagonal", present(diagonals[0]).lengthMm, "mm"],
            ["Body when 600 is the whole sign", resultOf(bodyInFrame({ width: 600, height: 400 }, width)).width, "mm"],
          ],
        );
      },
    },
    {
      id: "frame-cover",
      title: "Edges that a frame covers",
      formula:
        "Its depth is the substrate's thickness at the least. It is flush at substrate + slats − sanding, and proud beyond.",
      source: { text: "Arithmetic", status: "calculated" },
      limits: "Its back is level with the substrate's back.",
      example: () => {
        const backer = { substrate: 12, slats: 9, sanding: 0.3 };
        const { bareSubstrateMm, flushDepthMm } = resultOf(frameCover(11, backer));
        return worked(
          [
            ["Depth", 11, "mm"],
            ["Substrate", backer.substrate, "mm"],
            ["Slats", backer.slats, "mm"],
          ],
          [
            ["Bare at the back", bareSubstrateMm, "mm"],
            ["Flush at", flushDepthMm, "mm"],
          ],
        );
      },
    },
    {
      id: "frame-brads",
      title: "Brads of a frame",
      formula: "Length + 0.5 mm of setting − frame's width, into the middle of the substrate's edge.",
      source: practice,
      limits: `${frameBradNeededMm} mm into the edge at the least, ${frameBradSpacing.corner} mm off corners, ${frameBradSpacing.apart} mm apart at most.`,
      example: (kernel) => {
        const frame = resultOf(layOutFrame(board, { width: 20, mitred: true }, kernel));
        const { intoEdgeMm, heightMm } = resultOf(frameBrads(frame, { length: 30, frameWidth: 20, substrate: 12 }));
        return worked(
          [
            ["Brad", 30, "mm"],
            ["Frame", 20, "mm"],
            ["Substrate", 12, "mm"],
          ],
          [
            ["Into the edge", intoEdgeMm, "mm"],
            ["Above the back", heightMm, "mm"],
          ],
        );
      },
    },
  ],
};

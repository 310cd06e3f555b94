import type { LimitTexts } from "./limit-text.ts";

/** The limits of slats and frames: their brads, and the saw. */
export const slatLimits = {
  bradLengthMm: {
    group: "slats",
    rules: [31],
    label: "Length of the brads in slats",
    unit: "small length",
    why: "Our choice: through a slat of 8 or 9 mm into a substrate of 12 mm.",
  },
  bradHoldMm: {
    group: "slats",
    rules: [31],
    label: "Brad past a slat into the substrate",
    unit: "small length",
    why: "Common practice. With less it holds nothing while the glue sets.",
  },
  bradTrimMm: {
    group: "slats",
    rules: [31],
    label: "Inside the trim line without brads",
    unit: "small length",
    why: "Common practice. Nearer, the blade that trims the slats can meet one.",
  },
  frameBradLengthMm: {
    group: "slats",
    rules: [31],
    label: "Length of the frame's brads",
    unit: "small length",
    why: "Our choice: through a frame of up to 20 mm.",
  },
  frameBradHoldMm: {
    group: "slats",
    rules: [31],
    label: "Frame's brad into the board's edge",
    unit: "small length",
    why: "Common practice.",
  },
  sawSettingMost: {
    group: "slats",
    rules: [33],
    label: "The saw turns off a square cut, at most",
    unit: "degrees",
    why: "Common practice: mitre saws turn to 45 degrees and a little over, most of them to 50 on one side at least.",
  },
} as const satisfies LimitTexts;

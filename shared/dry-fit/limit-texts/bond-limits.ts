import type { LimitTexts } from "./limit-text.ts";

/** The limits of bonds and pockets. */
export const bondLimits = {
  rigidBondMm: {
    group: "bonds",
    rules: [17],
    label: "Movement that a rigid adhesive takes",
    unit: "small length",
    why: "Common practice: cements, cyanoacrylate and wood glue give hardly at all.",
  },
  gapFillingBondMm: {
    group: "bonds",
    rules: [17],
    label: "Movement that a gap-filling adhesive takes",
    unit: "small length",
    why: "Common practice: epoxy in a thick joint, neutral silicone, high-bond tape.",
  },
  pocketFloorShare: {
    group: "pockets",
    rules: [19],
    label: "Floor under a pocket, of the thickness",
    unit: "percent",
    why: "Common practice: a third of what is cut must be left under the deepest cut in the thinnest sheet.",
  },
  pocketGapLeastMm: {
    group: "pockets",
    rules: [19],
    label: "Least gap a side between piece and pocket",
    unit: "small length",
    why: "Common practice. Less, and the piece does not go in.",
  },
  pocketGapMostMm: {
    group: "pockets",
    rules: [19],
    label: "Widest gap a side between piece and pocket",
    unit: "small length",
    why: "Common practice. More, and it rattles and the gap is seen.",
  },
  pieceKerfMm: {
    group: "pockets",
    rules: [19],
    label: "Kerf of the pieces' cutter",
    unit: "small length",
    why: "Our choice for a laser that follows the line: half of it is missing from the piece all round. 0 where the path is set off by half of it.",
  },
  pocketKerfMm: {
    group: "pockets",
    rules: [19],
    label: "Kerf of the pockets' cutter",
    unit: "small length",
    why: "Our choice: a router's path is set off by its radius, so nothing. What a beam takes where it follows the line.",
  },
} as const satisfies LimitTexts;

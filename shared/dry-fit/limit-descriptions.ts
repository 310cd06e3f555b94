import type { LimitUnit } from "./limit-units.ts";
import { defaultLimits, type Limits, limitsSchema } from "./limits.ts";

export type LimitKey = keyof Limits;

/** The headings under which the limits stand, in order. */
const groups = {
  support: "Support under bonded pieces",
  strokes: "Thin strokes",
  holes: "Holes under caps",
  movement: "Movement of acrylic and wood",
  bonds: "What a bond takes",
  edges: "Holes near an edge",
  pockets: "Pockets",
  grip: "Grip of standoffs",
  screws: "Screws in the wood",
  caps: "Caps and feet",
  stiffness: "Push and sag",
  bed: "Bed of the machine",
  stock: "Stock on hand",
  colour: "Colour against artwork",
  lettering: "Lettering",
  pieces: "Small, handed and similar pieces",
  hanging: "Hanging and safety",
} as const;

type LimitDescription = {
  readonly group: keyof typeof groups;
  /** The rules that keep to it. */
  readonly rules: readonly number[];
  readonly label: string;
  readonly unit: LimitUnit;
  /** Where the default comes from, and what it is for. */
  readonly why: string;
};

/** What each limit is. A limit without its line here is a type error, and so is a line without a limit. */
const descriptions: Readonly<Record<LimitKey, LimitDescription>> = {
  unsupportedCaution: {
    group: "support",
    rules: [1],
    label: "Area off its support, for a caution",
    unit: "percent",
    why: "Common practice. What hangs over is held by no adhesive.",
  },
  unsupportedStop: {
    group: "support",
    rules: [1],
    label: "Area off its support, for a stop",
    unit: "percent",
    why: "Common practice.",
  },
  reachMm: {
    group: "support",
    rules: [1],
    label: "Reach over its support",
    unit: "small length",
    why: "Common practice. The longer the reach, the easier a push breaks it off.",
  },
  freeStrokeMm: {
    group: "strokes",
    rules: [3],
    label: "Thinnest stroke that is free",
    unit: "small length",
    why: "Common practice. A free stroke under it breaks in the hand: a stop. Under its sheet's thickness it is a caution.",
  },
  bondedStrokeMm: {
    group: "strokes",
    rules: [3],
    label: "Thinnest stroke that is bonded all over",
    unit: "small length",
    why: "Common practice. It breaks while it is cleaned and laid, not later.",
  },
  gapMm: {
    group: "strokes",
    rules: [4],
    label: "Narrowest gap inside one piece",
    unit: "small length",
    why: "Common practice. A narrower one melts shut, chips, or can't be cleaned and seen.",
  },
  placingErrorMm: {
    group: "holes",
    rules: [6],
    label: "Placing error of a hole, a side",
    unit: "small length",
    why: "Common practice: about half a millimetre when drilled through a template.",
  },
  coverMm: {
    group: "holes",
    rules: [6],
    label: "Cover of cap and barrel over the hole's edge",
    unit: "small length",
    why: "Common practice. Less than it, and the hole can show round the cap.",
  },
  expansionPerK: {
    group: "movement",
    rules: [6, 16, 17],
    label: "Expansion of acrylic",
    unit: "expansion",
    why: "Makers of sheet give 70 to 80 after ASTM D696.",
  },
  temperatureInsideK: {
    group: "movement",
    rules: [6, 16, 17],
    label: "Change of temperature inside",
    unit: "kelvin",
    why: "Our choice, either way from the day it is hung.",
  },
  temperatureOutsideK: {
    group: "movement",
    rules: [6, 16, 17],
    label: "Change of temperature outside",
    unit: "kelvin",
    why: "Our choice, either way from the day it is hung. Dark sheet in the sun goes further.",
  },
  moisturePoints: {
    group: "movement",
    rules: [6, 16, 17],
    label: "Change of the wood's moisture",
    unit: "points",
    why: "Our choice: points of moisture content, either way. What a point moves is the stock's own figure.",
  },
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
  edgeDiameters: {
    group: "edges",
    rules: [7],
    label: "Middle of a hole to the nearest edge",
    unit: "diameters",
    why: "Common practice, counted in diameters of the hole.",
  },
  webThicknesses: {
    group: "edges",
    rules: [7],
    label: "Web between a hole and the edge",
    unit: "thicknesses",
    why: "Common practice, counted in thicknesses of the sheet.",
  },
  gripDiameters: {
    group: "grip",
    rules: [8],
    label: "Cap's stud in the barrel",
    unit: "diameters",
    why: "Common practice, counted in diameters of the stud. With less the cap pulls out.",
  },
  studDiameters: {
    group: "grip",
    rules: [8],
    label: "Glued stud in the wood",
    unit: "diameters",
    why: "Common practice, counted in diameters of the stud.",
  },
  slotPlayMm: {
    group: "grip",
    rules: [8],
    label: "Slot of an edge grip wider than the sheet, at most",
    unit: "small length",
    why: "Common practice. A gasket or a set screw takes up that much, at the sheet's thinnest.",
  },
  edgeGripMm: {
    group: "grip",
    rules: [8],
    label: "Slot of an edge grip over the panel's edge",
    unit: "small length",
    why: "Common practice, after the panel has moved away from it.",
  },
  sandingMm: {
    group: "screws",
    rules: [10],
    label: "Taken off the wood by sanding",
    unit: "small length",
    why: "Common practice.",
  },
  skinMm: {
    group: "screws",
    rules: [10],
    label: "Wood left under a point",
    unit: "small length",
    why: "Common practice. With less a point bulges or shows at the back.",
  },
  lateralDivisor: {
    group: "screws",
    rules: [12],
    label: "Load across a screw, divided by",
    unit: "number",
    why: "Our choice. The handbook's load is one at about 0.4 mm of slip.",
  },
  withdrawalDivisor: {
    group: "screws",
    rules: [12],
    label: "Load that pulls a screw out, divided by",
    unit: "number",
    why: "The National Design Specification leaves 5.5 between the two published formulas. Not under 5.",
  },
  unprovenLoadShare: {
    group: "screws",
    rules: [12],
    label: "Share of an unproven load, for a caution",
    unit: "percent",
    why: "Our choice. Outside the published range a load is an estimate; under this share of it even a poor one will do.",
  },
  capClearanceMm: {
    group: "caps",
    rules: [13],
    label: "Round a cap to what lies beside it",
    unit: "small length",
    why: "Common practice, for a notch too.",
  },
  footShare: {
    group: "caps",
    rules: [14],
    label: "Foot of a barrel on what it stands on",
    unit: "percent",
    why: "Common practice. With less it tilts as the screw is tightened.",
  },
  pushN: {
    group: "stiffness",
    rules: [15],
    label: "Push by hand on a hanging panel",
    unit: "newtons",
    why: "Our choice: about what a hand leans with.",
  },
  bendMm: {
    group: "stiffness",
    rules: [15],
    label: "Giving way or sagging, at most",
    unit: "small length",
    why: "Our choice. The larger of this and the part of the spacing holds.",
  },
  bendPart: {
    group: "stiffness",
    rules: [15],
    label: "The same as a part of the spacing: one in",
    unit: "number",
    why: "Our choice.",
  },
  studGiveMm: {
    group: "movement",
    rules: [16],
    label: "Movement that a glued stud takes by bending",
    unit: "small length",
    why: "Our choice. Glued studs have no play.",
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
  bedWidthMm: {
    group: "bed",
    rules: [21],
    label: "Width of the bed",
    unit: "length",
    why: "Our choice until the shop states its own machine.",
  },
  bedHeightMm: {
    group: "bed",
    rules: [21],
    label: "Height of the bed",
    unit: "length",
    why: "Our choice until the shop states its own machine.",
  },
  sheetShare: {
    group: "stock",
    rules: [22],
    label: "Share of a sheet that pieces cover",
    unit: "percent",
    why: "Our choice: what is left is margin, kerf and the space between shapes.",
  },
  colourRemark: {
    group: "colour",
    rules: [23],
    label: "Difference to the artwork, for a remark",
    unit: "colour difference",
    why: "Common practice: up to 2 two colours look close.",
  },
  colourCaution: {
    group: "colour",
    rules: [23],
    label: "Difference to the artwork, for a caution",
    unit: "colour difference",
    why: "Common practice: over 5 it is another colour.",
  },
  contrastRatio: {
    group: "lettering",
    rules: [25],
    label: "Contrast of lettering, as a ratio",
    unit: "to one",
    why: "WCAG 2.2, 1.4.11, asks 3 to 1 of shapes on a screen; signs are held to it as common practice.",
  },
  contrastPoints: {
    group: "lettering",
    rules: [25],
    label: "Contrast of lettering, in light reflectance",
    unit: "points",
    why: "30 points are taken for adequate (BS 8300-2).",
  },
  smallPieceMm: {
    group: "pieces",
    rules: [28],
    label: "Longer side of a small piece",
    unit: "small length",
    why: "Common practice: shorter pieces fall through the bed and get lost.",
  },
  mirrorMm: {
    group: "pieces",
    rules: [29],
    label: "Difference between a piece and its mirror image",
    unit: "small length",
    why: "Our choice: up to it a piece fits its place with either face up.",
  },
  twinSameMm: {
    group: "pieces",
    rules: [30],
    label: "Difference of pieces that are the same",
    unit: "small length",
    why: "Our choice: exchanging them changes nothing.",
  },
  twinAlikeMm: {
    group: "pieces",
    rules: [30],
    label: "Difference that an eye overlooks",
    unit: "small length",
    why: "Our choice: half a millimetre a side is what discs of 20 and 21 mm differ by.",
  },
  twinAlikeShare: {
    group: "pieces",
    rules: [30],
    label: "Difference that an eye overlooks, of the longer side",
    unit: "percent",
    why: "Our choice, where it is more than the length above.",
  },
  unweighedShare: {
    group: "hanging",
    rules: [36, 38],
    label: "Hardware, adhesive and finish over the mass worked out",
    unit: "percent",
    why: "Our choice: nobody states their density.",
  },
  heaviestKg: {
    group: "hanging",
    rules: [38],
    label: "Mass that the shop hangs by itself",
    unit: "kilograms",
    why: "Our choice. Over it a licensed professional is asked, and the local code comes first.",
  },
  protrusionMm: {
    group: "hanging",
    rules: [37],
    label: "Reach off the wall over a walkway",
    unit: "length",
    why: "4 in (2010 ADA Standards, 307, from memory). Local rules come first.",
  },
};

export type DescribedLimit = Omit<LimitDescription, "group"> & {
  readonly key: LimitKey;
  readonly usual: number;
  readonly least: number;
  readonly most: number;
};
export type LimitGroup = {
  readonly id: string;
  readonly title: string;
  readonly rules: readonly number[];
  readonly limits: readonly DescribedLimit[];
};

/** Every limit, in the order of the schema. */
export const limitKeys: readonly LimitKey[] = limitsSchema.keyof().options;

/** What a limit is, with its default and its bounds. */
export function describeLimit(key: LimitKey): DescribedLimit {
  const { group: _, ...description } = descriptions[key];
  const { minValue, maxValue } = limitsSchema.shape[key].unwrap();
  return { key, ...description, usual: defaultLimits[key], least: minValue ?? -Infinity, most: maxValue ?? Infinity };
}

/** Every limit under its heading. */
export const limitGroups: readonly LimitGroup[] = Object.entries(groups).map(([id, title]) => {
  const limits = limitKeys.filter((key) => descriptions[key].group === id).map(describeLimit);
  const rules = [...new Set(limits.flatMap((limit) => limit.rules))].toSorted((a, b) => a - b);
  return { id, title, rules, limits };
});

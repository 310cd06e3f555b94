import type { LimitUnit } from "./limit-units.ts";
import { defaultLimits, type Limits, limitsSchema } from "./limits.ts";

export type LimitKey = keyof Limits;

/** The headings under which the limits stand, in order. */
const groups = {
  support: "Support under bonded pieces",
  strokes: "Thin strokes",
  holes: "Holes under caps",
  movement: "Movement of acrylic and wood",
  edges: "Holes near an edge",
  bed: "Bed of the machine",
  colour: "Colour against artwork",
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

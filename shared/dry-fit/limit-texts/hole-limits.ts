import type { LimitTexts } from "./limit-text.ts";

/** The limits of holes and of what moves them. */
export const holeLimits = {
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
    rules: [6, 16, 17, 35],
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
  studGiveMm: {
    group: "movement",
    rules: [16],
    label: "Movement that a glued stud takes by bending",
    unit: "small length",
    why: "Our choice. Glued studs have no play.",
  },
} as const satisfies LimitTexts;

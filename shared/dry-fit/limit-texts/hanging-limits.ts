import type { LimitTexts } from "./limit-text.ts";

/** The limits of hanging, and of what is not for the shop alone to judge. */
export const hangingLimits = {
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
} as const satisfies LimitTexts;

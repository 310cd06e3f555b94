import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { calculations } from "#shared/calculations/definitions.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { checkReference, checkReferenceWord } from "../support/check-reference.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const all = calculations.flatMap((group) => group.calculations);

/**
 * What the cited sources state for the worked examples, or what pencil and paper give, by calculation and result. The
 * last number is how far the source was rounded.
 */
const stated: Readonly<Record<string, Readonly<Record<string, string | readonly [value: number, within: number]>>>> = {
  // ISO 7823-1: 3 mm is 2.3 to 3.7.
  "sheet-tolerance": { "At the thinnest": [2.3, 1e-9], "At the thickest": [3.7, 1e-9] },
  // 18 + 19 + 5, and ± 0.9 (ISO 7823-1).
  height: { Top: [42, 1e-9], "at the least": [41.1, 1e-9], "at the most": [42.9, 1e-9] },
  // L of two rectangles: 75 mm², 40 mm, centroid (10·5·5 + 5·5·2.5)/75.
  area: { Area: [75, 1e-9], Edge: [40, 1e-9], "Centroid from either long edge": [312.5 / 75, 1e-9] },
  // A square metre of 3 mm at 1.19 g/cm³ (ASTM D792).
  mass: { Mass: [3.57, 1e-9] },
  // Wood Handbook, table 5-3: G 0.35; 1000 · 0.35 · 1.12.
  "wood-density": { Density: [392, 0.5] },
  "thinnest-stroke": { "Thinnest stroke": [1.5, 0.03], "Thinnest gap": [1.2, 0.03] },
  "smallest-box": { Length: [100, 1e-6], Width: [40, 1e-6], Area: [4000, 1e-6] },
  nodes: { Nodes: [4, 0] },
  "mirror-line": { "The wedge's face": "handed", "The L's mirror line": [45, 0.01] },
  "near-twins": { "Near twins": [1, 0] },
  "drop-outs": { Islands: [1, 0] },
  "small-pieces": { Small: "dot" },
  // Two right halves of 209.55: a/sin 45 and w · cot 45 more; the rest measured by clipping.
  "slat-lengths": {
    "Slats a side": [13, 0],
    "A full one, long point to long point": [334.45, 0.005],
    "along either edge": [209.55 * Math.SQRT2, 1e-6],
    "The shortest": [64.45, 0.005],
  },
  // The ellipse, of four cubics 0.028 % too large.
  "slat-outlines": { "Slats and spine cover": [Math.PI * 300 * 250 * 1.00028, 30] },
  "slat-start": {
    "Shortest from the corner": [8.49, 0.005],
    "Slivers from the corner": [2, 0],
    "Slivers from the start chosen": [0, 0],
  },
  "saw-settings": { "Asked of it": [60, 0] },
  // 3 mm at 45° is 4.24.
  "slat-stock": {
    "Kerf along the slat": [3 * Math.SQRT2, 1e-9],
    Alone: [334.45 + 4.24, 0.01],
    "Nested, each": [212.55 * Math.SQRT2, 1e-6],
    "Once a bar": [38.1, 1e-9],
  },
  "slat-brads": {
    "Slats that none fits in": [0, 0],
    "Too near the trim line": [0, 0],
    "Past the slat": [6.5, 1e-9],
    "Left before it shows": [3.2, 1e-9],
  },
  "slat-hold": { "Into the substrate": [3.5, 1e-9], "Only the slat holds it": "yes" },
  // A band of 6 through the middle of a disc of 15.
  "foot-on-slats": { "On wood": [0.5046, 0.001], "Over an open joint": "yes" },
  "slat-glue": { Glued: [457.2 * 482.6, 1e-3], Glue: [44.129, 0.001] },
  // Wood Handbook, equation 13-2: 1.06 mm for 100 mm of eastern white pine, 6 to 11 %.
  "slat-movement": {
    "One slat grows": [1.06, 1e-9],
    "All, over the width, at 45°": [457.2 * 0.00212 * 5 * 0.5, 1e-9],
    "Hollow side": "back",
  },
  // √(640² + 440²).
  frame: {
    "Long point": [640, 1e-9],
    "Short point": [600, 1e-9],
    "Saw setting": [45, 1e-9],
    Diagonal: [776.66, 0.005],
    "Body when 600 is the whole sign": [560, 0],
  },
  "frame-cover": { "Bare at the back": [1, 1e-9], "Flush at": [20.7, 1e-9] },
  "frame-brads": { "Into the edge": [10.5, 1e-9], "Above the back": [6, 1e-9] },
  support: { Bonded: [3200, 1e-6], "Off its support": [0.2, 1e-6], "Reaches over": [20, 0.05] },
  // 150 · (7e-5 · 20 + 0.00267 · 4).
  "movement-mismatch": { "They part by": [1.812, 1e-9], "Rigid adhesives allow": [0.1, 0], "Gap-filling ones": [1, 0] },
  "adhesive-pair": { Fits: "no", "Until full strength, tack, then wick": [24.25, 0] },
  locating: { Proposed: "template", "A hole pattern finds it": "no" },
  "pocket-floor": { Floor: [2.8, 1e-9], Needed: [2, 1e-9] },
  "pocket-gap": { Gap: [0.2, 1e-9], It: "fits" },
  "pocket-corners": { "Corners that bind": [4, 0] },
  // Wood Handbook, p. 13-17: 232 mm of white fir become 233.7.
  "seasonal-movement": { "It grows": [1.7, 0.05], to: [233.7, 0.05] },
  "hole-window": { From: [6.5, 1e-9], To: [9, 1e-9] },
  "hole-window-through-screw": { From: [5.5, 1e-9], To: [7, 1e-9] },
  // 300 · (7e-5 · 20 + 0.00267 · 4).
  "hole-movement": { Movement: [3.624, 1e-9] },
  "hole-pattern": { "Play that hole 2 lacks": [0.3, 1e-9] },
  "hole-to-edge": { "From middle to edge": [20, 1e-9], Web: [16, 1e-9] },
  "hole-proposals": { "Holes towards the corners": [4, 0], "Holes spaced evenly": [12, 0] },
  "barrel-offset": { "Nearest barrel on hand": [19, 0] },
  grip: { "Grip at the least": [6.1, 1e-9], Needed: [5, 0], "Grip at the most": [7.9, 1e-9], Room: [9.5, 0] },
  // ASME B18.6.1: No. 6 is 0.138 in, its head 0.279 in; the height is calculated.
  "wood-screw": { Diameter: [0.138 * 25.4, 1e-9], Head: [0.279 * 25.4, 1e-9], "Head's height": [2.06, 0.005] },
  // ASME B18.6.1: No. 8 is 0.164 in, its head 0.332 in.
  "screw-in-barrel": {
    "The floor hole should be": [0.164 * 25.4, 1e-9],
    "The bore should be": [0.332 * 25.4, 1e-9],
  },
  reach: { "Point below the wood's face": [11.44, 0.005] },
  "break-through": { "May be opened": [15.7, 1e-9], Left: [2.2, 1e-9] },
  "cap-footprint": { Notch: [3, 1e-9] },
  "barrel-foot": { "On wood": [0.5, 1e-3] },
  // Wood Handbook, chapter 8: 70 % of 0.131 in (NDS, table L3), 0.0917 in.
  "pilot-hole": { "Pilot hole in softwood": [0.0917 * 25.4, 0.001], "Nearest drill": [2.3, 1e-9] },
  // Wood Handbook, eq. 8-10: 593.2 lb; 2850 G² D of the NDS within half a percent.
  "screw-withdrawal": {
    "Pulls out at": [593.2 * 4.4482216, 0.3],
    "May be put on": [2850 * 0.48 ** 2 * 0.164 * 4.4482216, 2.5],
  },
  // Wood Handbook before 1991, table 8-4: 23.17 · 4.1656².
  "screw-lateral": { "Load of the table": [402.05, 0.005], "May be put on": [201.03, 0.005] },
  // ISO 7823-1: 6 mm is 5 to 7; the holder reaches 8 mm, its middle 3 outside.
  "edge-grip": { "Play at the thickest": [0.2, 1e-9], "Play at the thinnest": [2.2, 1e-9], "Over the edge": [5, 1e-9] },
  // 23.17 · 3.5052² · 13.5/(7 · 3.5052)/2 and 108.25 · 0.35² · 3.5052 · (2/3 · 16)/5.5; 13.5 mm are 3.85 D.
  "fixing-allowable": {
    "Across it": [78.31, 0.005],
    "Along it": [90.15, 0.005],
    "Estimate, for it is": "shallow",
  },
  "longest-span": { "Two rows of three": [200, 1e-9], "Their four corners": [300, 1e-9] },
  "fixing-loads": { "Across each": [4.903325, 1e-6], "Along each of the upper row": [1.0542149, 1e-6] },
  // Timoshenko's grid of points, calculated.
  sag: { Sag: [1.1358, 5e-5] },
  // 0.0391 · 100 · 300²/D, D = 3200 · 10³/(12 · 0.8631).
  push: { "Gives way": [1.139, 0.001] },
  "deflection-limit": { "May bend": [2, 1e-9] },
  // MUTCD 2009, 2A.13: 30 ft to the inch; 10 ft are common practice.
  "reading-distance": { "At the limit": [1, 1e-9], "With ease": [3, 1e-9] },
  // 2010 ADA Standards, table 703.5.5: 2 1/2 in.
  "visual-characters": { "Least height": [2.5, 1e-9] },
  "accessible-limits": { "At most": [0.48, 1e-9], "The gap is": "too large" },
  "stroke-to-height": { Share: [0.15, 1e-12] },
  // WCAG 2.2: 4.54.
  "contrast-ratio": { Ratio: [4.54, 0.005] },
  // CIE 15.
  "light-reflectance": { Reflects: [18.4187, 5e-5] },
  "luminance-contrast": { Contrast: [70, 1e-9], Difference: [42, 1e-9] },
  // CIE 15: L* 80 is 56.68, L* 72 is 43.67.
  "finished-wood": { "Reflects bare": [56.6813, 5e-5], Oiled: [43.665, 0.01] },
  // Sharma, Wu, Dalal, table I, pair 1.
  "colour-difference": { ΔE00: [2.0425, 5e-5], "They look": "visible" },
  // IEC 61966-2-1, CIE 15.
  lightness: { "L*": [53.24, 0.01], "a*": [80.09, 0.01], "b*": [67.2, 0.01] },
  "kerf-along": { "Kerf along the bar": [4.24, 0.005], "The cut runs": [38.1, 1e-9] },
  // 2440 · 0.9 − 10.
  "usable-bar": { "Can be used": [2186, 1e-9] },
  // 5 · (240√2 − 40 + 3√2) + 40.
  "nested-slats": { "They take": [1558.2695, 5e-5] },
  // Textbook example of the cutting-stock problem; optimum proved by a solver, 73 · 5600 − 407160.
  "stock-lengths": { Bars: [73, 0], "No plan needs fewer than": [73, 0], "Left over": [1640, 1e-9] },
  // Burke, Kendall, Whitwell: 40.
  "sheet-rectangles": { "Length of strip": [40, 1e-9] },
  // ⌊995/95⌋ · ⌊495/95⌋.
  "sheet-gaps": { "On one sheet": [50, 0] },
  // (π (100² − 60²) + 70²)/206², circles of four cubics 0.03 % larger.
  "sheet-shapes": { Sheets: [1, 0], Used: [0.5893, 0.0005] },
  "sheet-bed": { Parts: [4, 0] },
  // 0.36 m² · 1.15 · 42.00 = 17.388.
  "cost-line": { Quantity: [0.414, 1e-12], Amount: "17.39\u00a0EUR" },
  // 22.5 + 5.4 + 10 minutes at a euro each.
  "machine-minutes": { Minutes: [37.9, 1e-12], Amount: "37.90\u00a0EUR" },
  // 126 min at 48.00 are 100.80; 35 % of it 35.28; 19 % of 136.08 25.8552; a third of each 33.60 + 11.76 + 8.62.
  "cost-total": {
    "Marked up by": "35.28\u00a0EUR",
    Taxed: "25.86\u00a0EUR",
    Total: "161.94\u00a0EUR",
    "Per sign": "53.98\u00a0EUR",
  },
  // ISO 4217: 2 digits, none, 3.
  "minor-units": {
    "In euros": "1\u00a0234.50\u00a0EUR",
    "Digits of the yen": [0, 0],
    "Digits of the Bahraini dinar": [3, 0],
  },
  shadow: { Falls: [12, 1e-9], "Soft along": [1.2, 1e-9], "Soft across": [12 * 0.05 * Math.SQRT2, 1e-9] },
  // ISO 5455, ISO 5457 (8 × 6 fields on A3), ASME Y14.35.
  scale: { Scale: "1:2" },
  zones: { "Fields across": [8, 0], "Fields down": [6, 0] },
  "revision-letter": { Comes: "J" },
};

describe.each(all)("$id", ({ id, title, formula, source, limits, example }) => {
  it("says what it does, where it comes from and where it ends", () => {
    for (const text of [title, formula, source.text, limits]) expect(text.length).toBeGreaterThan(4);
    if (source.status === "common practice" || source.status === "our choice")
      expect(source.text).not.toMatch(/^ISO|^ASME/);
  });

  it("gives what its source states", () => {
    const expected = stated[id] ?? {};
    const { given, gives } = example(kernel);
    expect(given.length).toBeGreaterThan(0);
    expect(gives.map(({ name }) => name).toSorted()).toEqual(Object.keys(expected).toSorted());
    for (const { name, value, unit } of gives) {
      const what = `${title}: ${name}${unit ? `, ${unit}` : ""}`;
      const wanted = expected[name] ?? "";
      if (typeof wanted === "string")
        checkReferenceWord({ what, source: source.text, expected: wanted, got: String(value) });
      else checkReference({ what, source: source.text, expected: wanted[0], got: Number(value), within: wanted[1] });
    }
  });

  it("computes the same each time", () => {
    expect(example(kernel)).toEqual(example(kernel));
  });
});

it("every calculation has an id of its own, and every stated value a calculation", () => {
  expect(all.map(({ id }) => id).toSorted()).toEqual(Object.keys(stated).toSorted());
});

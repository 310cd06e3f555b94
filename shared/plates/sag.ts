import { checked, lengthRange, type Outcome, type Range } from "../units/outcome.ts";
import { type Deflection, deflectionOf, sheetRanges } from "./deflection.ts";
import { rigidityNmm, type Sheet } from "./rigidity.ts";

/** How a lying or tilted sheet is held. Spacings in mm. */
export type Support =
  /** On four points, one at each corner of a rectangle. */
  | { readonly kind: "four points"; readonly width: number; readonly height: number }
  /** A bay inside a square grid of points. */
  | { readonly kind: "grid"; readonly spacing: number }
  /** Lying on all four edges of a rectangle, free to turn there. */
  | { readonly kind: "edges"; readonly width: number; readonly height: number }
  /** Any other outline, as a strip over its longest reach between supports. */
  | { readonly kind: "strip"; readonly reach: number }
  /** What reaches over beyond the last support. */
  | { readonly kind: "overhang"; readonly reach: number };

/** Square on four corner points, ν 0.3 (calculated by the Ritz method; literature has 0.0249 to 0.0281). */
const fourPointsFactor = 0.0255;
/** Inside a square grid: Catalan's constant / 16 π², whatever ν is (Timoshenko has 0.00581). */
const gridFactor = 0.915965594177219 / (16 * Math.PI ** 2);

const loadRange: Range = { least: 0, most: 1 };

/**
 * Sag in mm of a sheet under an even load in N/mm². Four points: 0.0255 q a⁴/D with a the longer spacing, exact for a
 * square, else an upper estimate. Grid: 0.0058 q a⁴/D. Edges: Lévy's series (Timoshenko; Roark, 7th edition, table 11.4,
 * case 1a). Strip: 5 q a⁴/(384 E I), an upper estimate. Overhang: q c⁴/(8 E I). Small deflections only.
 */
export function sag(sheet: Sheet, support: Support, load: number): Outcome<Deflection> {
  const spans = spansOf(support);
  return checked({ ...sheetRanges(sheet), ...spans, load: [load, loadRange] }, () => {
    const { mm, upperEstimate } = sagFigure(sheet, support, load);
    return deflectionOf(mm, sheet.thickness, upperEstimate);
  });
}

function spansOf(support: Support): Record<string, readonly [number, Range]> {
  switch (support.kind) {
    case "four points":
    case "edges":
      return { width: [support.width, lengthRange], height: [support.height, lengthRange] };
    case "grid":
      return { spacing: [support.spacing, lengthRange] };
    case "strip":
    case "overhang":
      return { reach: [support.reach, lengthRange] };
  }
}

function sagFigure(sheet: Sheet, support: Support, load: number): { mm: number; upperEstimate: boolean } {
  const rigidity = rigidityNmm(sheet);
  // A strip of the sheet one mm wide.
  const strip = (sheet.modulus * sheet.thickness ** 3) / 12;
  switch (support.kind) {
    case "four points": {
      const { width, height } = support;
      const mm = (fourPointsFactor * load * Math.max(width, height) ** 4) / rigidity;
      return { mm, upperEstimate: width !== height };
    }
    case "grid":
      return { mm: (gridFactor * load * support.spacing ** 4) / rigidity, upperEstimate: false };
    case "edges": {
      const longer = Math.max(support.width, support.height);
      const shorter = Math.min(support.width, support.height);
      return { mm: (edgesFactor(longer / shorter) * load * shorter ** 4) / rigidity, upperEstimate: false };
    }
    case "strip":
      return { mm: (5 * load * support.reach ** 4) / (384 * strip), upperEstimate: true };
    case "overhang":
      return { mm: (load * support.reach ** 4) / (8 * strip), upperEstimate: false };
  }
}

/** Terms of the series: the next one would change the seventh digit. */
const terms = 15;

/**
 * Sag at the middle of a plate on its four edges, over q b⁴/D with b the shorter side and `ratio` the longer over it
 * (Lévy's series in Timoshenko, Woinowsky-Krieger, section 30).
 */
function edgesFactor(ratio: number): number {
  let sum = 0;
  for (let term = 0; term < terms; term++) {
    const m = 2 * term + 1;
    const alpha = (m * Math.PI * ratio) / 2;
    // cosh overflows for plates that are strips, where its part is nothing.
    const held = alpha > 300 ? 0 : (2 + alpha * Math.tanh(alpha)) / (2 * Math.cosh(alpha));
    sum += ((term % 2 === 0 ? 1 : -1) / m ** 5) * (1 - held);
  }
  return (4 / Math.PI ** 5) * sum;
}

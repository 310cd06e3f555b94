import type { StockKind } from "#shared/contracts/stock-entry.ts";
import type { Hardware } from "#shared/mockup/document.ts";
import type { WrittenEntry, WrittenHardware, WrittenScrew } from "./written.ts";

/** Colours to begin with: an undyed sheet, planed wood, bare metal. */
const sheet = "#E4E1DA";
const planed = "#E0C9A2";
const metal = "#C3C1BA";

export const blankScrew: WrittenScrew = {
  name: "",
  gauge: null,
  head: "flat",
  diameter: null,
  length: null,
  headDiameter: null,
  headHeight: null,
};

/** An empty form of a kind. What most of that kind have in common is filled in. */
export function blankEntry(kind: StockKind): WrittenEntry {
  switch (kind) {
    case "acrylic":
      return {
        kind,
        // Acrylic of any colour weighs about as much: ASTM D792.
        acrylic: { name: "", colour: sheet, look: "opaque", process: "cast", facesDiffer: false, densityKgM3: 1190 },
        thicknessesMm: [],
        sheets: [],
      };
    case "wood":
      return {
        kind,
        wood: {
          name: "",
          colour: planed,
          gravity: null,
          // What furniture wood settles at in heated rooms (Wood Handbook, GTR-282, chapter 13).
          moisturePercent: 8,
          hardness: "softwood",
          movementPerPoint: null,
        },
        thicknessesMm: [],
      };
    case "hardware":
      return { kind, hardware: blankHardware("capStud"), quantity: null };
    case "screw":
      return { kind, screw: blankScrew, quantity: null };
    case "adhesive":
      return { kind, adhesive: { name: "", family: "epoxy" } };
  }
}

const standoff = { name: "", finish: metal, barrelDiameter: null, barrelLength: null };
const floor = { floorThickness: null, floorHole: null, countersunk: true, screw: blankScrew };

/** A standoff of that kind without measures. */
export function blankHardware(kind: Hardware["kind"]): WrittenHardware {
  switch (kind) {
    case "capStud":
      return {
        kind,
        ...standoff,
        ...floor,
        boreDiameter: null,
        boreDepth: null,
        studDiameter: null,
        studLength: null,
        capDiameter: null,
        capThickness: null,
      };
    case "throughScrew":
      return {
        kind,
        ...standoff,
        boreDiameter: null,
        washerThickness: 0,
        cap: { diameter: null, thickness: null },
        screw: blankScrew,
      };
    case "blindStud":
      return { kind, ...standoff, studDiameter: null, studLength: null };
    case "edgeGrip":
      return { kind, ...standoff, ...floor, slotWidth: null, gripDepth: null, height: null };
  }
}

/** The same standoff as another kind: what both kinds have stays. */
export function asKind(hardware: WrittenHardware, kind: Hardware["kind"]): WrittenHardware {
  const blank = blankHardware(kind);
  const kept = Object.entries(hardware).filter(([field]) => field !== "kind" && field in blank);
  return { ...blank, ...Object.fromEntries(kept) };
}

import type { Acrylic, Adhesive, CapStud, Hardware, Screw, Wood } from "../mockup/document.ts";
import type { AcrylicStock, Stock, WoodStock } from "./stock.ts";
import { woodMovementOf } from "./wood-movement.ts";
import { flatHeadMm, woodScrewDiameterMm } from "./wood-screws.ts";

/**
 * A generic stock list to start a shop with. Names are invented; a shop writes its own over them. Densities: acrylic
 * 1190 kg/m³ (ASTM D792); gravities of wood from the Wood Handbook, GTR-282, tables 5-3 (at 12 % moisture, on oven-dry
 * mass).
 */

const acrylicDensityKgM3 = 1190;

function acrylic(
  name: string,
  colour: string,
  thicknessesMm: readonly number[],
  rest: Partial<Pick<Acrylic, "look" | "process" | "facesDiffer">> = {},
): AcrylicStock {
  const { look = "opaque", process = "cast", facesDiffer = false } = rest;
  const stock: Acrylic = {
    kind: "acrylic",
    stockId: null,
    name,
    colour,
    look,
    process,
    facesDiffer,
    densityKgM3: acrylicDensityKgM3,
  };
  return { acrylic: stock, thicknessesMm, sheets: [] };
}

const usual = [3, 4.5, 6] as const;

export const standardAcrylics: readonly AcrylicStock[] = [
  acrylic("Midnight", "#27314F", usual),
  acrylic("Brass", "#C8992F", usual),
  acrylic("Chalk", "#F4EFE4", usual),
  acrylic("Rust", "#B4523B", usual),
  acrylic("Sage", "#86A796", usual),
  acrylic("Marigold", "#E8B84A", usual),
  acrylic("Holly", "#2B3A32", usual),
  acrylic("Soot", "#1E1E1F", [3, 4.5, 6, 10]),
  acrylic("Snow", "#FCFCFA", [3, 4.5, 6, 10]),
  acrylic("Brick", "#96372B", usual),
  acrylic("Harbour", "#34416B", usual),
  acrylic("Tide", "#2F7A86", usual),
  acrylic("Fern", "#4C7A3D", usual),
  acrylic("Plum", "#5B2E4F", usual),
  acrylic("Slate", "#5C636B", usual),
  acrylic("Sand", "#D9C6A0", usual),
  acrylic("Rose", "#D58C8C", [3, 4.5]),
  acrylic("Clear", "#EEF3F3", [3, 4.5, 6, 10], { look: "clear" }),
  acrylic("Clear, extruded", "#EEF3F3", [2, 3, 5], { look: "clear", process: "extruded" }),
  acrylic("Frost", "#E4EBEA", [3, 4.5, 6], { look: "frosted", facesDiffer: true }),
  acrylic("Mirror, silver", "#C9CED2", [3], { look: "mirror", process: "extruded", facesDiffer: true }),
];

/** Flatsawn, as most boards are sold. The species is the one whose movement the Wood Handbook lists. */
function wood(
  name: string,
  colour: string,
  species: string,
  gravity: number,
  hardness: Wood["hardness"],
  thicknessesMm: readonly number[],
): WoodStock {
  // 8 % is what furniture wood settles at in heated rooms (Wood Handbook, GTR-282, chapter 13).
  const movement = woodMovementOf(species);
  if (!movement) throw new Error(`No movement is known for ${species}.`);
  const stock: Wood = {
    kind: "wood",
    stockId: null,
    name,
    colour,
    gravity,
    moisturePercent: 8,
    hardness,
    movementPerPoint: movement.tangential,
  };
  return { wood: stock, thicknessesMm };
}

export const standardWoods: readonly WoodStock[] = [
  wood("Eastern white pine", "#E6CFA4", "eastern white pine", 0.35, "softwood", [12, 18, 25]),
  wood("Ponderosa pine", "#E2C697", "ponderosa pine", 0.4, "softwood", [18, 25]),
  wood("Black walnut", "#6B4A33", "black walnut", 0.55, "hardwood", [12, 18, 25]),
  wood("Hard maple", "#E3CFAE", "sugar (hard) maple", 0.63, "hardwood", [12, 18, 25]),
  wood("Black cherry", "#A8683F", "black cherry", 0.5, "hardwood", [18, 25]),
  wood("Red oak", "#C49A6C", "red oak, commercial", 0.63, "hardwood", [18, 25]),
  wood("White ash", "#D8C3A0", "white ash", 0.6, "hardwood", [18, 25]),
  wood("Basswood", "#E5D5B5", "American basswood", 0.37, "hardwood", [12, 18]),
];

function screw(gauge: number, length: number): Screw {
  const head = flatHeadMm(gauge);
  if (!head) throw new Error(`No head is known for a No. ${gauge} screw.`);
  return {
    name: `No. ${gauge} × ${length}, flat head`,
    gauge,
    head: "flat",
    diameter: woodScrewDiameterMm(gauge),
    length,
    headDiameter: head.diameter,
    headHeight: head.height,
  };
}

export const standardScrews: readonly Screw[] = [12, 16, 19, 25, 32, 38, 45].map((length) => screw(6, length));

/** The floor is thick enough for a No. 6 head to be countersunk flush in it. */
const floorThickness = 2.5;

/**
 * Barrels whose bore passes a No. 6 head (7.09 mm); a threaded bush that goes in after the wood screw takes the thinner
 * stud. Stud lengths suit the sheets the barrel is meant for at both ends of their tolerance.
 */
function capStud(
  diameter: { readonly barrel: number; readonly stud: number; readonly capThickness: number },
  barrelLength: number,
  studLength: number,
): CapStud {
  return {
    kind: "capStud",
    stockId: null,
    name: `Standoff ${diameter.barrel} × ${barrelLength}`,
    finish: "#C3C1BA",
    barrelDiameter: diameter.barrel,
    barrelLength,
    boreDiameter: 7.5,
    boreDepth: barrelLength - floorThickness,
    floorThickness,
    floorHole: 4,
    countersunk: true,
    studDiameter: diameter.stud,
    studLength,
    capDiameter: diameter.barrel,
    capThickness: diameter.capThickness,
    screw: screw(6, 16),
  };
}

const slim = { barrel: 15, stud: 5, capThickness: 3 };
const stout = { barrel: 19, stud: 6, capThickness: 4 };

export const standardStandoffs: readonly CapStud[] = [
  capStud(slim, 12, 11),
  capStud(slim, 19, 15),
  capStud(slim, 25, 15),
  capStud(stout, 12, 12),
  capStud(stout, 19, 16),
  capStud(stout, 25, 18),
];

/** The screw suits 3 and 4.5 mm sheets over a board of 18 mm. */
const through = (barrelLength: number, length: number): Hardware => ({
  kind: "throughScrew",
  stockId: null,
  name: `Spacer 12 × ${barrelLength}, capped screw`,
  finish: "#C3C1BA",
  barrelDiameter: 12,
  barrelLength,
  boreDiameter: 4.5,
  washerThickness: 0.5,
  cap: { diameter: 14, thickness: 4 },
  screw: screw(6, length),
});

const blind = (barrelLength: number, studLength: number): Hardware => ({
  kind: "blindStud",
  stockId: null,
  name: `Hidden stud 10 × ${barrelLength}`,
  finish: "#C3C1BA",
  barrelDiameter: 10,
  barrelLength,
  studDiameter: 4,
  studLength,
});

/** The slot takes cast sheet of that thickness at its thickest (ISO 7823-1), a gasket what is left. */
const edge = (barrelLength: number, sheet: number, slotWidth: number): Hardware => ({
  kind: "edgeGrip",
  stockId: null,
  name: `Edge grip 16 × ${barrelLength}, ${sheet} mm sheet`,
  finish: "#C3C1BA",
  barrelDiameter: 16,
  barrelLength,
  floorThickness,
  floorHole: 4,
  countersunk: true,
  slotWidth,
  gripDepth: 5,
  height: barrelLength + slotWidth + 3,
  screw: screw(6, 16),
});

export const standardHardware: readonly Hardware[] = [
  ...standardStandoffs,
  through(12, 25),
  through(19, 32),
  blind(6, 20),
  blind(12, 26),
  edge(12, 4.5, 5.5),
  edge(19, 4.5, 5.5),
  edge(12, 6, 7.2),
  edge(19, 6, 7.2),
];

export const standardAdhesives: readonly Adhesive[] = [
  { stockId: null, name: "Wicking cement", family: "solvent cement" },
  { stockId: null, name: "Bodied cement", family: "bodied cement" },
  { stockId: null, name: "Thick cyanoacrylate", family: "cyanoacrylate" },
  { stockId: null, name: "Slow epoxy", family: "epoxy" },
  { stockId: null, name: "Neutral silicone", family: "neutral silicone" },
  { stockId: null, name: "High-bond tape", family: "high-bond tape" },
  { stockId: null, name: "Wood glue", family: "wood glue" },
];

/** All of it, uncounted. */
export const standardStock: Stock = {
  acrylics: standardAcrylics,
  woods: standardWoods,
  hardware: standardHardware.map((hardware) => ({ hardware, quantity: null })),
  screws: standardScrews,
  adhesives: standardAdhesives,
};

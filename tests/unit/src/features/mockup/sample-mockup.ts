import type { Acrylic, Adhesive, CapStud, MockupDocument, Wood } from "#shared/mockup/document.ts";

export const midnight: Acrylic = {
  kind: "acrylic",
  stockId: null,
  name: "Midnight, gloss, opaque",
  colour: "#262F4F",
  look: "opaque",
  process: "cast",
  facesDiffer: false,
  densityKgM3: 1190,
};
export const brass: Acrylic = { ...midnight, name: "Brass", colour: "#C8993A" };
export const chalk: Acrylic = { ...midnight, name: "Chalk", colour: "#F2EEE4" };
export const pine: Wood = {
  kind: "wood",
  stockId: null,
  name: "Pine, pale wash",
  colour: "#EADFC6",
  gravity: 0.35,
  moisturePercent: 8,
  hardness: "softwood",
  movementPerPoint: 0.00212,
};
export const cement: Adhesive = { stockId: null, name: "Bodied cement", family: "bodied cement" };
export const epoxy: Adhesive = { stockId: null, name: "Two-part epoxy", family: "epoxy" };

/** A cap stud with a barrel of this length: 5 mm stud, 15 mm cap and barrel. */
export function barrel(barrelLength: number, fields: Partial<CapStud> = {}): CapStud {
  return {
    kind: "capStud",
    stockId: null,
    name: `Standoff 15 × ${barrelLength}`,
    finish: "#C9C9C4",
    barrelDiameter: 15,
    barrelLength,
    boreDiameter: 8,
    boreDepth: barrelLength - 3,
    floorThickness: 3,
    floorHole: 4,
    countersunk: false,
    studDiameter: 5,
    studLength: 12,
    capDiameter: 15,
    capThickness: 5,
    screw: {
      name: "No. 6 × 16",
      gauge: 6,
      head: "flat",
      diameter: 3.51,
      length: 16,
      headDiameter: 6.8,
      headHeight: 2.06,
    },
    ...fields,
  };
}

export function emptyMockup(fields: Partial<MockupDocument> = {}): MockupDocument {
  return {
    version: 4,
    board: { outline: { kind: "rectangle" }, width: 600, height: 400, measures: "body" },
    hanging: { kind: "cleat", gap: 8, pose: "upright", carriesKg: null, points: [] },
    quantity: 1,
    backer: { stock: pine, thickness: 20, grainTurn: 0, slats: null, finish: [] },
    frame: null,
    layers: [],
    lettering: [],
    presentation: {
      photo: null,
      wall: "#EFE8DA",
      light: { azimuth: 330, elevation: 55, angularSize: 0.12 },
      viewingDistance: 6000,
    },
    ...fields,
  };
}

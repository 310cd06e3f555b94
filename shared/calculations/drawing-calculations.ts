import { penumbraMm, shadowOffsetMm } from "../drawing/light.ts";
import { nextRevisionLetter } from "../lifecycle/revision-letter.ts";
import { largestScale } from "../units/scales.ts";
import { columnFields, rowFields } from "../units/zones.ts";
import { type CalculationGroup, present, worked } from "./calculation.ts";

export const drawingCalculations: CalculationGroup = {
  title: "The drawing",
  calculations: [
    {
      id: "shadow",
      title: "Shadows",
      formula:
        "An edge h above what receives it falls h/tan ε away, soft over h · σ/sin² ε along and h · σ/sin ε across. ε is the light's elevation over the wall, σ its angular size.",
      source: { text: "Geometrical optics", status: "calculated" },
      limits: "One light far away; no light that is thrown back.",
      example: () => {
        const height = 12;
        const light = { azimuth: 315, elevation: 45, angularSize: 0.05 };
        const soft = penumbraMm(height, light);
        return worked(
          [
            ["Height", height, "mm"],
            ["Elevation", light.elevation, "°"],
            ["Angular size", light.angularSize, "rad"],
          ],
          [
            ["Falls", shadowOffsetMm(height, light), "mm"],
            ["Soft along", soft.along, "mm"],
            ["Soft across", soft.across, "mm"],
          ],
        );
      },
    },
    {
      id: "scale",
      title: "Scale of a view",
      formula: "The largest preferred scale at which the view fits.",
      source: { text: "ISO 5455; 1:4 and 1:8 for inches are common practice", status: "published" },
      limits: "50:1 to 1:1000.",
      example: () => {
        const thing = { widthMm: 600, heightMm: 400 };
        const space = { widthMm: 390, heightMm: 200 };
        return worked(
          [
            ["Sign", `${thing.widthMm} × ${thing.heightMm}`, "mm"],
            ["Space", `${space.widthMm} × ${space.heightMm}`, "mm"],
          ],
          [["Scale", present(largestScale(thing, space, { unit: "mm" })).name]],
        );
      },
    },
    {
      id: "zones",
      title: "Zones of a sheet",
      formula: "Fields of 50 mm from the sheet's middle, an even number along each side.",
      source: { text: "ISO 5457", status: "published" },
      limits: "Letters leave out I and O.",
      example: () => {
        const a3 = { widthMm: 420, heightMm: 297 };
        return worked(
          [["A3", `${a3.widthMm} × ${a3.heightMm}`, "mm"]],
          [
            ["Fields across", columnFields(a3).length],
            ["Fields down", rowFields(a3).length],
          ],
        );
      },
    },
    {
      id: "revision-letter",
      title: "Revision letters",
      formula: "A to Y without I, O, Q, S, X and Z, then AA.",
      source: { text: "ASME Y14.35", status: "from memory" },
      limits: "None.",
      example: () => worked([["After", "H"]], [["Comes", nextRevisionLetter("H")]]),
    },
  ],
};

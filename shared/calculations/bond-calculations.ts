import { familyFacts, pairFit, tackAndWick, waitingHours } from "../bonds/adhesive-families.ts";
import { locatingFit, proposedLocating } from "../bonds/locating-method.ts";
import { movementMismatchMm } from "../bonds/movement-mismatch.ts";
import { bindingCorners, pocketGap, pocketGapMm } from "../bonds/pocket-fit.ts";
import { pocketDepthToleranceMm, pocketFloor } from "../bonds/pocket-floor.ts";
import { measureSupport } from "../bonds/support.ts";
import { defaultLimits } from "../dry-fit/limits.ts";
import { flattenPath } from "../geometry/flatten.ts";
import { rectanglePath } from "../geometry/shapes.ts";
import { movementAcross, seasonalMovementMm } from "../materials/seasonal-movement.ts";
import { sheetBand } from "../materials/sheet-tolerance.ts";
import { woodMovementOf } from "../materials/wood-movement.ts";
import { type CalculationGroup, present, resultOf, worked } from "./calculation.ts";

const plate = (x: number, width: number, height: number) => flattenPath(rectanglePath({ x, y: 0, width, height }));

export const bondCalculations: CalculationGroup = {
  title: "Bonds, pockets and wood that moves",
  calculations: [
    {
      id: "support",
      title: "What of a piece is bonded, and how far it reaches over",
      formula:
        "Overlap of the piece with what is under it; the rest is off its support, and its farthest point reaches so far over the bond.",
      source: { text: "Geometry; the limits are common practice", status: "calculated" },
      limits: "Outlines flattened to 0.02 mm; strips under 0.06 mm are left out.",
      example: (kernel) => {
        const { overlapMm2, unsupportedShare, reachMm } = measureSupport(
          plate(0, 100, 40),
          plate(-50, 130, 40),
          kernel,
        );
        return worked(
          [
            ["Piece", "100 × 40", "mm"],
            ["Over the edge", 20, "mm"],
          ],
          [
            ["Bonded", overlapMm2, "mm²"],
            ["Off its support", unsupportedShare],
            ["Reaches over", present(reachMm), "mm"],
          ],
        );
      },
    },
    {
      id: "movement-mismatch",
      title: "Two bonded materials that move differently",
      formula:
        "Half the longest bonded length · (|α₁ − α₂| · |ΔT| + |C₁ − C₂| · |ΔM|), against what the adhesive allows.",
      source: { text: "Arithmetic; what adhesives allow is common practice", status: "common practice" },
      limits: "Warmth and damp at their worst together; wood's own growth by warmth is left out, being small.",
      example: () => {
        const bond = {
          longest: 300,
          one: { perK: defaultLimits.expansionPerK, perPoint: 0 },
          other: { perK: 0, perPoint: 0.00267 },
          temperatureK: defaultLimits.temperatureInsideK,
          moisturePoints: defaultLimits.moisturePoints,
        };
        return worked(
          [
            ["Acrylic on softwood, across the grain", bond.longest, "mm"],
            ["Temperature span", bond.temperatureK, "K"],
            ["Moisture span", bond.moisturePoints, "points"],
          ],
          [
            ["They part by", resultOf(movementMismatchMm(bond)), "mm"],
            ["Rigid adhesives allow", familyFacts("cyanoacrylate").allowsMm, "mm"],
            ["Gap-filling ones", familyFacts("neutral silicone").allowsMm, "mm"],
          ],
        );
      },
    },
    {
      id: "adhesive-pair",
      title: "Adhesives, the pairs they fit and how long they take",
      formula: "A list by family and surface; a joint in two steps takes both.",
      source: { text: "Common practice; the maker's sheet goes before it", status: "common practice" },
      limits: "Generic families at 20 °C. Test on scrap.",
      example: () => {
        const fit = pairFit("solvent cement", "acrylic", "coated back");
        return worked(
          [["Solvent cement on", "a mirror's back"]],
          [
            ["Fits", fit.fits ? "yes" : "no"],
            [`Until full strength, ${tackAndWick.name}`, waitingHours(tackAndWick).full, "h"],
          ],
        );
      },
    },
    {
      id: "locating",
      title: "How the hand finds a piece's place",
      formula:
        "A pocket or a hole pattern finds it where there is one; else a template, or a line scored under an opaque piece.",
      source: { text: "Common practice", status: "common practice" },
      limits: "Pieces that are bonded by eye have none.",
      example: () => {
        const layer = { hold: "bond", pieces: 5, holes: 0, opaque: true } as const;
        return worked(
          [["Bonded letters", layer.pieces]],
          [
            ["Proposed", proposedLocating(layer)],
            ["A hole pattern finds it", locatingFit("hole pattern", layer).finds ? "yes" : "no"],
          ],
        );
      },
    },
    {
      id: "pocket-floor",
      title: "What is left under a pocket",
      formula: "Thinnest sheet − deepest cut, at least a third of the nominal thickness.",
      source: {
        text: "Sheet from ISO 7823; the third and the depth's ± are common practice",
        status: "common practice",
      },
      limits: `Depth ± ${pocketDepthToleranceMm} mm.`,
      example: () => {
        const depth = 2;
        const floor = resultOf(pocketFloor(sheetBand("cast", 6), depth));
        return worked(
          [
            ["Cast sheet", 6, "mm"],
            ["Pocket", depth, "mm"],
          ],
          [
            ["Floor", floor.floorMm, "mm"],
            ["Needed", floor.neededMm, "mm"],
          ],
        );
      },
    },
    {
      id: "pocket-gap",
      title: "Gap round a piece in its pocket",
      formula: "Clearance + half the kerf of each cut that follows the line, per side.",
      source: { text: "Arithmetic; the limits are common practice", status: "common practice" },
      limits: `From ${pocketGap.least} to ${pocketGap.most} mm.`,
      example: () => {
        const fit = { clearance: 0.1, pieceKerf: 0.2, pocketKerf: 0 };
        const { gapMm, verdict } = resultOf(pocketGapMm(fit));
        return worked(
          [
            ["Clearance", fit.clearance, "mm"],
            ["Kerf of the piece", fit.pieceKerf, "mm"],
          ],
          [
            ["Gap", gapMm, "mm"],
            ["It", verdict],
          ],
        );
      },
    },
    {
      id: "pocket-corners",
      title: "Corners that a round bit does not cut",
      formula:
        "The pocket is what a disc of the bit's radius can sweep inside it; where the piece reaches over that, it does not go in.",
      source: { text: "Geometry", status: "calculated" },
      limits: "To 0.03 mm.",
      example: (kernel) => {
        const bit = 1.5;
        return worked(
          [
            ["Piece with square corners", "40 × 30", "mm"],
            ["Bit's radius", bit, "mm"],
          ],
          [["Corners that bind", bindingCorners(plate(0, 40, 30), 0.1, bit, kernel).length]],
        );
      },
    },
    {
      id: "seasonal-movement",
      title: "Wood that moves with the seasons",
      formula:
        "D · C · (M₁ − M₀) · sin²β: D its size, C by species, tangential unless it is quartersawn, M moisture in percent, β the angle to the grain.",
      source: { text: "Wood Handbook, GTR-190 and GTR-282, equation 13-2, table 13-5, p. 13-17", status: "published" },
      limits:
        "Wood free to move, 6 to 14 % moisture. Slats glued to a board are held: clad on one side it may cup, so its back is sealed or balanced.",
      example: () => {
        const species = "white fir";
        const perPoint = movementAcross(present(woodMovementOf(species)), "flatsawn");
        const board = { dimension: 232, perPoint, from: 8, to: 11, grainAngle: 90 };
        const moved = resultOf(seasonalMovementMm(board));
        return worked(
          [
            [`Flatsawn ${species}`, board.dimension, "mm"],
            ["Moisture from", board.from, "%"],
            ["to", board.to, "%"],
          ],
          [
            ["It grows", moved, "mm"],
            ["to", board.dimension + moved, "mm"],
          ],
        );
      },
    },
  ],
};

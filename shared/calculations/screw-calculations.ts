import { flattenPath } from "../geometry/flatten.ts";
import { rectanglePath } from "../geometry/shapes.ts";
import { nearestBarrel } from "../hardware/barrel-offset.ts";
import { edgeOverlapMm, slotPlayMm } from "../hardware/edge-grip.ts";
import { capStudGrip } from "../hardware/grip.ts";
import { screwMisfits } from "../hardware/screw-fit.ts";
import { leastHoldMm, reachRoom, screwReach, usualWood } from "../hardware/screw-reach.ts";
import { sheetBand } from "../materials/sheet-tolerance.ts";
import { standardStandoffs } from "../materials/standard-stock.ts";
import { flatHeadMm, woodScrewDiameterMm } from "../materials/wood-screws.ts";
import { type CalculationGroup, present, resultOf, worked } from "./calculation.ts";

export const screwCalculations: CalculationGroup = {
  title: "Standoffs and screws",
  calculations: [
    {
      id: "barrel-offset",
      title: "Offset of a panel on barrels",
      formula: "The panel's back stands as high as the barrel is long. Bore and floor make up the barrel's length.",
      source: { text: "Arithmetic", status: "calculated" },
      limits: "Washers count to the barrel.",
      example: () => {
        const drawn = 20;
        return worked(
          [["Drawn offset", drawn, "mm"]],
          [["Nearest barrel on hand", present(nearestBarrel(drawn, standardStandoffs)).barrelLength, "mm"]],
        );
      },
    },
    {
      id: "grip",
      title: "Grip of a cap's stud",
      formula:
        "Stud length − panel: at the thickest sheet at least one stud diameter, at the thinnest at most the bore's depth − what stands up of the screw's head.",
      source: { text: "Arithmetic; one stud diameter is common practice", status: "common practice" },
      limits: "Sheet thickness between the tolerances of ISO 7823.",
      example: () => {
        const screw = { head: "flat", headHeight: 2 } as const;
        const stud = { studLength: 12, studDiameter: 5, boreDepth: 9.5, countersunk: true, screw };
        const grip = capStudGrip(stud, sheetBand("cast", 5));
        return worked(
          [
            ["Stud", stud.studLength, "mm"],
            ["Cast sheet", 5, "mm"],
            ["Bore", stud.boreDepth, "mm"],
          ],
          [
            ["Grip at the least", grip.least, "mm"],
            ["Needed", grip.needed, "mm"],
            ["Grip at the most", grip.most, "mm"],
            ["Room", grip.room, "mm"],
          ],
        );
      },
    },
    {
      id: "edge-grip",
      title: "An edge grip on its sheet",
      formula:
        "Slot − sheet: at the thickest nothing or more, at the thinnest what a gasket takes up. Half the holder − its middle's distance from the edge: how far it reaches over.",
      source: {
        text: "Arithmetic; sheet by ISO 7823-1; how much is enough is common practice",
        status: "common practice",
      },
      limits: "Round holders with their middle outside the panel.",
      example: () => {
        const sheet = sheetBand("cast", 6);
        const { thickest, thinnest } = slotPlayMm(7.2, sheet);
        const panel = flattenPath(rectanglePath({ x: 0, y: 0, width: 200, height: 100 }));
        return worked(
          [
            ["Slot", 7.2, "mm"],
            ["Sheet", sheet.nominal, "mm"],
            ["Holder", 16, "mm"],
            ["Its middle outside", 3, "mm"],
          ],
          [
            ["Play at the thickest", thickest, "mm"],
            ["Play at the thinnest", thinnest, "mm"],
            ["Over the edge", edgeOverlapMm(16, panel, { x: -3, y: 50 }), "mm"],
          ],
        );
      },
    },
    {
      id: "wood-screw",
      title: "Size of a wood screw",
      formula: "D = 0.060 + 0.013 n inches, n the gauge. Head of a flat-head screw: (head − D)/(2 tan 41°) high.",
      source: { text: "ASME B18.6.1", status: "published" },
      limits: "Inch series, flat heads of 82°, gauges 4 to 14. The head at its sharp edge, the widest it can be.",
      example: () => {
        const gauge = 6;
        const head = present(flatHeadMm(gauge));
        return worked(
          [["Gauge", gauge]],
          [
            ["Diameter", woodScrewDiameterMm(gauge), "mm"],
            ["Head", head.diameter, "mm"],
            ["Head's height", head.height, "mm"],
          ],
        );
      },
    },
    {
      id: "screw-in-barrel",
      title: "A wood screw in its barrel",
      formula: "The floor's hole is at least as wide as the screw, the bore at least as wide as its head.",
      source: { text: "ASME B18.6.1 for the screw; arithmetic", status: "published" },
      limits: "Small barrels usually take a No. 6 and not a No. 8.",
      example: () => {
        const gauge = 8;
        const barrel = present(standardStandoffs[0]);
        const head = present(flatHeadMm(gauge));
        const screw = {
          ...barrel.screw,
          diameter: woodScrewDiameterMm(gauge),
          headDiameter: head.diameter,
          headHeight: head.height,
        };
        const misfits = screwMisfits({ ...barrel, screw });
        return worked(
          [
            ["Screw, gauge", gauge],
            ["Bore", barrel.boreDiameter, "mm"],
            ["Floor's hole", barrel.floorHole, "mm"],
          ],
          misfits.map(({ at, needsMm }) => [`The ${at} should be`, needsMm, "mm"]),
        );
      },
    },
    {
      id: "reach",
      title: "Reach of a screw into the wood",
      formula:
        "Flat head in a countersunk floor, or pan head: L − floor. Flat head on a plain floor: L − floor − head. Through panel and spacer: L − washer − panel − spacer. Stud from the back: stud − offset, its hole 1 mm deeper. Brad: L + 0.5.",
      source: { text: "Arithmetic; how a head is measured and set is common practice", status: "common practice" },
      limits: "Screws square to the face. The thinnest sheet makes the deepest reach.",
      example: () => {
        const driven = {
          kind: "capStud",
          length: 16,
          floor: 2.5,
          seat: "flat on a plain floor",
          headHeight: present(flatHeadMm(6)).height,
        } as const;
        const reach = resultOf(screwReach(driven));
        return worked(
          [
            ["Screw", driven.length, "mm"],
            ["Plain floor", driven.floor, "mm"],
            ["Flat head", driven.headHeight, "mm"],
          ],
          [["Point below the wood's face", reach.point.nominal, "mm"]],
        );
      },
    },
    {
      id: "break-through",
      title: "Breaking through, and holding only in the slat",
      formula:
        "The wood may be opened slat + substrate − sanding − skin deep; the point must come so far past the slat.",
      source: { text: "Common practice", status: "common practice" },
      limits: `Allowances: ${usualWood.sanding} mm sanding, ${usualWood.skin} mm skin; a screw ${leastHoldMm.screw} mm past the slat, a brad ${leastHoldMm.brad}, a frame's brad ${leastHoldMm["frame brad"]} into the edge.`,
      example: () => {
        const wood = { slat: 0, substrate: 18, ...usualWood };
        const reach = resultOf(
          screwReach({ kind: "capStud", length: 16, floor: 2.5, seat: "pan or round", headHeight: 2 }),
        );
        const room = resultOf(reachRoom(reach, wood));
        return worked(
          [
            ["Plank", wood.substrate, "mm"],
            ["Point at", reach.point.most, "mm"],
          ],
          [
            ["May be opened", room.mostMm, "mm"],
            ["Left", room.leftMm, "mm"],
          ],
        );
      },
    },
  ],
};

import { fixingAllowable } from "../hardware/fixing-allowable.ts";
import { fixingLoads, fixingRows, weightN } from "../hardware/fixing-loads.ts";
import { allowableLateralN, lateralSafety, screwLateral } from "../hardware/lateral.ts";
import { nearestDrillMm, pilotHoleMm } from "../hardware/pilot-hole.ts";
import { allowableWithdrawalN, screwWithdrawalN, withdrawalSafety } from "../hardware/withdrawal.ts";
import { standardStandoffs } from "../materials/standard-stock.ts";
import { rootDiameterMm } from "../materials/wood-screw-threads.ts";
import { woodScrewDiameterMm } from "../materials/wood-screws.ts";
import { type Deflection, deflectionLimitMm } from "../plates/deflection.ts";
import { holdingPattern } from "../plates/holding-pattern.ts";
import { longestSpanMm } from "../plates/longest-span.ts";
import { pushDeflection, usualPushN } from "../plates/push.ts";
import { acrylicSheet, lastingShare, ownWeight } from "../plates/rigidity.ts";
import { sag } from "../plates/sag.ts";
import { inchesToMm } from "../units/length.ts";
import { type CalculationGroup, present, resultOf, worked } from "./calculation.ts";

const figureMm = (deflection: Deflection): number | string =>
  deflection.kind === "figure" ? deflection.mm : "beyond half the thickness";

export const loadCalculations: CalculationGroup = {
  title: "Loads and stiffness",
  calculations: [
    {
      id: "pilot-hole",
      title: "Pilot hole",
      formula: "70 % of the screw's root diameter in softwood, 90 % in hardwood; then the nearest drill.",
      source: {
        text: "Wood Handbook, GTR-282, chapter 8; root diameters of NDS table L3 from memory",
        status: "published",
      },
      limits: "Screws in withdrawal. Shop charts differ by up to 1/32 in.",
      example: () => {
        const gauge = 8;
        const root = present(rootDiameterMm(gauge));
        const hole = resultOf(pilotHoleMm(root, "softwood"));
        return worked(
          [
            ["Gauge", gauge],
            ["Root", root, "mm"],
          ],
          [
            ["Pilot hole in softwood", hole, "mm"],
            ["Nearest drill", resultOf(nearestDrillMm(hole, "mm")), "mm"],
          ],
        );
      },
    },
    {
      id: "screw-withdrawal",
      title: "A screw pulled out of the wood",
      formula: `108.25 · G² · D · L newtons; over ${withdrawalSafety} for what may be put on. G specific gravity, D the screw's diameter, L thread in the wood, mm.`,
      source: { text: "Wood Handbook, GTR-282, equation 8-10; National Design Specification", status: "published" },
      limits:
        "Side grain of seasoned wood, a right pilot hole, sizes of the handbook's list (from memory). End grain holds three quarters and is erratic.",
      example: () => {
        const screw = { gravity: 0.48, diameter: woodScrewDiameterMm(8), threadInWood: inchesToMm(1) };
        return worked(
          [
            ["Specific gravity", screw.gravity],
            ["Screw", screw.diameter, "mm"],
            ["Thread in the wood", screw.threadInWood, "mm"],
          ],
          [
            ["Pulls out at", resultOf(screwWithdrawalN(screw)), "N"],
            ["May be put on", resultOf(allowableWithdrawalN(screw)), "N"],
          ],
        );
      },
    },
    {
      id: "screw-lateral",
      title: "A load across a screw",
      formula: `K · D² newtons, K by kind of wood and specific gravity; over ${lateralSafety} for what may be put on. Less in proportion under 7 D in the wood; under 4 D that is an estimate.`,
      source: {
        text: "Wood Handbook before 1991, table 8-4, and National Design Specification before 1991",
        status: "from memory",
      },
      limits: "Side grain of seasoned wood, about 0.4 mm of slip. What we divide by is our choice.",
      example: () => {
        const diameter = woodScrewDiameterMm(8);
        const screw = { gravity: 0.35, hardness: "softwood", diameter, penetration: 7 * diameter } as const;
        return worked(
          [
            ["Specific gravity", screw.gravity],
            ["Screw", screw.diameter, "mm"],
            ["In the wood", screw.penetration, "mm"],
          ],
          [
            ["Load of the table", resultOf(screwLateral(screw)).loadN, "N"],
            ["May be put on", resultOf(allowableLateralN(screw)), "N"],
          ],
        );
      },
    },
    {
      id: "fixing-allowable",
      title: "What one standoff may carry",
      formula:
        "Across: its screw's K D², in proportion under 7 D in the wood. Along: 108.25 G² D L, L thread in the wood, two thirds of the screw at the most. Each over its divisor.",
      source: {
        text: "Wood Handbook and National Design Specification, as the two before; from memory in parts",
        status: "from memory",
      },
      limits:
        "Outside the published range (under 4 D, a size that was not tested, a glued stud, wood lighter than the table) it is an estimate of ours, and a caution from a share of it on.",
      example: () => {
        const hardware = present(standardStandoffs[0] ?? null);
        const inWood = hardware.screw.length - hardware.floorThickness;
        const wood = { gravity: 0.35, hardness: "softwood" } as const;
        const divisors = { lateral: lateralSafety, withdrawal: withdrawalSafety };
        const may = resultOf(fixingAllowable(hardware, wood, inWood, divisors));
        return worked(
          [
            ["Screw", hardware.screw.name],
            ["Specific gravity", wood.gravity],
            ["In the wood", inWood, "mm"],
          ],
          [
            ["Across it", may.lateralN, "N"],
            ["Along it", may.withdrawalN, "N"],
            ["Estimate, for it is", may.unproven.join(", ")],
          ],
        );
      },
    },
    {
      id: "fixing-loads",
      title: "What a hanging panel asks of its fixings",
      formula:
        "Across each: W/n. Along each of the upper row: W · e / (h · n upper), e the centroid off the backer, h the rows apart; with one row half the barrel's diameter.",
      source: { text: "Statics", status: "calculated" },
      limits: "A stiff panel that turns about its lowest row. What counts as one row (half a barrel) is our choice.",
      example: () => {
        const massG = 2000;
        const centroidOff = 21.5;
        const places = [
          { x: 30, y: 30 },
          { x: 270, y: 30 },
          { x: 30, y: 230 },
          { x: 270, y: 230 },
        ];
        const rows = present(fixingRows(places, 15));
        const loads = resultOf(fixingLoads({ weightN: weightN(massG), centroidOff, rows }));
        return worked(
          [
            ["Panel", massG, "g"],
            ["Centroid off the backer", centroidOff, "mm"],
            ["Fixings", rows.fixings],
            ["Rows apart", rows.apart, "mm"],
          ],
          [
            ["Across each", loads.shearN, "N"],
            ["Along each of the upper row", loads.withdrawalN, "N"],
          ],
        );
      },
    },
    {
      id: "sag",
      title: "Sag of a lying panel",
      formula:
        "On four points 0.0255 q a⁴/D, inside a square grid 0.0058 q a⁴/D, on its edges by Lévy's series, other outlines as a strip 5 q a⁴/(384 E I). D = E t³/(12 (1 − ν²)).",
      source: {
        text: "Roark, 7th edition, table 11.4; Timoshenko, Theory of Plates and Shells; four points by the Ritz method",
        status: "published",
      },
      limits: `Up to half the sheet's thickness; beyond it no figure. For lasting loads acrylic has ${lastingShare} of its stiffness (common practice).`,
      example: () => {
        const sheet = { ...acrylicSheet, thickness: 5 };
        const spacing = 600;
        const load = ownWeight(sheet.thickness, 1190);
        return worked(
          [
            ["Acrylic", sheet.thickness, "mm"],
            ["Grid of standoffs", spacing, "mm"],
            ["Own weight", load * 1e6, "Pa"],
          ],
          [["Sag", figureMm(resultOf(sag(sheet, { kind: "grid", spacing }, load))), "mm"]],
        );
      },
    },
    {
      id: "push",
      title: "A push in a panel's middle",
      formula: "(P a²/D) · max(0.0391, 0.0242 a/b), on four points a and b apart, a the longer.",
      source: { text: "Ritz method and beam theory", status: "calculated" },
      limits: `Up to half the sheet's thickness. The usual push of ${usualPushN} N is our choice.`,
      example: () => {
        const sheet = { ...acrylicSheet, thickness: 10 };
        const spacing = { width: 300, height: 300 };
        return worked(
          [
            ["Acrylic", sheet.thickness, "mm"],
            ["Between standoffs", spacing.width, "mm"],
            ["Push", usualPushN, "N"],
          ],
          [["Gives way", figureMm(resultOf(pushDeflection(sheet, spacing, usualPushN))), "mm"]],
        );
      },
    },
    {
      id: "longest-span",
      title: "Longest span between standoffs",
      formula:
        "Four in a rectangle: its longer side. Others: the longest side of the shape round them or, if longer, the longest step needed to reach them all.",
      source: { text: "Geometry; shortest steps after R. C. Prim, 1957", status: "calculated" },
      limits: "An upper estimate where they stand in no rectangle; the sheet is then taken as a strip.",
      example: () => {
        const six = [0, 150, 300].flatMap((x) => [0, 200].map((y) => ({ x, y })));
        const four = six.filter(({ x }) => x !== 150);
        return worked(
          [
            ["Columns apart", 150, "mm"],
            ["Rows apart", 200, "mm"],
          ],
          [
            ["Two rows of three", longestSpanMm(six), "mm"],
            ["Their four corners", present(holdingPattern(four, 5)).longer, "mm"],
          ],
        );
      },
    },
    {
      id: "deflection-limit",
      title: "How far a panel may bend",
      formula: "The larger of 1 mm and a/300, a the longest spacing.",
      source: { text: "Our choice", status: "our choice" },
      limits: "A caution, and the shop's to set.",
      example: () => {
        const spacing = 600;
        return worked([["Spacing", spacing, "mm"]], [["May bend", resultOf(deflectionLimitMm(spacing)), "mm"]]);
      },
    },
  ],
};

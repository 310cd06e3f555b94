import { defaultLimits } from "../dry-fit/limits.ts";
import { flattenPath } from "../geometry/flatten.ts";
import { rectanglePath } from "../geometry/shapes.ts";
import { barrelFoot, footLimits } from "../hardware/barrel-foot.ts";
import { capFootprint } from "../hardware/cap-footprint.ts";
import { holeEdge } from "../hardware/hole-edge.ts";
import { holeMovementMm } from "../hardware/hole-movement.ts";
import { patternFaults } from "../hardware/hole-pattern.ts";
import { cornerHoles, evenHoles } from "../hardware/hole-proposals.ts";
import { holeWindow } from "../hardware/hole-window.ts";
import { holeWindowOfKind } from "../hardware/hole-window-of-kind.ts";
import { type CalculationGroup, present, worked } from "./calculation.ts";

const panel = flattenPath(rectanglePath({ x: 0, y: 0, width: 300, height: 200 }));

export const holeCalculations: CalculationGroup = {
  title: "Holes, caps and feet",
  calculations: [
    {
      id: "hole-window",
      title: "Hole window",
      formula:
        "From d + 2 (p + m) to (min(cap, barrel) + d)/2 − cover. d is what passes the panel, p how far a hole may be drilled from its place, m the most it moves against the backer.",
      source: {
        text: "Geometry; the play and never showing round the cap are common practice",
        status: "common practice",
      },
      limits: "One hole on its own; where the first is over the second no hole is right.",
      example: () => {
        const hole = {
          passing: 5,
          cap: 15,
          barrel: 15,
          placingError: defaultLimits.placingErrorMm,
          movement: 0.25,
          cover: defaultLimits.coverMm,
        };
        const { lower, upper } = holeWindow(hole);
        return worked(
          [
            ["Stud", hole.passing, "mm"],
            ["Cap and barrel", hole.cap, "mm"],
            ["Placing error", hole.placingError, "mm"],
            ["Movement", hole.movement, "mm"],
            ["Cover", hole.cover, "mm"],
          ],
          [
            ["From", lower, "mm"],
            ["To", upper, "mm"],
          ],
        );
      },
    },
    {
      id: "hole-window-through-screw",
      title: "Hole window of a screw through panel and spacer",
      formula:
        "As for a cap standoff, with the screw for d and the wider of cap and screw head for the cap. Studs fixed to the back and edge grips have no hole.",
      source: { text: "Geometry; play and cover are common practice", status: "common practice" },
      limits: "Round heads, caps and spacers.",
      example: () => {
        const hole = { kind: "throughScrew", screw: 4, head: 8, cap: 14, spacer: 12 } as const;
        const { lower, upper } = present(
          holeWindowOfKind(hole, {
            placingError: defaultLimits.placingErrorMm,
            movement: 0.25,
            cover: defaultLimits.coverMm,
          }),
        );
        return worked(
          [
            ["Screw", hole.screw, "mm"],
            ["Cap over its head", hole.cap, "mm"],
            ["Spacer", hole.spacer, "mm"],
          ],
          [
            ["From", lower, "mm"],
            ["To", upper, "mm"],
          ],
        );
      },
    },
    {
      id: "hole-movement",
      title: "Movement of a hole against the backer",
      formula:
        "L · (α · |ΔT| + C · |ΔM| · sin²β), from the fixed hole: L the distance, α the panel's expansion, C the wood's movement for a point of moisture, β the angle to the grain.",
      source: {
        text: "Wood Handbook, GTR-282, equation 13-2; linear expansion of acrylic after ASTM D696",
        status: "published",
      },
      limits: "Warmth and damp at their worst together. The spans of temperature and moisture are our choice.",
      example: () => {
        const hole = { x: 0, y: 300 };
        const conditions = {
          expansionPerK: defaultLimits.expansionPerK,
          temperatureK: defaultLimits.temperatureInsideK,
          woodPerPoint: 0.00267,
          moisturePoints: defaultLimits.moisturePoints,
          grainTurn: 0,
        };
        return worked(
          [
            ["From the fixed hole, across the grain", hole.y, "mm"],
            ["Expansion", conditions.expansionPerK, "1/K"],
            ["Temperature span", conditions.temperatureK, "K"],
            ["Wood", conditions.woodPerPoint, "1/point"],
            ["Moisture span", conditions.moisturePoints, "points"],
          ],
          [["Movement", holeMovementMm({ x: 0, y: 0 }, hole, conditions), "mm"]],
        );
      },
    },
    {
      id: "hole-pattern",
      title: "One fixed hole, the others with play",
      formula: "Just one hole of a panel is fixed; every other is at least as wide as the lower end of its window.",
      source: { text: "Common practice", status: "common practice" },
      limits: "Says nothing of panels that grow against each other.",
      example: () => {
        const holes = [
          { id: "1", diameter: 6, fixed: true, least: 6 },
          { id: "2", diameter: 6.2, fixed: false, least: 6.5 },
        ];
        const [fault] = patternFaults(holes);
        return worked(
          holes.map(({ id, diameter, fixed }) => [`Hole ${id}${fixed ? ", fixed" : ""}`, diameter, "mm"]),
          [["Play that hole 2 lacks", fault?.kind === "no play" ? fault.missing : 0, "mm"]],
        );
      },
    },
    {
      id: "hole-to-edge",
      title: "Hole to edge",
      formula:
        "From the hole's middle to the nearest edge at least so many hole diameters, and the web left beside the hole at least the sheet's thickness.",
      source: { text: "Common practice", status: "common practice" },
      limits: "Distances on the outline flattened to 0.02 mm.",
      example: () => {
        const hole = { x: 20, y: 100, diameter: 8 };
        const { centreMm, webMm } = present(holeEdge(hole, panel, []));
        return worked(
          [
            ["Hole", hole.diameter, "mm"],
            ["Asked for from its middle", defaultLimits.edgeDiameters * hole.diameter, "mm"],
          ],
          [
            ["From middle to edge", centreMm, "mm"],
            ["Web", webMm, "mm"],
          ],
        );
      },
    },
    {
      id: "hole-proposals",
      title: "Proposed holes",
      formula:
        "Towards the corners, as far out as edge, cap and barrel allow; or evenly, no further apart than the pitch; never where cap or barrel would stand on two levels.",
      source: { text: "Geometry", status: "our choice" },
      limits: "A proposal to be looked at and moved. Corners are found to a sixtieth of the way to the middle.",
      example: () => {
        const constraints = { edge: 16, apart: 30, level: [] };
        const pitch = 100;
        return worked(
          [
            ["Panel", "300 × 200", "mm"],
            ["From the edge", constraints.edge, "mm"],
            ["Pitch at most", pitch, "mm"],
          ],
          [
            ["Holes towards the corners", cornerHoles(panel, constraints).length],
            ["Holes spaced evenly", evenHoles(panel, constraints, pitch).length],
          ],
        );
      },
    },
    {
      id: "cap-footprint",
      title: "A cap on one level",
      formula:
        "What lies on the panel keeps half a millimetre off the cap's edge, or lies under all of the cap. Else it must be notched.",
      source: { text: "Common practice", status: "common practice" },
      limits: "Distances on the outlines flattened to 0.02 mm.",
      example: () => {
        const cap = { x: 50, y: 50, diameter: 15 };
        const letter = flattenPath(rectanglePath({ x: 55, y: 0, width: 50, height: 100 }));
        const print = capFootprint(cap, [{ id: "letter", region: letter }]);
        return worked(
          [
            ["Cap", cap.diameter, "mm"],
            ["Letter's edge from the cap's middle", 5, "mm"],
          ],
          [["Notch", print.kind === "several levels" ? (print.over[0]?.notchMm ?? 0) : 0, "mm"]],
        );
      },
    },
    {
      id: "barrel-foot",
      title: "A barrel's foot on the wood",
      formula: "Share of the foot that stands on wood; whether an open joint runs under it; how near the next brad is.",
      source: { text: "Common practice", status: "common practice" },
      limits: `At least ${footLimits.onWood * 100} % on wood, ${footLimits.bradMm} mm from brads.`,
      example: (kernel) => {
        const foot = { x: 300, y: 100, diameter: 15 };
        const { onWood } = barrelFoot(foot, { wood: panel, openJoints: [], brads: [] }, kernel);
        return worked(
          [
            ["Foot", foot.diameter, "mm"],
            ["Its middle from the board's edge", 0, "mm"],
          ],
          [["On wood", onWood]],
        );
      },
    },
  ],
};

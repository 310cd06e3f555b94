import { regionAreaMm2 } from "../geometry/area.ts";
import { flattenPath } from "../geometry/flatten.ts";
import { ellipsePath } from "../geometry/shapes.ts";
import { footLimits } from "../hardware/barrel-foot.ts";
import { screwReach } from "../hardware/screw-reach.ts";
import { movementAcross } from "../materials/seasonal-movement.ts";
import { woodMovementOf } from "../materials/wood-movement.ts";
import { backerMovement } from "../slats/backer-movement.ts";
import { bradReach, bradsAtTrim } from "../slats/brad-checks.ts";
import { bradMap, bradSpacing } from "../slats/brad-map.ts";
import { slatAngleRange } from "../slats/check-slats.ts";
import { chooseStart } from "../slats/choose-start.ts";
import { footOnSlats, openJointsOf } from "../slats/foot-on-slats.ts";
import { glueArea, usualSpreadGPerM2 } from "../slats/glue-area.ts";
import { cornerPhase, stripLengthMm, stripsOfHalf } from "../slats/half-board.ts";
import { layOutSlats } from "../slats/lay-out-slats.ts";
import { settingsBeyond } from "../slats/saw-settings.ts";
import { slatHold, usualHoldMm } from "../slats/slat-hold.ts";
import type { SlatBoard, SlatDesign } from "../slats/slat-layout.ts";
import { sliversOf } from "../slats/slivers.ts";
import { stockTaken } from "../slats/stock-taken.ts";
import { type CalculationGroup, present, resultOf, worked } from "./calculation.ts";

const board: SlatBoard = { width: 457.2, height: 482.6, outline: null };
const slats: SlatDesign = {
  pattern: "spine",
  angle: 45,
  slatWidth: 38.1,
  gap: 0,
  spineWidth: 38.1,
  spineOffset: 0,
  start: { kind: "corner" },
  direction: "up",
  overhang: 0,
};
const geometry = { text: "Plane geometry", status: "calculated" } as const;
const practice = { text: "Common practice", status: "common practice" } as const;

export const slatCalculations: CalculationGroup = {
  title: "Slats",
  calculations: [
    {
      id: "slat-lengths",
      title: "Slats on a rectangular board",
      formula:
        "On each side of the spine a slat's edge is y = x · cot θ + c, and slats repeat every (w + gap)/sin θ along it. From long point to long point a slat that runs from spine to edge is a/sin θ + w · cot θ; where a corner cuts it, from its lowest entry to its highest exit.",
      source: geometry,
      limits: `θ between slat and spine, ${slatAngleRange.least} to ${slatAngleRange.most} degrees; a from the spine to the edge, overhang included.`,
      example: () => {
        const half = {
          reach: (board.width - slats.spineWidth) / 2,
          height: board.height,
          angle: 45,
          slatWidth: 38.1,
          gap: 0,
        };
        const strips = stripsOfHalf({ ...half, phase: cornerPhase(half) });
        const lengths = strips.map(stripLengthMm);
        return worked(
          [
            ["Board", "457.2 × 482.6", "mm"],
            ["Spine and slats wide", slats.slatWidth, "mm"],
            ["Angle", half.angle, "°"],
          ],
          [
            ["Slats a side", strips.length],
            ["A full one, long point to long point", Math.max(...lengths), "mm"],
            ["along either edge", Math.max(...strips.map(({ fromEdge, toEdge }) => Math.min(fromEdge, toEdge))), "mm"],
            ["The shortest", Math.min(...lengths), "mm"],
          ],
        );
      },
    },
    {
      id: "slat-outlines",
      title: "Slats on a board of any outline",
      formula:
        "Each strip is clipped with the outline grown by the overhang, and once more with the outline itself. An end that meets one straight edge is cut along it, any other is cut square past it; parts that stay apart are slats of their own.",
      source: geometry,
      limits: "Outlines flattened to 0.02 mm, on a grid of 0.001 mm.",
      example: (kernel) => {
        const outline = flattenPath(ellipsePath({ x: 300, y: 250 }, 300, 250));
        const layout = resultOf(
          layOutSlats({ width: 600, height: 500, outline }, { ...slats, angle: 60, overhang: 25 }, kernel),
        );
        const pieces = layout.spine ? [layout.spine, ...layout.slats] : layout.slats;
        return worked(
          [["Ellipse", "600 × 500", "mm"]],
          [["Slats and spine cover", pieces.reduce((sum, { trimmed }) => sum + regionAreaMm2(trimmed), 0), "mm²"]],
        );
      },
    },
    {
      id: "slat-start",
      title: "A start that leaves no sliver",
      formula:
        "The last slat in a corner is t/cos θ long, t its height there, so it grows and shrinks with the start. The start that leaves the longest shortest slat is taken, the same on both sides of the spine.",
      source: {
        text: "Plane geometry; a slat shorter than wide is a sliver by common practice",
        status: "common practice",
      },
      limits:
        "Rounded to 0.1 mm, and holds when the first slat is laid 0.5 mm off (our choice). Some boards have no such start.",
      example: (kernel) => {
        const design = { ...slats, angle: 30 };
        const { current, best } = resultOf(chooseStart(board, design, kernel));
        const start = { kind: "height", height: best.height } as const;
        const layout = resultOf(layOutSlats(board, { ...design, start }, kernel));
        return worked(
          [
            ["Angle", design.angle, "°"],
            ["Slats wide", design.slatWidth, "mm"],
          ],
          [
            ["Shortest from the corner", current.shortestMm, "mm"],
            ["Slivers from the corner", current.slivers],
            ["Slivers from the start chosen", sliversOf(layout).length],
          ],
        );
      },
    },
    {
      id: "saw-settings",
      title: "Saw settings",
      formula: "90° − θ at the spine and along upright edges, θ along level ones, off a square cut.",
      source: geometry,
      limits: "Ends that are trimmed flush may be cut square, so only cuts that must fit are held against the saw.",
      example: (kernel) => {
        const layout = resultOf(layOutSlats(board, { ...slats, angle: 30, overhang: 25 }, kernel));
        const turns = 50;
        const [steepest] = settingsBeyond(layout.slats, turns);
        return worked(
          [
            ["Angle", 30, "°"],
            ["The saw turns", turns, "°"],
          ],
          [["Asked of it", present(steepest).setting, "°"]],
        );
      },
    },
    {
      id: "slat-stock",
      title: "What a slat takes of its stock",
      formula:
        "L + kerf/sin(blade to slat). Slats with two parallel cuts lie point against point: a/sin θ + kerf/sin θ each, and w · cot θ more once a bar.",
      source: { text: "Arithmetic", status: "calculated" },
      limits: "By the flatter of its two cuts; the squaring cut of the bar is not in it.",
      example: (kernel) => {
        const layout = resultOf(layOutSlats(board, slats, kernel));
        const full = present(layout.slats.find(({ strip }) => strip === 5));
        const kerf = 3;
        const { aloneMm, nested } = resultOf(stockTaken(full, { kerf, slatWidth: slats.slatWidth }));
        return worked(
          [
            ["A full slat", full.longPoint, "mm"],
            ["Kerf", kerf, "mm"],
          ],
          [
            ["Kerf along the slat", aloneMm - full.longPoint, "mm"],
            ["Alone", aloneMm, "mm"],
            ["Nested, each", present(nested).eachMm, "mm"],
            ["Once a bar", present(nested).onceMm, "mm"],
          ],
        );
      },
    },
    {
      id: "slat-brads",
      title: "Where brads go, and how deep",
      formula:
        "Along the middle of each slat, clear of trim line, joints and barrels; a brad whose place is taken moves along its slat. It reaches its length and 0.5 mm of setting below the face.",
      source: practice,
      limits: `${bradSpacing.trim} mm inside the trim line, ${bradSpacing.joint} mm off joints, ${bradSpacing.barrel} mm off barrels, ${bradSpacing.apart} mm apart at most, ${usualHoldMm.brad} mm past the slat at least.`,
      example: (kernel) => {
        const layout = resultOf(layOutSlats(board, { ...slats, overhang: 30 }, kernel));
        const map = resultOf(bradMap(layout, [{ x: 120, y: 150 }], kernel));
        const under = { slat: 9, substrate: 12, sanding: 0.3, skin: 2 };
        const { pastSlatMm, leftMm } = resultOf(bradReach(15, under));
        return worked(
          [
            ["Brad", 15, "mm"],
            ["Slats", under.slat, "mm"],
            ["Substrate", under.substrate, "mm"],
          ],
          [
            ["Slats that none fits in", map.without.length],
            ["Too near the trim line", bradsAtTrim(map.brads, layout.body).length],
            ["Past the slat", pastSlatMm, "mm"],
            ["Left before it shows", leftMm, "mm"],
          ],
        );
      },
    },
    {
      id: "slat-hold",
      title: "A screw that only the slat holds",
      formula: "Point below the face − slat: at least so far into the substrate, or glue alone holds the load.",
      source: practice,
      limits: `${usualHoldMm.screw} mm for a screw, ${usualHoldMm.brad} mm for a brad. Sanding does not count.`,
      example: () => {
        const { point } = resultOf(
          screwReach({ kind: "capStud", length: 12, floor: 2.5, seat: "flat in a countersunk floor", headHeight: 2 }),
        );
        const { pastSlatMm, onlySlat } = resultOf(slatHold(point, { slat: 6, substrate: 12 }));
        return worked(
          [
            ["Screw", 12, "mm"],
            ["Floor of the barrel", 2.5, "mm"],
            ["Slats", 6, "mm"],
          ],
          [
            ["Into the substrate", pastSlatMm, "mm"],
            ["Only the slat holds it", onlySlat ? "yes" : "no"],
          ],
        );
      },
    },
    {
      id: "foot-on-slats",
      title: "A barrel's foot on slats",
      formula: "Share of the foot on wood; open joints are the gaps between neighbouring slats.",
      source: { text: "Geometry; the limits are common practice", status: "common practice" },
      limits: `${footLimits.onWood * 100} % on wood, over no open joint.`,
      example: (kernel) => {
        const layout = resultOf(layOutSlats(board, { ...slats, gap: 6 }, kernel));
        const { from, to, width } = present(openJointsOf(layout)[8]);
        const middle = { x: (from.x + to.x) / 2, y: (from.y + to.y) / 2 };
        const { onWood, overJoint } = footOnSlats({ ...middle, diameter: 15 }, layout, [], kernel);
        return worked(
          [
            ["Foot", 15, "mm"],
            ["Joint under its middle", width, "mm"],
          ],
          [
            ["On wood", onWood],
            ["Over an open joint", overJoint ? "yes" : "no"],
          ],
        );
      },
    },
    {
      id: "slat-glue",
      title: "Glue under slats",
      formula: "Trimmed area of spine and slats is what holds; glue is spread before trimming, so on the laid area.",
      source: {
        text: "Arithmetic; the spread is common practice, the maker's sheet goes before it",
        status: "common practice",
      },
      limits: `${usualSpreadGPerM2} g/m² on one face.`,
      example: (kernel) => {
        const { areaMm2, massG } = resultOf(glueArea(resultOf(layOutSlats(board, slats, kernel))));
        return worked(
          [["Board without gaps", "457.2 × 482.6", "mm"]],
          [
            ["Glued", areaMm2, "mm²"],
            ["Glue", massG, "g"],
          ],
        );
      },
    },
    {
      id: "slat-movement",
      title: "Slats and substrate that move differently",
      formula:
        "D · C · ΔM · sin²β each, D the board's width or height, β between it and the grain. What the slats want more than the substrate lets them bends a board that is clad on one side.",
      source: { text: "Wood Handbook, GTR-190 and GTR-282, equation 13-2, table 13-5", status: "published" },
      limits: "6 to 14 % moisture, free movement. Seal or balance the back; how far it bends is not worked out.",
      example: () => {
        const slatPerPoint = movementAcross(present(woodMovementOf("eastern white pine")), "flatsawn");
        const backer = { ...board, angle: 45, slatWidth: 100, slatPerPoint, from: 6, to: 11 };
        const { slat, acrossWidth, held } = resultOf(
          backerMovement({ ...backer, substrate: { perPoint: 0, grain: 0 } }),
        );
        return worked(
          [
            ["Flatsawn eastern white pine slats", backer.slatWidth, "mm"],
            ["Moisture from", backer.from, "%"],
            ["to", backer.to, "%"],
          ],
          [
            ["One slat grows", slat, "mm"],
            ["All, over the width, at 45°", acrossWidth.slats, "mm"],
            ["Hollow side", held.hollow],
          ],
        );
      },
    },
  ],
};

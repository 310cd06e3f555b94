import { regionAreaMm2, regionCentroid, regionPerimeterMm } from "../geometry/area.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { Kernel } from "../geometry/kernel.ts";
import { nodeCount } from "../geometry/node-count.ts";
import type { Region } from "../geometry/path.ts";
import { circlePath, rectanglePath } from "../geometry/shapes.ts";
import { smallestBox } from "../geometry/smallest-box.ts";
import { flatteningToleranceMm } from "../geometry/tolerance.ts";
import { regionTransform, rotateMatrix } from "../geometry/transform.ts";
import { sheetMassG, woodDensityKgM3 } from "../materials/density.ts";
import { sheetBand } from "../materials/sheet-tolerance.ts";
import { dropOuts } from "../pieces/drop-outs.ts";
import { faceMatters } from "../pieces/handed-pieces.ts";
import { mirrorLine, mirrorToleranceMm } from "../pieces/mirror-symmetry.ts";
import { nearTwins, usualTwinLimits } from "../pieces/near-twins.ts";
import { smallPieceMm, smallPieces } from "../pieces/small-pieces.ts";
import { thinnestGap } from "../pieces/thinnest-gap.ts";
import { thinnestWidth } from "../stack/thin-places.ts";
import { bandSum, exactly } from "../units/banded.ts";
import { type CalculationGroup, present, worked } from "./calculation.ts";

const box = (x: number, y: number, width: number, height: number): Region =>
  flattenPath(rectanglePath({ x, y, width, height }));
const disc = (radius: number, x = 0): Region => flattenPath(circlePath({ x, y: 0 }, radius));
const ell = (kernel: Kernel): Region => kernel.union([...box(0, 0, 5, 10), ...box(0, 0, 10, 5)], "nonzero");

export const pieceCalculations: CalculationGroup = {
  title: "Pieces and heights",
  calculations: [
    {
      id: "sheet-tolerance",
      title: "What a sheet may measure",
      formula: "Cast acrylic ±(0.4 + 0.1 t) mm; extruded ±10 % under 3 mm, ±5 % from 3 mm.",
      source: { text: "ISO 7823-1 and ISO 7823-2", status: "published" },
      limits: "Acrylic sheet as it is bought. Wood is taken as planed to its thickness.",
      example: () => {
        const band = sheetBand("cast", 3);
        return worked(
          [["Cast sheet", band.nominal, "mm"]],
          [
            ["At the thinnest", band.least, "mm"],
            ["At the thickest", band.most, "mm"],
          ],
        );
      },
    },
    {
      id: "height",
      title: "Height of a piece, with its band",
      formula:
        "Top of the highest thing under it, plus the offset or less the pocket, plus the sheet; least with least, most with most.",
      source: { text: "Arithmetic", status: "calculated" },
      limits: "Adhesive counts as nothing.",
      example: () => {
        const backer = exactly(18);
        const offset = exactly(19);
        const sheet = sheetBand("cast", 5);
        const top = bandSum(backer, offset, sheet);
        return worked(
          [
            ["Backer", backer.nominal, "mm"],
            ["Barrel", offset.nominal, "mm"],
            ["Cast sheet", sheet.nominal, "mm"],
          ],
          [
            ["Top", top.nominal, "mm"],
            ["at the least", top.least, "mm"],
            ["at the most", top.most, "mm"],
          ],
        );
      },
    },
    {
      id: "area",
      title: "Area, edge and centroid",
      formula: "Outlines flattened to straight edges, then the shoelace formula, holes taken off.",
      source: { text: "Plane geometry", status: "calculated" },
      limits: `Curves to ${flatteningToleranceMm} mm.`,
      example: (kernel) => {
        const region = ell(kernel);
        const centroid = present(regionCentroid(region));
        return worked(
          [["An L", "10 × 10 less 5 × 5", "mm"]],
          [
            ["Area", regionAreaMm2(region), "mm²"],
            ["Edge", regionPerimeterMm(region), "mm"],
            ["Centroid from either long edge", centroid.x, "mm"],
          ],
        );
      },
    },
    {
      id: "mass",
      title: "Mass of acrylic",
      formula: "Area without pockets and holes · thickness · density.",
      source: { text: "Density 1.19 g/cm³, ASTM D792", status: "published" },
      limits: "Nominal thickness; hardware, adhesive and finish are not in it.",
      example: () => {
        const density = 1190;
        const thickness = 3;
        return worked(
          [
            ["Area", 1, "m²"],
            ["Thickness", thickness, "mm"],
            ["Density", density, "kg/m³"],
          ],
          [["Mass", sheetMassG(1e6, thickness, density) / 1000, "kg"]],
        );
      },
    },
    {
      id: "wood-density",
      title: "Density of wood",
      formula: "1000 · G · (1 + M/100), G the specific gravity at 12 % moisture, M the moisture in percent.",
      source: { text: "Wood Handbook, GTR-282, chapter 4 and table 5-3", status: "published" },
      limits: "Species averages; a board may differ by a tenth.",
      example: () => {
        const gravity = 0.35;
        const moisture = 12;
        return worked(
          [
            ["Eastern white pine, specific gravity", gravity],
            ["Moisture", moisture, "%"],
          ],
          [["Density", woodDensityKgM3(gravity, moisture), "kg/m³"]],
        );
      },
    },
    {
      id: "thinnest-stroke",
      title: "Thinnest stroke and gap",
      formula:
        "What an opening takes away: shrunk by half the limit and grown again, with mitred corners. The interval is halved until the width is found.",
      source: { text: "Mathematical morphology", status: "calculated" },
      limits:
        "To 0.02 mm. Tips of 30° and less count as thin, corners from 45° do not; of gaps only those that stay narrow for four times the limit, or do not come to a point.",
      example: (kernel) => {
        const neck = 1.5;
        const dumbbell = kernel.union(
          [...box(0, 0, 10, 10), ...box(10, 5 - neck / 2, 8, neck), ...box(18, 0, 10, 10)],
          "nonzero",
        );
        const slot = 1.2;
        const twoBars = kernel.union([...box(0, 0, 20, 20), ...box(20 + slot, 0, 20, 20)], "nonzero");
        return worked(
          [
            ["Two blocks with a neck of", neck, "mm"],
            ["Two bars with a slot of", slot, "mm"],
          ],
          [
            ["Thinnest stroke", present(thinnestWidth(dumbbell, 3, kernel)).widthMm, "mm"],
            ["Thinnest gap", present(thinnestGap(twoBars, 3, kernel)).widthMm, "mm"],
          ],
        );
      },
    },
    {
      id: "smallest-box",
      title: "Smallest box",
      formula:
        "One side of it lies along an edge of the convex hull; each edge is tried, with calipers turned round the hull.",
      source: { text: "H. Freeman, R. Shapira, Communications of the ACM 18(7), 1975", status: "published" },
      limits: "Outlines flattened to 0.02 mm.",
      example: () => {
        const turn = 30;
        const found = present(smallestBox(regionTransform(box(0, 0, 100, 40), rotateMatrix(turn))));
        return worked(
          [["100 × 40 turned by", turn, "°"]],
          [
            ["Length", found.length, "mm"],
            ["Width", found.width, "mm"],
            ["Area", found.length * found.width, "mm²"],
          ],
        );
      },
    },
    {
      id: "nodes",
      title: "Nodes of an outline",
      formula: "Points that segments start and end at, each once.",
      source: { text: "Counting", status: "calculated" },
      limits: "Of the outline as it was brought in, before it is flattened.",
      example: () => worked([["A circle of four curves", ""]], [["Nodes", nodeCount(circlePath({ x: 0, y: 0 }, 10))]]),
    },
    {
      id: "mirror-line",
      title: "Mirror line, and pieces with a hand",
      formula:
        "The first moment ∫ zᵖ dA about the centroid that is not nothing points along p times the line; each such line is tried on the outline.",
      source: { text: "Plane geometry", status: "calculated" },
      limits: `Outlines that differ by up to ${mirrorToleranceMm} mm count as the same (our choice).`,
      example: (kernel) => {
        const wedge: Region = [
          [
            { x: 0, y: 0 },
            { x: 60, y: 0 },
            { x: 20, y: 35 },
          ],
        ];
        return worked(
          [["A wedge with sides of three lengths, and an L with equal arms", ""]],
          [
            ["The wedge's face", faceMatters({ region: wedge, facesDiffer: false }, kernel)],
            ["The L's mirror line", present(mirrorLine(ell(kernel), kernel)), "°"],
          ],
        );
      },
    },
    {
      id: "near-twins",
      title: "Pieces that are nearly alike",
      formula:
        "Laid on each other by the middles of their boxes, upright and turned by 180°: neither reaches over the other by more than the limit, but they are not the same.",
      source: { text: "Our choice", status: "our choice" },
      limits: `Alike up to ${usualTwinLimits.alikeMm} mm or ${usualTwinLimits.alikeShare * 100} % of the size, the same up to ${usualTwinLimits.sameMm} mm.`,
      example: (kernel) => {
        const pieces = [disc(10), disc(10.5, 50)].map((region, index) => ({
          id: String(index),
          region: kernel.union(region, "evenodd"),
        }));
        return worked([["Discs", "20 and 21", "mm"]], [["Near twins", nearTwins(pieces, kernel).length]]);
      },
    },
    {
      id: "drop-outs",
      title: "What drops out",
      formula: "Parts that lie in an opening of another part.",
      source: { text: "Plane geometry", status: "calculated" },
      limits: "Bridges are not proposed.",
      example: (kernel) => {
        const opening = kernel.difference(disc(20), disc(8));
        const plate = kernel.difference(box(-50, -30, 100, 60), opening);
        return worked([["An O of 40 mm cut into a plate", ""]], [["Islands", dropOuts(plate).length]]);
      },
    },
    {
      id: "small-pieces",
      title: "Small pieces",
      formula: "Pieces whose smallest box is shorter than the limit.",
      source: { text: "Common practice", status: "common practice" },
      limits: `${smallPieceMm} mm over the longer side.`,
      example: () => {
        const pieces = [
          { id: "dot", region: disc(3) },
          { id: "bar", region: box(0, 0, 40, 2) },
        ];
        return worked([["A dot of 6 mm and a bar of 40 × 2 mm", ""]], [["Small", smallPieces(pieces).join(", ")]]);
      },
    },
  ],
};

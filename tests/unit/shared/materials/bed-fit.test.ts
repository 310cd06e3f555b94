import { expect, it } from "vitest";
import { flattenPath } from "#shared/geometry/flatten.ts";
import { placeRegion } from "#shared/geometry/placement.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { fitOnBed } from "#shared/materials/bed-fit.ts";

const bed = { widthMm: 900, heightMm: 600 };
const plate = (width: number, height: number, turn = 0) =>
  placeRegion(flattenPath(rectanglePath({ x: 0, y: 0, width, height })), {
    x: 40,
    y: 70,
    turn,
    scale: 1,
    mirrored: false,
  });

it.each([
  { name: "900 by 600", piece: plate(900, 600), over: 0 },
  { name: "600 by 900, to be turned", piece: plate(600, 900), over: 0 },
  { name: "900 by 600 drawn at 30°", piece: plate(900, 600, 30), over: 0 },
  { name: "1070 by 10, only from corner to corner", piece: plate(1070, 10), over: 0 },
  { name: "910 by 610", piece: plate(910, 610), over: 10 },
  { name: "650 by 650", piece: plate(650, 650), over: 50 },
])("$name goes over the bed by $over mm", ({ piece, over }) => {
  expect(fitOnBed(piece, bed)?.overMm).toBeCloseTo(over, 2);
});

it("what covers nothing needs no bed", () => {
  expect(fitOnBed([], bed)).toBeNull();
});

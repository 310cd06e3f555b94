import { expect, it } from "vitest";
import { columnFields, frameOf, rowFields, zoneOf } from "#shared/units/zones.ts";

// ISO 5457:1999: fields of 50 mm from the axes of symmetry; A0 24 × 16, A1 16 × 12, A2 12 × 8, A3 8 × 6, A4 6 × 4 (long
// × short side). From memory.
it.each([
  { name: "A4", long: 297, short: 210, fields: [6, 4] },
  { name: "A3", long: 420, short: 297, fields: [8, 6] },
  { name: "A2", long: 594, short: 420, fields: [12, 8] },
  { name: "A1", long: 841, short: 594, fields: [16, 12] },
  { name: "A0", long: 1189, short: 841, fields: [24, 16] },
])("$name has $fields fields", ({ long, short, fields }) => {
  const lying = { widthMm: long, heightMm: short };
  expect([columnFields(lying).length, rowFields(lying).length]).toEqual(fields);
  const standing = { widthMm: short, heightMm: long };
  expect([rowFields(standing).length, columnFields(standing).length]).toEqual(fields);
});

const a3 = { widthMm: 420, heightMm: 297 };

// Margins of the frame: 20 mm at the left, 10 mm elsewhere (ISO 5457). From memory.
it("the frame of A3 leaves 390 by 277 mm", () => {
  expect(frameOf(a3)).toEqual({ x: 20, y: 10, width: 390, height: 277 });
});

it("fields meet at the sheet's middle and the outer ones end at the frame", () => {
  expect(columnFields(a3)[4]).toEqual({ label: "5", fromMm: 210, toMm: 260 });
  expect(columnFields(a3)[0]).toEqual({ label: "1", fromMm: 20, toMm: 60 });
  expect(columnFields(a3)[7]).toEqual({ label: "8", fromMm: 360, toMm: 410 });
  expect(rowFields(a3)[3]).toEqual({ label: "D", fromMm: 148.5, toMm: 198.5 });
  expect(rowFields(a3)[5]).toEqual({ label: "F", fromMm: 248.5, toMm: 287 });
});

it("letters leave out I and O", () => {
  const labels = rowFields({ widthMm: 1189, heightMm: 841 }).map(({ label }) => label);
  expect(labels.join("")).toBe("ABCDEFGHJKLMNPQR");
});

it.each([
  { point: { x: 25, y: 15 }, zone: "A1" },
  { point: { x: 209.9, y: 148.4 }, zone: "C4" },
  { point: { x: 210, y: 148.5 }, zone: "D5" },
  { point: { x: 180, y: 60 }, zone: "B4" },
  { point: { x: 0, y: 0 }, zone: "A1" },
  { point: { x: 420, y: 297 }, zone: "F8" },
  { point: { x: 420.1, y: 20 }, zone: null },
  { point: { x: 20, y: -0.1 }, zone: null },
  { point: { x: Number.NaN, y: 20 }, zone: null },
])("the point $point of A3 lies in $zone", ({ point, zone }) => {
  expect(zoneOf(point, a3)).toBe(zone);
});

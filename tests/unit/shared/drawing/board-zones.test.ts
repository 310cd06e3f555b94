import { expect, it } from "vitest";
import { zoneOfBoardPoint, zonesOnBoard } from "#shared/drawing/board-zones.ts";
import type { DrawingSheet, Item } from "#shared/drawing/display-list.ts";

const group = (x: number, y: number, scale: number, items: Item[], id?: string): Item => ({
  kind: "group",
  x,
  y,
  scale,
  items,
  ...(id ? { id } : {}),
});

/** A4 lying: fields of 50 mm from the middle, 6 across and 4 down (ISO 5457). The board at 1:5, its corner at 60 mm, 45 mm. */
const sheet: DrawingSheet = {
  name: "1",
  widthMm: 297,
  heightMm: 210,
  items: [group(40, 25, 0.2, [group(100, 100, 1, [], "board-plane")])],
};
const blank: DrawingSheet = { ...sheet, items: [group(0, 0, 1, [])] };

it("a spot of the board has the zone of the paper it is printed on", () => {
  // 60 + 400/5 = 140 mm across lies before the middle (148.5), in field 3; 45 + 100/5 = 65 mm down in field B (55 to 105).
  expect(zoneOfBoardPoint(sheet, { x: 400, y: 100 })).toBe("B3");
});

it("the fields in mm of the board agree with the zone of each spot", () => {
  const zones = zonesOnBoard(sheet);
  expect(zones.columns.map(({ label }) => label)).toEqual(["1", "2", "3", "4", "5", "6"]);
  expect(zones.rows.map(({ label }) => label)).toEqual(["A", "B", "C", "D"]);
  // Field 4 begins in the middle of the paper: (148.5 - 60) * 5.
  expect(zones.columns[3]?.fromMm).toBeCloseTo(442.5, 9);
  expect(zoneOfBoardPoint(sheet, { x: 442.4, y: 100 })).toBe("B3");
  expect(zoneOfBoardPoint(sheet, { x: 442.6, y: 100 })).toBe("B4");
});

it("a sheet without the board has no zones of it", () => {
  expect(zonesOnBoard(blank)).toEqual({ columns: [], rows: [] });
  expect(zoneOfBoardPoint(blank, { x: 1, y: 1 })).toBeNull();
});

it("the plane is found inside a clip, and a spot off the paper has no zone", () => {
  const clipped: DrawingSheet = { ...sheet, items: [{ kind: "clip", clip: [], items: [...sheet.items] }] };
  expect(zoneOfBoardPoint(clipped, { x: 400, y: 100 })).toBe("B3");
  expect(zoneOfBoardPoint(sheet, { x: 2000, y: 100 })).toBeNull();
});

import { expect, it } from "vitest";
import { alignPictures } from "@/features/compare/model/align-pictures.ts";

const list = (widthMm: number, heightMm: number) => ({ widthMm, heightMm, items: [] });

it("boards with different margins come to lie on each other", () => {
  const before = { list: list(700, 500), origin: { x: 60, y: 90 } };
  const after = { list: list(760, 470), origin: { x: 100, y: 55 } };
  const pair = alignPictures(before, after);
  expect(pair.origin).toEqual({ x: 100, y: 90 });
  expect(pair.before.items).toEqual([{ kind: "group", x: 40, y: 0, scale: 1, items: [] }]);
  expect(pair.after.items).toEqual([{ kind: "group", x: 0, y: 35, scale: 1, items: [] }]);
  // Both reach as far as the farther one: 760 across; 500 down from the first, 35 + 470 from the second.
  expect([pair.before.widthMm, pair.before.heightMm]).toEqual([760, 505]);
  expect([pair.after.widthMm, pair.after.heightMm]).toEqual([760, 505]);
});

it("equal pictures are not moved", () => {
  const one = { list: list(640, 480), origin: { x: 20, y: 30 } };
  const pair = alignPictures(one, one);
  expect(pair.before).toEqual({
    widthMm: 640,
    heightMm: 480,
    items: [{ kind: "group", x: 0, y: 0, scale: 1, items: [] }],
  });
});

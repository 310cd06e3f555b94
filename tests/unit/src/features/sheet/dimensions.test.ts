import { expect, it } from "vitest";
import type { DisplayList, Item } from "#shared/drawing/display-list.ts";
import { hasDimensions, withoutDimensions } from "@/features/sheet/model/dimensions.ts";

const stroke = { colour: "#1F1D1A", widthMm: 0.25 };
const line = (id?: string): Item => ({
  kind: "line",
  points: [
    { x: 0, y: 0 },
    { x: 9, y: 0 },
  ],
  stroke,
  ...(id ? { id } : {}),
});
const group = (items: Item[], id?: string): Item => ({
  kind: "group",
  x: 1,
  y: 2,
  scale: 1,
  items,
  ...(id ? { id } : {}),
});

it("dimensions are left out wherever they lie, and nothing else moves", () => {
  const list: DisplayList = {
    widthMm: 640,
    heightMm: 440,
    items: [
      group([line("p1"), line("dimension:width"), { kind: "clip", clip: [], items: [line("dimension:c")] }]),
      line(),
    ],
  };
  expect(hasDimensions(list)).toBe(true);
  expect(withoutDimensions(list)).toEqual({
    widthMm: 640,
    heightMm: 440,
    items: [group([line("p1"), { kind: "clip", clip: [], items: [] }]), line()],
  });
});

it("a whole group of dimensions goes as one", () => {
  const list = { widthMm: 10, heightMm: 10, items: [group([line()], "dimension:chain"), line("board")] };
  expect(withoutDimensions(list).items).toEqual([line("board")]);
});

it("a drawing without dimensions stays the very same list", () => {
  const list = { widthMm: 10, heightMm: 10, items: [group([line("dimensioned")])] };
  expect(hasDimensions(list)).toBe(false);
  expect(withoutDimensions(list)).toBe(list);
});

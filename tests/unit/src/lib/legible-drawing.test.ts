import { expect, it } from "vitest";
import type { DisplayList, Item } from "#shared/drawing/display-list.ts";
import { isCrowded, isLegible, legibleAt, withOverallAlone } from "@/lib/legible-drawing.ts";

const text = (sizeMm: number, words: string): Item => ({
  kind: "text",
  text: words,
  at: { x: 0, y: 0 },
  sizeMm,
  font: "serif",
  colour: "#1F1D1A",
  align: "middle",
});
const group = (id: string, ...items: Item[]): Item => ({ kind: "group", id, x: 0, y: 0, scale: 1, items });
const line: Item = {
  kind: "line",
  points: [
    { x: 10, y: 300 },
    { x: 480, y: 20 },
  ],
  stroke: { colour: "#1F1D1A", widthMm: 1 },
};
const picture: DisplayList = {
  widthMm: 600,
  heightMm: 400,
  items: [
    group("dimension:overall", text(20, "600"), line),
    group("dimension:across", text(20, "168")),
    group("dimension:down", text(20, "18")),
    group("labels", text(20, "A")),
  ],
};

/** Words and em size in mm of all lettering, in order. */
const lettering = (items: readonly Item[]): [string, number][] =>
  items.flatMap((item) =>
    item.kind === "text"
      ? [[item.text, item.sizeMm] as [string, number]]
      : item.kind === "group"
        ? lettering(item.items)
        : [],
  );

it("is the same picture where the lettering is large enough", () => {
  expect(isLegible(picture, 0.625)).toBe(true);
  expect(legibleAt(picture, 0.625)).toBe(picture);
});

it("grows lettering that is a little too small, and keeps every dimension", () => {
  expect(isLegible(picture, 0.5)).toBe(false);
  expect(lettering(legibleAt(picture, 0.5).items)).toEqual([
    ["600", 25],
    ["168", 25],
    ["18", 25],
    ["A", 25],
  ]);
});

it("keeps the overall dimensions alone where larger lettering would crowd, and ends where they end", () => {
  expect(isCrowded(picture, 0.5)).toBe(false);
  expect(isCrowded(picture, 0.25)).toBe(true);
  const alone = withOverallAlone(picture, { cropped: true });
  expect(lettering(alone.items)).toEqual([
    ["600", 20],
    ["A", 20],
  ]);
  // The overall line ends at 480, 300; as much is kept beside it as the lettering is high.
  expect([alone.widthMm, alone.heightMm]).toEqual([500, 320]);
  const whole = withOverallAlone(picture, { cropped: false });
  expect([whole.widthMm, whole.heightMm]).toEqual([600, 400]);
  // 12.5 px at 0.25 px a mm are 50 mm; labels grow by three tenths at most, or they would leave their circles.
  expect(lettering(legibleAt(alone, 0.25).items)).toEqual([
    ["600", 50],
    ["A", 26],
  ]);
});

it("leaves a drawing without overall dimensions whole, however small", () => {
  expect(isCrowded({ ...picture, items: picture.items.slice(1) }, 0.01)).toBe(false);
});

it("counts a group's own scale", () => {
  const scaled: DisplayList = { ...picture, items: [{ kind: "group", x: 0, y: 0, scale: 5, items: [text(4, "600")] }] };
  expect(isLegible(scaled, 0.625)).toBe(true);
  expect(isLegible(scaled, 0.6)).toBe(false);
});

it("leaves a picture without lettering as it is", () => {
  const bare: DisplayList = { ...picture, items: [] };
  expect(legibleAt(bare, 0.01)).toBe(bare);
});

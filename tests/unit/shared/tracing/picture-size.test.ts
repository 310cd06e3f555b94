import { expect, it } from "vitest";
import { pictureSize } from "#shared/tracing/picture-size.ts";

it.each([
  { name: "300 an inch", perMm: 300 / 25.4, width: 1200, mm: 101.6, warning: "size.from-density" },
  { name: "150 an inch", perMm: 150 / 25.4, width: 3000, mm: 508, warning: "size.from-density" },
  { name: "72 an inch, which nobody asked for", perMm: 72 / 25.4, width: 1200, mm: 300, warning: "size.of-picture" },
  { name: "96 an inch, which nobody asked for", perMm: 96 / 25.4, width: 1200, mm: 300, warning: "size.of-picture" },
  { name: "so fine that it would be 12 mm", perMm: 100, width: 1200, mm: 300, warning: "size.of-picture" },
  { name: "so coarse that it would be 12 m", perMm: 0.1, width: 1200, mm: 300, warning: "size.of-picture" },
  { name: "none", perMm: null, width: 1200, mm: 300, warning: "size.of-picture" },
])("a picture whose file states $name becomes $mm mm wide", ({ perMm, width, mm, warning }) => {
  const size = pictureSize({ width, height: 400 }, perMm === null ? null : { x: perMm, y: perMm });
  expect(size.mmPerPx * width).toBeCloseTo(mm, 9);
  expect(size.warning).toBe(warning);
});

it("goes by no density that differs between width and height", () => {
  expect(pictureSize({ width: 1200, height: 400 }, { x: 12, y: 6 }).warning).toBe("size.of-picture");
});

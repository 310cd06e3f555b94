import { describe, expect, it } from "vitest";
import { readViewBox, viewportOf } from "#shared/artwork/viewport.ts";
import { pointTransform } from "#shared/geometry/transform.ts";

const settled = [0, 0, 200, 100] as const;

describe("a drawing's true size", () => {
  it.each([
    { width: "80mm", height: "40mm", mm: [80, 40] },
    { width: "8cm", height: "4cm", mm: [80, 40] },
    { width: "2in", height: "1in", mm: [50.8, 25.4] },
    { width: "144pt", height: "72pt", mm: [50.8, 25.4] },
    { width: "12pc", height: "6pc", mm: [50.8, 25.4] },
    { width: "320Q", height: "160q", mm: [80, 40] },
    { width: " 8.0e1 mm", height: undefined, mm: [80, 40] },
    { width: undefined, height: "40mm", mm: [80, 40] },
  ])("$width by $height is known", ({ width, height, mm }) => {
    const view = viewportOf({ ...(width && { width }), ...(height && { height }), viewBox: "0 0 200 100" }, settled);
    expect([view?.widthMm, view?.heightMm]).toEqual([expect.closeTo(mm[0] ?? 0, 9), expect.closeTo(mm[1] ?? 0, 9)]);
    expect(view?.warning).toBeNull();
  });

  it.each([{ width: "192", height: "96" }, { width: "192px", height: "96px" }, { width: "100%", height: "50%" }, {}])(
    "$width by $height is a guess at 96 to the inch",
    (size) => {
      const view = viewportOf({ ...size, viewBox: "0 0 192 96" }, settled);
      expect(view).toMatchObject({
        widthMm: expect.closeTo(50.8, 9),
        heightMm: expect.closeTo(25.4, 9),
        warning: "size.guessed",
      });
    },
  );

  it("without a view box the reader's stands in", () => {
    expect(viewportOf({}, settled)).toMatchObject({
      widthMm: expect.closeTo(200 * (25.4 / 96), 9),
      warning: "size.guessed",
    });
    expect(viewportOf({ viewBox: "0 0 -5 5" }, settled)?.widthMm).toBeCloseTo(200 * (25.4 / 96), 9);
  });

  it.each([{ width: "0" }, { height: "-3mm" }, { width: "0mm", height: "5mm" }])(
    "$width by $height shows nothing",
    (size) => {
      expect(viewportOf(size, settled)).toBeNull();
    },
  );

  it.each([{ width: "20000mm" }, { width: "0.1mm" }])("$width is no sign, so it is fitted to 300 mm", (size) => {
    expect(viewportOf({ ...size, viewBox: "0 0 200 100" }, settled)).toMatchObject({
      widthMm: expect.closeTo(300, 9),
      heightMm: expect.closeTo(150, 9),
      warning: "size.rescaled",
    });
  });
});

describe("a view box in its frame", () => {
  // A view box of 200 × 100 from 10, 20 in a frame of 100 × 100 mm: drawn at 0.5 or 1 mm to the unit.
  it.each([
    { aspect: undefined, corner: [0, 25], opposite: [100, 75] },
    { aspect: "xMidYMin", corner: [0, 0], opposite: [100, 50] },
    { aspect: "xMidYMax meet", corner: [0, 50], opposite: [100, 100] },
    { aspect: "xMinYMid slice", corner: [0, 0], opposite: [200, 100] },
    { aspect: "defer xMaxYMid slice", corner: [-100, 0], opposite: [100, 100] },
    { aspect: "none", corner: [0, 0], opposite: [100, 100] },
  ])("$aspect", ({ aspect, corner, opposite }) => {
    const view = viewportOf(
      { width: "100mm", height: "100mm", viewBox: "10 20 200 100", ...(aspect && { aspect }) },
      settled,
    );
    if (!view) throw new Error("No frame.");
    const at = (x: number, y: number) => {
      const point = pointTransform({ x, y }, view.toMm);
      return [expect.closeTo(point.x, 9), expect.closeTo(point.y, 9)];
    };
    expect(corner).toEqual(at(10, 20));
    expect(opposite).toEqual(at(210, 120));
  });

  it.each(["0 0 10", "0 0 ten 10", "0 0 10 0", "", "1e400 0 1 1"])("%s is no view box", (text) => {
    expect(readViewBox(text)).toBeNull();
  });
});

import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { WallPhoto } from "#shared/mockup/document.ts";
import { homographyBetween, mapPoint } from "#shared/wall/homography.ts";
import { mapQuad } from "#shared/wall/quad.ts";
import { raisedPlane } from "#shared/wall/raised-plane.ts";
import { likelyErrorAt, readWallPhoto, type WallReading } from "#shared/wall/read-wall-photo.ts";
import { sheetCornersMm } from "#shared/wall/sheet-on-wall.ts";
import { type KnownCamera, seenBy } from "../../../support/known-camera.ts";
import { seededRandom } from "../../../support/seeded-random.ts";

type Marks = Omit<WallPhoto, "photoId" | "at">;
type Sheet = Pick<WallPhoto, "paper" | "lies">;

const camera = (given: Partial<KnownCamera> = {}): KnownCamera => ({
  focal: 3000,
  widthPx: 4000,
  heightPx: 3000,
  distance: 2400,
  aside: 25,
  above: -8,
  roll: 2,
  lookAt: { x: 350, y: 60 },
  ...given,
});

const marksOf = (of: KnownCamera, sheet: Sheet, shake: () => number = () => 0): Marks => ({
  widthPx: of.widthPx,
  heightPx: of.heightPx,
  ...sheet,
  corners: [
    ...mapQuad(sheetCornersMm(sheet), (corner) => {
      const { x, y } = seenBy(of, corner);
      return { x: x + shake(), y: y + shake() };
    }),
  ],
});

function reading(marks: Marks): WallReading {
  const outcome = readWallPhoto(marks);
  if (!outcome.ok) throw new Error(outcome.reason);
  return outcome.value;
}

const a4: Sheet = { paper: "A4", lies: "upright" };

const cameras: fc.Arbitrary<KnownCamera> = fc.record({
  focal: fc.double({ min: 2200, max: 6000, noNaN: true }),
  widthPx: fc.constant(4000),
  heightPx: fc.constant(3000),
  distance: fc.double({ min: 900, max: 4000, noNaN: true }),
  aside: fc.double({ min: -55, max: 55, noNaN: true }),
  above: fc.double({ min: -35, max: 35, noNaN: true }),
  roll: fc.double({ min: -20, max: 20, noNaN: true }),
  lookAt: fc.record({
    x: fc.double({ min: -500, max: 500, noNaN: true }),
    y: fc.double({ min: -300, max: 300, noNaN: true }),
  }),
});
const papers: fc.Arbitrary<Sheet> = fc.record({
  paper: fc.constantFrom("A4" as const, "Letter" as const),
  lies: fc.constantFrom("upright" as const, "lying" as const),
});

describe("a photo of the wall", () => {
  it("frontal at 0.75 px a mm is read as worked out by hand", () => {
    // 3000 px / 4000 mm; the sheet's middle is 400 mm left of where the camera looks.
    const front = camera({ distance: 4000, aside: 0, above: 0, roll: 0, lookAt: { x: 400, y: 0 } });
    const marks = marksOf(front, { paper: "Letter", lies: "lying" });
    expect(marks.corners[0].x).toBeCloseTo(2000 + (-400 - 139.7) * 0.75, 9);
    expect(marks.corners[0].y).toBeCloseTo(1500 - 107.95 * 0.75, 9);
    const { toPhoto, pxPerMm, camera: known, residualPx } = reading(marks);
    expect(pxPerMm).toBeCloseTo(0.75, 9);
    expect(mapPoint(toPhoto, { x: 1000, y: -200 })?.x).toBeCloseTo(2450, 6);
    expect(mapPoint(toPhoto, { x: 1000, y: -200 })?.y).toBeCloseTo(1350, 6);
    expect(residualPx).toBeLessThan(1e-6);
    // Every focal length shows a frontal sheet alike.
    expect(known).toBeNull();
  });

  it("from any camera gives back every point of the wall, with nothing left over", () => {
    fc.assert(
      fc.property(cameras, papers, (known, sheet) => {
        const { toPhoto, toWall, residualPx } = reading(marksOf(known, sheet));
        for (const point of [
          { x: 0, y: 0 },
          { x: 420, y: -160 },
          { x: -380, y: 230 },
        ]) {
          const seen = seenBy(known, point);
          const mapped = mapPoint(toPhoto, point);
          expect(mapped?.x).toBeCloseTo(seen.x, 6);
          expect(mapped?.y).toBeCloseTo(seen.y, 6);
          const back = mapPoint(toWall, seen);
          expect(back?.x).toBeCloseTo(point.x, 6);
          expect(back?.y).toBeCloseTo(point.y, 6);
        }
        expect(residualPx).toBeLessThan(1e-5);
      }),
      { numRuns: 100, seed: 11 },
    );
  });

  it("from aslant tells the focal length, and where the front of a sign that stands off is seen", () => {
    const known = camera({ distance: 1500, aside: 40 });
    const { camera: found, toPhoto } = reading(marksOf(known, a4));
    if (!found) throw new Error("The focal length is told.");
    expect(found.focal).toBeCloseTo(3000, 3);
    const point = { x: 600, y: -250 };
    const seen = seenBy(known, point, 64);
    const mapped = mapPoint(raisedPlane(toPhoto, found, 64), point);
    expect(mapped?.x).toBeCloseTo(seen.x, 5);
    expect(mapped?.y).toBeCloseTo(seen.y, 5);
    // 64 mm make a difference that is seen.
    expect(Math.hypot(seen.x - seenBy(known, point).x, seen.y - seenBy(known, point).y)).toBeGreaterThan(50);
  });

  it("with marks off at random leaves over what they are off by", () => {
    const random = seededRandom(5);
    // Sum of twelve even numbers less six: spread 1, bell-shaped.
    const shake = () => 1.5 * (Array.from({ length: 12 }, () => random()).reduce((sum, one) => sum + one, 0) - 6);
    const known = camera({ distance: 1300, aside: 38, above: 12 });
    const squares = Array.from({ length: 400 }, () => 4 * reading(marksOf(known, a4, shake)).residualPx ** 2);
    const spread = Math.sqrt(squares.reduce((sum, square) => sum + square, 0) / squares.length);
    // One figure is left over, so its square comes to 1.5² on average; over 400 photos the root is within 10 %.
    expect(spread).toBeGreaterThan(1.35);
    expect(spread).toBeLessThan(1.65);
  });

  it("tells that the sheet is the other paper, where the marks say so", () => {
    const marks = marksOf(camera({ aside: 0, above: 0, distance: 1200 }), { paper: "Letter", lies: "upright" });
    expect(reading(marks).betterSheet).toBeNull();
    const wrong = reading({ ...marks, paper: "A4", lies: "lying" });
    expect(wrong.residualPx).toBeGreaterThan(2);
    expect(wrong.betterSheet).toEqual({ paper: "Letter", lies: "upright" });
  });

  it("is refused with corners that no sheet has", () => {
    const { corners, ...marks } = marksOf(camera(), a4);
    const [a, b, c, d] = corners;
    expect(readWallPhoto({ ...marks, corners: [a, c, b, d] })).toEqual({ ok: false, reason: "crossed" });
  });
});

describe("the likely error", () => {
  it("is what a thousand shaken photos show", () => {
    const random = seededRandom(9);
    const shake = () => Array.from({ length: 12 }, () => random()).reduce((sum, one) => sum + one, 0) - 6;
    const known = camera({ aside: 15, distance: 1800 });
    const exact = marksOf(known, a4);
    const box = { x: 250, y: -120, width: 600, height: 240 };
    const ends = [box.x, box.x + box.width].map((x) => seenBy(known, { x, y: box.y + box.height / 2 }));
    const widths = Array.from({ length: 1000 }, () => {
      const toWall = homographyBetween(marksOf(known, a4, shake).corners, sheetCornersMm(a4));
      const [left, right] = ends.map((end) => (toWall ? mapPoint(toWall, end) : null));
      return left && right ? Math.hypot(right.x - left.x, right.y - left.y) : Number.NaN;
    });
    const spread = Math.sqrt(widths.reduce((sum, width) => sum + (width - 600) ** 2, 0) / widths.length);
    const told = likelyErrorAt(exact, { residualPx: 0 }, box);
    expect(told?.widthMm).toBeGreaterThan(spread * 0.93);
    expect(told?.widthMm).toBeLessThan(spread * 1.07);
  });

  it("grows with the distance from the sheet and with marks that fit no camera", () => {
    const marks = marksOf(camera(), a4);
    const at = (x: number, residualPx = 0) =>
      likelyErrorAt(marks, { residualPx }, { x, y: -100, width: 600, height: 200 })?.widthMm ?? Number.NaN;
    expect(at(1000)).toBeGreaterThan(1.5 * at(-300));
    expect(at(200, 2)).toBeCloseTo(4 * at(200), 0);
    expect(at(200, 0.3)).toBe(at(200));
  });
});

import { describe, expect, it } from "vitest";
import type { WallPhoto } from "#shared/mockup/document.ts";
import { mapQuad } from "#shared/wall/quad.ts";
import { readWallPhoto } from "#shared/wall/read-wall-photo.ts";
import { sheetCornersMm } from "#shared/wall/sheet-on-wall.ts";
import { depthWords, errorWords, placeOnWallWords, residualWords } from "@/features/mockup/model/wall-words.ts";
import { buildSign } from "../../../../../support/build-sign.ts";
import { type KnownCamera, seenBy } from "../../../../../support/known-camera.ts";

/** 600 × 400 mm. */
const sign = buildSign([]);
const camera: KnownCamera = {
  focal: 3000,
  widthPx: 4000,
  heightPx: 3000,
  distance: 2000,
  aside: 0,
  above: 0,
  roll: 0,
  lookAt: { x: 300, y: 0 },
};
const shot = (by: Partial<KnownCamera>, at: WallPhoto["at"], sheet: Pick<WallPhoto, "paper" | "lies">): WallPhoto => ({
  photoId: "11111111-1111-4111-8111-111111111111",
  widthPx: 4000,
  heightPx: 3000,
  ...sheet,
  corners: [...mapQuad(sheetCornersMm(sheet), (corner) => seenBy({ ...camera, ...by }, corner))],
  at,
});
const readingOf = (photo: WallPhoto) => {
  const read = readWallPhoto(photo);
  if (!read.ok) throw new Error(read.reason);
  return read.value;
};
const upright = { paper: "A4", lies: "upright" } as const;

describe("words on the wall", () => {
  it.each([
    { at: { x: 640, y: 0 }, words: "From edge to edge it hangs 235 mm right of the sheet." },
    { at: { x: -640, y: -380 }, words: "From edge to edge it hangs 235 mm left of and 31.5 mm above the sheet." },
    { at: { x: 0, y: 400 }, words: "From edge to edge it hangs 51.5 mm below the sheet." },
    { at: { x: 100, y: 100 }, words: "It covers the sheet." },
  ])("say where the sign hangs: $words", ({ at, words }) => {
    expect(placeOnWallWords(sign, shot({}, at, upright), "mm")).toBe(words);
  });

  it("say how true a frontal picture is", () => {
    const photo = shot({}, { x: 500, y: 0 }, upright);
    expect(errorWords(sign, photo, readingOf(photo), "mm")).toMatch(
      /^Here the sign, 600 mm wide, is true to about \d+(\.5)? mm, its height to \d+(\.5)? mm and its place to \d+(\.5)? mm\.$/,
    );
    expect(residualWords(readingOf(photo), "mm")).toBe(
      "The corners are 0 px from where a camera would see the sheet’s, 0 mm on the wall.",
    );
    expect(depthWords(readingOf(photo))).toMatch(/drawn flat on it\.$/);
  });

  it("say that depth is shown where the view tells it", () => {
    expect(depthWords(readingOf(shot({ aside: 40, distance: 1200 }, { x: 500, y: 0 }, upright)))).toBe(
      "What stands off the wall is shown where the camera would see it.",
    );
  });

  it("name the sheet that the corners are of, where they say so", () => {
    const photo = shot({ distance: 1200 }, { x: 500, y: 0 }, { paper: "Letter", lies: "upright" });
    expect(residualWords(readingOf({ ...photo, paper: "A4", lies: "lying" }), "mm")).toMatch(
      /They are those of a Letter sheet upright: choose that if it is so\.$/,
    );
  });

  it("ask for another look at corners that no sheet explains", () => {
    const photo = shot({ aside: 20, distance: 1200 }, { x: 500, y: 0 }, upright);
    const [a, b, c, d] = photo.corners;
    const moved = { ...photo, corners: [a, b, { x: c.x - 60, y: c.y + 50 }, d] as WallPhoto["corners"] };
    expect(residualWords(readingOf(moved), "mm")).toMatch(/look at each corner again/);
  });
});

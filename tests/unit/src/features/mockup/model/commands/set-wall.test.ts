import { describe, expect, it } from "vitest";
import { documentSchema } from "#shared/mockup/document.ts";
import {
  chooseWallPhoto,
  hangAt,
  isUnmarked,
  markCorner,
  setSheet,
  setWallColour,
} from "@/features/mockup/model/commands/set-wall.ts";
import { buildSign } from "../../../../../../support/build-sign.ts";

const sign = buildSign([]);
const chosen = {
  photoId: "11111111-1111-4111-8111-111111111111",
  widthPx: 1600,
  heightPx: 1200,
  paper: "A4" as const,
};
const onPhoto = chooseWallPhoto(sign, chosen);
const photoOf = (document: typeof sign) => {
  const { photo } = document.presentation;
  if (!photo) throw new Error("It is on a photo.");
  return photo;
};

describe("the wall of a mockup", () => {
  it("takes a colour, and nothing that is none", () => {
    expect(setWallColour(sign, "#AABBCC").presentation.wall).toBe("#AABBCC");
    expect(setWallColour(sign, "red")).toBe(sign);
    expect(setWallColour(sign, sign.presentation.wall)).toBe(sign);
  });

  it("is a photo with its marks in the middle and the sign beside them, and a plain one again", () => {
    const photo = photoOf(onPhoto);
    expect(documentSchema.safeParse(onPhoto).success).toBe(true);
    // A fifth of 1200 px wide, as high as A4 is.
    expect(photo.corners[0]).toEqual({ x: 680, y: 430.29 });
    expect(photo.corners[2]).toEqual({ x: 920, y: 769.71 });
    expect(photo.at).toEqual({ x: sign.board.width / 2 + 300, y: 0 });
    expect(chooseWallPhoto(onPhoto, chosen)).toBe(onPhoto);
    expect(chooseWallPhoto(onPhoto, null).presentation.photo).toBeNull();
    expect(chooseWallPhoto(sign, null)).toBe(sign);
  });

  it("is known to be unmarked until a mark is put somewhere", () => {
    expect(isUnmarked(photoOf(onPhoto))).toBe(true);
    expect(isUnmarked(photoOf(markCorner(onPhoto, { corner: 2, to: { x: 921, y: 769.71 } })))).toBe(false);
  });

  it("keeps a mark within its photo, and the other marks where they are", () => {
    const marked = markCorner(onPhoto, { corner: 1, to: { x: 1700, y: -3 } });
    expect(photoOf(marked).corners[1]).toEqual({ x: 1600, y: 0 });
    expect(photoOf(marked).corners[0]).toBe(photoOf(onPhoto).corners[0]);
    expect(markCorner(onPhoto, { corner: 1, to: { x: Number.NaN, y: 4 } })).toBe(onPhoto);
    expect(markCorner(onPhoto, { corner: 0, to: { x: 680, y: 430.291 } })).toBe(onPhoto);
    expect(markCorner(sign, { corner: 0, to: { x: 1, y: 1 } })).toBe(sign);
  });

  it("hangs the sign where it is told, and leaves it for what is out of reach", () => {
    expect(photoOf(hangAt(onPhoto, { y: -120.5 })).at).toEqual({ x: photoOf(onPhoto).at.x, y: -120.5 });
    expect(hangAt(onPhoto, { x: 10_001 })).toBe(onPhoto);
    expect(hangAt(onPhoto, { x: Number.NaN })).toBe(onPhoto);
    expect(hangAt(sign, { x: 5 })).toBe(sign);
  });

  it("says which sheet is taped", () => {
    const lying = setSheet(onPhoto, { paper: "Letter", lies: "lying" });
    expect(photoOf(lying)).toMatchObject({ paper: "Letter", lies: "lying", at: photoOf(onPhoto).at });
    expect(setSheet(lying, { paper: "Letter" })).toBe(lying);
  });
});

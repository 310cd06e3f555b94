import { Jimp } from "jimp";
import { describe, expect, it } from "vitest";
import { prepareBytes } from "#server/photos/prepare-bytes.ts";
import { asTaken, cameraSerial, jpegOf, pngOf, twoHalves } from "../../../support/wall-pictures.ts";

async function prepared(bytes: Uint8Array) {
  const answer = await prepareBytes(bytes);
  if (!answer.ok) throw new Error("It is a picture.");
  const picture = await Jimp.fromBuffer(Buffer.from(answer.jpeg));
  expect([picture.bitmap.width, picture.bitmap.height]).toEqual([answer.widthPx, answer.heightPx]);
  const greenAt = (x: number, y: number) => ((picture.getPixelColor(x, y) >>> 16) & 0xff) > 128;
  return { ...answer, greenAt };
}

describe("a photo of the wall", () => {
  it.each([
    { orientation: 1, widthPx: 60, green: { x: 50, y: 20 }, red: { x: 10, y: 20 } },
    { orientation: 3, widthPx: 60, green: { x: 10, y: 20 }, red: { x: 50, y: 20 } },
    // Held on its side: what was right is below, or above.
    { orientation: 6, widthPx: 40, green: { x: 20, y: 50 }, red: { x: 20, y: 10 } },
    { orientation: 8, widthPx: 40, green: { x: 20, y: 10 }, red: { x: 20, y: 50 } },
  ])("turned $orientation stands upright", async ({ orientation, widthPx, green, red }) => {
    const photo = await prepared(asTaken(await jpegOf(twoHalves(60, 40)), orientation));
    expect(photo.widthPx).toBe(widthPx);
    expect(photo.greenAt(green.x, green.y)).toBe(true);
    expect(photo.greenAt(red.x, red.y)).toBe(false);
  });

  it("keeps nothing that the camera wrote", async () => {
    const taken = asTaken(await jpegOf(twoHalves(60, 40)), 6);
    expect(Buffer.from(taken).includes(cameraSerial)).toBe(true);
    const { jpeg } = await prepared(taken);
    const text = Buffer.from(jpeg);
    expect(text.includes(cameraSerial)).toBe(false);
    expect(text.includes("Exif")).toBe(false);
    // SOI, then JFIF's own segment and no other of an application (ITU-T T.81, annex B).
    expect([...jpeg.subarray(0, 4)]).toEqual([0xff, 0xd8, 0xff, 0xe0]);
  });

  it("over 4,096 px is made smaller, in its own proportions", async () => {
    const { widthPx, heightPx } = await prepared(await pngOf(twoHalves(5000, 500)));
    expect(widthPx).toBe(4096);
    expect(heightPx).toBeGreaterThanOrEqual(409);
    expect(heightPx).toBeLessThanOrEqual(410);
  });

  it("that lets light through lies on white", async () => {
    const glass = new Jimp({ width: 30, height: 30, color: 0x00000000 });
    const { jpeg } = await prepared(await pngOf(glass));
    const picture = await Jimp.fromBuffer(Buffer.from(jpeg));
    expect(picture.getPixelColor(15, 15) >>> 8).toBeGreaterThan(0xfafafa);
  });

  it("that is cut off, or is only called a photo, is none", async () => {
    const jpeg = await jpegOf(twoHalves(60, 40));
    expect(await prepareBytes(jpeg.subarray(0, 40))).toEqual({ ok: false });
    expect(await prepareBytes(new TextEncoder().encode("<svg/>"))).toEqual({ ok: false });
    const png = await pngOf(twoHalves(60, 40));
    expect(await prepareBytes(png.subarray(0, png.length - 30))).toEqual({ ok: false });
  });
});

import { PNG } from "pngjs";
import { describe, expect, it } from "vitest";
import { base64OfBytes, bytesOfBase64 } from "#shared/drawing/base64.ts";
import { alphaPng, palettePng } from "#shared/drawing/png.ts";

const plane = { width: 3, height: 2, pixels: Uint8Array.of(0, 1, 128, 254, 255, 7) };

describe("alphaPng", () => {
  it("is read back by another decoder with every opacity and the colour", () => {
    const { width, height, data } = PNG.sync.read(Buffer.from(alphaPng(plane, "#1A1208")));
    expect([width, height]).toEqual([3, 2]);
    const pixels = Array.from({ length: 6 }, (_, index) => [...data.subarray(index * 4, index * 4 + 4)]);
    expect(pixels).toEqual([0, 1, 128, 254, 255, 7].map((alpha) => [26, 18, 8, alpha]));
  });

  it("gives the same bytes for the same plane", () => {
    expect(alphaPng(plane, "#1A1208")).toEqual(alphaPng({ ...plane, pixels: plane.pixels.slice() }, "#1A1208"));
  });

  it.each([
    { width: 0, height: 2, pixels: new Uint8Array(0) },
    { width: 3, height: 2, pixels: new Uint8Array(5) },
  ])("refuses $width by $height with $pixels.length pixels", (wrong) => {
    expect(() => alphaPng(wrong, "#000000")).toThrow(/can't hold/);
  });
});

describe("palettePng", () => {
  it("is read back by another decoder as the listed colours, opaque", () => {
    const png = palettePng({ width: 2, height: 1, pixels: Uint8Array.of(1, 0) }, ["#102030", "#FEDCBA"]);
    expect([...PNG.sync.read(Buffer.from(png)).data]).toEqual([0xfe, 0xdc, 0xba, 255, 0x10, 0x20, 0x30, 255]);
  });

  it("refuses a palette of more than 256 colours", () => {
    expect(() => palettePng({ width: 1, height: 1, pixels: Uint8Array.of(0) }, Array(257).fill("#000000"))).toThrow(
      /257/,
    );
  });
});

describe("base64", () => {
  // RFC 4648, section 10.
  it.each([
    ["", ""],
    ["f", "Zg=="],
    ["fo", "Zm8="],
    ["foo", "Zm9v"],
    ["foob", "Zm9vYg=="],
    ["fooba", "Zm9vYmE="],
    ["foobar", "Zm9vYmFy"],
  ])("of %j is %s and back", (text, encoded) => {
    const bytes = new TextEncoder().encode(text);
    expect(base64OfBytes(bytes)).toBe(encoded);
    expect(bytesOfBase64(encoded)).toEqual(bytes);
  });

  it("refuses a character of another alphabet", () => {
    expect(() => bytesOfBase64("Zm9*")).toThrow(/Not base64/);
  });
});

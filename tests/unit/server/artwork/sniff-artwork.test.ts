import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { sniffArtwork } from "#server/artwork/sniff-artwork.ts";

const text = (words: string) => new TextEncoder().encode(words);
const png = (width: number, height: number) => {
  const bytes = Buffer.alloc(33);
  Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13]).copy(bytes);
  bytes.write("IHDR", 12, "latin1");
  bytes.writeUInt32BE(width, 16);
  bytes.writeUInt32BE(height, 20);
  return bytes;
};
// Start, an APP0 segment of 4 bytes, a Huffman table that looks like a frame at first sight, then a progressive frame of 300 × 640.
const jpeg = Buffer.from("ffd8 ffe00004aabb ffc40004ccdd ffc200110802 80012c 03 0000000000".replaceAll(" ", ""), "hex");

describe("a file's kind by its content", () => {
  it.each([
    { name: "nothing", bytes: new Uint8Array(), kind: "empty" },
    { name: "a drawing", bytes: text(`<svg xmlns="http://www.w3.org/2000/svg"/>`), kind: "svg" },
    {
      name: "a drawing after a declaration and a remark",
      bytes: text(`<?xml version="1.0"?>\n<!-- a --><svg>`),
      kind: "svg",
    },
    { name: "a drawing with a byte order mark", bytes: text("\ufeff<svg/>"), kind: "svg" },
    { name: "a drawing in UTF-16", bytes: Buffer.from("\ufeff<svg/>", "utf16le"), kind: "svg" },
    { name: "a drawing with prefixes", bytes: text("<s:svg/>"), kind: "svg" },
    { name: "other XML, for the import to refuse in its words", bytes: text("<html><body/></html>"), kind: "svg" },
    { name: "a compressed file", bytes: Uint8Array.of(0x1f, 0x8b, 8), kind: "gzip" },
    { name: "a PDF", bytes: text("%PDF-1.4"), kind: "pdf" },
    { name: "plain words", bytes: text("svg please"), kind: "unknown" },
    { name: "a GIF", bytes: text("GIF89a"), kind: "unknown" },
  ] as const)("$name", ({ bytes, kind }) => {
    expect(sniffArtwork(bytes)).toEqual({ kind, pixels: null });
  });

  it("a PNG's size is read from its header, whatever it claims", () => {
    expect(sniffArtwork(png(64, 32))).toEqual({ kind: "png", pixels: { width: 64, height: 32 } });
    expect(sniffArtwork(png(200_000, 200_000)).pixels).toEqual({ width: 200_000, height: 200_000 });
    expect(sniffArtwork(png(0, 32)).pixels).toBeNull();
    expect(sniffArtwork(png(64, 32).subarray(0, 20))).toEqual({ kind: "png", pixels: null });
    const renamed = readFileSync(new URL("../../../fixtures/artwork/renamed-picture.svg", import.meta.url));
    expect(sniffArtwork(renamed)).toEqual({ kind: "png", pixels: { width: 64, height: 32 } });
  });

  it("a JPEG's size is read from its frame header, past other segments", () => {
    expect(sniffArtwork(jpeg)).toEqual({ kind: "jpeg", pixels: { width: 300, height: 640 } });
    expect(sniffArtwork(jpeg.subarray(0, 12))).toEqual({ kind: "jpeg", pixels: null });
  });

  it("a view into a larger buffer is read at its own place", () => {
    const padded = Buffer.concat([Buffer.alloc(5), png(7, 9)]);
    expect(sniffArtwork(padded.subarray(5)).pixels).toEqual({ width: 7, height: 9 });
  });
});

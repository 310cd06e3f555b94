import { deflateSync } from "node:zlib";
import { describe, expect, it } from "vitest";
import { readPicture } from "#server/artwork/read-picture.ts";
import { unpacksAsTold } from "#server/artwork/unpacks-as-told.ts";
import { prepareBytes } from "#server/photos/prepare-bytes.ts";
import { pngChunk } from "../../../support/pictures.ts";

type Kind = { width: number; height: number; depth?: number; colourType?: number; interlaced?: boolean };

function header({ width, height, depth = 8, colourType = 2, interlaced = true }: Kind): Uint8Array {
  const content = Buffer.alloc(13);
  content.writeUInt32BE(width, 0);
  content.writeUInt32BE(height, 4);
  content.set([depth, colourType, 0, 0, interlaced ? 1 : 0], 8);
  return pngChunk("IHDR", content);
}

const pngWith = (...chunks: Uint8Array[]): Buffer =>
  Buffer.concat([Buffer.from("89504e470d0a1a0a", "hex"), ...chunks, pngChunk("IEND", new Uint8Array())]);

/** Where each pass begins and how far its pixels are apart: PNG (Third Edition), section 8.2. */
const passes = [
  { x: 0, y: 0, across: 8, down: 8 },
  { x: 4, y: 0, across: 8, down: 8 },
  { x: 0, y: 4, across: 4, down: 8 },
  { x: 2, y: 0, across: 4, down: 4 },
  { x: 0, y: 2, across: 2, down: 4 },
  { x: 1, y: 0, across: 2, down: 2 },
  { x: 0, y: 1, across: 1, down: 2 },
];

function bytesOfPasses(width: number, height: number, bits: number): number {
  const sizes = passes.map(({ x, y, across, down }) => {
    const cells = Math.ceil((width - x) / across);
    const lines = Math.ceil((height - y) / down);
    return cells <= 0 || lines <= 0 ? 0 : lines * (1 + Math.ceil((cells * bits) / 8));
  });
  return sizes.reduce((sum, size) => sum + size, 0);
}

describe("a PNG that unpacks to what its header asks for", () => {
  it("may be interlaced, of any size and depth", () => {
    const refused: string[] = [];
    for (const depth of [1, 8, 16])
      for (let width = 1; width <= 34; width++)
        for (let height = 1; height <= 34; height++) {
          const pixels = Buffer.alloc(bytesOfPasses(width, height, depth));
          const kind = { width, height, depth, colourType: 0 };
          const file = pngWith(header(kind), pngChunk("IDAT", deflateSync(pixels, { level: 1 })));
          if (!unpacksAsTold(file)) refused.push(`${width} × ${height} × ${depth}`);
        }
    expect(refused).toEqual([]);
  });

  it("is read, interlaced and in several parts", async () => {
    const packed = deflateSync(Buffer.alloc(bytesOfPasses(40, 30, 24)));
    const parts = [packed.subarray(0, 5), packed.subarray(5)].map((part) => pngChunk("IDAT", part));
    const { picture } = await readPicture(pngWith(header({ width: 40, height: 30 }), ...parts));
    expect([picture.width, picture.height]).toEqual([40, 30]);
  });
});

describe("a PNG that unpacks to more than its header asks for", () => {
  const small = { width: 100, height: 100 };
  const flood = pngChunk("IDAT", deflateSync(Buffer.alloc(200_000_000), { level: 1 }));
  // Both ways a reader was seen to take gigabytes for a file of a megabyte.
  it.each([
    { name: "interlaced", bytes: pngWith(header(small), flood) },
    {
      name: "with a second header that is believed",
      bytes: pngWith(
        header({ ...small, interlaced: false }),
        header({ width: 8000, height: 8000, interlaced: false }),
        flood,
      ),
    },
  ])("is refused before it is unpacked: $name", async ({ bytes }) => {
    expect(unpacksAsTold(bytes)).toBe(false);
    await expect(readPicture(bytes)).rejects.toMatchObject({ code: "picture.unreadable" });
    expect(await prepareBytes(bytes)).toEqual({ ok: false });
  });

  it.each([
    { name: "no header", bytes: pngWith(flood) },
    { name: "a header that is cut off", bytes: pngWith(header(small)).subarray(0, 20) },
    { name: "nothing at all", bytes: Buffer.alloc(0) },
  ])("can't be told of one with $name", ({ bytes }) => {
    expect(unpacksAsTold(bytes)).toBe(false);
  });
});

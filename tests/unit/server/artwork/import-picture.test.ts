import { deflateSync } from "node:zlib";
import { afterAll, describe, expect, it } from "vitest";
import { importFile, stopImporting } from "#server/artwork/import-file.ts";
import { firstChoices } from "#shared/tracing/trace-choices.ts";
import { jpegOf, paintedPicture, pngChunk, pngDensity, pngOf, rawPng } from "../../../support/pictures.ts";

afterAll(stopImporting);

// All parts of the suite share two cores; a fault would end in import.failed, not in this limit.
const outcomeOf = (bytes: Uint8Array) => importFile(bytes, { timeMs: 60_000 });
async function taken(bytes: Uint8Array) {
  const outcome = await outcomeOf(bytes);
  if (!outcome.ok) throw new Error(`Refused: ${outcome.refusal.code}`);
  const { artwork, trace } = outcome;
  return {
    colours: artwork.colours.map(({ colour, pieces }) => [colour, pieces]),
    codes: artwork.warnings.map(({ code }) => code),
    size: [artwork.widthMm, artwork.heightMm],
    box: artwork.pieces[0]?.box,
    trace,
  };
}

const wide = 60;
const high = 40;
const isInk = (x: number, y: number) => x >= 10 && x < 40 && y >= 10 && y < 30;
/** A block of 30 by 20 pixels, told pixel by pixel. */
const rowsOf = (bytesAt: (ink: boolean) => readonly number[]) =>
  Uint8Array.from(
    Array.from({ length: wide * high }, (_, at) => bytesAt(isInk(at % wide, Math.floor(at / wide)))).flat(),
  );
const plain = paintedPicture(wide, high, (x, y) => (isInk(x, y) ? "#27314F" : "#00000000"), 1);
const kinds = { width: wide, height: high };

describe("kinds of PNG", () => {
  const palette = pngChunk("PLTE", Uint8Array.of(0xc8, 0x99, 0x2f, 0x27, 0x31, 0x4f));
  const clearFirst = pngChunk("tRNS", Uint8Array.of(0));
  it.each([
    { name: "eight bits with opacity", file: pngOf(plain), colours: [["#27314F", 1]] },
    {
      name: "sixteen bits",
      file: rawPng({
        ...kinds,
        depth: 16,
        colourType: 2,
        bytesPerPixel: 6,
        rows: rowsOf((ink) => (ink ? [0x27, 0x27, 0x31, 0x31, 0x4f, 0x4f] : [255, 255, 255, 255, 255, 255])),
      }),
      colours: [["#27314F", 1]],
    },
    {
      name: "grey",
      file: rawPng({ ...kinds, depth: 8, colourType: 0, bytesPerPixel: 1, rows: rowsOf((ink) => [ink ? 64 : 255]) }),
      colours: [["#404040", 1]],
    },
    {
      name: "grey with opacity",
      file: rawPng({
        ...kinds,
        depth: 8,
        colourType: 4,
        bytesPerPixel: 2,
        rows: rowsOf((ink) => (ink ? [64, 255] : [64, 0])),
      }),
      colours: [["#404040", 1]],
    },
    {
      name: "a palette",
      file: rawPng({
        ...kinds,
        depth: 8,
        colourType: 3,
        bytesPerPixel: 1,
        extra: [palette],
        rows: rowsOf((ink) => [ink ? 1 : 0]),
      }),
      colours: [
        ["#C8992F", 1],
        ["#27314F", 1],
      ],
    },
    {
      name: "a palette with a transparent colour",
      file: rawPng({
        ...kinds,
        depth: 8,
        colourType: 3,
        bytesPerPixel: 1,
        extra: [palette, clearFirst],
        rows: rowsOf((ink) => [ink ? 1 : 0]),
      }),
      colours: [["#27314F", 1]],
    },
  ])("$name", async ({ file, colours }) => {
    expect((await taken(file)).colours).toEqual(colours);
  });

  it("an animated one shows its first picture, with a warning", async () => {
    const control = pngChunk("acTL", Uint8Array.of(0, 0, 0, 2, 0, 0, 0, 0));
    expect(await taken(pngOf(plain, [control]))).toMatchObject({
      colours: [["#27314F", 1]],
      codes: ["size.of-picture", "animation.ignored"],
    });
  });

  it("one that states 50 pixels to the inch is 30.48 mm wide", async () => {
    const { size, codes } = await taken(pngOf(plain, [pngDensity(1969)]));
    expect(size[0]).toBeCloseTo(30.47, 1);
    expect(codes).toEqual(["size.from-density"]);
  });
});

describe("kinds of JPEG", () => {
  const onWhite = paintedPicture(wide, high, (x, y) => (isInk(x, y) ? "#27314F" : "#FFFFFF"), 1);

  it("keeps colours nearly and edges truly", async () => {
    const { colours, box } = await taken(await jpegOf(onWhite, 90));
    expect(colours).toEqual([[expect.stringMatching(/^#2[5-9][23][0-9A-F]4[C-F]$|^#2[5-9][23][0-9A-F]5[0-2]$/), 1]]);
    // 300 mm over 60 px: the block is 150 by 100 mm.
    expect(box?.width).toBeCloseTo(150, -1);
  });

  it("turns a picture the way its camera says", async () => {
    const jpeg = await jpegOf(onWhite, 90);
    // Exif 2.32, sections 4.5 and 4.6.4: one entry, orientation 6 (the camera was turned a quarter).
    const exif = Buffer.from("Exif\0\0II*\0\x08\0\0\0\x01\0\x12\x01\x03\0\x01\0\0\0\x06\0\0\0\0\0\0\0", "latin1");
    const segment = Buffer.concat([Buffer.of(0xff, 0xe1, 0, exif.length + 2), exif]);
    const { size } = await taken(Buffer.concat([jpeg.subarray(0, 2), segment, jpeg.subarray(2)]));
    expect(size).toEqual([200, 300]);
  });

  it("refuses print colours in words", async () => {
    const frame = Buffer.from("ffc00014080028003c0401110002110103110104110100", "hex");
    const outcome = await outcomeOf(Buffer.concat([Buffer.of(0xff, 0xd8), frame, Buffer.alloc(40)]));
    expect(outcome).toMatchObject({ ok: false, refusal: { code: "picture.print-colours" } });
  });
});

describe("pictures that are refused, with the reason in words", () => {
  const png = pngOf(plain);
  const bomb = (() => {
    const file = rawPng({ ...kinds, depth: 8, colourType: 6, bytesPerPixel: 4, rows: new Uint8Array(4) });
    const head = file.subarray(0, 33);
    return Buffer.concat([head, pngChunk("IDAT", deflateSync(Buffer.alloc(400_000_000)))]);
  })();
  /** Every second pixel black, as a chess board: a file of less than a kilobyte. */
  const specks = rawPng({
    width: 1000,
    height: 1000,
    depth: 1,
    colourType: 0,
    bytesPerPixel: 1 / 8,
    rows: Uint8Array.from({ length: 1000 * 125 }, (_, at) => (Math.floor(at / 125) % 2 ? 0xaa : 0x55)),
  });
  it.each([
    { name: "a cut PNG", bytes: () => png.subarray(0, 60), code: "picture.unreadable" },
    { name: "a PNG without its header", bytes: () => png.subarray(0, 12), code: "picture.unreadable" },
    {
      name: "a PNG whose checksum is wrong",
      bytes: () => png.map((byte, at) => (at === 29 ? byte ^ 1 : byte)),
      code: "picture.unreadable",
    },
    { name: "a PNG that unpacks to 400 MB", bytes: () => bomb, code: "picture.unreadable" },
    {
      name: "a PNG of 20,000 by 20,000 pixels",
      bytes: () =>
        rawPng({ width: 20_000, height: 20_000, depth: 1, colourType: 0, bytesPerPixel: 1, rows: new Uint8Array(9) }),
      code: "picture.too-large",
    },
    {
      name: "a PNG of 8 by 8 pixels",
      bytes: () => pngOf(paintedPicture(8, 8, () => "#27314F", 1)),
      code: "picture.too-small",
    },
    {
      name: "a JPEG of 60,000 by 60,000 pixels",
      bytes: () => Buffer.concat([Buffer.from("ffd8ffc0001108ea60ea6003011100021101031101", "hex"), Buffer.alloc(40)]),
      code: "picture.too-large",
    },
    {
      name: "a JPEG that ends after its frame",
      bytes: () => Buffer.concat([Buffer.from("ffd8ffc00011080028003c03011100021101031101", "hex"), Buffer.alloc(9)]),
      code: "picture.unreadable",
    },
    { name: "half a million specks on white", bytes: () => specks, code: "picture.too-many-pieces" },
    {
      name: "a picture of nothing",
      bytes: () => pngOf(paintedPicture(40, 40, () => "#00000000", 1)),
      code: "picture.nothing-left",
    },
  ])("$name", async ({ bytes, code }) => {
    const outcome = await outcomeOf(bytes());
    expect(outcome).toMatchObject({ ok: false, refusal: { code } });
    if (!outcome.ok) expect(outcome.refusal.text).toMatch(/\.$/);
  });

  it.each([
    { name: "specks that are all to be kept", dropped: [] },
    { name: "specks that are all left out of what is to be cut", dropped: ["#FFFFFF"] },
  ])("$name", async ({ dropped }) => {
    const width = 600;
    const rows = Uint8Array.from({ length: width * width }, (_, at) =>
      Math.floor(at / width) % 2 && (at % width) % 2 ? 255 : 0,
    );
    const bytes = rawPng({ width, height: width, depth: 8, colourType: 0, bytesPerPixel: 1, rows });
    const faults: string[] = [];
    const choices = { ...firstChoices, speckle: 0, dropped, background: "kept" as const };
    const onFault = (fault: string) => faults.push(fault);
    const outcome = await importFile(bytes, { timeMs: 60_000, choices, onFault });
    expect(faults).toEqual([]);
    expect(outcome).toMatchObject({ ok: false, refusal: { code: "picture.too-many-pieces" } });
  });

  it("and the next file is taken all the same", async () => {
    expect((await taken(png)).colours).toEqual([["#27314F", 1]]);
  });
});

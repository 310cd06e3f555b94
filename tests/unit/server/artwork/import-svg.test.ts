import { readFileSync } from "node:fs";
import { gzipSync } from "node:zlib";
import { afterAll, describe, expect, it } from "vitest";
import { importFile, stopImporting } from "#server/artwork/import-file.ts";
import type { ImportedArtwork } from "#shared/artwork/imported-artwork.ts";
import type { RefusalCode } from "#shared/artwork/refusals.ts";
import type { WarningCode } from "#shared/artwork/warnings.ts";

// What a file holds decides these outcomes; how busy the machine is must not.
const patient = { timeMs: 60_000 };
const fixture = (name: string) => readFileSync(new URL(`../../../fixtures/artwork/${name}`, import.meta.url));
const bytesOf = (text: string) => new TextEncoder().encode(text);
const drawing = (content: string) =>
  `<svg xmlns="http://www.w3.org/2000/svg" viewBox="0 0 100 100" width="100mm">${content}</svg>`;
const square = drawing(`<rect x="10" y="20" width="30" height="40" fill="#123456"/>`);

afterAll(stopImporting);

async function taken(bytes: Uint8Array): Promise<ImportedArtwork> {
  const faults: string[] = [];
  const outcome = await importFile(bytes, { ...patient, onFault: (message) => faults.push(message) });
  expect(faults).toEqual([]);
  if (!outcome.ok) throw new Error(`Refused: ${outcome.refusal.code}`);
  return outcome.artwork;
}

async function refusalOf(bytes: Uint8Array): Promise<{ code: string; text: string }> {
  const outcome = await importFile(bytes, patient);
  if (outcome.ok) throw new Error("The file was taken.");
  return outcome.refusal;
}

describe("files that are refused, with the reason in words", () => {
  const files: { name: string; bytes: () => Uint8Array; code: RefusalCode }[] = [
    { name: "an empty file", bytes: () => new Uint8Array(), code: "file.empty" },
    { name: "a picture renamed to .svg", bytes: () => fixture("renamed-picture.svg"), code: "picture.unreadable" },
    { name: "a JPEG picture", bytes: () => Uint8Array.of(0xff, 0xd8, 0xff, 0xe0, 0, 16), code: "picture.unreadable" },
    { name: "a PDF that ends after its header", bytes: () => bytesOf("%PDF-1.7\n"), code: "pdf.broken" },
    { name: "plain text", bytes: () => fixture("plain-text.svg"), code: "file.unknown" },
    { name: "a file of 11 MB", bytes: () => bytesOf(drawing(" ".repeat(11_000_000))), code: "file.too-large" },
    { name: "a gzip bomb", bytes: () => gzipSync(Buffer.alloc(200_000_000, 0x20)), code: "file.unpacking" },
    { name: "a damaged gzip file", bytes: () => gzipSync(square).subarray(0, 60), code: "file.unpacking" },
    {
      name: "bytes that are not UTF-8",
      bytes: () => Uint8Array.of(...bytesOf("<svg>"), 0xc3, 0x28),
      code: "file.encoding",
    },
    {
      name: "an encoding nobody knows",
      bytes: () => bytesOf(`<?xml version="1.0" encoding="klingon-8"?>${square}`),
      code: "file.encoding",
    },
    { name: "a truncated file", bytes: () => fixture("truncated.svg"), code: "svg.broken" },
    { name: "a web page with a drawing in it", bytes: () => fixture("web-page.svg"), code: "svg.not-svg" },
    { name: "nested entities", bytes: () => fixture("billion-laughs.svg"), code: "svg.entities" },
    { name: "an entity that is too long", bytes: () => fixture("big-entity.svg"), code: "svg.entities" },
    { name: "an entity from a file", bytes: () => fixture("external-entity.svg"), code: "svg.entities" },
    {
      name: "an entity used 20,000 times",
      bytes: () =>
        bytesOf(`<!DOCTYPE svg [<!ENTITY e "0123456789">]>${drawing(`<text>${"&e;".repeat(20_000)}</text>`)}`),
      code: "svg.entities",
    },
    { name: "a use bomb", bytes: () => fixture("use-bomb.svg"), code: "svg.too-many-elements" },
    { name: "symbols that use each other", bytes: () => fixture("use-circle.svg"), code: "svg.too-many-elements" },
    { name: "100,001 elements", bytes: () => bytesOf(drawing("<g/>".repeat(100_000))), code: "svg.too-many-elements" },
    {
      name: "groups 5,000 deep",
      bytes: () => bytesOf(drawing("<g>".repeat(5000) + "</g>".repeat(5000))),
      code: "svg.too-deep",
    },
    { name: "a width of zero", bytes: () => fixture("zero-size.svg"), code: "svg.no-size" },
    { name: "a clip that breaks the reader", bytes: () => fixture("clip-use-of-group.svg"), code: "svg.unreadable" },
    { name: "a dash bomb", bytes: () => fixture("dash-bomb.svg"), code: "svg.too-many-dashes" },
    {
      name: "20,001 paths",
      bytes: () => bytesOf(drawing(`<rect width="9" height="9"/>`.repeat(20_001))),
      code: "svg.too-many-paths",
    },
    {
      name: "500,000 points",
      bytes: () => bytesOf(drawing(`<path d="M0 0${"L90 1 1 90".repeat(250_000)}"/>`)),
      code: "svg.too-many-points",
    },
    { name: "a drawing of nothing", bytes: () => fixture("nothing-visible.svg"), code: "svg.nothing-visible" },
  ];

  it.each(files)("$name: $code", async ({ bytes, code }) => {
    const refusal = await refusalOf(bytes());
    expect(refusal.code).toBe(code);
    // What is wrong, then what to do.
    expect(refusal.text.split(". ").length + refusal.text.split(": ").length).toBeGreaterThan(2);
  });

  it("a drawing that takes too long is stopped, and the next file is taken", async () => {
    // Every translucent square splits all that lie below it.
    const squares = Array.from(
      { length: 3000 },
      (_, i) =>
        `<path transform="rotate(${i} 50 50)" d="M${i % 7} 9h${40 + (i % 11)}v60h-40z" fill="#${(0x100000 + i * 997).toString(16)}" opacity=".5"/>`,
    );
    const outcome = await importFile(bytesOf(drawing(squares.join(""))), { timeMs: 300 });
    expect(outcome).toMatchObject({ ok: false, refusal: { code: "import.too-slow" } });
    expect((await taken(bytesOf(square))).pieces).toHaveLength(1);
  });

  it("a file that breaks the reader does not spoil the next one", async () => {
    await refusalOf(fixture("clip-use-of-group.svg"));
    expect((await taken(bytesOf(square))).pieces).toHaveLength(1);
  });
});

describe("odd files that are taken", () => {
  type Colours = readonly (readonly [colour: string, pieces: number, areaMm2: number])[];
  const px = 25.4 / 96;
  const perPx2 = px * px;
  const files: {
    name: string;
    file: string;
    colours: Colours;
    warnings: WarningCode[];
    size?: readonly [number, number];
  }[] = [
    {
      name: "short entities for namespaces",
      file: "namespace-entities.svg",
      colours: [["#CC2211", 1, 1200]],
      warnings: [],
      size: [80, 40],
    },
    { name: "no namespace", file: "no-namespace.svg", colours: [["#000080", 1, 1500]], warnings: [], size: [100, 50] },
    {
      name: "no size",
      file: "no-size.svg",
      colours: [["#000000", 1, 25.4 * 12.7]],
      warnings: ["size.guessed"],
      size: [25.4, 12.7],
    },
    {
      name: "a size of 529 metres",
      file: "huge-size.svg",
      colours: [["#000000", 1, 22_500]],
      warnings: ["size.rescaled"],
      size: [300, 150],
    },
    {
      name: "a page that does not fit its view box",
      file: "fitted.svg",
      colours: [["#000000", 1, 2500]],
      warnings: [],
      size: [100, 50],
    },
    {
      name: "coordinates of 1e30",
      file: "huge-coordinates.svg",
      colours: [["#000000", 1, 100 * perPx2]],
      warnings: ["size.guessed", "shape.too-far"],
    },
    {
      name: "numbers that are none",
      file: "not-numbers.svg",
      colours: [["#000000", 1, 314.16 * perPx2]],
      warnings: ["size.guessed", "number.unreadable"],
    },
    {
      name: "references that leave the file",
      file: "outside-references.svg",
      colours: [["#112233", 1, 1000 * perPx2]],
      warnings: ["size.guessed", "reference.outside"],
    },
    {
      name: "scripts and handlers",
      file: "script.svg",
      colours: [["#000000", 1, 200 * perPx2]],
      warnings: ["size.guessed", "script.removed"],
    },
    {
      name: "a web page inside",
      file: "foreign-object.svg",
      colours: [["#000000", 1, 400 * Math.PI * perPx2]],
      warnings: ["size.guessed", "foreign.left-out"],
    },
    { name: "dashes", file: "dashes.svg", colours: [["#000000", 6, 200]], warnings: [], size: [100, 100] },
    { name: "even-odd and non-zero holes", file: "even-odd.svg", colours: [["#000000", 2, 2900]], warnings: [] },
    // Area of the pentagram by non-zero: tests/fixtures/reference/geometry-cases.json, "winding".
    {
      name: "a line that crosses itself",
      file: "self-crossing.svg",
      colours: [["#CC0000", 1, 11_225.7]],
      warnings: [],
    },
    {
      name: "clips in clips, one in units of the box",
      file: "nested-clips.svg",
      colours: [["#00AA00", 1, 1750]],
      warnings: [],
    },
    { name: "a mask of black and white", file: "mask.svg", colours: [["#0000FF", 1, 4900]], warnings: [] },
    {
      name: "a mask of grey",
      file: "soft-mask.svg",
      colours: [
        ["#000000", 1, 5000],
        ["#7F7F7F", 1, 5000],
      ],
      warnings: ["opacity.mixed", "mask.soft"],
    },
    {
      name: "a translucent group",
      file: "opacity.svg",
      colours: [
        ["#8080FF", 1, 2700],
        ["#FF0000", 1, 2700],
        ["#800080", 1, 900],
      ],
      warnings: ["opacity.mixed"],
    },
    {
      name: "a gradient and a pattern",
      file: "gradient.svg",
      colours: [
        ["#00FF00", 1, 1000],
        ["#808080", 1, 1000],
      ],
      warnings: ["gradient.flattened", "pattern.flattened"],
    },
    {
      name: "a picture inside",
      file: "picture-inside.svg",
      colours: [["#000000", 1, 400 * perPx2]],
      warnings: ["size.guessed", "image.left-out"],
    },
    {
      name: "CSS the reader passes over",
      file: "page-colours.svg",
      colours: [
        ["#000000", 3, 1000 * perPx2],
        ["#0000FF", 1, 400 * perPx2],
      ],
      warnings: [
        "size.guessed",
        "css.var",
        "css.media",
        "css.important",
        "css.current-color",
        "css.vector-effect",
        "css.transform-origin",
      ],
    },
    // Mitre 800, bevel with square caps 887.5, and a dot of radius 5.
    {
      name: "lines with corners, caps and a dot",
      file: "strokes.svg",
      colours: [["#123456", 3, 800 + 887.5 + 25 * Math.PI]],
      warnings: [],
    },
    {
      name: "lines under a stretched pen",
      file: "stretched.svg",
      colours: [
        ["#000000", 1, 600],
        ["#FF0000", 1, 80],
      ],
      warnings: [],
    },
    {
      name: "a blur, a blend and an animation",
      file: "effects.svg",
      colours: [["#000000", 2, 1800 * perPx2]],
      warnings: ["size.guessed", "animation.ignored", "filter.ignored", "blend.ignored"],
    },
    {
      name: "a circle half outside the page",
      file: "outside-page.svg",
      colours: [["#FFAA00", 1, 800 * Math.PI]],
      warnings: ["frame.cut"],
    },
  ];

  it.each(files)("$name", async ({ file, colours, warnings, size }) => {
    const artwork = await taken(fixture(file));
    expect(artwork.colours.map(({ colour, pieces }) => [colour, pieces])).toEqual(
      colours.map(([colour, pieces]) => [colour, pieces]),
    );
    for (const [index, [, , area]] of colours.entries()) {
      // Four cubics make a circle 0.03 % too large.
      expect(Math.abs((artwork.colours[index]?.areaMm2 ?? 0) / area - 1)).toBeLessThan(0.0005);
    }
    expect(artwork.warnings.map(({ code }) => code)).toEqual(warnings);
    if (size)
      expect([artwork.widthMm, artwork.heightMm]).toEqual([expect.closeTo(size[0], 6), expect.closeTo(size[1], 6)]);
  });

  it("text is drawn in our font, and what it lacks is said", async () => {
    const artwork = await taken(fixture("text.svg"));
    expect(artwork.warnings.map(({ code }) => code)).toEqual(["text.font-replaced", "text.missing-letters"]);
    // "I", "l" and the box that stands for the letter our font lacks.
    expect(artwork.pieces).toHaveLength(3);
  });

  it.each([
    { name: "compressed", bytes: gzipSync(square) },
    { name: "UTF-16, little end first", bytes: Buffer.from(`\ufeff${square}`, "utf16le") },
    { name: "UTF-16, big end first", bytes: Buffer.from(`\ufeff${square}`, "utf16le").swap16() },
    { name: "UTF-16 without a mark", bytes: Buffer.from(square, "utf16le") },
    { name: "UTF-8 with a mark", bytes: Buffer.from(`\ufeff${square}`) },
    {
      name: "ISO 8859-1",
      bytes: Buffer.from(`<?xml version="1.0" encoding="ISO-8859-1"?><!-- caf\u00e9 -->${square}`, "latin1"),
    },
    {
      name: "a prefix on every name",
      bytes: bytesOf(square.replace("xmlns=", "xmlns:s=").replace(/<(\/?)(svg|rect)/g, "<$1s:$2")),
    },
  ])("a square as $name is the same square", async ({ bytes }) => {
    const artwork = await taken(bytes);
    expect(artwork.pieces).toEqual([
      {
        index: 0,
        colour: "#123456",
        path: [expect.objectContaining({ segments: expect.any(Array) })],
        box: { x: 10, y: 20, width: 30, height: 40 },
        areaMm2: 1200,
      },
    ]);
  });

  it("the same bytes give the same pieces, in a fresh worker too", async () => {
    const bytes = readFileSync(new URL("../../../../node_modules/@twemoji/svg/1f426.svg", import.meta.url));
    const first = await taken(bytes);
    expect(await taken(bytes)).toEqual(first);
    await stopImporting();
    expect(await taken(bytes)).toEqual(first);
  });

  it("files that arrive together all get their own answer", async () => {
    const sizes = [5, 6, 7, 8];
    const artworks = await Promise.all(
      sizes.map((side) => taken(bytesOf(drawing(`<rect width="${side}" height="${side}"/>`)))),
    );
    expect(artworks.map(({ pieces }) => pieces[0]?.areaMm2)).toEqual([25, 36, 49, 64]);
  });
});

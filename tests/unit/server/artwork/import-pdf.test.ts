import { deflateSync } from "node:zlib";
import { type PDFDocument, PDFName, PDFNumber, type PDFPage, StandardFonts } from "pdf-lib";
import { afterAll, describe, expect, it } from "vitest";
import { importFile, stopImporting } from "#server/artwork/import-file.ts";
import { unpacksWithinLimit } from "#server/artwork/unpacked-size.ts";
import type { ImportedArtwork } from "#shared/artwork/imported-artwork.ts";
import { pdfOf } from "../../../support/seeded-pdf.ts";

const patient = { timeMs: 60_000 };
const mmPerPoint = 25.4 / 72;
/** A square of 72 points, 25.4 mm, whose lower left corner stands at 100, 50. */
const square = "0.8 0.1 0.1 rg\n100 50 72 72 re\nf";

afterAll(stopImporting);

async function taken(bytes: Uint8Array): Promise<ImportedArtwork> {
  const faults: string[] = [];
  const outcome = await importFile(bytes, { ...patient, onFault: (message) => faults.push(message) });
  expect(faults).toEqual([]);
  if (!outcome.ok) throw new Error(`Refused: ${outcome.refusal.code}`);
  return outcome.artwork;
}

async function refusalOf(bytes: Uint8Array): Promise<string> {
  const outcome = await importFile(bytes, patient);
  if (outcome.ok) throw new Error("The file was taken.");
  return outcome.refusal.code;
}

const codesOf = ({ warnings }: ImportedArtwork) => warnings.map(({ code }) => code);
const areaOf = ({ pieces }: ImportedArtwork) => pieces.reduce((sum, { areaMm2 }) => sum + areaMm2, 0);

describe("the size and place of a page", () => {
  it("are true: 72 points are an inch, measured from the page's upper left corner", async () => {
    const artwork = await taken(await pdfOf(square));
    expect(artwork.widthMm).toBeCloseTo(400 * mmPerPoint, 6);
    expect(artwork.heightMm).toBeCloseTo(300 * mmPerPoint, 6);
    expect(codesOf(artwork)).toEqual([]);
    expect(artwork.pieces).toHaveLength(1);
    const { box, colour, areaMm2 } = artwork.pieces[0] ?? { box: null, colour: "", areaMm2: 0 };
    expect(colour).toBe("#CC1A1A");
    expect(areaMm2).toBeCloseTo(645.16, 2);
    expect(box?.x).toBeCloseTo(100 * mmPerPoint, 3);
    expect(box?.y).toBeCloseTo((300 - 50 - 72) * mmPerPoint, 3);
  });

  it.each([
    {
      name: "a crop box",
      prepare: (page: PDFPage) => page.setCropBox(90, 40, 200, 100),
      size: [200, 100],
      at: [10, 18],
    },
    {
      name: "a unit of two points",
      prepare: (page: PDFPage) => page.node.set(PDFName.of("UserUnit"), PDFNumber.of(2)),
      size: [800, 600],
      at: [200, 356],
    },
    {
      name: "a quarter turn",
      prepare: (page: PDFPage) => page.node.set(PDFName.of("Rotate"), PDFNumber.of(90)),
      size: [300, 400],
      at: [50, 100],
    },
    {
      name: "a half turn",
      prepare: (page: PDFPage) => page.node.set(PDFName.of("Rotate"), PDFNumber.of(180)),
      size: [400, 300],
      at: [228, 50],
    },
    {
      name: "a quarter turn back",
      prepare: (page: PDFPage) => page.node.set(PDFName.of("Rotate"), PDFNumber.of(-90)),
      size: [300, 400],
      at: [178, 228],
    },
  ])("follow $name", async ({ prepare, size, at }) => {
    const { widthMm, heightMm, pieces } = await taken(await pdfOf(square, { prepare }));
    expect([widthMm, heightMm].map((mm) => Math.round(mm / mmPerPoint))).toEqual(size);
    expect([pieces[0]?.box.x, pieces[0]?.box.y].map((mm) => Math.round((mm ?? 0) / mmPerPoint))).toEqual(at);
  });
});

describe("what a page paints", () => {
  it("is filled by the rule that its operator names", async () => {
    const twice = "0 0 0 rg\n100 50 72 72 re\n118 68 36 36 re\n";
    expect(areaOf(await taken(await pdfOf(`${twice}f`)))).toBeCloseTo(645.16, 2);
    expect(areaOf(await taken(await pdfOf(`${twice}f*`)))).toBeCloseTo(645.16 * 0.75, 2);
  });

  it("ends at its clip, and clips end with the state they were set in", async () => {
    const clipped = `q\n100 50 36 72 re\nW\nn\n${square}\nQ\n0 0 1 rg\n300 200 72 72 re\nf`;
    const { pieces } = await taken(await pdfOf(clipped));
    expect(pieces.map(({ colour, areaMm2 }) => [colour, areaMm2.toFixed(1)])).toEqual([
      ["#0000FF", "645.2"],
      ["#CC1A1A", "322.6"],
    ]);
  });

  it("has lines of their width under the coordinates in force", async () => {
    // 144 points long, 5 wide, drawn in units of two points.
    const line = "q\n2 0 0 2 0 0 cm\n2.5 w\n0 0 0 RG\n50 50 m\n122 50 l\nS\nQ";
    expect(areaOf(await taken(await pdfOf(line)))).toBeCloseTo(144 * 5 * mmPerPoint ** 2, 2);
  });

  it("takes greys and inks as the colours a screen shows", async () => {
    const greys = await taken(await pdfOf("0.5 g\n100 50 72 72 re\nf"));
    expect(greys.colours.map(({ colour }) => colour)).toEqual(["#808080"]);
    const yellow = await taken(await pdfOf("0 0 1 0 k\n100 50 72 72 re\nf"));
    // An ink's yellow is not the screen's #FFFF00: without the printer's profile any near one will do.
    expect(yellow.colours.map(({ colour }) => colour)[0]).toMatch(/^#F[0-9A-F][EF][0-9A-F][0-4][0-9A-F]$/);
  });
});

describe("groups, masks and drawn letters", () => {
  /** A form that is a transparency group (ISO 32000-1, 11.4.7). */
  const group = (file: PDFDocument, content: string) =>
    file.context.register(
      file.context.stream(content, {
        Type: "XObject",
        Subtype: "Form",
        BBox: [0, 0, 400, 300],
        Group: { S: "Transparency", CS: "DeviceRGB" },
      }),
    );

  it("a faded group is faded as a whole: what lies over something in it hides it", async () => {
    const prepare = (page: PDFPage, file: PDFDocument) => {
      const form = group(file, "1 0 0 rg 100 50 72 72 re f 0 0 1 rg 136 50 72 72 re f");
      page.node.set(
        PDFName.of("Resources"),
        file.context.obj({ XObject: { Fm: form }, ExtGState: { Half: { ca: 0.5 } } }),
      );
    };
    const { colours } = await taken(await pdfOf("/Half gs\n/Fm Do", { prepare }));
    expect(colours.map(({ colour, areaMm2 }) => [colour, areaMm2.toFixed(1)])).toEqual([
      ["#8080FF", "645.2"],
      ["#FF8080", "322.6"],
    ]);
  });

  it("a soft mask lets through what it is white under", async () => {
    const prepare = (page: PDFPage, file: PDFDocument) => {
      const mask = { S: "Luminosity", G: group(file, "1 g 100 50 36 72 re f") };
      page.node.set(
        PDFName.of("Resources"),
        file.context.obj({ ExtGState: { Masked: { SMask: mask }, Plain: { SMask: "None" } } }),
      );
    };
    const masked = await taken(await pdfOf(`/Masked gs\n${square}`, { prepare }));
    expect(areaOf(masked)).toBeCloseTo(322.58, 1);
    const ended = await taken(await pdfOf(`/Masked gs\n/Plain gs\n${square}`, { prepare }));
    expect(areaOf(ended)).toBeCloseTo(645.16, 1);
  });

  it("letters that a font draws by operators stand where the text has them", async () => {
    const prepare = (page: PDFPage, file: PDFDocument) => {
      const a = file.context.register(file.context.stream("1000 0 0 0 750 750 d1 0 0 750 750 re f"));
      const font = {
        Type: "Font",
        Subtype: "Type3",
        FontBBox: [0, 0, 750, 750],
        FontMatrix: [0.001, 0, 0, 0.001, 0, 0],
        CharProcs: { square: a },
        Encoding: { Type: "Encoding", Differences: [97, "square"] },
        FirstChar: 97,
        LastChar: 97,
        Widths: [1000],
        Resources: {},
      };
      page.node.set(PDFName.of("Resources"), file.context.obj({ Font: { T3: font } }));
    };
    // Two letters of 40 points, 4 more between them; each a square of 30 points.
    const { pieces } = await taken(await pdfOf("BT\n/T3 40 Tf\n4 Tc\n1 0 0 rg\n100 50 Td\n(aa) Tj\nET", { prepare }));
    expect(pieces.map(({ box }) => [box.x, box.width].map((mm) => (mm / mmPerPoint).toFixed(2)))).toEqual([
      ["100.00", "30.00"],
      ["144.00", "30.00"],
    ]);
  });
});

describe("what a page can't give is said", () => {
  it("lines of no width", async () => {
    expect(codesOf(await taken(await pdfOf(`${square}\n0 w\n10 10 m\n90 90 l\nS`)))).toEqual(["pdf.hairline"]);
  });

  it("letters of a font that the file doesn't hold", async () => {
    const prepare = (page: PDFPage, file: PDFDocument) =>
      page.drawText("Heron", { x: 20, y: 20, font: file.embedStandardFont(StandardFonts.Helvetica) });
    const artwork = await taken(await pdfOf(square, { prepare }));
    expect(codesOf(artwork)).toEqual(["pdf.font-missing"]);
    expect(artwork.pieces).toHaveLength(1);
  });

  it("more pages than one", async () => {
    const prepare = (_page: PDFPage, file: PDFDocument) => void file.addPage([90, 90]);
    const { warnings, widthMm } = await taken(await pdfOf(square, { prepare }));
    expect(widthMm).toBeCloseTo(400 * mmPerPoint, 6);
    expect(warnings).toEqual([
      {
        code: "pdf.other-pages",
        text: "The PDF has 2 pages. The first one was taken; save another as a file of its own to bring it in.",
      },
    ]);
  });

  it("layers that are switched off", async () => {
    const prepare = (page: PDFPage, file: PDFDocument) => {
      const layer = file.context.register(file.context.obj({ Type: "OCG", Name: PDFName.of("Notes") }));
      file.catalog.set(PDFName.of("OCProperties"), file.context.obj({ OCGs: [layer], D: { OFF: [layer] } }));
      page.node.set(PDFName.of("Resources"), file.context.obj({ Properties: { Notes: layer } }));
    };
    const hidden = `${square}\n/OC /Notes BDC\n0 0 1 rg\n200 50 72 72 re\nf\nEMC`;
    const artwork = await taken(await pdfOf(hidden, { prepare }));
    expect(artwork.colours.map(({ colour }) => colour)).toEqual(["#CC1A1A"]);
    expect(codesOf(artwork)).toEqual(["pdf.layer-hidden"]);
  });

  it("what can't be read in the middle of a page", async () => {
    const artwork = await taken(await pdfOf(`${square}\n/Nowhere gs\n0 0 1 rg\n200 50 72 72 re\nf`));
    expect(artwork.colours.map(({ colour }) => colour)).toEqual(["#0000FF", "#CC1A1A"]);
    expect(codesOf(artwork)).toEqual(["pdf.damaged"]);
  });

  it("gradients, which become their middle", async () => {
    const prepare = (page: PDFPage, file: PDFDocument) => {
      const ramp = { FunctionType: 2, Domain: [0, 1], C0: [1, 0, 0], C1: [0, 0, 1], N: 1 };
      const shading = {
        ShadingType: 2,
        ColorSpace: "DeviceRGB",
        Coords: [0, 0, 400, 0],
        Function: ramp,
        Extend: [true, true],
      };
      page.node.set(PDFName.of("Resources"), file.context.obj({ Shading: { Ramp: shading } }));
    };
    const artwork = await taken(await pdfOf("100 50 72 72 re\nW\nn\n/Ramp sh", { prepare }));
    expect(codesOf(artwork)).toEqual(["gradient.flattened"]);
    expect(artwork.colours.map(({ colour }) => colour)).toEqual(["#800080"]);
    expect(areaOf(artwork)).toBeCloseTo(645.16, 1);
  });
});

describe("a PDF that is refused, with the reason in words", () => {
  const dot = Buffer.from(
    "iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAYAAAAfFcSJAAAADUlEQVR42mNk+M9QDwADhgGAWjR9awAAAABJRU5ErkJggg==",
    "base64",
  );

  it("holds a picture and nothing drawn", async () => {
    let file: PDFDocument | undefined;
    let page: PDFPage | undefined;
    await pdfOf("", {
      prepare: (one, all) => {
        page = one;
        file = all;
      },
    });
    if (!file || !page) throw new Error("No page.");
    page.drawImage(await file.embedPng(dot), { x: 10, y: 10, width: 200, height: 200 });
    expect(await refusalOf(await file.save())).toBe("pdf.only-pictures");
  });

  it("is cut off, or nonsense after its header", async () => {
    const whole = await pdfOf(square);
    expect(await refusalOf(whole.subarray(0, 60))).toBe("pdf.broken");
    expect(await refusalOf(new TextEncoder().encode("%PDF-1.7\nnonsense"))).toBe("pdf.broken");
  });

  it("is locked", async () => {
    const locked = [
      "%PDF-1.4",
      "1 0 obj<</Type/Catalog/Pages 2 0 R>>endobj",
      "2 0 obj<</Type/Pages/Kids[3 0 R]/Count 1>>endobj",
      "3 0 obj<</Type/Page/Parent 2 0 R/MediaBox[0 0 9 9]>>endobj",
      `4 0 obj<</Filter/Standard/V 1/R 2/P -4/O<${"ab".repeat(32)}>/U<${"cd".repeat(32)}>>>endobj`,
      "trailer<</Root 1 0 R/Encrypt 4 0 R/ID[<00><00>]>>",
      "%%EOF",
    ].join("\n");
    expect(await refusalOf(new TextEncoder().encode(locked))).toBe("pdf.password");
  });

  it("unpacks to more than it may", async () => {
    const prepare = (page: PDFPage, file: PDFDocument) => {
      const bomb = file.context.stream(deflateSync(Buffer.alloc(150_000_000, 0x20)), { Filter: "FlateDecode" });
      page.node.set(PDFName.of("Contents"), file.context.register(bomb));
    };
    const bytes = await pdfOf("", { prepare });
    expect(bytes.length).toBeLessThan(1_000_000);
    expect(await refusalOf(bytes)).toBe("pdf.unpacking");
  });

  it("draws more than anyone could cut", async () => {
    const many = Array.from({ length: 20_001 }, (_, index) => `${index % 400} 5 0.5 0.5 re\nf`).join("\n");
    expect(await refusalOf(await pdfOf(many))).toBe("svg.too-many-paths");
  });
});

describe("how much a PDF unpacks to", () => {
  const stream = (data: Buffer) =>
    Buffer.concat([Buffer.from("1 0 obj<<>>stream\r\n"), data, Buffer.from("\nendstream")]);
  const packed = deflateSync(Buffer.alloc(1000, 0x41));

  it.each([
    { name: "a stream up to the limit", bytes: stream(packed), limit: 1000, within: true },
    { name: "one byte more", bytes: stream(packed), limit: 999, within: false },
    {
      name: "two streams that together are more",
      bytes: Buffer.concat([stream(packed), stream(packed)]),
      limit: 1500,
      within: false,
    },
    {
      name: "a stream packed twice",
      bytes: stream(deflateSync(deflateSync(Buffer.alloc(5000)))),
      limit: 2000,
      within: false,
    },
    { name: "a stream that breaks off", bytes: stream(packed).subarray(0, 25), limit: 999, within: true },
    { name: "a stream that is not packed", bytes: stream(Buffer.alloc(5000, 0x41)), limit: 10, within: true },
  ])("is told of $name", ({ bytes, limit, within }) => {
    expect(unpacksWithinLimit(bytes, limit)).toBe(within);
  });

  // The reader begins at the next line, whatever stands behind the word.
  it.each(["stream\n", "stream\r", "stream \n", "stream % a remark\r\n"])("is told behind %j", (word) => {
    expect(unpacksWithinLimit(Buffer.concat([Buffer.from(`1 0 obj<<>>${word}`), packed]), 999)).toBe(false);
  });

  it("is too much when a stream is packed over and over", () => {
    let data: Buffer = Buffer.from("x");
    for (let turn = 0; turn < 6; turn++) data = deflateSync(data);
    expect(unpacksWithinLimit(stream(data), 1_000_000)).toBe(false);
  });
});

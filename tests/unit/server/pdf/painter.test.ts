import { PNG } from "pngjs";
import { describe, expect, it } from "vitest";
import { PdfPainter } from "#server/pdf/painter.ts";
import { findMissingCharacters } from "#server/pdf/proof.ts";
import { savePdf } from "#server/pdf/save-pdf.ts";
import { base64OfBytes } from "#shared/drawing/base64.ts";
import type { DisplayList, Item } from "#shared/drawing/display-list.ts";
import { alphaPng } from "#shared/drawing/png.ts";
import { circlePath, rectanglePath } from "#shared/geometry/shapes.ts";
import { pageAsPng, popplerText } from "../../../support/poppler.ts";

const information = {
  title: "Test",
  author: "Shop",
  subject: "Subject",
  keywords: [],
  date: new Date("2026-11-30T00:00:00Z"),
};
const page = (items: readonly Item[]): DisplayList => ({ widthMm: 60, heightMm: 40, items });
const text = (words: string, rest: Partial<Extract<Item, { kind: "text" }>> = {}): Item => ({
  kind: "text",
  text: words,
  at: { x: 5, y: 20 },
  sizeMm: 5,
  font: "serif",
  colour: "#000000",
  align: "left",
  ...rest,
});

async function paint(items: readonly Item[]) {
  const painter = await PdfPainter.create();
  await painter.addPage(page(items));
  return { pdf: await savePdf(painter, information), missing: [...painter.missingCharacters] };
}

/** The picture at 10 pixels a millimetre; a colour is read in mm. */
async function pictureOf(items: readonly Item[]) {
  const { pdf } = await paint(items);
  const png = PNG.sync.read(await pageAsPng(pdf, { page: 1, dpi: 254 }));
  return {
    png,
    at: (x: number, y: number) => {
      const start = (Math.floor(y * 10) * png.width + Math.floor(x * 10)) * 4;
      return [...png.data.subarray(start, start + 3)];
    },
  };
}

describe("paths", () => {
  it("are filled by the even-odd rule, y down", async () => {
    const ring = [...circlePath({ x: 20, y: 10 }, 8), ...circlePath({ x: 20, y: 10 }, 4)];
    const { at } = await pictureOf([{ kind: "path", path: ring, fill: "#27304F" }]);
    expect(at(20, 10)).toEqual([255, 255, 255]);
    expect(at(26, 10)).toEqual([39, 48, 79]);
    expect(at(20, 30)).toEqual([255, 255, 255]);
  });

  it("are drawn whole however long they are, and however many", async () => {
    const points = Array.from({ length: 200_000 }, (_, index) => ({ x: (index % 600) / 10, y: 10 + (index % 2) }));
    const stroke = { colour: "#27304F", widthMm: 0.2 } as const;
    const group: Item = { kind: "group", x: 0, y: 0, scale: 1, items: [{ kind: "line", points, stroke }] };
    const { at } = await pictureOf([
      group,
      { kind: "path", path: rectanglePath({ x: 50, y: 30, width: 8, height: 8 }), fill: "#27304F" },
    ]);
    expect(at(54, 34)).toEqual([39, 48, 79]);
  });

  it("let through what their opacity says", async () => {
    const { at } = await pictureOf([
      { kind: "path", path: rectanglePath({ x: 0, y: 0, width: 30, height: 40 }), fill: "#000000", opacity: 0.4 },
    ]);
    expect(at(10, 10)[0]).toBe(153);
    expect(at(40, 10)[0]).toBe(255);
  });

  it("are moved and scaled by their group, lines with them", async () => {
    const line: Item = {
      kind: "line",
      points: [
        { x: 0, y: 5 },
        { x: 10, y: 5 },
      ],
      stroke: { colour: "#FF0000", widthMm: 1 },
    };
    const { at } = await pictureOf([{ kind: "group", x: 10, y: 10, scale: 3, items: [line] }]);
    expect(at(20, 25)).toEqual([255, 0, 0]);
    expect(at(20, 26.3)).toEqual([255, 0, 0]);
    expect(at(20, 26.7)).toEqual([255, 255, 255]);
    expect(at(8, 25)).toEqual([255, 255, 255]);
  });

  it("end at their clip, holes included", async () => {
    const clip = [
      ...rectanglePath({ x: 10, y: 10, width: 20, height: 20 }),
      ...rectanglePath({ x: 15, y: 15, width: 5, height: 5 }),
    ];
    const wide: Item = { kind: "path", path: rectanglePath({ x: 0, y: 0, width: 60, height: 40 }), fill: "#00FF00" };
    const { at } = await pictureOf([{ kind: "clip", clip, items: [wide] }]);
    expect(at(12, 12)).toEqual([0, 255, 0]);
    expect(at(17, 17)).toEqual([255, 255, 255]);
    expect(at(40, 12)).toEqual([255, 255, 255]);
  });
});

describe("images", () => {
  it("stand upright with their own alpha and the item's opacity", async () => {
    // Dark in the upper left and lower right quarter, a pixel a millimetre.
    const dark = (index: number) => Math.floor(index / 10) % 2 === Math.floor(index / 200);
    const plane = {
      width: 20,
      height: 20,
      pixels: Uint8Array.from({ length: 400 }, (_, index) => (dark(index) ? 255 : 0)),
    };
    const pngBase64 = base64OfBytes(alphaPng(plane, "#000000"));
    const { at } = await pictureOf([
      { kind: "image", box: { x: 10, y: 10, width: 20, height: 20 }, pngBase64, opacity: 0.5 },
    ]);
    expect(at(14, 14)[0]).toBeCloseTo(127, -0.5);
    expect(at(26, 26)[0]).toBeCloseTo(127, -0.5);
    expect(at(26, 14)[0]).toBe(255);
    expect(at(9, 14)[0]).toBe(255);
  });
});

describe("text", () => {
  it("outside the base cut is set from the cuts that hold it", async () => {
    const words = "Łódź, Đà Nẵng, Київ";
    const { pdf, missing } = await paint([text(words)]);
    expect(missing).toEqual([]);
    expect((await popplerText(pdf, "pdftotext")).trim()).toBe(words);
  });

  it("that no font holds becomes boxes and is reported, and the rest still stands", async () => {
    const { pdf, missing } = await paint([text("Owl 梟 sign")]);
    expect(missing).toEqual(["梟"]);
    expect(await popplerText(pdf, "pdftotext")).toMatch(/Owl\s+sign/);
    const { at } = await pictureOf([text("梟", { sizeMm: 20 })]);
    // A box 0.54 em wide and 0.7 em high, drawn with a line of 0.06 em.
    expect(at(6.6, 12)).toEqual([0, 0, 0]);
    expect(at(12, 13)).toEqual([255, 255, 255]);
  });

  it("is looked through for missing characters before it is drawn", async () => {
    const inside: Item = { kind: "group", x: 0, y: 0, scale: 1, items: [text("梟 ☃"), text("plain")] };
    expect(await findMissingCharacters([page([inside])])).toEqual(["☃", "梟"]);
  });

  it.each([
    { align: "left", from: 30, to: 42 },
    { align: "middle", from: 24, to: 36 },
    { align: "right", from: 18, to: 30 },
  ] as const)("aligned $align stands from about $from to $to mm", async ({ align, from, to }) => {
    const { png } = await pictureOf([text("MMMMM", { at: { x: 30, y: 20 }, sizeMm: 2.43, align })]);
    const dark = Array.from({ length: png.width }, (_, x) => x).filter((x) =>
      Array.from({ length: png.height }, (_, y) => png.data[(y * png.width + x) * 4] ?? 255).some(
        (value) => value < 100,
      ),
    );
    expect(Math.abs((dark[0] ?? 0) / 10 - from)).toBeLessThan(0.4);
    expect(Math.abs((dark.at(-1) ?? 0) / 10 - to)).toBeLessThan(0.4);
  });

  it("turned to the left reads upwards from its point", async () => {
    const { png } = await pictureOf([text("MMMM", { at: { x: 30, y: 30 }, turn: -90 })]);
    const dark = Array.from(png.data.keys()).filter((index) => index % 4 === 0 && (png.data[index] ?? 255) < 100);
    const xs = dark.map((index) => ((index / 4) % png.width) / 10);
    const ys = dark.map((index) => Math.floor(index / 4 / png.width) / 10);
    expect(Math.max(...xs)).toBeLessThan(30.3);
    expect(Math.min(...xs)).toBeGreaterThan(25.8);
    expect(Math.max(...ys)).toBeLessThan(30.2);
  });
});

describe("savePdf", () => {
  it("refuses a document without a date", async () => {
    const painter = await PdfPainter.create();
    await painter.addPage(page([]));
    await expect(async () => savePdf(painter, { ...information, date: new Date("soon") })).rejects.toThrow(RangeError);
  });
});

import { getDocument, OPS, type PDFDocumentProxy } from "pdfjs-dist/legacy/build/pdf.mjs";
import { PNG } from "pngjs";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { renderProof } from "#server/pdf/proof.ts";
import type { Snapshot } from "#shared/mockup/snapshot.ts";
import { orrerySnapshot } from "../support/orrery-snapshot.ts";
import { pageAsPng, popplerText } from "../support/poppler.ts";

/**
 * The proof as two other programs read it: pdf.js and poppler. Sizes: ISO 216 (A3 is 297 by 420 mm) and ISO 32000-1, 8.3.2.3
 * (72 units an inch), so 100 mm at 1:5 is 20 mm of paper or 56.693 points.
 */
const hash = "60303ae22b998861bce3b28f33eec1be758a213c86c93c076dbe9f558c11c752";

let snapshot: Snapshot;
let pdf: Uint8Array;
let read: PDFDocumentProxy;
beforeAll(async () => {
  snapshot = await orrerySnapshot("A3");
  pdf = await renderProof(snapshot, hash);
  read = await getDocument({ data: pdf.slice(), verbosity: 0 }).promise;
}, 60_000);
afterAll(() => read.loadingTask.destroy());

/** The dark run of pixels that starts nearest to `from` on one row of a picture. */
function darkColumns(png: PNG, row: number): number[] {
  return Array.from({ length: png.width }, (_, x) => x).filter(
    (x) => (png.data[(row * png.width + x) * 4] ?? 255) < 120,
  );
}

describe("the proof", () => {
  it("has pages of true size", async () => {
    const page = await read.getPage(1);
    const [, , width = 0, height = 0] = page.view;
    expect(width).toBeCloseTo(1190.551, 2);
    expect(height).toBeCloseTo(841.89, 2);
    expect(read.numPages).toBe(snapshot.drawing.sheets.length);
  });

  it("is true to scale: the board's 600 mm at 1:5 are 120 mm of paper", async () => {
    const dpi = 254;
    const png = PNG.sync.read(await pageAsPng(pdf, { page: 1, dpi }));
    const group = snapshot.drawing.sheets[0]?.items.find((item) => item.kind === "group" && item.id === "elevation");
    const plane = group?.kind === "group" ? group.items[0] : undefined;
    if (group?.kind !== "group" || plane?.kind !== "group") throw new Error("The sheet has no elevation.");
    const pixels = (mm: number) => (mm * dpi) / 25.4;
    // A row through pale wood near the board's upper edge crosses its two upright edges; only these and dimension lines are dark.
    const row = Math.round(pixels(group.y + (plane.y + 12) * group.scale));
    const left = pixels(group.x + plane.x * group.scale);
    const dark = darkColumns(png, row);
    const near = (at: number) => {
      const close = dark.filter((x) => Math.abs(x + 0.5 - at) < pixels(0.6));
      expect(close.length).toBeGreaterThan(0);
      return close.reduce((sum, x) => sum + x + 0.5, 0) / close.length;
    };
    const length = near(left + pixels(120)) - near(left);
    // 120 mm within a tenth of a millimetre, a pixel here.
    expect(Math.abs((length * 25.4) / dpi - 120)).toBeLessThan(0.1);
  });

  it("draws the disc as curves of 260 mm across, 147.40 points at 1:5", async () => {
    const page = await read.getPage(1);
    const list = await page.getOperatorList();
    const boxes = list.fnArray.flatMap((operator, index) => {
      const args = list.argsArray[index];
      return operator === OPS.constructPath && args?.[2] ? [args[2] as ArrayLike<number>] : [];
    });
    // In the path's own units, mm of the sign; the matrix around it scales by 0.2 × 72 / 25.4.
    const discs = boxes.filter(
      (box) =>
        Math.abs((box[2] ?? 0) - (box[0] ?? 0) - 260) < 0.1 && Math.abs((box[3] ?? 0) - (box[1] ?? 0) - 260) < 0.1,
    );
    expect(discs.length).toBeGreaterThan(0);
    expect(260 * 0.2 * (72 / 25.4)).toBeCloseTo(147.4, 2);
  });

  it("is lettered with text that can be searched and copied, ligatures and all", async () => {
    const text = (await popplerText(pdf, "pdftotext")).replace(/\s+/g, " ");
    for (const words of [
      "Lobby sign, rings and planets",
      "Will the caps be brushed or polished?",
      "Figures are estimates",
      "Top at",
      "43.5",
      "B holes 159.8",
    ]) {
      expect(text).toContain(words);
    }
    const page = await read.getPage(1);
    const { items } = await page.getTextContent();
    const joined = items.map((item) => ("str" in item ? item.str : "")).join(" ");
    expect(joined).toContain("Front elevation");
    expect(joined).toContain("Figures are estimates");
  });

  it("carries its fonts as embedded subsets with a map to Unicode", async () => {
    const rows = (await popplerText(pdf, "pdffonts")).trim().split("\n").slice(2);
    expect(rows.length).toBeGreaterThanOrEqual(4);
    for (const row of rows) expect(row).toMatch(/^[A-Z]{6}\+Merriweather.*CID TrueType\s+Identity-H\s+yes yes yes/);
  });

  it("names the snapshot it was made from, and the issue's date instead of the clock's", async () => {
    const info = await popplerText(pdf, "pdfinfo");
    expect(info).toMatch(new RegExp(`Subject:.*${hash}`));
    expect(info).toMatch(new RegExp(`Keywords:.*sha256:${hash}`));
    expect(info).toMatch(/Title:\s+CL-0142, revision B: Lobby sign, rings and planets/);
    const { info: read2 } = await read.getMetadata();
    expect(read2).toMatchObject({ CreationDate: "D:20261130000000Z", ModDate: "D:20261130000000Z" });
  });

  it("has the same bytes for the same snapshot, read back from its stored text", async () => {
    const again: Snapshot = JSON.parse(JSON.stringify(snapshot));
    expect(Buffer.from(await renderProof(again, hash)).equals(Buffer.from(pdf))).toBe(true);
  });

  it("embeds each picture once", async () => {
    const text = Buffer.from(pdf).toString("latin1");
    // Grain, and the shadows on board, disc and rings with a soft mask each.
    expect(text.match(/\/Subtype \/Image/g)?.length).toBe(1 + 3 * 2);
  });
});

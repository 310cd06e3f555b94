import { readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { PNG } from "pngjs";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { importFile, stopImporting } from "#server/artwork/import-file.ts";
import type { ImportOutcome } from "#shared/artwork/imported-artwork.ts";
import { launchBrowser } from "../support/browser.ts";
import { piecesAsSvg } from "../support/ink-agreement.ts";
import { paperInkAgreement, svgAsPng } from "../support/paper-ink.ts";
import { pageAsPng } from "../support/poppler.ts";
import { printTable } from "../support/print-table.ts";
import { seededPdf } from "../support/seeded-pdf.ts";

// Source: the same pages as poppler draws them, which shares no code with the import; our pieces are drawn by resvg. The
// pages are written by pdf-lib from a seed, and by Chromium's print to PDF from files of an open icon set (Twemoji).
const seeds = Array.from({ length: 4 }, (_, index) => 501 + index);
const printed = 2;
const goodInk = 0.98;
const dpi = 300;

type Judged = {
  readonly name: string;
  readonly theirs: Buffer;
  readonly ours: Buffer | null;
  readonly outcome: ImportOutcome;
  readonly score: number;
};

const judged: Judged[] = [];

beforeAll(async () => {
  for (const seed of seeds) judged.push(await judge(`seed ${seed}`, await seededPdf(seed)));
  for (const { name, pdf } of await printedPages()) judged.push(await judge(name, pdf));
  printTable("Ink agreement of imported PDF pages with poppler", [
    ["page", "agreement", "pieces", "warned of"],
    ...judged.map(({ name, score, outcome }) => [
      name,
      score.toFixed(4),
      outcome.ok ? outcome.artwork.pieces.length : outcome.refusal.code,
      outcome.ok ? outcome.artwork.warnings.map(({ code }) => code).join(", ") : "",
    ]),
  ]);
}, 120_000);
afterAll(stopImporting);

describe("pages of PDF as pieces", () => {
  it("agree with poppler's picture of them", () => {
    expect(judged).toHaveLength(seeds.length + printed);
    expect(
      judged.filter(({ score }) => score < goodInk).map(({ name, score }) => `${name} ${score.toFixed(4)}`),
    ).toEqual([]);
  });

  it("have the size that poppler gives them, to a pixel", () => {
    for (const { theirs, outcome } of judged) {
      const { width, height } = PNG.sync.read(theirs);
      if (!outcome.ok) throw new Error(outcome.refusal.code);
      expect(Math.abs((outcome.artwork.widthMm / 25.4) * dpi - width)).toBeLessThanOrEqual(1);
      expect(Math.abs((outcome.artwork.heightMm / 25.4) * dpi - height)).toBeLessThanOrEqual(1);
    }
  });

  it("lose no letter and no shape: nothing is warned of but mixed colours and cut edges", () => {
    const codes = new Set(
      judged.flatMap(({ outcome }) => (outcome.ok ? outcome.artwork.warnings : [])).map((w) => w.code),
    );
    expect([...codes].filter((code) => !["opacity.mixed", "frame.cut", "gradient.flattened"].includes(code))).toEqual(
      [],
    );
  });

  it("would not agree if the pieces were those of another page", () => {
    const scores = judged.slice(0, 4).map(({ theirs }, index) => {
      const other = judged[(index + 1) % judged.length]?.ours;
      return other ? paperInkAgreement(theirs, other) : -1;
    });
    expect(scores.filter((score) => score >= goodInk)).toEqual([]);
  });
});

async function judge(name: string, pdf: Uint8Array): Promise<Judged> {
  const outcome = await importFile(pdf, { timeMs: 60_000 });
  const theirs = await pageAsPng(pdf, { page: 1, dpi });
  const ours = outcome.ok ? await svgAsPng(piecesAsSvg(outcome.artwork), PNG.sync.read(theirs).width) : null;
  return { name, theirs, ours, outcome, score: ours ? paperInkAgreement(theirs, ours) : -1 };
}

async function printedPages(): Promise<{ name: string; pdf: Uint8Array }[]> {
  const folder = join(import.meta.dirname, "../../node_modules/@twemoji/svg");
  const names = readdirSync(folder)
    .filter((file) => file.endsWith(".svg"))
    .sort();
  const chosen = names.filter((_, index) => index % Math.floor(names.length / printed) === 100).slice(0, printed);
  const browser = await launchBrowser();
  try {
    const page = await browser.newPage();
    const pages: { name: string; pdf: Uint8Array }[] = [];
    for (const name of chosen) {
      const svg = readFileSync(join(folder, name), "utf8").replace("<svg ", '<svg width="360" height="360" ');
      await page.setContent(`<!doctype html><title>page</title><body style="margin:0">${svg}`);
      pages.push({ name, pdf: await page.pdf({ width: "400px", height: "400px", printBackground: true }) });
    }
    return pages;
  } finally {
    await browser.close();
  }
}

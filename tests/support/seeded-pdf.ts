import { readFile } from "node:fs/promises";
import { createRequire } from "node:module";
import fontkit from "@pdf-lib/fontkit";
import { degrees, PDFDocument, PDFOperator, PDFOperatorNames, type PDFPage } from "pdf-lib";
import { unpackWoff } from "#server/artwork/unpack-woff.ts";
import { seededRandom } from "./seeded-random.ts";

const require = createRequire(import.meta.url);

/** Operators of a content stream, one a line, as ISO 32000-1 writes them. */
export async function pdfOf(
  content: string,
  {
    size = [400, 300],
    prepare,
  }: { size?: [number, number]; prepare?: (page: PDFPage, file: PDFDocument) => void } = {},
): Promise<Uint8Array> {
  const file = await PDFDocument.create({ updateMetadata: false });
  const page = file.addPage(size);
  prepare?.(page, file);
  addContent(page, content);
  return file.save();
}

/** Adds operators to a page as they stand. */
export function addContent(page: PDFPage, content: string): void {
  for (const line of content.split("\n"))
    if (line.trim() !== "") {
      const words = line.trim().split(/\s+/);
      const name = words.pop() ?? "";
      const operator = Object.values(PDFOperatorNames).find((known) => known === name);
      if (!operator) throw new Error(`${name} is no operator of PDF.`);
      page.pushOperators(PDFOperator.of(operator, words));
    }
}

/**
 * A page of shapes drawn by seed: fills by both rules, lines with caps, joins and dashes, clips, turned and stretched coordinates,
 * opacity, letters, on pages that are cropped and turned.
 */
export async function seededPdf(seed: number): Promise<Uint8Array> {
  const random = seededRandom(seed);
  const between = (low: number, high: number) => low + (high - low) * random();
  const pick = <T>(list: readonly [T, ...T[]]): T => list[Math.floor(random() * list.length)] ?? list[0];
  const number = (low: number, high: number) => between(low, high).toFixed(2);
  const colour = () => pick(["0.8 0.1 0.1", "0.1 0.4 0.8", "0.1 0.6 0.2", "0.95 0.75 0.1", "0.2 0.2 0.2"]);

  const file = await PDFDocument.create({ updateMetadata: false });
  file.registerFontkit(fontkit);
  const page = file.addPage([400, 300]);
  page.setRotation(degrees(pick([0, 0, 90, 180, 270])));
  if (random() < 0.4) page.setCropBox(20, 30, 340, 250);
  const faded = page.node.newExtGState("Faded", file.context.obj({ ca: 0.5, CA: 0.5 }));

  const outline = () => {
    if (random() < 0.3) return `${number(20, 300)} ${number(20, 200)} ${number(20, 120)} ${number(20, 120)} re`;
    const at = () => `${number(10, 390)} ${number(10, 290)}`;
    const steps = Array.from({ length: Math.floor(between(2, 6)) }, () =>
      random() < 0.5 ? `${at()} l` : `${at()} ${at()} ${at()} c`,
    );
    return `${at()} m\n${steps.join("\n")}${random() < 0.6 ? "\nh" : ""}`;
  };
  const lines: string[] = [];
  for (let shape = 0; shape < 7; shape++) {
    lines.push("q");
    if (random() < 0.3) lines.push(`${outline()}\n${pick(["W", "W*"])}\nn`);
    if (random() < 0.4) {
      const turn = between(0, Math.PI);
      const [cos, sin] = [Math.cos(turn), Math.sin(turn)];
      const [wide, high] = [between(0.4, 1.2), between(0.4, 1.2)];
      const six = [cos * wide, sin * wide, -sin * high, cos * high, between(0, 200), between(0, 150)];
      lines.push(`${six.map((value) => value.toFixed(4)).join(" ")} cm`);
    }
    if (random() < 0.2) lines.push(`${faded} gs`);
    lines.push(`${colour()} rg`, `${colour()} RG`, `${number(2, 14)} w`);
    lines.push(`${pick([0, 1, 2])} J`, `${pick([0, 1, 2])} j`, `${number(1.5, 8)} M`);
    if (random() < 0.3) lines.push(`[${number(6, 30)} ${number(4, 20)}] ${number(0, 20)} d`);
    lines.push(outline(), pick(["f", "f*", "S", "s", "B", "B*", "b"]), "Q");
  }
  addContent(page, lines.join("\n"));
  const font = await file.embedFont(
    unpackWoff(await readFile(require.resolve("@fontsource/merriweather/files/merriweather-latin-400-normal.woff"))),
    { subset: random() < 0.5 },
  );
  page.drawText("Orrery & Co.", {
    font,
    size: between(14, 60),
    x: between(20, 120),
    y: between(40, 220),
    rotate: degrees(between(-30, 30)),
  });
  return file.save();
}

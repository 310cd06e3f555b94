import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { DrawingSheet, Item } from "#shared/drawing/display-list.ts";
import { drawSheets, type Paper, paperScaleOf, type SheetsInput } from "#shared/drawing/sheet.ts";
import { leastCapHeightMm } from "#shared/drawing/type.ts";
import { boxContains, boxGrow, boxIntersection } from "#shared/geometry/box.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { FrozenNote } from "#shared/mockup/snapshot.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { frameOf } from "#shared/units/zones.ts";
import { orreryBooks, orreryFindings, orreryNotes, orreryTitleBlock } from "../../../support/orrery-books.ts";
import { type TextBox, textBoxesOf } from "../../../support/text-boxes.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

function inputFor(paper: Paper, unit: "mm" | "in", changes: Partial<SheetsInput> = {}): SheetsInput {
  const document = changes.document ?? orreryBooks();
  return {
    titleBlock: { ...orreryTitleBlock, unit },
    document,
    figures: computeFigures(document, kernel),
    kernel,
    findings: orreryFindings,
    notes: orreryNotes,
    words: "ORRERY BOOKS",
    unit,
    paper,
    ...changes,
  };
}

/** Pairs of lines that share more than a hair of paper. */
function overlaps(boxes: readonly TextBox[]): string[] {
  return boxes.flatMap((one, index) =>
    boxes.slice(index + 1).flatMap((other) => {
      const shared = boxIntersection(one.box, other.box);
      return shared && shared.width > 0.15 && shared.height > 0.15 ? [`${one.text} | ${other.text}`] : [];
    }),
  );
}

/** Zone marks stand in the band around the frame, 5 mm wide. */
function outsideFrame(sheet: DrawingSheet): string[] {
  const band = boxGrow(frameOf(sheet), 5);
  const frame = frameOf(sheet);
  return textBoxesOf(sheet).flatMap(({ text, box }) => {
    const zone = /^([A-Z]|\d{1,2})$/.test(text);
    return boxContains(zone ? band : frame, box) ? [] : [text];
  });
}

const textsOf = (sheet: DrawingSheet | undefined) => (sheet ? textBoxesOf(sheet).map(({ text }) => text) : []);

const longNotes: readonly FrozenNote[] = Array.from({ length: 30 }, (_, index) => ({
  number: index + 1,
  kind: "question",
  state: "open",
  text: `Note ${index + 1}: could the letters stand a little farther from the lower edge, so that the cleat is not seen from below?`,
  author: "Tilda Marsh",
  fromRevision: "A",
  zone: "C2",
}));

const sets: readonly { paper: Paper; unit: "mm" | "in"; width: number; height: number }[] = [
  { paper: "A4", unit: "mm", width: 297, height: 210 },
  { paper: "A3", unit: "mm", width: 420, height: 297 },
  { paper: "Letter", unit: "in", width: 279.4, height: 215.9 },
  { paper: "Tabloid", unit: "in", width: 431.8, height: 279.4 },
];

describe.each(sets)("a set on $paper in $unit", ({ paper, unit, width, height }) => {
  let sheets: DrawingSheet[];
  beforeAll(() => {
    sheets = drawSheets(inputFor(paper, unit));
  });

  it("lies, at true size", () => {
    for (const sheet of sheets) expect([sheet.widthMm, sheet.heightMm]).toEqual([width, height]);
  });

  it("keeps all lettering inside the frame", () => {
    expect(sheets.flatMap(outsideFrame)).toEqual([]);
  });

  it("sets no line over another", () => {
    expect(sheets.flatMap((sheet) => overlaps(textBoxesOf(sheet)))).toEqual([]);
  });

  it("letters nothing lower than 2.5 mm", () => {
    for (const { text, sizeMm } of sheets.flatMap(textBoxesOf)) {
      expect(sizeMm * 0.743, text).toBeGreaterThanOrEqual(leastCapHeightMm - 1e-9);
    }
  });

  it("carries the title block's fields on every sheet, and is not approved", () => {
    for (const [index, sheet] of sheets.entries()) {
      const texts = textsOf(sheet);
      for (const label of [
        "Owner",
        "Client",
        "Title",
        "Revision",
        "Number",
        "Date of issue",
        "Sheet",
        "Created by",
        "Approved by",
        "Document type",
        "Scale",
      ]) {
        expect(texts).toContain(label);
      }
      expect(texts).toEqual(
        expect.arrayContaining([`${index + 1} of ${sheets.length}`, "not yet", "CL-0142", "2026-11-30", paper]),
      );
    }
  });

  it("says what its figures are", () => {
    expect(textsOf(sheets[0]).join(" ")).toContain(
      "Figures are estimates for planning. Local codes and a licensed professional’s judgment come first.",
    );
  });

  it("says on each sheet what its bare numbers are (ISO 129-1)", () => {
    const words = unit === "mm" ? "Measures in mm." : "Measures in inches.";
    for (const sheet of sheets) expect(textsOf(sheet).join(" ")).toContain(words);
  });

  it("carries every note, finding and schedule row somewhere", () => {
    const all = sheets.flatMap((sheet) => textsOf(sheet)).join(" ");
    for (const words of [
      "Will the caps be brushed or polished?",
      "Caution: Thin stroke",
      "Caution: Locate",
      "ORRERY BOOKS",
      "Eastern",
      "Lettering",
    ]) {
      expect(all).toContain(words);
    }
  });
});

describe("the views", () => {
  const scaleOf = (sheet: DrawingSheet | undefined, id: string) =>
    sheet?.items.find((item): item is Extract<Item, { kind: "group" }> => item.kind === "group" && item.id === id)
      ?.scale;

  it("stand at the largest preferred scale that fits, the section at the elevation's (ISO 5455)", () => {
    const [sheet] = drawSheets(inputFor("A3", "mm"));
    // 1:2 would need 300 mm for the board alone, and the views have 280.
    expect(scaleOf(sheet, "elevation")).toBe(0.2);
    expect(scaleOf(sheet, "section")).toBe(0.2);
    expect(textsOf(sheet)).toContain("1:5");
  });

  it("of a small sign stop at full size", () => {
    const document = { ...orreryBooks(), layers: [] };
    document.board = { ...document.board, width: 60, height: 40 };
    const input = inputFor("A3", "mm", { document });
    expect(scaleOf(drawSheets(input)[0], "elevation")).toBe(1);
    expect(paperScaleOf(input)).toBe(1);
  });

  it("of the largest sign we take still fit", () => {
    const document = { ...orreryBooks(), layers: [] };
    document.board = { ...document.board, width: 10_000, height: 3000 };
    const sheets = drawSheets(inputFor("A4", "mm", { document }));
    expect(sheets.flatMap(outsideFrame)).toEqual([]);
    expect(scaleOf(sheets[0], "elevation")).toBe(0.01);
  });

  it("are told to others as millimetres of sign a millimetre of paper", () => {
    expect(paperScaleOf(inputFor("A3", "mm"))).toBe(5);
  });
});

describe("a set with much to say", () => {
  it("goes on over further sheets without losing, crowding or repeating a note", () => {
    const sheets = drawSheets(inputFor("A4", "mm", { notes: longNotes }));
    expect(sheets.length).toBeGreaterThan(2);
    expect(sheets.flatMap((sheet) => overlaps(textBoxesOf(sheet)))).toEqual([]);
    expect(sheets.flatMap(outsideFrame)).toEqual([]);
    const starts = sheets.flatMap((sheet) => textsOf(sheet)).flatMap((text) => /^Note (\d+):/.exec(text)?.[1] ?? []);
    expect(starts).toEqual(longNotes.map(({ number }) => String(number)));
  });

  it("breaks a note longer than a column, and a name longer than its cell", () => {
    const text = "undivided ".repeat(700).trim();
    const [first] = longNotes;
    if (!first) throw new Error("There is a first note.");
    const titleBlock = {
      ...orreryTitleBlock,
      title: "X".repeat(120),
      owner: "A very long workshop name and sons, signs of all kinds",
    };
    const sheets = drawSheets(inputFor("A4", "mm", { notes: [{ ...first, text }], titleBlock }));
    const all = sheets.flatMap((sheet) => textsOf(sheet)).join(" ");
    expect(all.match(/undivided/g)).toHaveLength(700);
    expect(all.match(/X/g)?.length).toBe(120 * sheets.length);
    expect(sheets.flatMap(outsideFrame)).toEqual([]);
  });

  it("of many layers moves its schedule on and ends", () => {
    const document = orreryBooks();
    const [, orbits] = document.layers;
    if (!orbits) throw new Error("The sign has orbits.");
    const keys = [..."HIJKLMNPQRSTUVWXYZ"];
    document.layers.push(...keys.map((key) => ({ ...orbits, key, pieces: [] })));
    const sheets = drawSheets(inputFor("A4", "mm", { document }));
    const texts = sheets.flatMap((sheet) => textsOf(sheet));
    expect(texts.filter((text) => text === "Orbits")).toHaveLength(19);
    expect(sheets.flatMap(outsideFrame)).toEqual([]);
    expect(sheets.flatMap((sheet) => overlaps(textBoxesOf(sheet)))).toEqual([]);
  });
});

import { readFileSync } from "node:fs";
import { expect, it } from "vitest";
import { mmToPt } from "#shared/units/length.ts";
import { paperSizes, usualPaper } from "#shared/units/paper.ts";
import { checkReference } from "../support/check-reference.ts";

// ISO 216:2007 and ANSI/ASME Y14.1; points at 72 to the inch of 25.4 mm (ISO 32000-1, 8.3.2.3).
const table = readFileSync(new URL("../fixtures/reference/paper-sizes.csv", import.meta.url), "utf8")
  .split("\n")
  .filter((line) => line && !line.startsWith("#"))
  .slice(1)
  .map((line) => line.split(","))
  .map(([standard = "", name = "", width = "", height = "", widthPt = "", heightPt = ""]) => ({
    standard,
    name: name.replace(/^A \((.+)\)$/, "$1").replace(/^B \((\w+).*\)$/, "$1"),
    widthMm: Number(width),
    heightMm: Number(height),
    widthPt: Number(widthPt),
    heightPt: Number(heightPt),
  }));

it("knows at least the five sizes of ISO 216 and the five of ANSI/ASME Y14.1", () => {
  expect(paperSizes.map(({ name }) => name)).toEqual([
    "A4",
    "A3",
    "A2",
    "A1",
    "A0",
    "Letter",
    "Tabloid",
    "C",
    "D",
    "E",
  ]);
});

it.each(paperSizes)("$name has the size that the standard lists", (size) => {
  const row = table.find(({ name, standard }) => name === size.name && standard === size.standard);
  expect(row).toMatchObject({ widthMm: size.widthMm, heightMm: size.heightMm });
  const points = { source: `${size.standard}, ISO 32000-1`, within: 5e-4 };
  checkReference({ ...points, what: `${size.name}, wide, pt`, expected: row?.widthPt ?? 0, got: mmToPt(size.widthMm) });
  checkReference({
    ...points,
    what: `${size.name}, high, pt`,
    expected: row?.heightPt ?? 0,
    got: mmToPt(size.heightMm),
  });
});

it("proofs are drawn on A3 or Tabloid, lying", () => {
  expect(usualPaper("mm")).toMatchObject({ name: "A3", widthMm: 420, heightMm: 297 });
  expect(usualPaper("in")).toMatchObject({ name: "Tabloid", widthMm: 431.8, heightMm: 279.4 });
});

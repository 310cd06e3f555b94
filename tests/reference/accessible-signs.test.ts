import { describe, expect, it } from "vitest";
import { z } from "zod";
import { accessibleCheck } from "#shared/legibility/accessible-check.ts";
import { type AccessibleMeasure, accessibleLimits } from "#shared/legibility/accessible-limits.ts";
import { strokeToHeight } from "#shared/legibility/stroke-to-height.ts";
import { visualCharacterHeightMm } from "#shared/legibility/visual-height.ts";
import { inchesToMm, mmToInches } from "#shared/units/length.ts";
import { checkReference, checkReferenceWord } from "../support/check-reference.ts";
import { referenceCsv, referenceJson, resultOf } from "../support/reference-data.ts";

// U.S. Department of Justice, 2010 ADA Standards for Accessible Design, section 703.
const source = "2010 ADA Standards, 703";
const inches = z.number().optional();
const worked = z
  .object({
    visual_character_height: z.array(
      z.object({ baseline_in: z.number(), distance_ft: z.number(), min_height_in: z.number() }),
    ),
    raised: z.array(
      z.object({
        height_in: inches,
        stroke_in: inches,
        depth_in: inches,
        depth_mm: inches,
        gap_in: inches,
        gap_to_border_in: inches,
        ok: z.boolean(),
      }),
    ),
    visual_stroke: z.array(z.object({ height_in: z.number(), stroke_in: z.number(), ok: z.boolean() })),
    line_spacing_visual: z.array(z.object({ height_in: z.number(), baseline_gap_in: z.number(), ok: z.boolean() })),
  })
  .parse(referenceJson("ada-703-worked.json"));

describe("table 703.5.5, heights of visual characters", () => {
  it.each(referenceCsv("ada-703-5-5.csv"))(
    "from $distance_from_in in at a baseline up to $baseline_max_in in: $base_height_in in",
    (row) => {
      const top = row.baseline_max_in === "" ? 200 : Number(row.baseline_max_in);
      const from = Math.max(Number(row.distance_from_in), 1);
      const got = resultOf(visualCharacterHeightMm(inchesToMm(top), inchesToMm(from)));
      checkReference({
        what: `height at baseline ${top} in from ${from} in, in`,
        source: `${source}.5.5`,
        expected: Number(row.base_height_in),
        got: mmToInches(got),
        within: 1e-9,
      });
      const further = resultOf(visualCharacterHeightMm(inchesToMm(top), inchesToMm(from + 12)));
      // What it grows by over the next foot; nothing before the band's rise begins.
      expect(mmToInches(further - got)).toBeCloseTo(Number(row.add_in_per_ft_beyond), 9);
    },
  );

  it.each(worked.visual_character_height)("baseline $baseline_in in from $distance_ft ft: $min_height_in in", (row) => {
    const got = resultOf(visualCharacterHeightMm(inchesToMm(row.baseline_in), inchesToMm(row.distance_ft * 12)));
    checkReference({
      what: `height at baseline ${row.baseline_in} in from ${row.distance_ft} ft, in`,
      source: `${source}.5.5`,
      expected: row.min_height_in,
      got: mmToInches(got),
      within: 1e-9,
    });
  });

  it("has no band for baselines under 40 in", () => {
    expect(visualCharacterHeightMm(inchesToMm(39.9), 1000)).toMatchObject({ ok: false, reason: { field: "baseline" } });
  });
});

const measures: Readonly<Record<string, AccessibleMeasure>> = {
  "depth of raised characters above background": "raised depth",
  "width of O / height of I,raised": "raised width to height",
  "width of O / height of I,visual": "visual width to height",
  "height of raised characters": "raised height",
  "stroke thickness of raised I": "raised stroke",
  "gap between raised characters, rectangular section": "raised gap",
  "gap between raised characters, other sections, at base": "raised gap at base",
  "raised characters to raised borders and decoration": "raised to border",
  "line spacing of raised characters, baseline to baseline": "raised line spacing",
  "braille dot base diameter": "braille dot base",
  "braille distance between two dots in a cell": "braille dot spacing",
  "braille distance between corresponding dots in adjacent cells": "braille cell spacing",
  "braille dot height": "braille dot height",
  "braille distance between corresponding dots one cell below": "braille line spacing",
  "braille below text, gap to other raised characters and borders": "braille to text",
  "baseline of lowest tactile character above floor": "tactile lowest baseline",
  "baseline of highest tactile character above floor": "tactile highest baseline",
  "visual characters above floor": "visual height above floor",
  "stroke thickness of visual I": "visual stroke",
  "gap between visual characters": "visual gap",
  "line spacing of visual characters": "visual line spacing",
  "pictogram field height": "pictogram field",
};

describe("the clauses with numbers", () => {
  const rows = referenceCsv("ada-703-clauses.csv").filter(
    // The floor in front of a door's sign is no measure of the sign.
    (row) => (row.min !== "" || row.max !== "") && row.clause !== "703.4.2",
  );
  it("are all there and no others", () => {
    expect(rows).toHaveLength(accessibleLimits.length);
  });

  it.each(rows)("$clause $quantity: $min to $max", (row) => {
    const id = measures[row.quantity ?? ""] ?? measures[`${row.quantity},${row.note}`];
    const limit = accessibleLimits.find((one) => one.id === id);
    const inUnit = (value: number) => (limit?.unit === "mm" ? mmToInches(value) : value);
    expect(limit?.clause).toBe(row.clause);
    for (const [side, text] of [
      ["least", row.min],
      ["most", row.max],
    ] as const) {
      const value = limit?.[side];
      // Four strokes are no number of their own; accessibleCheck takes the stroke.
      if (text === "" || text === "4 x stroke" || text === undefined) expect(value).toBeNull();
      else
        checkReference({
          what: `${row.clause} ${id}, ${side}`,
          source,
          expected: Number(text),
          got: inUnit(value ?? NaN),
          within: 1e-12,
        });
    }
  });
});

describe("worked cases", () => {
  it.each(worked.raised)(
    "raised characters of $height_in $stroke_in $depth_in $depth_mm $gap_in $gap_to_border_in: $ok",
    (row) => {
      const { height_in: height, stroke_in: stroke, gap_in: gap } = row;
      const mm = (value: number | undefined) => (value === undefined ? {} : { value: inchesToMm(value) });
      const results = accessibleCheck(
        {
          ...("value" in mm(height) ? { "raised height": inchesToMm(height ?? 0) } : {}),
          ...(height !== undefined && stroke !== undefined
            ? { "raised stroke": resultOf(strokeToHeight(inchesToMm(stroke), inchesToMm(height))) }
            : {}),
          ...(row.depth_in !== undefined ? { "raised depth": inchesToMm(row.depth_in) } : {}),
          ...(row.depth_mm !== undefined ? { "raised depth": row.depth_mm } : {}),
          ...(gap !== undefined ? { "raised gap": inchesToMm(gap) } : {}),
          ...(row.gap_to_border_in !== undefined ? { "raised to border": inchesToMm(row.gap_to_border_in) } : {}),
        },
        stroke === undefined ? null : inchesToMm(stroke),
      );
      expect(results.length).toBeGreaterThan(0);
      const got = results.every(({ verdict }) => verdict === "within");
      checkReferenceWord({
        what: `raised ${JSON.stringify(row).replaceAll('"', "")}`,
        source: `${source}.2`,
        expected: String(row.ok),
        got: String(got),
      });
    },
  );

  it.each(worked.visual_stroke)("a visual stroke of $stroke_in in on $height_in in: $ok", (row) => {
    const share = resultOf(strokeToHeight(inchesToMm(row.stroke_in), inchesToMm(row.height_in)));
    const [result] = accessibleCheck({ "visual stroke": share });
    checkReferenceWord({
      what: `visual stroke ${row.stroke_in} on ${row.height_in} in`,
      source: `${source}.5.7`,
      expected: String(row.ok),
      got: String(result?.verdict === "within"),
    });
  });

  it.each(worked.line_spacing_visual)("lines $baseline_gap_in apart on $height_in in: $ok", (row) => {
    const [result] = accessibleCheck({ "visual line spacing": row.baseline_gap_in / row.height_in });
    checkReferenceWord({
      what: `line spacing ${row.baseline_gap_in} on ${row.height_in} in`,
      source: `${source}.5.9`,
      expected: String(row.ok),
      got: String(result?.verdict === "within"),
    });
  });
});

import { contrastRatio } from "../colour/contrast.ts";
import { finishedWoodLrv } from "../colour/finished-wood.ts";
import { deltaE00, type Lab, labOf } from "../colour/lab.ts";
import { lrvOfLightness, luminanceContrast } from "../colour/lrv.ts";
import { colourMatch } from "../colour/nearest-stock.ts";
import { accessibleCheck } from "../legibility/accessible-check.ts";
import { lettersForDistance } from "../legibility/reading-distance.ts";
import { strokeToHeight } from "../legibility/stroke-to-height.ts";
import { visualCharacterHeightMm } from "../legibility/visual-height.ts";
import { inchesToMm, mmToInches } from "../units/length.ts";
import { type CalculationGroup, present, resultOf, worked } from "./calculation.ts";

const noCompliance = "An aid for the drawing, no statement that a sign complies.";

export const legibilityCalculations: CalculationGroup = {
  title: "Letters and colours",
  calculations: [
    {
      id: "reading-distance",
      title: "Letter height for a distance",
      formula: "At the limit distance/360 (1 in for 30 ft), with ease distance/120 (1 in for 10 ft).",
      source: { text: "MUTCD, 2009 edition, section 2A.13; ease is common practice", status: "published" },
      limits: "Clear letters with good contrast; script and thin strokes need more.",
      example: () => {
        const feet = 30;
        const letters = resultOf(lettersForDistance(inchesToMm(12 * feet)));
        return worked(
          [["Distance", feet, "ft"]],
          [
            ["At the limit", mmToInches(letters.limitMm), "in"],
            ["With ease", mmToInches(letters.easeMm), "in"],
          ],
        );
      },
    },
    {
      id: "visual-characters",
      title: "Height of visual characters on accessible signs",
      formula:
        "By the baseline's height over the floor and the distance: 5/8, 2 or 3 in, and 1/8 in more for each foot beyond 6, 15 or 21 ft.",
      source: { text: "2010 ADA Standards, table 703.5.5", status: "published" },
      limits: `Baselines from 40 in. Between whole feet it rises evenly (our choice). ${noCompliance}`,
      example: () => {
        const baseline = 60;
        const feet = 21;
        const height = resultOf(visualCharacterHeightMm(inchesToMm(baseline), inchesToMm(12 * feet)));
        return worked(
          [
            ["Baseline over the floor", baseline, "in"],
            ["Distance", feet, "ft"],
          ],
          [["Least height", mmToInches(height), "in"]],
        );
      },
    },
    {
      id: "accessible-limits",
      title: "Limits for raised and visual characters, braille and pictograms",
      formula:
        "Measured values beside the least and the most of each clause; the gap between raised characters at most four strokes.",
      source: { text: "2010 ADA Standards, section 703", status: "published" },
      limits: noCompliance,
      example: () => {
        const gap = 0.49;
        const stroke = 0.12;
        const result = present(accessibleCheck({ "raised gap": inchesToMm(gap) }, inchesToMm(stroke))[0]);
        return worked(
          [
            ["Raised gap", gap, "in"],
            ["Stroke", stroke, "in"],
          ],
          [
            ["At most", mmToInches(present(result.limit.most)), "in"],
            ["The gap is", result.verdict],
          ],
        );
      },
    },
    {
      id: "stroke-to-height",
      title: "Stroke to height",
      formula: "Stroke over the height of the I.",
      source: { text: "2010 ADA Standards, 703.2.6 and 703.5.7", status: "published" },
      limits: noCompliance,
      example: () => {
        const height = 40;
        const stroke = 6;
        return worked(
          [
            ["Height", height, "mm"],
            ["Stroke", stroke, "mm"],
          ],
          [["Share", resultOf(strokeToHeight(stroke, height))]],
        );
      },
    },
    {
      id: "contrast-ratio",
      title: "Contrast ratio",
      formula: "(L₁ + 0.05)/(L₂ + 0.05), L the relative luminance of sRGB.",
      source: { text: "W3C, Web Content Accessibility Guidelines 2.2", status: "published" },
      limits: "Made for screens; a first answer for sheets.",
      example: () => {
        const [one, other] = ["#767676", "#FFFFFF"] as const;
        return worked(
          [
            ["Letter", one],
            ["Ground", other],
          ],
          [["Ratio", contrastRatio(one, other)]],
        );
      },
    },
    {
      id: "light-reflectance",
      title: "Light reflectance value",
      formula: "100 · ((L* + 16)/116)³; under L* 8 100 · L* · 27/24389.",
      source: { text: "CIE 15", status: "published" },
      limits: "From sRGB an estimate, good to about a point.",
      example: () => {
        const lightness = 50;
        return worked([["L*", lightness]], [["Reflects", resultOf(lrvOfLightness(lightness)), "%"]]);
      },
    },
    {
      id: "luminance-contrast",
      title: "Luminance contrast",
      formula: "(B₁ − B₂)/B₁, B the light reflectance values, B₁ the lighter; and their difference in points.",
      source: { text: "ADAAG 1991, appendix A4.30.5; BS 8300-2 for 30 points", status: "published" },
      limits: `Matt faces. ${noCompliance}`,
      example: () => {
        const [lighter, darker] = [60, 18] as const;
        const { percent, points } = resultOf(luminanceContrast(lighter, darker));
        return worked(
          [
            ["Lighter", lighter, "%"],
            ["Darker", darker, "%"],
          ],
          [
            ["Contrast", percent, "%"],
            ["Difference", points, "points"],
          ],
        );
      },
    },
    {
      id: "finished-wood",
      title: "Wood under its finish",
      formula:
        "A stain draws the wood's CIELAB towards its own by its strength; the first clear coat takes 3 (water) or 8 (oil) from L*.",
      source: { text: "Our choice; what clear coats do is from memory", status: "our choice" },
      limits: "An estimate to compare signs by; a finished sample is measured for a promise.",
      example: () => {
        const bare: Lab = { L: 80, a: 4, b: 25 };
        return worked(
          [["L* of bare wood", bare.L]],
          [
            ["Reflects bare", resultOf(finishedWoodLrv(bare, [])), "%"],
            ["Oiled", resultOf(finishedWoodLrv(bare, [{ kind: "clear, oil or shellac" }])), "%"],
          ],
        );
      },
    },
    {
      id: "colour-difference",
      title: "Difference of two colours",
      formula: "ΔE00 of CIEDE2000; up to 1 the same, to 2 close, to 5 visible, more another colour.",
      source: {
        text: "G. Sharma, W. Wu, E. N. Dalal, Color Research and Application 30(1), 2005; the words are common practice",
        status: "published",
      },
      limits: "sRGB stands for opaque sheets in daylight; a sample decides.",
      example: () => {
        const one: Lab = { L: 50, a: 2.6772, b: -79.7751 };
        const other: Lab = { L: 50, a: 0, b: -82.7485 };
        const difference = deltaE00(one, other);
        return worked(
          [
            ["One", `${one.L} ${one.a} ${one.b}`],
            ["Other", `${other.L} ${other.a} ${other.b}`],
          ],
          [
            ["ΔE00", difference],
            ["They look", colourMatch(difference)],
          ],
        );
      },
    },
    {
      id: "lightness",
      title: "CIELAB of a sheet's colour",
      formula: "sRGB to XYZ under D65, then CIELAB.",
      source: { text: "IEC 61966-2-1 and CIE 15", status: "published" },
      limits: "2-degree observer.",
      example: () => {
        const colour = "#FF0000";
        const { L, a, b } = labOf(colour);
        return worked(
          [["Colour", colour]],
          [
            ["L*", L],
            ["a*", a],
            ["b*", b],
          ],
        );
      },
    },
  ],
};

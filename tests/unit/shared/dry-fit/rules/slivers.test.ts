import { describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { bestStart } from "#shared/dry-fit/best-start.ts";
import { slivers } from "#shared/dry-fit/rules/slivers.ts";
import type { Path } from "#shared/geometry/path.ts";
import { rememberingKernel } from "#shared/geometry/remembering-kernel.ts";
import { polygonRing } from "#shared/geometry/shapes.ts";
import type { MockupDocument, Slats } from "#shared/mockup/document.ts";
import { sliversOf } from "#shared/slats/slivers.ts";
import { slatsOf } from "#shared/stack/backer.ts";
import { buildSign } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";
import { triedMends } from "../../../../support/mend-findings.ts";
import { resultOf } from "../../../../support/reference-data.ts";
import { buildSlatSign } from "../../../../support/slat-sign.ts";

/** The worked example: 45 degrees on a spine, from the corner, of 457.2 by 482.6 mm. */
const chevron: Partial<Slats> = { pattern: "spine", angle: 45, slatWidth: 38.1, spineWidth: 38.1, overhang: 25 };
const board = (width: number, height: number, kind: "rectangle" | "ellipse" = "rectangle") => ({
  board: { ...buildSign([]).board, outline: { kind }, width, height },
});
const sign = (slats: Partial<Slats> = chevron, more: Partial<MockupDocument> = board(457.2, 482.6)) =>
  buildSlatSign(slats, [], more);

describe("slats that can't be laid", () => {
  it.each([
    { slats: { gap: 60 }, text: /^The slats can't be laid. A gap of 60 mm is wider than the slats of 40 mm/ },
    { slats: { slatWidth: 500 }, text: /^The slats can't be laid. A slat of 500 mm is wider than the board/ },
    { slats: { slatWidth: 0.5 }, text: /^The slats can't be laid. The slats' width must lie between 1 mm/ },
  ])("stop the sign in words: $text", async ({ slats, text }) => {
    const findings = await findingsOf(slivers, buildSlatSign(slats));
    expect(findings).toMatchObject([{ rule: 32, severity: "stop", title: "Slats" }]);
    expect(findings[0]?.text).toMatch(text);
    expect((await triedMends(slivers, buildSlatSign(slats))).labels).toEqual([[]]);
  });
});

describe("slats shorter than wide", () => {
  it("are none on a plank, and none where slats lie across", async () => {
    expect(await findingsOf(slivers, buildSign([]))).toEqual([]);
    expect(await findingsOf(slivers, buildSlatSign())).toEqual([]);
  });

  // Square to a spine of 40 slats are (width − 40)/2 long.
  it.each([
    { width: 120, value: null },
    { width: 119.9, value: 39.95 },
  ])("on a board $width wide: $value", async ({ width, value }) => {
    const square = sign({ pattern: "spine", slatWidth: 40 }, board(width, 400));
    const findings = await findingsOf(slivers, square);
    expect(findings.map((finding) => finding.value)).toEqual(value === null ? [] : [value]);
    // Wherever they begin they are as short.
    for (const { text } of findings)
      expect(text).toContain("No start leaves every slat longer than it is wide, and this is the best.");
    expect((await triedMends(slivers, square)).labels).toEqual(value === null ? [] : [[]]);
  });

  it("are as many as the layout has, the shortest told with its place", async () => {
    const kernel = await loadKernel();
    const laid = slatsOf(sign(), kernel);
    const slats = laid ? resultOf(laid).slats : [];
    const short = slats.filter(({ trimmedLongPoint }) => trimmedLongPoint < 38.1);
    expect(short.length).toBeGreaterThan(0);
    const findings = await findingsOf(slivers, sign());
    const least = Math.min(...short.map(({ trimmedLongPoint }) => trimmedLongPoint));
    expect(findings).toMatchObject([{ rule: 32, severity: "caution", limit: 38.1, unit: "mm" }]);
    expect(findings[0]?.value).toBeCloseTo(least, 2);
    expect(findings[0]?.text).toContain(`${short.length} slats of ${slats.length} shorter than they are wide, 38.1 mm`);
  });

  it.each([
    { name: "a rectangle", more: board(457.2, 482.6) },
    { name: "an ellipse", more: board(600, 500, "ellipse") },
  ])("are mended on $name by the best start", async ({ more }) => {
    const { labels, mended } = await triedMends(slivers, sign(chevron, more));
    expect(labels).toEqual([[expect.stringMatching(/^Begin .* from the lower edge at the spine$/)]]);
    expect(mended[0]?.backer.slats?.start.kind).toBe("height");
  });

  it("begin where the start chosen for that board lies", async () => {
    // The corners' slats are equally long at (482.6 − 209.55 − 53.88)/2 = 109.58; two pitches of 53.88 less.
    const { labels, mended } = await triedMends(slivers, sign());
    expect(labels).toEqual([["Begin 1.8 mm from the lower edge at the spine"]]);
    expect(mended[0]?.backer.slats?.start).toEqual({ kind: "height", height: 1.8 });
  });

  it("are measured from the edge that falling slats rise from", async () => {
    const { labels } = await triedMends(slivers, sign({ ...chevron, direction: "down" }));
    expect(labels).toEqual([[expect.stringMatching(/ from the upper edge at the spine$/)]]);
  });

  it("are not looked into for long: many slats on an outline are told to try another start", async () => {
    // In the tip below a slat of 4.5 across is 800 · 4.5/2000 = 1.8 mm long; 444 of them cover 2000 mm.
    const path = [
      polygonRing([
        { x: 0, y: 0 },
        { x: 800, y: 0 },
        { x: 300, y: 2000 },
      ]),
    ];
    const triangle = { ...buildSign([]).board, outline: { kind: "path" as const, path: changeable(path) } };
    const many = sign({ slatWidth: 4.5 }, { board: { ...triangle, width: 800, height: 2000 } });
    expect(bestStart(many, await loadKernel())).toBeNull();
    const [finding] = await findingsOf(slivers, many);
    expect(finding).toMatchObject({ value: 1.8, limit: 4.5 });
    expect(finding?.text).toMatch(/glue. Try another start.$/);
    expect((await triedMends(slivers, many)).labels).toEqual([[]]);
  });
});

const changeable = (path: Path) => path.map(({ start, segments }) => ({ start, segments: [...segments] }));

it("the best start is found once for a board and its slats, and free of slivers on the very board", async () => {
  const kernel = rememberingKernel(await loadKernel());
  const ellipse = sign(chevron, board(600, 500, "ellipse"));
  const choice = bestStart(ellipse, kernel);
  const moved = { ...ellipse, presentation: { ...ellipse.presentation, viewingDistance: 1 } };
  expect(bestStart(moved, kernel)).toBe(choice);
  if (!choice || !ellipse.backer.slats) throw new Error("There is a start.");
  const slats: Slats = { ...ellipse.backer.slats, start: { kind: "height", height: choice.best.height } };
  const layout = slatsOf({ ...ellipse, backer: { ...ellipse.backer, slats } }, kernel);
  expect(layout && sliversOf(resultOf(layout))).toEqual([]);
});

import { describe, expect, it } from "vitest";
import { locate } from "#shared/dry-fit/rules/locate.ts";
import { standardAcrylics } from "#shared/materials/standard-stock.ts";
import { buildLayer, buildSign, hole, plate, pocketHold, standoffHold } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";
import { triedMends } from "../../../../support/mend-findings.ts";

const pieces = () => [plate("p1", 20, 20, [100, 200]), plate("p2", 20, 20, [140, 200])];
const clear = standardAcrylics.find(({ acrylic }) => acrylic.look === "clear")?.acrylic;
const signOf = (rest: Parameters<typeof buildLayer>[2]) => buildSign([buildLayer("B", pieces(), rest)]);

it("bonded pieces with nothing to find their place by are one finding a layer", async () => {
  const findings = await findingsOf(locate, signOf({ locate: "none" }));
  expect(findings).toMatchObject([
    { rule: 20, severity: "caution", layerKey: "B", pieceIds: ["p1", "p2"], value: 2, where: { x: 100, y: 200 } },
  ]);
  expect(findings[0]?.text).toBe(
    "2 pieces of B, Layer B are bonded with nothing to find the place by, and a bond can't be moved. Plan a template: one cut-out sheet places all pieces at once.",
  );
});

it.each(["template", "scored line"] as const)("with a %s they are found", async (by) => {
  expect(await findingsOf(locate, signOf({ locate: by }))).toEqual([]);
});

describe("a way that does not find the place", () => {
  it.each([
    { what: "a pocket of a bonded layer", rest: { locate: "pocket" } as const, says: "There is no pocket" },
    { what: "a hole pattern of a bonded layer", rest: { locate: "hole pattern" } as const, says: "There are no holes" },
    {
      what: "a scored line under a clear sheet",
      rest: clear ? ({ locate: "scored line", stock: clear } as const) : {},
      says: "seen through",
    },
    {
      what: "a hole pattern of one hole",
      rest: { locate: "hole pattern", hold: standoffHold([hole("h", 100, 200)]) } as const,
      says: "One hole leaves the panel free to turn",
    },
    {
      what: "a scored line under a panel",
      rest: { locate: "scored line", hold: standoffHold([hole("h", 100, 200), hole("i", 140, 200)]) } as const,
      says: "stands off the face",
    },
  ])("$what", async ({ rest, says }) => {
    const findings = await findingsOf(locate, signOf(rest));
    expect(findings).toMatchObject([{ severity: "caution", value: 2 }]);
    expect(findings[0]?.text).toContain(says);
  });

  it.each([
    { what: "no way", rest: { locate: "none" } as const, labels: [["Plan a template", "Plan a scored line"]] },
    {
      what: "a line under a clear sheet",
      rest: clear ? ({ locate: "scored line", stock: clear } as const) : {},
      labels: [["Plan a template"]],
    },
    {
      what: "a line under a panel",
      rest: { locate: "scored line", hold: standoffHold([hole("h", 100, 200), hole("i", 140, 200)]) } as const,
      labels: [["Plan the hole pattern"]],
    },
    {
      what: "a hole pattern without holes",
      rest: { locate: "hole pattern", hold: pocketHold(1) } as const,
      labels: [["Plan a pocket", "Plan a scored line"]],
    },
  ])("$what is mended: $labels", async ({ rest, labels }) => {
    expect((await triedMends(locate, signOf(rest))).labels).toEqual(labels);
  });
});

it("a pocket, a panel without standoffs and an empty layer ask for nothing", async () => {
  expect(await findingsOf(locate, signOf({ locate: "none", hold: pocketHold(1) }))).toEqual([]);
  expect(await findingsOf(locate, signOf({ locate: "none", hold: standoffHold([]) }))).toEqual([]);
  expect(await findingsOf(locate, signOf({ locate: "hole pattern", hold: standoffHold([]) }))).toEqual([]);
  expect(await findingsOf(locate, buildSign([buildLayer("B", [], { locate: "none" })]))).toEqual([]);
});

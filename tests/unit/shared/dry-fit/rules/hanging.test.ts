import { describe, expect, it } from "vitest";
import { hanging } from "#shared/dry-fit/rules/hanging.ts";
import { licensedPractice } from "#shared/dry-fit/rules/licensed-practice.ts";
import { protrusion } from "#shared/dry-fit/rules/protrusion.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { buildSign } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

// 600 × 400 × 18 mm of pine at G12 0.35 and 8 %: 0.00432 m³ · 378 kg/m³ = 1.63296 kg; a fifth more for what is not weighed.
const withTheRest = 1.63296 * 1.2;
const hung = (hangs: Partial<MockupDocument["hanging"]>): MockupDocument => {
  const sign = buildSign([]);
  return { ...sign, hanging: { ...sign.hanging, kind: "cleat", ...hangs } };
};

describe("hanging", () => {
  it.each([
    { carriesKg: 1.9595, count: 1 },
    { carriesKg: 1.9596, count: 0 },
    { carriesKg: 20, count: 0 },
  ])("a fixing for $carriesKg kg: $count", async ({ carriesKg, count }) => {
    const findings = await findingsOf(hanging, hung({ carriesKg }));
    expect(findings).toHaveLength(count);
    for (const finding of findings) {
      expect(finding).toMatchObject({ rule: 36, severity: "stop", value: 1.96, limit: carriesKg, unit: "kg" });
      expect(withTheRest).toBeCloseTo(1.959_55, 4);
    }
  });

  it("that nobody chose, or whose fixing nobody stated, is a caution", async () => {
    expect(await findingsOf(hanging, hung({ kind: "none" }))).toMatchObject([{ severity: "caution", value: null }]);
    expect(await findingsOf(hanging, hung({ carriesKg: null }))).toMatchObject([{ severity: "caution", value: null }]);
  });
});

describe("over a walkway", () => {
  // Plain board: 18 mm and the gap behind it.
  it.each([
    { gap: 84, walkway: true, count: 0 },
    { gap: 84.1, walkway: true, count: 1 },
    { gap: 200, walkway: false, count: 0 },
  ])("$gap mm of gap, people passing: $walkway: $count", async ({ gap, walkway, count }) => {
    const findings = await findingsOf(protrusion, hung({ gap }), { context: { walkway } });
    expect(findings).toHaveLength(count);
    for (const finding of findings) expect(finding).toMatchObject({ rule: 37, severity: "caution", limit: 102 });
  });
});

describe("what is not for the shop alone", () => {
  const plain = hung({});
  it.each([
    { context: {}, texts: [] },
    { context: { place: "outside" as const }, texts: ["hangs outside"] },
    { context: { overhead: true }, texts: ["hangs over"] },
    { context: { electrical: true }, texts: ["electrical parts"] },
    {
      context: { place: "outside" as const, overhead: true, electrical: true },
      texts: ["hangs outside", "hangs over", "electrical parts"],
    },
  ])("$texts", async ({ context, texts }) => {
    const findings = await findingsOf(licensedPractice, plain, { context });
    expect(findings).toHaveLength(texts.length);
    for (const [index, text] of texts.entries()) {
      expect(findings[index]).toMatchObject({ rule: 38, severity: "stop", value: null });
      expect(findings[index]?.text).toContain(text);
      expect(findings[index]?.text).toContain("licensed");
    }
  });

  it.each([
    { heaviestKg: 1.9595, count: 1 },
    { heaviestKg: 1.9596, count: 0 },
  ])("over $heaviestKg kg: $count", async ({ heaviestKg, count }) => {
    const findings = await findingsOf(licensedPractice, plain, { limits: { heaviestKg } });
    expect(findings).toHaveLength(count);
    for (const finding of findings) expect(finding).toMatchObject({ value: 1.96, unit: "kg" });
  });
});

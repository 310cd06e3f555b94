import { describe, expect, it } from "vitest";
import type { BoundFinding } from "#shared/dry-fit/set-aside.ts";
import { wakingWords } from "#shared/dry-fit/waking-words.ts";

const thin: BoundFinding = {
  rule: 3,
  title: "Thin stroke",
  severity: "stop",
  text: "1.82 mm at the thinnest.",
  layerKey: "C",
  pieceIds: ["p1"],
  holeId: null,
  value: 1.82,
  limit: 2,
  unit: "mm",
};

const breaking = (text: string): string => text.replaceAll("\u00a0", " ");

describe("what woke a finding", () => {
  it.each<{ now: Partial<BoundFinding>; unit?: "mm" | "in"; words: string }>([
    { now: { value: 1.64 }, words: "The value was 1.82 mm then, it is 1.64 mm now." },
    { now: { value: 1.64 }, unit: "in", words: "The value was 0.072″ then, it is 0.065″ now." },
    { now: { limit: 2.5 }, words: "The limit was 2 mm then, it is 2.5 mm now." },
    { now: { severity: "caution", value: 1.9 }, words: "It was a stop then, it is a caution now." },
    { now: { value: 0.3, unit: "%" }, words: "The value was 1.82 mm then, it is 0.3 % now." },
    { now: { value: null }, words: "What the dry fit says of it has changed since." },
    // Less than a thousandth of an inch apart: both would read alike.
    { now: { value: 1.83 }, unit: "in", words: "What the dry fit says of it has changed since." },
  ])("$now in $unit: $words", ({ now, unit = "mm", words }) => {
    expect(breaking(wakingWords(thin, { ...thin, ...now }, unit))).toBe(words);
  });

  it("keeps a value and its unit on one line", () => {
    expect(wakingWords(thin, { ...thin, value: 1.64 }, "mm")).toBe(
      "The value was 1.82\u00a0mm then, it is 1.64\u00a0mm now.",
    );
  });

  it("is a plain number for what is counted", () => {
    const counted = { ...thin, value: 3, unit: null, limit: 0 };
    expect(wakingWords(counted, { ...counted, value: 4 }, "mm")).toBe("The value was 3 then, it is 4 now.");
  });
});

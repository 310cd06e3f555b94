import { describe, expect, it } from "vitest";
import { makingWords } from "#shared/drawing/making-words.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { orreryBooks } from "../../../support/orrery-books.ts";

const hung = (hanging: Partial<MockupDocument["hanging"]>, finish: MockupDocument["backer"]["finish"] = []) => {
  const document = orreryBooks();
  const base = { kind: "cleat", gap: 12, pose: "upright", carriesKg: 20, points: [] } as const;
  return { ...document, hanging: { ...base, points: [], ...hanging }, backer: { ...document.backer, finish } };
};

describe("how a sign is made, for the shop", () => {
  it("says how it hangs, what the fixing carries and how long the finish dries", () => {
    const points = [
      { x: 150, y: 30 },
      { x: 450, y: 30 },
    ];
    const finish: MockupDocument["backer"]["finish"] = [
      { kind: "sanding", grit: 180 },
      { kind: "stain", name: "Umber", colour: "#4A2B12", strength: 0.5, dryingHours: 8 },
      { kind: "clear coat", name: "Clear", base: "water-borne", dryingHours: 12 },
    ];
    expect(makingWords(hung({ points }, finish), "mm")).toBe(
      "Hanging: cleat, upright, 12 mm behind it, the fixing carries 20 kg, 2 places set out for it. The finish dries 20 hours in all.",
    );
  });

  it("says what nobody has chosen or stated", () => {
    expect(makingWords(hung({ kind: "none", gap: 0, pose: "lying", carriesKg: null }), "mm")).toBe(
      "Hanging: not chosen, lying flat, what the fixing carries is not stated.",
    );
  });

  it("is in pounds and inches for a shop that works in them", () => {
    expect(makingWords(hung({ kind: "keyholes", gap: 12.7, carriesKg: 9.0718474 }), "in")).toBe(
      "Hanging: keyholes, upright, 1/2″ behind it, the fixing carries 20 lb.",
    );
  });
});

import { describe, expect, it } from "vitest";
import { againstBrief } from "@/features/mockup/model/against-brief.ts";
import { emptyMockup } from "../sample-mockup.ts";

/** 600 × 400 mm, one of it. */
const document = emptyMockup();

describe("againstBrief", () => {
  it("says each measure and number that is not as asked", () => {
    expect(againstBrief({ widthMm: 750, heightMm: 380, quantity: 2 }, document, "mm")).toEqual([
      "The brief asks for 750 mm wide, the board is 600 mm wide.",
      "The brief asks for 380 mm high, the board is 400 mm high.",
      "The brief asks for 2 of this sign, the mockup is for 1.",
    ]);
  });

  it("says nothing of what is as asked, or was not asked", () => {
    expect(againstBrief({ widthMm: 600, heightMm: null, quantity: 1 }, document, "mm")).toEqual([]);
  });

  it("takes lengths that read alike in inches for the same", () => {
    // 23 5/8″ is 600.075 mm.
    expect(againstBrief({ widthMm: 600.075, heightMm: 400, quantity: 1 }, document, "in")).toEqual([]);
    expect(againstBrief({ widthMm: 609.6, heightMm: 400, quantity: 1 }, document, "in")).toEqual([
      "The brief asks for 24″ wide, the board is 23 5/8″ wide.",
    ]);
  });

  it("counts the frame where the measures mean overall, and not where they mean the body", () => {
    // 600 by 400 and 18 mm on every side.
    const framed = (measures: "body" | "overall") =>
      emptyMockup({
        board: { ...document.board, measures },
        frame: { stock: document.backer.stock, width: 18, depth: 20, mitred: true },
      });
    const asked = { widthMm: 636, heightMm: 400, quantity: 1 };
    expect(againstBrief(asked, framed("overall"), "mm")).toEqual([
      "The brief asks for 400 mm high, the sign with its frame is 436 mm high.",
    ]);
    expect(againstBrief(asked, framed("body"), "mm")).toEqual([
      "The brief asks for 636 mm wide, the board is 600 mm wide.",
    ]);
  });
});

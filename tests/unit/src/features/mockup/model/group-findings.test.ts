import { describe, expect, it } from "vitest";
import type { Finding } from "#shared/dry-fit/finding.ts";
import { runsOfRules } from "@/features/mockup/model/group-findings.ts";
import { shortAndRest } from "@/features/mockup/model/short-text.ts";

const found = (rule: number, text: string): Finding => ({
  rule,
  title: `Rule ${rule}`,
  severity: "caution",
  text,
  layerKey: null,
  pieceIds: [],
  holeId: null,
  where: null,
  value: null,
  limit: null,
  unit: null,
  source: "our choice",
});
const standings = (...rules: number[]) =>
  rules.map((rule, index) => ({ finding: found(rule, String(index)), setAside: null, woken: null }));

describe("findings of a rule", () => {
  it("up to four are shown, of five three and two wait", () => {
    const cuts = (count: number) =>
      runsOfRules(standings(...Array.from({ length: count }, () => 20))).map(({ first, rest }) => [
        first.length,
        rest.length,
      ]);
    expect(cuts(4)).toEqual([[4, 0]]);
    expect(cuts(5)).toEqual([[3, 2]]);
    expect(cuts(30)).toEqual([[3, 27]]);
    expect(cuts(0)).toEqual([]);
  });

  it("keep their order, and every one is somewhere", () => {
    const runs = runsOfRules(standings(1, 1, 3, 3, 3, 3, 3, 8));
    expect(runs.map(({ rule, title, first, rest }) => [rule, title, first.length, rest.length])).toEqual([
      [1, "Rule 1", 2, 0],
      [3, "Rule 3", 3, 2],
      [8, "Rule 8", 1, 0],
    ]);
    expect(runs.flatMap(({ first, rest }) => [...first, ...rest]).map(({ finding }) => finding.text)).toEqual([
      "0",
      "1",
      "2",
      "3",
      "4",
      "5",
      "6",
      "7",
    ]);
  });
});

describe("a long text", () => {
  const tail =
    "Test on scrap first, follow the maker's sheet, and air the room while it cures, since its fumes are harmful.";

  it("is its first sentence and the rest, with not a letter lost", () => {
    const text = `Wicking cement bonds C, Rings: it can be moved after 30 minutes. ${tail}`;
    const { short, rest } = shortAndRest(text);
    expect(short).toBe("Wicking cement bonds C, Rings: it can be moved after 30 minutes.");
    expect(`${short} ${rest}`).toBe(text);
  });

  it("is not cut after the full stop of a number", () => {
    expect(shortAndRest(`No. 6 × 16 in Standoff 15 × 19 reaches 12 mm. ${tail}`).short).toBe(
      "No. 6 × 16 in Standoff 15 × 19 reaches 12 mm.",
    );
  });

  it("stays whole when it is short or a single sentence", () => {
    expect(shortAndRest("It is short. Two sentences.")).toEqual({ short: "It is short. Two sentences.", rest: "" });
    const single = `A sentence ${"that goes on ".repeat(14)}and on.`;
    expect(shortAndRest(single)).toEqual({ short: single, rest: "" });
  });
});

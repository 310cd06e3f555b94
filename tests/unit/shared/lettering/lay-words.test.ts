import createClipper from "clipper2-wasm";
import { beforeAll, describe, expect, it } from "vitest";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import { boxOfPath } from "#shared/geometry/box.ts";
import { clipperKernel } from "#shared/geometry/clipper-kernel.ts";
import { connectedPieces } from "#shared/geometry/connected.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { placePath } from "#shared/geometry/placement.ts";
import { type LaidWords, layWords, type Setting } from "#shared/lettering/lay-words.ts";
import { openFaceOf } from "../../../support/open-faces.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = clipperKernel(await createClipper());
});

const plain: Setting = {
  words: "H",
  capHeight: 40,
  letterSpacing: 0,
  kerning: true,
  lineSpacing: 64,
  align: "left",
  along: { kind: "line" },
};
const lay = (setting: Partial<Setting>, key = "montserrat-600") =>
  layWords({ ...plain, ...setting }, openFaceOf(key), kernel);
function laid(setting: Partial<Setting>, key?: string): LaidWords {
  const outcome = lay(setting, key);
  if (!outcome.ok) throw new Error(outcome.problem);
  return outcome.laid;
}
const boxOf = ({ letters }: LaidWords, index: number) => {
  const letter = letters[index];
  const box = letter && boxOfPath(placePath(letter.path, { ...letter.laid, scale: 1, mirrored: false }));
  if (!box) throw new Error(`There is no letter ${index}.`);
  return box;
};
const reads = ({ letters }: LaidWords) => letters.map((one) => one.reads);

describe("letters", () => {
  it("are numbered with spaces and line feeds counted, and read as they are written", () => {
    const { letters } = laid({ words: "A b\nÉ" });
    expect(letters.map(({ letter, reads: text }) => [letter, text])).toEqual([
      [0, "A"],
      [2, "b"],
      [4, "É"],
    ]);
  });

  it("lie about the middle of their own box", () => {
    for (const { path } of laid({ words: "Ag,É" }).letters) {
      const box = boxOfPath(path);
      expect((box?.x ?? 9) + (box?.width ?? 0) / 2).toBeCloseTo(0, 2);
      expect((box?.y ?? 9) + (box?.height ?? 0) / 2).toBeCloseTo(0, 2);
    }
  });

  it.each([
    { words: "i", parts: 2 },
    { words: "é", parts: 2 },
    { words: "Ö", parts: 3 },
    { words: ":", parts: 2 },
    { words: "e\u0301", parts: 2 },
    { words: "O", parts: 1 },
  ])("of several parts as $words are one piece", ({ words, parts }) => {
    const { letters } = laid({ words });
    expect(letters).toHaveLength(1);
    expect(letters[0]?.reads).toBe(words.normalize("NFC"));
    expect(connectedPieces(kernel.union(flattenPath(letters[0]?.path ?? []), "evenodd"))).toHaveLength(parts);
  });

  it("are never joined to ligatures", () => {
    for (const key of ["montserrat-600", "lobster-400", "merriweather-700"])
      expect(reads(laid({ words: "office fish Th" }, key)).join("")).toBe("officefishTh");
  });

  it("have no overlaps left: read by the even-odd rule they cover what they cover by the nonzero rule", () => {
    for (const { path } of laid({ words: "AKRØ&Q@8" }, "montserrat-800").letters) {
      const flat = flattenPath(path, 0.005);
      const evenOdd = regionAreaMm2(kernel.union(flat, "evenodd"));
      expect(evenOdd).toBeGreaterThan(50);
      expect(regionAreaMm2(kernel.union(flat, "nonzero")) / evenOdd).toBeCloseTo(1, 4);
    }
  });

  it("that a face lacks are named once each, and nothing stands in their place", () => {
    const outcome = laid({ words: "AЖBЖ→" });
    expect(outcome.missing).toEqual(["Ж", "→"]);
    expect(reads(outcome)).toEqual(["A", "B"]);
  });

  it("without a shape of their own are no letters, and lack nothing", () => {
    const outcome = laid({ words: "A\u00ADB\u00A0C\tD" });
    expect(outcome.missing).toEqual([]);
    expect(reads(outcome)).toEqual(["A", "B", "C", "D"]);
    const bare = laid({ words: "AB C D" });
    expect(outcome.box?.width).toBeCloseTo(bare.box?.width ?? 0, 3);
  });

  it("are none where there are only spaces", () => {
    const outcome = laid({ words: " \n " });
    expect(outcome.letters).toEqual([]);
    expect(outcome.box).toBeNull();
  });
});

describe("a line", () => {
  it("grows by the space between letters, not after the last", () => {
    const close = laid({ words: "HHHH" }).box;
    const wide = laid({ words: "HHHH", letterSpacing: 5 }).box;
    expect((wide?.width ?? 0) - (close?.width ?? 0)).toBeCloseTo(15, 3);
  });

  it.each([
    { align: "left" as const, left: 0 },
    { align: "centre" as const, left: -0.5 },
    { align: "right" as const, left: -1 },
  ])("lined up $align has its outlines there, every line of it", ({ align, left }) => {
    const outcome = laid({ words: "H\nAVE", align });
    const first = boxOf(outcome, 0);
    expect(first.x).toBeCloseTo(left * first.width, 2);
    const second = [1, 2, 3].map((index) => boxOf(outcome, index));
    const start = Math.min(...second.map(({ x }) => x));
    const end = Math.max(...second.map(({ x, width }) => x + width));
    expect(start).toBeCloseTo(left * (end - start), 2);
  });

  it("stands with its feet on its own line", () => {
    const outcome = laid({ words: "H\nH\nH", lineSpacing: 70 });
    expect([0, 1, 2].map((index) => boxOf(outcome, index)).map(({ y, height }) => y + height)).toEqual([
      expect.closeTo(0, 2),
      expect.closeTo(70, 2),
      expect.closeTo(140, 2),
    ]);
  });

  it("may be empty between two others", () => {
    const outcome = laid({ words: "H\n\nH", lineSpacing: 70 });
    expect(boxOf(outcome, 1).y).toBeCloseTo(100, 2);
  });
});

describe("an arc", () => {
  const arc = (side: "over" | "under", radius = 150) => ({ kind: "arc" as const, side, radius });

  it("bears letters outside when they go over it, and inside when they hang in it, reading from left to right", () => {
    for (const side of ["over", "under"] as const) {
      const { letters } = laid({ words: "HIH", align: "centre", along: arc(side) });
      const xs = letters.map(({ laid: at }) => at.x);
      expect(xs).toEqual(xs.toSorted((a, b) => a - b));
      const away = letters.map(({ laid: at }) => Math.hypot(at.x, side === "over" ? 150 - at.y : 150 + at.y));
      for (const one of away) expect(one).toBeCloseTo(side === "over" ? 170 : 130, 1);
    }
  });

  it("has the middle letter upright where its line begins at the middle", () => {
    for (const side of ["over", "under"] as const) {
      const [, middle] = laid({ words: "HIH", align: "centre", along: arc(side) }).letters;
      expect(middle?.laid.turn).toBeCloseTo(0, 1);
      expect(middle?.laid.x).toBeCloseTo(0, 1);
      expect(middle?.laid.y).toBeCloseTo(-20, 1);
    }
  });

  it("puts the next line lower down", () => {
    for (const side of ["over", "under"] as const) {
      const [first, second] = laid({ words: "I\nI", align: "centre", along: arc(side), lineSpacing: 60 }).letters;
      expect((second?.laid.y ?? 0) - (first?.laid.y ?? 0)).toBeCloseTo(60, 2);
    }
  });

  it("refuses words that would go round more than once, and says how far", () => {
    expect(lay({ words: "HHHHHHHHHHHH", along: arc("over", 40) })).toEqual({
      ok: false,
      problem: expect.stringMatching(
        /^The words would go \d{3}° round, more than once\. Take a larger radius, smaller letters or less space between them\.$/,
      ),
    });
    const turned = Number(/(\d+)°/.exec(JSON.stringify(lay({ words: "HHHHHHHHHHHH", along: arc("over", 40) })))?.[1]);
    const { box } = laid({ words: "HHHHHHHHHHHH" });
    expect(turned).toBe(Math.round((((box?.width ?? 0) / 40) * 180) / Math.PI));
    expect(turned).toBeGreaterThan(360);
  });

  it("refuses a line whose radius has run out", () => {
    expect(lay({ words: "I\nI", along: arc("over", 60), lineSpacing: 60 })).toEqual({
      ok: false,
      problem: "Line 2 would stand on no radius at all. Take a larger radius, fewer lines or less space between them.",
    });
  });
});

describe("touching letters", () => {
  it("are told by their places", () => {
    expect(laid({ words: "HH" }).touching).toEqual([]);
    expect(laid({ words: "H HV", letterSpacing: -10 }).touching).toEqual([[2, 3]]);
  });

  it("are those of a script", () => {
    expect(laid({ words: "fish" }, "lobster-400").touching).toEqual([
      [0, 1],
      [1, 2],
      [2, 3],
    ]);
  });

  it("are found across lines", () => {
    expect(laid({ words: "g\nH", lineSpacing: 42 }).touching).toEqual([[0, 2]]);
  });
});

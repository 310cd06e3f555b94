import { describe, expect, it } from "vitest";
import { ArtworkBudget } from "#shared/artwork/budget.ts";
import { dashLine } from "#shared/artwork/dashes.ts";
import { readEntities } from "#shared/artwork/entities.ts";
import { staysInside, withoutOutsideUrls } from "#shared/artwork/outside-references.ts";
import { averageOfStops } from "#shared/artwork/paint.ts";
import { artworkRefusal, refusalCodes } from "#shared/artwork/refusals.ts";
import { maskLuminance, rgbaFromHex, rgbaOver, rgbaToHex, white } from "#shared/artwork/rgba.ts";
import { simplifyRing } from "#shared/artwork/simplify-ring.ts";
import { artworkWarnings, warningCodes } from "#shared/artwork/warnings.ts";

const line = (...list: [number, number][]) => list.map(([x, y]) => ({ x, y }));

describe("dashes", () => {
  const dash = (pattern: number[], offset = 0, closed = false) =>
    dashLine(line([0, 0], [10, 0], [10, 10]), { closed, pattern, offset, budget: new ArtworkBudget() });

  it("alternate drawn and skipped lengths around corners", () => {
    expect(dash([8, 4])).toEqual([line([0, 0], [8, 0]), line([10, 2], [10, 10])]);
  });

  it("start inside the pattern by the offset, also a negative one", () => {
    expect(dash([8, 4], 3)?.[0]).toEqual(line([0, 0], [5, 0]));
    expect(dash([8, 4], -1)?.[0]).toEqual(line([1, 0], [9, 0]));
    expect(dash([8, 4], 8)?.[0]).toEqual(line([4, 0], [10, 0], [10, 2]));
  });

  it("an odd pattern is run through twice", () => {
    expect(dash([5])).toEqual([line([0, 0], [5, 0]), line([10, 0], [10, 5])]);
  });

  it("a dash without length is a dot along the line", () => {
    const dots = dash([0, 6]);
    expect(dots?.map(([at]) => at)).toEqual(line([0, 0], [6, 0], [10, 2], [10, 8]));
    expect(dots?.every(([a, b]) => a && b && a.x + a.y < b.x + b.y)).toBe(true);
  });

  it("a closed line is dashed back to its start", () => {
    expect(dash([100, 1], 0, true)?.[0]?.at(-1)).toEqual({ x: 0, y: 0 });
  });

  it.each([[[]], [[0, 0]], [[-1, 4]]])("%j leaves the line whole", (pattern) => {
    expect(dash(pattern)).toBeNull();
  });

  it("too many are refused before they are cut", () => {
    expect(() => dash([1e-9])).toThrow("20,000 dashes");
  });
});

describe("entities of a DOCTYPE", () => {
  it("short texts are read", () => {
    expect(readEntities(` svg [ <!ENTITY a "one"> <!ENTITY b-2 'two "2"'> ]`)).toEqual({ a: "one", "b-2": 'two "2"' });
    expect(
      readEntities(` svg PUBLIC "-//W3C//DTD SVG 1.1//EN" "http://www.w3.org/Graphics/SVG/1.1/DTD/svg11.dtd"`),
    ).toEqual({});
  });

  it.each([
    `<!ENTITY a "&b;">`,
    `<!ENTITY a "<rect/>">`,
    `<!ENTITY a SYSTEM "file:///etc/passwd">`,
    `<!ENTITY % a "text">`,
    `<!ENTITY a "${"x".repeat(201)}">`,
    Array.from({ length: 51 }, (_, i) => `<!ENTITY a${i} "x">`).join(""),
  ])("%s is refused", (doctype) => {
    expect(readEntities(doctype)).toBeNull();
  });
});

describe("references", () => {
  it.each([
    ["#shape", true],
    ["data:image/png;base64,AAAA", true],
    ["data:image/svg+xml,<svg/>", false],
    ["other.svg#shape", false],
    ["file:///etc/passwd", false],
    ["https://shapes.example/a.svg", false],
    ["javascript:alert(1)", false],
  ])("%s stays inside: %s", (href, inside) => {
    expect(staysInside(href)).toBe(inside);
  });

  it("imports and outside urls leave the CSS, inside ones stay", () => {
    expect(withoutOutsideUrls(`@import "a.css"; a { fill: url(#g); mask: url('b.svg#m') }`)).toEqual({
      text: " a { fill: url(#g); mask: none }",
      found: true,
    });
    expect(withoutOutsideUrls("@font-face { src: url(data:font/woff2;base64,AAAA) }")).toEqual({
      text: "@font-face { src: none }",
      found: false,
    });
    expect(withoutOutsideUrls("fill:url( '#g' )")).toEqual({ text: "fill:url( '#g' )", found: false });
  });
});

describe("colours", () => {
  it("half blue over red is purple, over white pale blue", () => {
    const blue = { r: 0, g: 0, b: 255, a: 0.5 };
    expect(rgbaToHex(rgbaOver(blue, { r: 255, g: 0, b: 0, a: 1 }))).toBe("#800080");
    expect(rgbaToHex(rgbaOver(blue, white))).toBe("#8080FF");
  });

  it("only six digits are a colour", () => {
    expect(rgbaFromHex("#12aBcD")).toEqual({ r: 18, g: 171, b: 205, a: 1 });
    expect(rgbaFromHex("red")).toBeNull();
    expect(rgbaFromHex("#fff")).toBeNull();
  });

  it("white lets all through a mask, green more than blue", () => {
    expect(maskLuminance(white)).toBeCloseTo(1, 12);
    expect(maskLuminance({ r: 0, g: 255, b: 0, a: 1 })).toBeCloseTo(0.7154, 12);
  });

  it("a gradient's average weighs each stretch and what it covers", () => {
    const stop = (at: number, hex: string, a = 1) => ({ at, colour: rgbaFromHex(hex, a) ?? white });
    const average = (...stops: ReturnType<typeof stop>[]) => {
      const colour = averageOfStops(stops);
      return colour && [rgbaToHex(colour), colour.a];
    };
    expect(average(stop(0, "#000000"), stop(1, "#ffffff"))).toEqual(["#808080", 1]);
    // Black to 0.5, then white at once: half and half. To 0.8 grey on average over the first part.
    expect(average(stop(0.5, "#000000"), stop(0.5, "#ffffff"))).toEqual(["#808080", 1]);
    expect(average(stop(0, "#ff0000", 0), stop(1, "#0000ff", 1))).toEqual(["#0000FF", 0.5]);
    expect(average()).toBeNull();
  });
});

describe("simplifying a ring", () => {
  it("drops points on straight edges and keeps corners", () => {
    const ring = line([0, 0], [5, 0.001], [10, 0], [10, 10], [5, 10], [0, 10], [0, 5]);
    expect(simplifyRing(ring, 0.002)).toEqual(line([0, 0], [10, 0], [10, 10], [0, 10]));
  });

  it("keeps what strays farther, and never less than a triangle", () => {
    const ring = line([0, 0], [5, 0.01], [10, 0], [10, 10]);
    expect(simplifyRing(ring, 0.002)).toEqual(ring);
    const sliver = line([0, 0], [5, 0.001], [10, 0], [5, -0.001]);
    expect(simplifyRing(sliver, 0.01)).toEqual(sliver);
  });
});

describe("what people read", () => {
  it("each refusal and warning is a sentence, and no two are the same", () => {
    const texts = [
      ...refusalCodes.map((code) => artworkRefusal(code).text),
      ...artworkWarnings(new Set(warningCodes)).map(({ text }) => text),
    ];
    for (const text of texts) expect(text).toMatch(/^[A-Z].*\.$/);
    expect(new Set(texts).size).toBe(texts.length);
  });
});

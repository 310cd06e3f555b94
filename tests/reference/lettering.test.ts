import { readFileSync } from "node:fs";
import { initWasm, Resvg } from "@resvg/resvg-wasm";
import createClipper from "clipper2-wasm";
import { beforeAll, describe, expect, it } from "vitest";
import { unpackWoff } from "#server/artwork/unpack-woff.ts";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import { boxOfPath, boxOfRegion } from "#shared/geometry/box.ts";
import { clipperKernel } from "#shared/geometry/clipper-kernel.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Region } from "#shared/geometry/path.ts";
import { pathFromText } from "#shared/geometry/path-text.ts";
import { placePath } from "#shared/geometry/placement.ts";
import { pathTransform, translateMatrix } from "#shared/geometry/transform.ts";
import { faces } from "#shared/lettering/faces.ts";
import { type LaidWords, layWords, type Setting } from "#shared/lettering/lay-words.ts";
import { checkReference } from "../support/check-reference.ts";
import { fontKerning } from "../support/font-kerning.ts";
import { fileOfFace, fontOfFace, openFaceOf } from "../support/open-faces.ts";

let kernel: Kernel;

beforeAll(async () => {
  kernel = clipperKernel(await createClipper());
  await initWasm(readFileSync(new URL("../../node_modules/@resvg/resvg-wasm/index_bg.wasm", import.meta.url)));
});

const plain: Setting = {
  words: "H",
  capHeight: 50,
  letterSpacing: 0,
  kerning: true,
  lineSpacing: 80,
  align: "left",
  along: { kind: "line" },
};

function laid(key: string, setting: Partial<Setting>): LaidWords {
  const outcome = layWords({ ...plain, ...setting }, openFaceOf(key), kernel);
  if (!outcome.ok) throw new Error(outcome.problem);
  return outcome.laid;
}

const regionOf = ({ letters }: LaidWords): Region =>
  kernel.union(
    letters.flatMap(({ path, laid: at }) => flattenPath(placePath(path, { ...at, scale: 1, mirrored: false }), 0.005)),
    "nonzero",
  );

describe("outlines", () => {
  // Source: resvg's own text layout and outlines (rustybuzz, ttf-parser) of the same font file, which share no code with fontkit.
  it.each(faces.map(({ key, family, cssWeight }) => ({ key, family, cssWeight })))(
    "of $key are those that resvg draws of the same words",
    ({ key, family, cssWeight }) => {
      const words = "AVON & Bärgüé 2469";
      const capHeight = 50;
      const font = fontOfFace(key);
      const sizePx = (capHeight * font.unitsPerEm) / openFaceOf(key).capHeight;
      const svg = `<svg xmlns="http://www.w3.org/2000/svg" width="2000" height="300"><text x="20" y="150" font-family="${family}" font-weight="${cssWeight}" font-size="${sizePx}">${words.replace("&", "&amp;")}</text></svg>`;
      const drawing = new Resvg(svg, {
        font: { fontBuffers: [new Uint8Array(unpackWoff(fileOfFace(key)))], defaultFontFamily: family },
      }).toString();
      const theirs = kernel.union(
        [...drawing.matchAll(/ d="([^"]+)"/g)].flatMap(([, text]) =>
          flattenPath(pathFromText(text ?? "") ?? [], 0.005),
        ),
        "nonzero",
      );
      const box = boxOfRegion(theirs);
      if (!box) throw new Error("resvg drew nothing.");
      const ours = kernel.union(
        regionOf(laid(key, { words, capHeight })).map((ring) => ring.map(({ x, y }) => ({ x: x + box.x, y: y + 150 }))),
        "nonzero",
      );
      const shared = regionAreaMm2(kernel.intersect(theirs, ours));
      const joined = regionAreaMm2(kernel.union([...theirs, ...ours], "nonzero"));
      checkReference({
        what: `shared over joined area, ${key}`,
        source: "resvg's text of the same font",
        expected: 1,
        got: shared / joined,
        within: 0.001,
      });
    },
  );
});

describe("cap height", () => {
  // Source: the OpenType specification, OS/2 sCapHeight: "the distance between the baseline and the approximate height of
  // uppercase letters", as the shipped files state it. Josefin Sans states 702 where its H is 728 high, so the outline counts.
  it.each(faces.map(({ key }) => ({ key })))("of $key is the height of its H over the line", ({ key }) => {
    const [h] = laid(key, { words: "H", capHeight: 50 }).letters;
    const box = h && boxOfPath(pathTransform(h.path, translateMatrix(h.laid.x, h.laid.y)));
    checkReference({
      what: `top of H at 50 mm, ${key}`,
      source: "calculated",
      expected: -50,
      got: box?.y ?? 0,
      within: 0.001,
    });
    const font = fontOfFace(key);
    checkReference({
      what: `OS/2 cap height over H, ${key}`,
      source: "the font's OS/2 table",
      expected: 1,
      got: font.capHeight / openFaceOf(key).capHeight,
      within: key.startsWith("josefin") ? 0.04 : 0.003,
    });
  });
});

describe("kerning", () => {
  // Source: the shipped file's own GPOS or kern table for A before V, read byte by byte after the OpenType specification.
  it.each(faces.map(({ key }) => ({ key })))(
    "draws A and V of $key together as the font's own table says",
    ({ key }) => {
      const gap = (kerning: boolean): number => {
        const [a, v] = laid(key, { words: "AV", kerning }).letters;
        return (v?.laid.x ?? 0) - (a?.laid.x ?? 0);
      };
      const font = fontOfFace(key);
      const [a, v] = ["A", "V"].map((letter) => font.glyphForCodePoint(letter.charCodeAt(0)).id);
      const units = fontKerning(unpackWoff(fileOfFace(key)), a ?? 0, v ?? 0);
      checkReference({
        what: `A to V, kerned less plain, mm at 50 mm caps, ${key}`,
        source: "the font's kerning table",
        expected: (units * 50) / openFaceOf(key).capHeight,
        got: gap(true) - gap(false),
        within: 0.001,
      });
      // Lobster alone leaves the two as they are.
      expect(units === 0).toBe(key === "lobster-400");
    },
  );
});

describe("an arc", () => {
  // By hand: letters of equal width stand at equal angles; feet s apart along a radius R are 2 R sin(s / 2R) apart straight.
  it.each([
    { side: "over" as const, radius: 120 },
    { side: "under" as const, radius: 120 },
    { side: "over" as const, radius: 300 },
  ])("$side $radius mm sets feet a chord apart", ({ side, radius }) => {
    const key = "montserrat-600";
    const apart = (fontOfFace(key).glyphForCodePoint(72).advanceWidth * 50) / 700 + 4;
    const { letters } = laid(key, {
      words: "HH",
      letterSpacing: 4,
      align: "centre",
      along: { kind: "arc", radius, side },
    });
    const feet = letters.map(({ laid: { x, y, turn } }) => {
      const radians = (turn * Math.PI) / 180;
      // The middle of H's box stands half the cap height over its foot.
      return { x: x - 25 * Math.sin(radians), y: y + 25 * Math.cos(radians) };
    });
    const [a, b] = feet;
    checkReference({
      what: `chord between feet, ${side} ${radius} mm`,
      source: "calculated",
      expected: 2 * radius * Math.sin(apart / (2 * radius)),
      got: Math.hypot((b?.x ?? 0) - (a?.x ?? 0), (b?.y ?? 0) - (a?.y ?? 0)),
      // Turns are kept to a hundredth of a degree, which takes either foot 25 mm × 0.005° from its place.
      within: 0.0045,
    });
    expect(letters.map(({ laid: { turn } }) => Math.sign(turn))).toEqual(side === "over" ? [-1, 1] : [1, -1]);
  });
});

import { PNG } from "pngjs";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { stripsOfSlats } from "#shared/drawing/slat-face.ts";
import { type GrainStrip, stripGrain } from "#shared/drawing/strip-grain.ts";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { SlatLayout } from "#shared/slats/slat-layout.ts";
import { faceStock, slatsOf } from "#shared/stack/backer.ts";
import {
  grainOffAxis,
  type Lightness,
  lightnessOfPicture,
  meanLightness,
  patchCorrelation,
} from "../../../support/grain-measures.ts";
import { slatSign, walnut } from "../../../support/slat-signs.ts";

/** What the eye asks of a face of slats, measured on its pixels. Limits: our choice. */
const mostOffDegrees = 5;
const mostAlike = 0.3;
const leastToneStep = 1;

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

type Face = { readonly layout: SlatLayout; readonly strips: readonly GrainStrip[]; readonly lightness: Lightness };

function faceOf(document: MockupDocument): Face {
  const layout = slatsOf(document, kernel);
  if (!layout?.ok) throw new Error("The slats can't be laid.");
  const { colour, name } = faceStock(document.backer);
  const strips = stripsOfSlats(layout.value, name);
  const { width, height } = document.board;
  const image = stripGrain({ x: 0, y: 0, width, height }, strips, colour);
  const png = PNG.sync.read(Buffer.from(image.pngBase64, "base64"));
  return { layout: layout.value, strips, lightness: lightnessOfPicture(png, image.box) };
}

/** Pairs of slats that lie side by side. */
function neighboursOf({ layout, strips }: Face): [GrainStrip, GrainStrip][] {
  return layout.slats.flatMap((one, index) =>
    layout.slats.flatMap((other, place): [GrainStrip, GrainStrip][] => {
      const [a, b] = [strips[index], strips[place]];
      return a && b && one.side === other.side && other.strip === one.strip + 1 ? [[a, b]] : [];
    }),
  );
}

const signs = [
  { name: "pine on a spine at 45°", least: 20, document: () => slatSign() },
  { name: "narrow pine at 30°", least: 30, document: () => slatSign({ angle: 30, slatWidth: 25 }) },
  {
    name: "walnut, mitred at 60°",
    least: 20,
    document: () => slatSign({ stock: walnut, angle: 60, pattern: "mitred" }),
  },
  { name: "round pine with gaps", least: 18, document: () => slatSign({ gap: 4 }, round()) },
];
const round = (): Partial<MockupDocument> => ({ board: { ...slatSign().board, outline: { kind: "ellipse" } } });

describe.each(signs)("the grain of $name", ({ least, document }) => {
  let face: Face;
  beforeAll(() => {
    face = faceOf(document());
  }, 60_000);

  it("runs along each slat's own axis", () => {
    // Of a corner smaller than 6 cm² nothing can be measured.
    const measured = face.strips.filter(({ region }) => regionAreaMm2(region) > 600);
    expect(measured.length).toBeGreaterThanOrEqual(least);
    for (const strip of measured) expect(grainOffAxis(face.lightness, strip)).toBeLessThan(mostOffDegrees);
  });

  it("is another stretch on each slat than on its neighbour", () => {
    const alike = neighboursOf(face)
      .map(([one, other]) => patchCorrelation(face.lightness, one, other, face.layout.design.slatWidth))
      .filter((correlation) => correlation !== null);
    expect(alike.length).toBeGreaterThanOrEqual(least / 2);
    for (const correlation of alike) expect(correlation).toBeLessThan(mostAlike);
  });

  it("is of a tone that differs from the neighbour's, for more than 9 pairs in 10", () => {
    const steps = neighboursOf(face).map(([one, other]) =>
      Math.abs(meanLightness(face.lightness, one) - meanLightness(face.lightness, other)),
    );
    const told = steps.filter((step) => step >= leastToneStep);
    expect(told.length / steps.length).toBeGreaterThan(0.9);
  });
});

describe("what measures grain", () => {
  it("sees grain that runs across, slats of one stretch, and slats of one tone", () => {
    const face = faceOf(slatSign());
    const [one, other] = neighboursOf(face)[6] ?? [];
    if (!one || !other) throw new Error("The sign has too few slats.");
    const { from, to } = one.axis;
    const across = { from, to: { x: from.x - (to.y - from.y), y: from.y + (to.x - from.x) } };
    expect(grainOffAxis(face.lightness, { ...one, axis: across })).toBeGreaterThan(80);
    const twins = [one, { ...other, tone: one.tone, seed: one.seed }] as const;
    const image = stripGrain({ x: 0, y: 0, width: 600, height: 400 }, twins, "#E6CFA4");
    const picture = lightnessOfPicture(PNG.sync.read(Buffer.from(image.pngBase64, "base64")), image.box);
    expect(patchCorrelation(picture, ...twins, 38)).toBeGreaterThan(0.8);
    expect(Math.abs(meanLightness(picture, one) - meanLightness(picture, other))).toBeLessThan(leastToneStep);
  });
});

describe("a face of slats", () => {
  it("has the same bytes for the same slats", () => {
    const layout = slatsOf(slatSign(), kernel);
    if (!layout?.ok) throw new Error("The slats can't be laid.");
    const made = () =>
      stripGrain({ x: 0, y: 0, width: 600, height: 400 }, stripsOfSlats(layout.value, "Pine"), "#E6CFA4");
    expect(made()).toEqual(made());
  });

  it("stays small with 2,000 slats on the largest board", () => {
    const { board } = slatSign();
    // 10 m of slats laid level, 10 mm and a gap of 0.1 each: 990 a side.
    const document = slatSign(
      { angle: 90, slatWidth: 10, gap: 0.1, spineWidth: 50 },
      { board: { ...board, width: 10_000, height: 9_990 } },
    );
    const layout = slatsOf(document, kernel);
    if (!layout?.ok) throw new Error("The slats can't be laid.");
    const strips = stripsOfSlats(layout.value, "Pine");
    expect(strips.length).toBeGreaterThan(1950);
    const image = stripGrain({ x: 0, y: 0, width: 10_000, height: 9_990 }, strips, "#E6CFA4");
    const png = PNG.sync.read(Buffer.from(image.pngBase64, "base64"));
    expect(png.width * png.height).toBeLessThan(610_000);
  });
});

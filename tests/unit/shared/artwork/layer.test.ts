import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { clipLayer, fadeLayer, type Layer, paintLayers, patchLayer } from "#shared/artwork/layer.ts";
import { type Rgba, rgbaFromHex } from "#shared/artwork/rgba.ts";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Region } from "#shared/geometry/path.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const square = (x: number, y: number, side: number): Region => [
  [
    { x, y },
    { x: x + side, y },
    { x: x + side, y: y + side },
    { x, y: y + side },
  ],
];
const colour = (hex: string, a = 1): Rgba => rgbaFromHex(hex, a) ?? { r: 0, g: 0, b: 0, a: 1 };
const red = colour("#ff0000");
const blue = colour("#0000ff");
const shown = (layer: Layer) => Object.fromEntries(layer.map(({ key, region }) => [key, regionAreaMm2(region)]));

describe("what shows of shapes painted over each other", () => {
  it("the upper hides the lower", () => {
    const layers = [patchLayer(red, square(0, 0, 10)), patchLayer(blue, square(5, 5, 10))];
    expect(shown(paintLayers(kernel, layers))).toEqual({ "#FF0000": 75, "#0000FF": 100 });
    expect(shown(paintLayers(kernel, layers.toReversed()))).toEqual({ "#FF0000": 100, "#0000FF": 75 });
  });

  it("what is wholly hidden is gone", () => {
    const layers = [patchLayer(red, square(2, 2, 3)), patchLayer(blue, square(0, 0, 10))];
    expect(shown(paintLayers(kernel, layers))).toEqual({ "#0000FF": 100 });
  });

  it("one colour over itself is one patch without a seam", () => {
    const layers = [
      patchLayer(red, square(0, 0, 10)),
      patchLayer(blue, square(20, 0, 5)),
      patchLayer(red, square(10, 0, 10)),
    ];
    const painted = paintLayers(kernel, layers);
    expect(shown(painted)).toEqual({ "#FF0000": 200, "#0000FF": 25 });
    expect(painted.find(({ key }) => key === "#FF0000")?.region).toHaveLength(1);
  });

  it("a translucent colour mixes with what it lies on and stays itself beside it", () => {
    const layers = [patchLayer(red, square(0, 0, 10)), patchLayer(colour("#0000ff", 0.5), square(5, 0, 10))];
    expect(shown(paintLayers(kernel, layers))).toEqual({ "#FF0000": 50, "#800080": 50, "#0000FF/128": 50 });
  });

  it("two translucent colours mix where they meet", () => {
    const half = (hex: string) => colour(hex, 0.5);
    const layers = [patchLayer(half("#ff0000"), square(0, 0, 10)), patchLayer(half("#0000ff"), square(0, 0, 10))];
    // Covering 3/4, two thirds of it blue.
    expect(shown(paintLayers(kernel, layers))).toEqual({ "#5500AA/191": 100 });
  });

  it("the order of painting is kept over many shapes", () => {
    const layers = Array.from({ length: 9 }, (_, i) => patchLayer(colour(`#00000${i}`), square(i, 0, 10)));
    const areas = Object.fromEntries(Array.from({ length: 9 }, (_, i) => [`#00000${i}`, i < 8 ? 10 : 100]));
    expect(shown(paintLayers(kernel, layers))).toEqual(areas);
  });

  it("a frame keeps its hole, through which the lower shows", () => {
    const frame = kernel.union([...square(0, 0, 20), ...square(5, 5, 10)], "evenodd");
    const layers = [patchLayer(red, square(0, 0, 20)), patchLayer(blue, frame)];
    expect(shown(paintLayers(kernel, layers))).toEqual({ "#FF0000": 100, "#0000FF": 300 });
  });

  it("clips and fades", () => {
    const layer = patchLayer(red, square(0, 0, 10));
    expect(shown(clipLayer(kernel, layer, square(5, 5, 10)))).toEqual({ "#FF0000": 25 });
    expect(clipLayer(kernel, layer, [])).toEqual([]);
    expect(shown(fadeLayer(layer, 0.25))).toEqual({ "#FF0000/64": 100 });
    expect(fadeLayer(layer, 0)).toEqual([]);
    expect(paintLayers(kernel, [])).toEqual([]);
  });
});

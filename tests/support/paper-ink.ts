import { readFile } from "node:fs/promises";
import { createRequire } from "node:module";
import { initWasm, Resvg } from "@resvg/resvg-wasm";
import { PNG } from "pngjs";

/** Channels that differ by less are the same colour: renderers smooth edges in steps of their own. */
const sameColour = 64;

let ready: Promise<void> | undefined;

/** An SVG text as pixels on white paper. */
export async function svgAsPng(svg: string, width: number): Promise<Buffer> {
  ready ??= readFile(createRequire(import.meta.url).resolve("@resvg/resvg-wasm/index_bg.wasm")).then((wasm) =>
    initWasm(wasm),
  );
  await ready;
  const reader = new Resvg(svg, { background: "white", fitTo: { mode: "width", value: width } });
  const picture = reader.render();
  const png = Buffer.from(picture.asPng());
  picture.free();
  reader.free();
  return png;
}

/**
 * How well two pictures on white paper agree: of the pixels that either paints, the share that both paint in the same
 * colour. −1 when they are not of one size, to a pixel.
 */
export function paperInkAgreement(first: Buffer, second: Buffer): number {
  const [a, b] = [PNG.sync.read(first), PNG.sync.read(second)];
  if (Math.abs(a.width - b.width) > 1 || Math.abs(a.height - b.height) > 1) return -1;
  let ink = 0;
  let agreed = 0;
  for (let y = 0; y < Math.min(a.height, b.height); y++)
    for (let x = 0; x < Math.min(a.width, b.width); x++) {
      const pixels = [a.data.subarray((y * a.width + x) * 4), b.data.subarray((y * b.width + x) * 4)] as const;
      const isInk = (pixel: Buffer) => [0, 1, 2].some((channel) => (pixel[channel] ?? 255) < 255 - sameColour);
      if (!isInk(pixels[0]) && !isInk(pixels[1])) continue;
      ink += 1;
      if ([0, 1, 2].every((channel) => Math.abs((pixels[0][channel] ?? 0) - (pixels[1][channel] ?? 0)) <= sameColour))
        agreed += 1;
    }
  return ink === 0 ? 1 : agreed / ink;
}

import type { Picture } from "./picture.ts";

/** Channels of a pixel and its eight neighbours may differ by this much and still be one colour. */
const flatSpread = 14;

/** 1 for every pixel that looks like its neighbours (all of the 3 × 3 that lie in the picture), 0 for those at an edge. */
export function flatPixels({ width, height, data }: Picture): Uint8Array {
  const pixels = width * height;
  const flat = new Uint8Array(pixels).fill(1);
  const lowRow = new Uint8Array(pixels);
  const highRow = new Uint8Array(pixels);
  for (let channel = 0; channel < 4; channel++) {
    const valueAt = (pixel: number): number => {
      const alpha = data[pixel * 4 + 3] ?? 0;
      return channel === 3 ? alpha : Math.round(((data[pixel * 4 + channel] ?? 0) * alpha) / 255);
    };
    for (let pixel = 0; pixel < pixels; pixel++) {
      const x = pixel % width;
      const here = valueAt(pixel);
      const left = x > 0 ? valueAt(pixel - 1) : here;
      const right = x < width - 1 ? valueAt(pixel + 1) : here;
      lowRow[pixel] = Math.min(left, here, right);
      highRow[pixel] = Math.max(left, here, right);
    }
    for (let pixel = 0; pixel < pixels; pixel++) {
      const above = pixel >= width ? pixel - width : pixel;
      const below = pixel + width < pixels ? pixel + width : pixel;
      const low = Math.min(lowRow[above] ?? 0, lowRow[pixel] ?? 0, lowRow[below] ?? 0);
      const high = Math.max(highRow[above] ?? 0, highRow[pixel] ?? 0, highRow[below] ?? 0);
      if (high - low > flatSpread) flat[pixel] = 0;
    }
  }
  return flat;
}

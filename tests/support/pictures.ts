import { crc32, deflateSync } from "node:zlib";
import { Jimp } from "jimp";
import type { Picture } from "#shared/tracing/picture.ts";

/** A colour as #RRGGBB or #RRGGBBAA. */
type Paint = (x: number, y: number) => string;

/** A picture whose pixels are the mean of `samples`² points of a drawing: smooth edges, as programs draw them. */
export function paintedPicture(width: number, height: number, paint: Paint, samples = 4): Picture {
  const data = new Uint8Array(width * height * 4);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      const sums = [0, 0, 0, 0];
      for (let sample = 0; sample < samples * samples; sample++) {
        const [red = 0, green = 0, blue = 0, alpha = 255] = Buffer.from(
          paint(x + ((sample % samples) + 0.5) / samples, y + (Math.floor(sample / samples) + 0.5) / samples).slice(1),
          "hex",
        );
        for (const [channel, value] of [red * alpha, green * alpha, blue * alpha, alpha].entries())
          sums[channel] = (sums[channel] ?? 0) + value;
      }
      const alpha = sums[3] ?? 0;
      const at = (y * width + x) * 4;
      for (let channel = 0; channel < 3; channel++)
        data[at + channel] = alpha ? Math.round((sums[channel] ?? 0) / alpha) : 0;
      data[at + 3] = Math.round(alpha / samples ** 2);
    }
  }
  return { width, height, data };
}

/** The picture as a JPEG file of the given quality, 0 to 100. */
export async function jpegOf({ width, height, data }: Picture, quality = 80): Promise<Uint8Array<ArrayBuffer>> {
  const image = Jimp.fromBitmap({ width, height, data: Buffer.from(data) });
  return Uint8Array.from(await image.getBuffer("image/jpeg", { quality }));
}

/** Eight bits of red, green, blue and opacity. */
export const pngOf = ({ width, height, data }: Picture, extra: readonly Uint8Array[] = []): Uint8Array<ArrayBuffer> =>
  rawPng({ width, height, depth: 8, colourType: 6, bytesPerPixel: 4, extra, rows: Uint8Array.from(data) });

/** A PNG file of the given kind (PNG, Third Edition, sections 5 and 11), its rows unfiltered, `extra` chunks before the pixels. */
export function rawPng(file: {
  width: number;
  height: number;
  depth: number;
  colourType: number;
  bytesPerPixel: number;
  extra?: readonly Uint8Array[];
  rows: Uint8Array;
}): Uint8Array<ArrayBuffer> {
  const { width, height, depth, colourType, bytesPerPixel, extra = [], rows } = file;
  const head = Buffer.alloc(13);
  head.writeUInt32BE(width, 0);
  head.writeUInt32BE(height, 4);
  head.set([depth, colourType, 0, 0, 0], 8);
  const line = width * bytesPerPixel;
  const lines = Array.from({ length: Math.ceil(rows.length / line) }, (_, y) =>
    Buffer.concat([Buffer.of(0), rows.subarray(y * line, (y + 1) * line)]),
  );
  const signature = Uint8Array.of(0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a);
  const pixels = pngChunk("IDAT", deflateSync(Buffer.concat(lines)));
  return Uint8Array.from(
    Buffer.concat([signature, pngChunk("IHDR", head), ...extra, pixels, pngChunk("IEND", new Uint8Array())]),
  );
}

export function pngChunk(name: string, content: Uint8Array): Uint8Array {
  const chunk = Buffer.alloc(12 + content.length);
  chunk.writeUInt32BE(content.length, 0);
  chunk.write(name, 4, "latin1");
  chunk.set(content, 8);
  chunk.writeUInt32BE(crc32(chunk.subarray(4, 8 + content.length)), 8 + content.length);
  return chunk;
}

/** A pHYs chunk: pixels in a metre. */
export function pngDensity(perMetre: number): Uint8Array {
  const content = Buffer.alloc(9);
  content.writeUInt32BE(perMetre, 0);
  content.writeUInt32BE(perMetre, 4);
  content[8] = 1;
  return pngChunk("pHYs", content);
}

import { zlibSync } from "fflate";
import type { Colour } from "./display-list.ts";
import { colourChannels } from "./palette.ts";

/** One byte a pixel, row by row from the upper left. */
export type Plane = { readonly width: number; readonly height: number; readonly pixels: Uint8Array };

const crcTable = Uint32Array.from({ length: 256 }, (_, byte) => {
  let value = byte;
  for (let bit = 0; bit < 8; bit += 1) value = value & 1 ? 0xedb88320 ^ (value >>> 1) : value >>> 1;
  return value >>> 0;
});

function crc32(bytes: Uint8Array): number {
  let crc = 0xffffffff;
  for (const byte of bytes) crc = (crcTable[(crc ^ byte) & 255] ?? 0) ^ (crc >>> 8);
  return (crc ^ 0xffffffff) >>> 0;
}

function chunk(type: string, data: Uint8Array): Uint8Array {
  const bytes = new Uint8Array(12 + data.length);
  const view = new DataView(bytes.buffer);
  view.setUint32(0, data.length);
  for (let index = 0; index < 4; index += 1) bytes[4 + index] = type.charCodeAt(index);
  bytes.set(data, 8);
  view.setUint32(8 + data.length, crc32(bytes.subarray(4, 8 + data.length)));
  return bytes;
}

/** Each row after the "up" filter (type 2): smooth masks shrink to a third of what unfiltered rows take. */
function filteredRows({ width, height, pixels }: Plane): Uint8Array {
  const rows = new Uint8Array(height * (width + 1));
  for (let y = 0; y < height; y += 1) {
    const at = y * (width + 1);
    rows[at] = 2;
    for (let x = 0; x < width; x += 1) {
      const above = y === 0 ? 0 : (pixels[(y - 1) * width + x] ?? 0);
      rows[at + 1 + x] = ((pixels[y * width + x] ?? 0) - above) & 255;
    }
  }
  return rows;
}

function indexedPng(plane: Plane, palette: Uint8Array, alphas: Uint8Array | null): Uint8Array {
  if (plane.width < 1 || plane.height < 1 || plane.pixels.length !== plane.width * plane.height) {
    throw new Error(`A PNG of ${plane.width} by ${plane.height} can't hold ${plane.pixels.length} pixels.`);
  }
  const header = new Uint8Array(13);
  const view = new DataView(header.buffer);
  view.setUint32(0, plane.width);
  view.setUint32(4, plane.height);
  header[8] = 8;
  header[9] = 3;
  const parts = [
    Uint8Array.of(137, 80, 78, 71, 13, 10, 26, 10),
    chunk("IHDR", header),
    chunk("PLTE", palette),
    ...(alphas === null ? [] : [chunk("tRNS", alphas)]),
    chunk("IDAT", zlibSync(filteredRows(plane), { level: 6 })),
    chunk("IEND", new Uint8Array(0)),
  ];
  const png = new Uint8Array(parts.reduce((sum, part) => sum + part.length, 0));
  let at = 0;
  for (const part of parts) {
    png.set(part, at);
    at += part.length;
  }
  return png;
}

/** A PNG of one colour whose opacity is the plane's value (ISO/IEC 15948: palette of 256, alpha in tRNS). Same plane, same bytes. */
export function alphaPng(plane: Plane, colour: Colour): Uint8Array {
  const channels = colourChannels(colour);
  const palette = Uint8Array.from({ length: 768 }, (_, index) => channels[index % 3] ?? 0);
  return indexedPng(
    plane,
    palette,
    Uint8Array.from({ length: 256 }, (_, index) => index),
  );
}

/** A PNG whose pixels are positions in a list of 1 to 256 opaque colours. Same plane, same bytes. */
export function palettePng(plane: Plane, colours: readonly Colour[]): Uint8Array {
  if (colours.length < 1 || colours.length > 256)
    throw new Error(`A palette has 1 to 256 colours, not ${colours.length}.`);
  return indexedPng(plane, Uint8Array.from(colours.flatMap((colour) => [...colourChannels(colour)])), null);
}

import { inflateSync } from "node:zlib";

const headerName = "IHDR";
/** Samples of a pixel by colour type: grey, colours, palette, grey and colours with opacity. */
const samples: Readonly<Record<number, number>> = { 0: 1, 2: 3, 3: 1, 4: 2, 6: 4 };

/**
 * Whether a PNG can't unpack to more than the size at its beginning asks for: it has no second header, which readers would
 * believe instead of the first, and an interlaced one, which they unpack without a bound, holds no more than its pixels. PNG (Third Edition),
 * sections 5.3 (chunks), 8.2 (passes) and 11.2.1 (IHDR).
 */
export function unpacksAsTold(bytes: Uint8Array): boolean {
  const file = Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const chunks = [...chunksOf(file)];
  const [header, ...others] = chunks;
  if (header?.name !== headerName || header.data.length !== 13) return false;
  if (others.some(({ name }) => name === headerName)) return false;
  const isInterlaced = header.data[12] !== 0;
  const packed = chunks.filter(({ name }) => name === "IDAT").map(({ data }) => data);
  return !isInterlaced || unpacksWithin(Buffer.concat(packed), interlacedBytes(header.data));
}

function* chunksOf(file: Buffer): Generator<{ name: string; data: Buffer }> {
  for (let at = 8; at + 8 <= file.length; ) {
    const end = at + 8 + file.readUInt32BE(at);
    yield { name: file.toString("latin1", at + 4, at + 8), data: file.subarray(at + 8, end) };
    at = end + 4;
  }
}

/** No fewer than the seven passes take: together they have less than two lines for each of the picture and seven more; a line begins with a byte of its own and may end with one that is not full. */
function interlacedBytes(header: Buffer): number {
  const width = header.readUInt32BE(0);
  const height = header.readUInt32BE(4);
  const bits = (header[8] ?? 0) * (samples[header[9] ?? -1] ?? 0);
  return Math.ceil((width * height * bits) / 8) + 2 * (2 * height + 7);
}

function unpacksWithin(packed: Buffer, most: number): boolean {
  try {
    inflateSync(packed, { maxOutputLength: most });
    return true;
  } catch (error) {
    const code = error instanceof Error && "code" in error ? error.code : null;
    // What is damaged the reader refuses in its own way, having unpacked no more than was unpacked here.
    return code !== "ERR_BUFFER_TOO_LARGE";
  }
}

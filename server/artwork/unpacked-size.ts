import { inflateSync } from "node:zlib";
import { artworkLimits } from "#shared/artwork/limits.ts";

/** A stream may be packed more than once; deeper than this nobody does it but to hide its size. */
const deepest = 4;

/**
 * Whether the packed streams of a PDF together unpack to no more than the limit. Only Flate is looked at, in which a few bytes
 * can stand for a thousand times as many; the time limit bounds the others. Whether the streams are used doesn't matter.
 */
export function unpacksWithinLimit(bytes: Uint8Array, limit: number = artworkLimits.unpackedBytes): boolean {
  const file = Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  let left = limit;
  for (let at = file.indexOf("stream"); at >= 0; at = file.indexOf("stream", at + 6)) {
    if (file.toString("latin1", at - 3, at) === "end") continue;
    let packed = file.subarray(startOfData(file, at + 6));
    for (let depth = 0; isZlib(packed); depth++) {
      const plain = depth < deepest ? inflate(packed, left) : null;
      if (plain === null) return false;
      left -= plain.length;
      packed = plain;
    }
  }
  return true;
}

/** On the next line, as the reader has it, whatever else stands behind the word. */
function startOfData(file: Buffer, from: number): number {
  let at = from;
  while (at < file.length && file[at] !== 0x0a && file[at] !== 0x0d) at++;
  return file[at] === 0x0d && file[at + 1] === 0x0a ? at + 2 : at + 1;
}

/** RFC 1950, section 2.2: method 8, and the first two bytes as a number are a multiple of 31. */
function isZlib(data: Buffer): boolean {
  const [first = 0, second = 0] = data;
  return data.length > 2 && (first & 0x0f) === 8 && ((first << 8) | second) % 31 === 0;
}

/** What the data unpacks to, as far as it is sound; null when that is more than `most` bytes. */
function inflate(data: Buffer, most: number): Buffer | null {
  try {
    return inflateSync(data, { maxOutputLength: Math.max(1, most), finishFlush: 2 });
  } catch (error) {
    const code = error instanceof Error && "code" in error ? error.code : null;
    // Data that breaks off in the middle gives little more than what was counted: the reader stops there, too.
    return code === "ERR_BUFFER_TOO_LARGE" ? null : Buffer.alloc(0);
  }
}

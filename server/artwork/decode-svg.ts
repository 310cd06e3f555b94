import { gunzipSync } from "node:zlib";
import { artworkLimits } from "#shared/artwork/limits.ts";
import { ArtworkRefused } from "#shared/artwork/refusals.ts";

/**
 * The text of an SVG file: unpacked when it is compressed, read in the encoding its byte order mark, its zero bytes or
 * its XML declaration tells, UTF-8 otherwise. Throws ArtworkRefused with file.unpacking, file.too-large or file.encoding.
 */
export function decodeSvg(bytes: Uint8Array): string {
  const plain = bytes[0] === 0x1f && bytes[1] === 0x8b ? unpack(bytes) : bytes;
  if (plain.length > artworkLimits.textBytes) throw new ArtworkRefused("file.too-large");
  try {
    return new TextDecoder(encodingOf(plain), { fatal: true }).decode(plain);
  } catch (error) {
    // An unknown name is a RangeError, a byte that doesn't fit a TypeError: both mean the letters can't be read.
    if (error instanceof RangeError || error instanceof TypeError) throw new ArtworkRefused("file.encoding");
    throw error;
  }
}

function unpack(bytes: Uint8Array): Uint8Array {
  try {
    return gunzipSync(bytes, { maxOutputLength: artworkLimits.textBytes });
  } catch {
    // Damaged data and data over the limit end here alike, and the sentence names both.
    throw new ArtworkRefused("file.unpacking");
  }
}

function encodingOf(bytes: Uint8Array): string {
  const [first, second] = bytes;
  if ((first === 0xff && second === 0xfe) || (first === 0x3c && second === 0)) return "utf-16le";
  if ((first === 0xfe && second === 0xff) || (first === 0 && second === 0x3c)) return "utf-16be";
  const head = Buffer.from(bytes.subarray(0, 200)).toString("latin1");
  const named = /^(?:\u00ef\u00bb\u00bf)?\s*<\?xml[^>]*\bencoding\s*=\s*["']([\w.:-]+)["']/.exec(head)?.[1] ?? "utf-8";
  // The bytes read as they stand, so a declaration of UTF-16 on them is a leftover.
  return /^utf-?16/i.test(named) ? "utf-8" : named;
}

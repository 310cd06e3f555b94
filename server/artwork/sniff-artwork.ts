export type ArtworkKind = "svg" | "gzip" | "png" | "jpeg" | "pdf" | "empty" | "unknown";

/** What a file is by its content, whatever its name says; pictures with the size their header gives, if it can be read. */
export type SniffedArtwork = {
  readonly kind: ArtworkKind;
  readonly pixels: { readonly width: number; readonly height: number } | null;
};

/**
 * Tells a file's kind from its first bytes, and a picture's size from its header, without decoding anything.
 * "svg" means text that looks like XML with an svg element in it: whether it is one, the import finds out.
 */
export function sniffArtwork(bytes: Uint8Array): SniffedArtwork {
  const kind = kindOf(bytes);
  if (kind === "png") return { kind, pixels: pngSize(bytes) };
  if (kind === "jpeg") return { kind, pixels: jpegSize(bytes) };
  return { kind, pixels: null };
}

function kindOf(bytes: Uint8Array): ArtworkKind {
  if (bytes.length === 0) return "empty";
  if (startsWith(bytes, [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a])) return "png";
  if (startsWith(bytes, [0xff, 0xd8, 0xff])) return "jpeg";
  if (startsWith(bytes, [0x25, 0x50, 0x44, 0x46, 0x2d])) return "pdf";
  if (startsWith(bytes, [0x1f, 0x8b])) return "gzip";
  // Every second byte of UTF-16 text in a Latin script is 0, so leaving zeros out shows the letters of either encoding.
  const head = Buffer.from(bytes.subarray(0, 65_536).filter((byte) => byte !== 0)).toString("latin1");
  if (/^[^<]{0,16}</.test(head) && /<([\w-]+:)?svg[\s>/]/.test(head)) return "svg";
  // Some writers put a few bytes of their own before the header; readers look for it in the first thousand.
  return head.slice(0, 1024).includes("%PDF-") ? "pdf" : textKind(head);
}

/** XML that names no svg early on still goes to the import, whose refusal says more than "unknown". */
function textKind(head: string): ArtworkKind {
  return /^(\u00ef\u00bb\u00bf|\u00ff\u00fe|\u00fe\u00ff)?\s*<(\?xml|!DOCTYPE|!--|[A-Za-z])/.test(head)
    ? "svg"
    : "unknown";
}

/** PNG (Third Edition), section 11.2.1: the IHDR chunk comes first and begins with width and height. */
function pngSize(bytes: Uint8Array): SniffedArtwork["pixels"] {
  const view = viewOf(bytes);
  if (bytes.length < 24 || view.getUint32(12) !== 0x49484452) return null;
  return sizeOrNull(view.getUint32(16), view.getUint32(20));
}

/** ITU-T T.81, annex B: segments follow each other until the frame header, whose parameters hold lines and samples per line. */
function jpegSize(bytes: Uint8Array): SniffedArtwork["pixels"] {
  const view = viewOf(bytes);
  let at = 2;
  while (at + 9 < bytes.length) {
    if (bytes[at] !== 0xff) return null;
    const marker = bytes[at + 1] ?? 0;
    if (marker === 0xff) {
      at++;
      continue;
    }
    const isFrame = marker >= 0xc0 && marker <= 0xcf && marker !== 0xc4 && marker !== 0xc8 && marker !== 0xcc;
    if (isFrame) return sizeOrNull(view.getUint16(at + 7), view.getUint16(at + 5));
    const standsAlone = marker === 0x01 || (marker >= 0xd0 && marker <= 0xd8);
    at += standsAlone ? 2 : 2 + Math.max(2, view.getUint16(at + 2));
  }
  return null;
}

function sizeOrNull(width: number, height: number): SniffedArtwork["pixels"] {
  return width > 0 && height > 0 ? { width, height } : null;
}

function startsWith(bytes: Uint8Array, signature: readonly number[]): boolean {
  return bytes.length >= signature.length && signature.every((byte, index) => bytes[index] === byte);
}

const viewOf = (bytes: Uint8Array) => new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);

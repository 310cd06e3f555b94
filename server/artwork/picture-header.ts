import type { WarningCode } from "#shared/artwork/warnings.ts";
import type { Density } from "#shared/tracing/picture-size.ts";
import { sniffArtwork } from "./sniff-artwork.ts";

/** What a picture's file says before anything is decoded. */
export type PictureHeader = {
  readonly lossy: boolean;
  readonly width: number;
  readonly height: number;
  /** Channels of a JPEG's frame: 1 grey, 3 colour, 4 print colours; null for a PNG. */
  readonly channels: number | null;
  readonly density: Density | null;
  readonly warnings: ReadonlySet<WarningCode>;
};

/** Metres and inches in millimetres, as the two formats state densities. */
const unitsMm = { metre: 1000, inch: 25.4, centimetre: 10 };

/** The header of a PNG or JPEG; null when it can't be read. */
export function readPictureHeader(bytes: Uint8Array): PictureHeader | null {
  const { kind, pixels } = sniffArtwork(bytes);
  if (!pixels) return null;
  if (kind === "png") return { lossy: false, ...pixels, channels: null, ...pngNotes(bytes) };
  return kind === "jpeg" ? { lossy: true, ...pixels, ...jpegNotes(bytes), warnings: new Set() } : null;
}

/** PNG (Third Edition), sections 5.3 (chunks), 11.3.4.3 (pHYs) and 11.3.6.1 (acTL, which says that it is animated). */
function pngNotes(bytes: Uint8Array): Pick<PictureHeader, "density" | "warnings"> {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const warnings = new Set<WarningCode>();
  let density: Density | null = null;
  for (let at = 8; at + 12 <= bytes.length; ) {
    const length = view.getUint32(at);
    const name = String.fromCharCode(...bytes.subarray(at + 4, at + 8));
    if (name === "IDAT" || name === "IEND") break;
    if (name === "acTL") warnings.add("animation.ignored");
    if (name === "pHYs" && length === 9 && at + 17 <= bytes.length && bytes[at + 16] === 1)
      density = { x: view.getUint32(at + 8) / unitsMm.metre, y: view.getUint32(at + 12) / unitsMm.metre };
    at += 12 + length;
  }
  return { density, warnings };
}

/** ITU-T T.81, annex B.2.2 (frame header) and ITU-T T.871, section 10.1 (the JFIF segment's density). */
function jpegNotes(bytes: Uint8Array): Pick<PictureHeader, "density" | "channels"> {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  let density: Density | null = null;
  for (let at = 2; at + 18 < bytes.length; ) {
    if (bytes[at] !== 0xff) break;
    const marker = bytes[at + 1] ?? 0;
    if (marker === 0xff) {
      at++;
      continue;
    }
    if (marker >= 0xc0 && marker <= 0xcf && ![0xc4, 0xc8, 0xcc].includes(marker))
      return { density, channels: bytes[at + 9] ?? null };
    if (marker === 0xe0 && String.fromCharCode(...bytes.subarray(at + 4, at + 8)) === "JFIF") {
      const unit = bytes[at + 11];
      const mm = unit === 1 ? unitsMm.inch : unit === 2 ? unitsMm.centimetre : null;
      if (mm !== null) density = { x: view.getUint16(at + 12) / mm, y: view.getUint16(at + 14) / mm };
    }
    const standsAlone = marker === 0x01 || (marker >= 0xd0 && marker <= 0xd8);
    at += standsAlone ? 2 : 2 + Math.max(2, view.getUint16(at + 2));
  }
  return { density, channels: null };
}

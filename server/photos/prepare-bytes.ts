import { Jimp } from "jimp";
import { longestPhotoSidePx } from "#shared/mockup/wall-photo.ts";
import { sniffArtwork } from "../artwork/sniff-artwork.ts";
import { unpacksAsTold } from "../artwork/unpacks-as-told.ts";

export type PreparedBytes =
  | { readonly ok: true; readonly jpeg: Uint8Array; readonly widthPx: number; readonly heightPx: number }
  | { readonly ok: false };

/** Of what the encoder can do: beyond this the file grows and the wall does not get clearer. */
const quality = 86;
/** What decoding the largest picture that is let in takes, with room, and its pixels: the header that was looked at may not be the one that counts. */
const decoding = { maxMemoryUsageInMB: 1_500, maxResolutionInMP: 40 };

/**
 * A JPEG or PNG turned as its camera was held, made smaller where it is larger than a photo is kept, laid on white where it lets
 * light through, and written anew as a JPEG: only its pixels are taken over, nothing else that is in the file. `ok` is false for bytes that are no such picture.
 */
export async function prepareBytes(bytes: Uint8Array): Promise<PreparedBytes> {
  if (sniffArtwork(bytes).kind === "png" && !unpacksAsTold(bytes)) return { ok: false };
  const picture = await Jimp.fromBuffer(Buffer.from(bytes), { "image/jpeg": decoding }).catch(() => null);
  if (!picture) return { ok: false };
  const { width, height, data } = picture.bitmap;
  const plain = new Jimp({ width, height, data });
  layOnWhite(plain.bitmap.data);
  if (Math.max(width, height) > longestPhotoSidePx) plain.scaleToFit({ w: longestPhotoSidePx, h: longestPhotoSidePx });
  const jpeg = await plain.getBuffer("image/jpeg", { quality });
  return { ok: true, jpeg: Uint8Array.from(jpeg), widthPx: plain.bitmap.width, heightPx: plain.bitmap.height };
}

function layOnWhite(pixels: Buffer): void {
  for (let at = 0; at < pixels.length; at += 4) {
    const alpha = pixels[at + 3] ?? 255;
    if (alpha === 255) continue;
    for (let part = at; part < at + 3; part++)
      pixels[part] = Math.round(((pixels[part] ?? 0) * alpha + 255 * (255 - alpha)) / 255);
    pixels[at + 3] = 255;
  }
}

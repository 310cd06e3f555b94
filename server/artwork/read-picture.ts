import { artworkLimits } from "#shared/artwork/limits.ts";
import { ArtworkRefused } from "#shared/artwork/refusals.ts";
import type { PictureFile } from "#shared/tracing/trace-picture.ts";
import { type PictureHeader, readPictureHeader } from "./picture-header.ts";
import { unpacksAsTold } from "./unpacks-as-told.ts";

/**
 * A PNG or JPEG as pixels, turned the way its camera says. Its size is read from the header first: a small file can unpack to
 * gigabytes. Throws ArtworkRefused with the reason when it can't be taken.
 */
export async function readPicture(bytes: Uint8Array): Promise<PictureFile> {
  const header = readPictureHeader(bytes);
  if (!header) throw new ArtworkRefused("picture.unreadable");
  const { lossy, density, warnings } = header;
  refuseBySize(header);
  if (header.channels === 4) throw new ArtworkRefused("picture.print-colours");
  if (!lossy && !unpacksAsTold(bytes)) throw new ArtworkRefused("picture.unreadable");
  // Loaded by the first picture: drawings need none of it.
  const { Jimp } = await import("jimp");
  const limits = { maxResolutionInMP: artworkLimits.picturePixels / 1e6, maxMemoryUsageInMB: 1_000 };
  const read = await Jimp.fromBuffer(stillPicture(bytes, header), { "image/jpeg": limits }).catch(() => null);
  if (!read) throw new ArtworkRefused("picture.unreadable");
  const { width, height, data } = read.bitmap;
  const asTold = width * height === header.width * header.height && data.length === width * height * 4;
  if (!asTold) throw new ArtworkRefused("picture.unreadable");
  return { picture: { width, height, data }, lossy, density, warnings };
}

/** The reader takes an animated PNG for a format of its own; without the chunk that says so it is its first picture. */
function stillPicture(bytes: Uint8Array, { warnings }: PictureHeader): Buffer {
  const whole = Buffer.from(bytes);
  const at = warnings.has("animation.ignored") ? whole.indexOf("acTL", 0, "latin1") - 4 : -1;
  if (at < 0) return whole;
  return Buffer.concat([whole.subarray(0, at), whole.subarray(at + 12 + whole.readUInt32BE(at))]);
}

function refuseBySize({ width, height }: PictureHeader): void {
  if (width * height > artworkLimits.picturePixels) throw new ArtworkRefused("picture.too-large");
  if (Math.min(width, height) < artworkLimits.pictureSide) throw new ArtworkRefused("picture.too-small");
}

import { open } from "node:fs/promises";
import { artworkLimits } from "#shared/artwork/limits.ts";
import { artworkRefusal, type RefusalCode } from "#shared/artwork/refusals.ts";
import { AppError } from "../http/app-error.ts";
import type { ReceivedFile } from "../http/uploads.ts";
import { type ArtworkKind, sniffArtwork } from "./sniff-artwork.ts";

export const largestArtworkBytes = artworkLimits.fileBytes;

const refusedKinds: Readonly<Partial<Record<ArtworkKind, RefusalCode>>> = {
  empty: "file.empty",
  unknown: "file.unknown",
};

const mediaTypes: Readonly<Partial<Record<ArtworkKind, string>>> = {
  pdf: "application/pdf",
  png: "image/png",
  jpeg: "image/jpeg",
};

/**
 * The media type of a file by its first bytes, whatever its name says. Refuses in words what can't be artwork yet, and keeps
 * nothing of it.
 */
export async function acceptedType(file: ReceivedFile): Promise<string> {
  const head = Buffer.alloc(65_536);
  const handle = await open(file.path, "r");
  const { bytesRead } = await handle.read(head, 0, head.length, 0).finally(() => handle.close());
  const { kind, pixels } = sniffArtwork(head.subarray(0, bytesRead));
  const isHuge = pixels !== null && pixels.width * pixels.height > artworkLimits.picturePixels;
  const code = isHuge ? "picture.too-large" : refusedKinds[kind];
  if (code) throw new AppError("unsupported_type", { detail: artworkRefusal(code).text });
  return mediaTypes[kind] ?? "image/svg+xml";
}

import { open } from "node:fs/promises";
import { artworkLimits } from "#shared/artwork/limits.ts";
import { artworkRefusal, type RefusalCode } from "#shared/artwork/refusals.ts";
import { AppError } from "../http/app-error.ts";
import type { ReceivedFile } from "../http/uploads.ts";
import { type ArtworkKind, sniffArtwork } from "./sniff-artwork.ts";

export const largestArtworkBytes = artworkLimits.fileBytes;

const refusedKinds: Readonly<Partial<Record<ArtworkKind, RefusalCode>>> = {
  empty: "file.empty",
  png: "file.png",
  jpeg: "file.jpeg",
  pdf: "file.pdf",
  unknown: "file.unknown",
};

/** Looks at a file's first bytes, whatever its name says, and refuses in words what can't be artwork yet. Keeps nothing of it. */
export async function refuseWrongType(file: ReceivedFile): Promise<void> {
  const head = Buffer.alloc(65_536);
  const handle = await open(file.path, "r");
  const { bytesRead } = await handle.read(head, 0, head.length, 0).finally(() => handle.close());
  const code = refusedKinds[sniffArtwork(head.subarray(0, bytesRead)).kind];
  if (code) throw new AppError("unsupported_type", { detail: artworkRefusal(code).text });
}

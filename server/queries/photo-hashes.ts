import type { MockupDocument } from "#shared/mockup/document.ts";
import type { ReadContext } from "../http/context.ts";
import { WallPhoto } from "../models/wall-photo.ts";

/** SHA-256 of the file of the photo that the document is shown on, by the photo's id; nothing when it is on a plain wall. */
export async function photoHashes(
  { transaction }: ReadContext,
  { shopId, document }: { shopId: string; document: MockupDocument },
): Promise<Record<string, string>> {
  const { photo } = document.presentation;
  if (!photo) return {};
  const known = await WallPhoto.findOne({ where: { id: photo.photoId, shopId }, include: ["file"], transaction });
  return known?.file ? { [known.id]: known.file.sha256 } : {};
}

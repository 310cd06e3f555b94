import { artworkUsed } from "#shared/mockup/artwork-used.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { ReadContext } from "../http/context.ts";
import { Artwork } from "../models/artwork.ts";

/** SHA-256 of the file of each artwork that the document draws from, by artwork id. */
export async function artworkHashes(
  { transaction }: ReadContext,
  { shopId, document }: { shopId: string; document: MockupDocument },
): Promise<Record<string, string>> {
  const artworks = await Artwork.findAll({
    where: { id: artworkUsed(document), shopId },
    attributes: ["id"],
    include: ["file"],
    order: ["id"],
    transaction,
  });
  return Object.fromEntries(artworks.flatMap(({ id, file }) => (file ? [[id, file.sha256]] : [])));
}

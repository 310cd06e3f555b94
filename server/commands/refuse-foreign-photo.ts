import type { MockupDocument } from "#shared/mockup/document.ts";
import { invalid } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { WallPhoto } from "../models/wall-photo.ts";

/** A mockup may only be shown on a photo that was brought in for the job's own client, in the size that the photo has. */
export async function refuseForeignPhoto(
  { transaction }: Context,
  { shopId, clientId, document }: { shopId: string; clientId: string; document: MockupDocument },
): Promise<void> {
  const { photo } = document.presentation;
  if (!photo) return;
  const { photoId: id, widthPx, heightPx } = photo;
  const known = await WallPhoto.count({
    where: { id, shopId, widthPx, heightPx },
    include: [{ association: "job", where: { clientId }, required: true }],
    transaction,
  });
  if (known === 0)
    throw invalid([{ pointer: "/document/presentation/photo", detail: "The photo of the wall is not this client’s." }]);
}

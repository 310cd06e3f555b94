import type { WallPhotoItem } from "#shared/contracts/wall-photos.ts";
import type { WallPhoto } from "../models/wall-photo.ts";
import type { Actor } from "../policies/actor.ts";
import type { JobFacts } from "../policies/job.ts";
import { wallPhotoPolicy } from "../policies/wall-photo.ts";

export function presentWallPhoto(actor: Actor, facts: JobFacts, photo: WallPhoto): WallPhotoItem {
  const { file, adder } = photo;
  if (!file) throw new Error("A photo is presented with its file.");
  return {
    id: photo.id,
    name: photo.name,
    widthPx: photo.widthPx,
    heightPx: photo.heightPx,
    sha256: file.sha256,
    byteSize: file.byteSize,
    addedAt: photo.addedAt.toISOString(),
    addedBy: adder?.name ?? "",
    can: { remove: wallPhotoPolicy.change(actor, facts) && photo.removedAt === null },
  };
}

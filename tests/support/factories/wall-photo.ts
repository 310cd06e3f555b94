import { type WallPhotoItem, wallPhotoItem } from "#shared/contracts/wall-photos.ts";
import type { WallPhoto } from "#shared/mockup/document.ts";
import { asTaken, jpegOf, twoHalves } from "../wall-pictures.ts";
import { formWith, type World } from "./work.ts";

export const wallPhotosPath = ({ params, job }: World): string =>
  `/api/shops/${params.shop}/jobs/${job.id}/wall-photos`;

/** A photo of 480 by 640 px of a job's wall, brought in as the page does. */
export async function buildWallPhoto(world: World, visitor = world.visitors.maker): Promise<WallPhotoItem> {
  const photo = asTaken(await jpegOf(twoHalves(640, 480)), 6);
  const { status, text } = await visitor.send("POST", wallPhotosPath(world), {
    body: formWith("lobby.jpg", photo, "image/jpeg"),
  });
  if (status !== 201) throw new Error(`The photo was refused: ${status} ${text}`);
  return wallPhotoItem.parse(JSON.parse(text));
}

/** The sign on that photo, 300 mm right of an A4 sheet. */
export const shownOn = ({ id, widthPx, heightPx }: WallPhotoItem): WallPhoto => ({
  photoId: id,
  widthPx,
  heightPx,
  paper: "A4",
  lies: "upright",
  corners: [
    { x: 100, y: 200 },
    { x: 180, y: 205 },
    { x: 178, y: 318 },
    { x: 99, y: 312 },
  ],
  at: { x: 300, y: -20 },
});

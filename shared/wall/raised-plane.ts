import { type Camera, planeToPhoto } from "./camera.ts";
import { type Homography, inverse, product } from "./homography.ts";

/**
 * The map from a plane that stands `heightMm` off the wall to the photo. The wall itself is taken as marked (`wall`), and the
 * camera only says how far the raised plane is shifted and grown beside it, so that what lies on the wall stays where it was marked.
 */
export function raisedPlane(wall: Homography, camera: Camera, heightMm: number): Homography {
  if (heightMm === 0) return wall;
  const flat = inverse(planeToPhoto(camera, 0));
  return flat ? product(product(wall, flat), planeToPhoto(camera, heightMm)) : wall;
}

import type { Point } from "#shared/geometry/path.ts";

/**
 * A camera written down without the project's own: it stands at `distance` mm from a point of the wall, looks at it from
 * `aside` degrees to the right and `above` degrees above, and is rolled by `roll` degrees. Wall mm: x right, y down.
 */
export type KnownCamera = {
  readonly focal: number;
  readonly widthPx: number;
  readonly heightPx: number;
  readonly distance: number;
  readonly aside: number;
  readonly above: number;
  readonly roll: number;
  readonly lookAt: Point;
};

const radians = (degrees: number): number => (degrees * Math.PI) / 180;

/** Where the camera sees a point that stands `off` mm before the wall, px from the photo's upper left. */
export function seenBy(camera: KnownCamera, { x, y }: Point, off = 0): Point {
  const { focal, widthPx, heightPx, distance, lookAt } = camera;
  const [aside, above, roll] = [radians(camera.aside), radians(camera.above), radians(camera.roll)];
  // Wall axes with z towards the viewer; the camera's place on a sphere about the point it looks at.
  const eye = {
    x: lookAt.x + distance * Math.sin(aside) * Math.cos(above),
    y: lookAt.y - distance * Math.sin(above),
    z: distance * Math.cos(aside) * Math.cos(above),
  };
  const ahead = { x: (lookAt.x - eye.x) / distance, y: (lookAt.y - eye.y) / distance, z: -eye.z / distance };
  const right = { x: Math.cos(aside), y: 0, z: -Math.sin(aside) };
  // Down is ahead × right, with x right, y down and z towards the viewer a left-handed frame.
  const down = {
    x: -(ahead.y * right.z - ahead.z * right.y),
    y: -(ahead.z * right.x - ahead.x * right.z),
    z: -(ahead.x * right.y - ahead.y * right.x),
  };
  const to = { x: x - eye.x, y: y - eye.y, z: off - eye.z };
  const along = (axis: typeof to): number => axis.x * to.x + axis.y * to.y + axis.z * to.z;
  const [u, v] = [(focal * along(right)) / along(ahead), (focal * along(down)) / along(ahead)];
  return {
    x: widthPx / 2 + u * Math.cos(roll) - v * Math.sin(roll),
    y: heightPx / 2 + u * Math.sin(roll) + v * Math.cos(roll),
  };
}

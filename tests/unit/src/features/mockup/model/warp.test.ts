import { describe, expect, it } from "vitest";
import type { Point } from "#shared/geometry/path.ts";
import { mapQuad } from "#shared/wall/quad.ts";
import { readWallPhoto } from "#shared/wall/read-wall-photo.ts";
import { sheetCornersMm } from "#shared/wall/sheet-on-wall.ts";
import { matrix3dOf, seenAt, warpOf } from "@/features/mockup/model/warp.ts";
import { type KnownCamera, seenBy } from "../../../../../support/known-camera.ts";

const camera: KnownCamera = {
  focal: 1500,
  widthPx: 1600,
  heightPx: 1200,
  distance: 1800,
  aside: 32,
  above: -7,
  roll: -2,
  lookAt: { x: 200, y: -50 },
};
const sheet = { paper: "Letter", lies: "lying" } as const;

function place(at: Point, given: Partial<KnownCamera> = {}) {
  const by = { ...camera, ...given };
  const corners = mapQuad(sheetCornersMm(sheet), (corner) => seenBy(by, corner));
  const read = readWallPhoto({ ...sheet, widthPx: by.widthPx, heightPx: by.heightPx, corners: [...corners] });
  if (!read.ok) throw new Error(read.reason);
  return {
    reading: read.value,
    at,
    board: { width: 600, height: 400 },
    box: { x: -50, y: -40, width: 700, height: 480 },
    shown: 0.5,
  };
}

describe("a plane of the sign on its photo", () => {
  const at = { x: 550, y: -80 };

  it.each([0, 26, 48])("%d mm off the wall is seen where the camera sees it, to a hundredth of a px", (off) => {
    const where = place(at);
    const warp = warpOf(where, { offWallMm: off });
    if (!warp) throw new Error("It is in sight.");
    for (const onBoard of [
      { x: 0, y: 0 },
      { x: 600, y: 400 },
      { x: 123, y: 321 },
    ]) {
      const seen = seenBy(camera, { x: at.x - 300 + onBoard.x, y: at.y - 200 + onBoard.y }, off);
      const drawn = seenAt(warp, where.box, onBoard);
      expect(drawn?.x).toBeCloseTo(seen.x * 0.5, 2);
      expect(drawn?.y).toBeCloseTo(seen.y * 0.5, 2);
    }
    // Never drawn smaller than it is shown: at its nearest it is drawn 1:1.
    expect(warp.pxPerMm).toBeGreaterThan(0.3);
  });

  it("in a frontal view lies flat on the wall, whatever it stands off", () => {
    const where = place(at, { aside: 0, above: 0 });
    expect(warpOf(where, { offWallMm: 48 })).toEqual(warpOf(where, { offWallMm: 0 }));
  });

  it("is not drawn where part of it would be behind the camera", () => {
    expect(warpOf(place({ x: 3600, y: 0 }, { aside: 60, distance: 700 }), { offWallMm: 0 })).toBeNull();
  });

  it("is written as CSS reads it: column by column, with what divides it last in each", () => {
    expect(matrix3dOf([1, 2, 3, 4, 5, 6, 0.5, 0.25, 2])).toBe("matrix3d(0.5,2,0,0.25,1,2.5,0,0.125,0,0,1,0,1.5,3,0,1)");
  });
});

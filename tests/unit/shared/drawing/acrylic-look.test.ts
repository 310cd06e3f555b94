import { describe, expect, it } from "vitest";
import { type AcrylicFace, drawAcrylic } from "#shared/drawing/acrylic-look.ts";
import type { Item } from "#shared/drawing/display-list.ts";
import { mirrorImage } from "#shared/drawing/mirror-image.ts";
import { boxOfPath } from "#shared/geometry/box.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";

const box = { x: 100, y: 100, width: 80, height: 40 };
const face = (look: AcrylicFace["stock"]["look"], azimuth = 270): AcrylicFace => ({
  id: "p1",
  path: rectanglePath(box),
  box,
  stock: { colour: "#27304F", look },
  thicknessMm: 5,
  light: { azimuth },
  lineMm: 0.5,
});

const bodyOf = (items: readonly Item[]) => items.find((item) => item.kind === "path" && item.id === "p1");
const insideOf = (items: readonly Item[]): readonly Item[] =>
  items.flatMap((item) => (item.kind === "clip" ? item.items : []));
/** The two last things inside a piece: its own outline with a copy that lies off it, bright and dark. */
const edgesOf = (items: readonly Item[]) => {
  const [bright, dark] = insideOf(items).slice(-2);
  if (bright?.kind !== "path" || dark?.kind !== "path") throw new Error("The piece has no edges.");
  return { bright, dark };
};
const shiftOf = (item: Extract<Item, { kind: "path" }>) => {
  const copy = boxOfPath(item.path.slice(1));
  return {
    x: Math.sign(Math.round(((copy?.x ?? 0) - box.x) * 1000)),
    y: Math.sign(Math.round(((copy?.y ?? 0) - box.y) * 1000)),
  };
};

describe("acrylic", () => {
  it.each([
    // Azimuth clockwise from the top. The bright edge is what a copy moved away from the light leaves bare.
    { from: "the left", azimuth: 270, away: { x: 1, y: 0 } },
    { from: "the top", azimuth: 0, away: { x: 0, y: 1 } },
    { from: "the lower right", azimuth: 135, away: { x: -1, y: -1 } },
  ])("is bright along the edges towards a light from $from, dark along the others", ({ azimuth, away }) => {
    const { bright, dark } = edgesOf(drawAcrylic(face("opaque", azimuth)));
    expect(shiftOf(bright)).toEqual(away);
    expect(shiftOf(dark)).toEqual({ x: -away.x || 0, y: -away.y || 0 });
    expect(Number.parseInt(bright.fill?.slice(1, 3) ?? "0", 16)).toBeGreaterThan(0x27);
    expect(Number.parseInt(dark.fill?.slice(1, 3) ?? "ff", 16)).toBeLessThan(0x27);
  });

  it("lets as much of the ground through as its look does", () => {
    const opacities = (["opaque", "mirror", "frosted", "clear"] as const).map((look) => {
      const body = bodyOf(drawAcrylic(face(look)));
      return body?.kind === "path" ? (body.opacity ?? 1) : 0;
    });
    expect(opacities.slice(0, 2)).toEqual([1, 1]);
    expect(opacities[2]).toBeGreaterThan(0.75);
    expect(opacities[2]).toBeLessThan(1);
    expect(opacities[3]).toBeLessThan(0.3);
  });

  it("keeps all but its body and its outline inside itself", () => {
    for (const look of ["opaque", "mirror", "frosted", "clear"] as const) {
      const items = drawAcrylic(face(look));
      expect(items.map(({ kind }) => kind)).toEqual(["path", "clip", "path"]);
    }
  });

  it("reflects in grades of its own colour when it is a mirror, the same for the same colour", () => {
    const images = insideOf(drawAcrylic(face("mirror"))).filter((item) => item.kind === "image");
    expect(images).toMatchObject([{ box }]);
    expect(mirrorImage("#C4C8CC")).toBe(mirrorImage("#C4C8CC"));
    expect(mirrorImage("#C4C8CC")).not.toBe(mirrorImage("#C79A3A"));
    // Small: every letter of a sign has one.
    expect(mirrorImage("#C4C8CC").length).toBeLessThan(4000);
  });
});

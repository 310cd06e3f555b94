import { expect, it } from "vitest";
import {
  spotInWindow,
  spotOnDrawing,
  viewFit,
  viewFollowing,
  viewHeld,
  viewMoved,
  viewScaled,
  viewShowing,
} from "@/lib/drawing-view.ts";

const picture = { width: 600, height: 400 };
const room = { width: 324, height: 524 };
const fit = viewFit(picture, room);

it("the whole drawing fits with its margin and lies in the middle", () => {
  expect(fit).toEqual({ scale: 0.5, x: 12, y: 162 });
});

it("a window too small for its margin still gets a positive scale", () => {
  expect(viewFit(picture, { width: 10, height: 10 }).scale).toBeGreaterThan(0);
});

it("a spot read back from the window is the spot that was shown", () => {
  const place = spotInWindow(fit, { x: 37, y: 251 });
  expect(place).toEqual({ x: 30.5, y: 287.5 });
  expect(spotOnDrawing(fit, place)).toEqual({ x: 37, y: 251 });
});

it("coming closer keeps the spot under the pointer", () => {
  const about = { x: 112, y: 200 };
  const closer = viewScaled(fit, 3, about, fit);
  expect(closer.scale).toBe(1.5);
  expect(spotOnDrawing(closer, about)).toEqual(spotOnDrawing(fit, about));
});

it.each([
  { factor: 0.2, scale: 0.5 },
  { factor: 1000, scale: 12 },
])("a factor of $factor ends at the limit $scale", ({ factor, scale }) => {
  expect(viewScaled(fit, factor, { x: 5, y: 5 }, fit).scale).toBe(scale);
});

it("a drawing smaller than its window is centred, whatever was asked", () => {
  expect(viewHeld(viewMoved(fit, { x: 900, y: -70 }), picture, room)).toEqual(fit);
});

it("a drawing larger than its window keeps its edge within a quarter of the window", () => {
  const far = viewHeld({ scale: 2, x: 5000, y: -5000 }, picture, room);
  expect(far).toEqual({ scale: 2, x: 81, y: 524 - 800 - 131 });
});

it("a spot that shows already moves nothing, one outside is brought just inside", () => {
  expect(viewShowing(fit, { x: 300, y: 200 }, room)).toBe(fit);
  const close = { scale: 4, x: 0, y: 0 };
  expect(spotInWindow(viewShowing(close, { x: 500, y: 2 }, room), { x: 500, y: 2 })).toEqual({ x: 324 - 48, y: 48 });
});

it("one finger drags, two that part come closer about their middle", () => {
  expect(viewFollowing(fit, [{ x: 5, y: 5 }], [{ x: 25, y: -2 }], fit)).toEqual({ scale: 0.5, x: 32, y: 155 });
  const from = [
    { x: 100, y: 200 },
    { x: 140, y: 200 },
  ];
  const to = [
    { x: 70, y: 230 },
    { x: 190, y: 230 },
  ];
  const pinched = viewFollowing(fit, from, to, fit);
  expect(pinched.scale).toBe(1.5);
  expect(spotOnDrawing(pinched, { x: 130, y: 230 })).toEqual(spotOnDrawing(fit, { x: 120, y: 200 }));
});

it("two fingers that began on one spot only drag", () => {
  const same = { x: 50, y: 60 };
  expect(viewFollowing(fit, [same, same], [same, { x: 90, y: 60 }], fit)).toEqual({ scale: 0.5, x: 32, y: 162 });
});

import type { Locator } from "playwright-core";
import { expect, vi } from "vitest";
import { patienceMs } from "./served-app.ts";

/** Where points of the board, mm, lie in the window, once the view of the elevation has made room for the dimensions. */
export async function boardInWindow(
  elevation: Locator,
): Promise<(x: number, y: number) => readonly [x: number, y: number]> {
  const read = async () => (await elevation.getAttribute("data-view")) ?? "";
  let view = "";
  await vi.waitFor(
    async () => {
      const before = view;
      view = await read();
      expect(view).toBe(before);
    },
    { timeout: patienceMs, interval: 250 },
  );
  const box = await elevation.boundingBox();
  const [scale, left, top] = view.split(" ").map(Number);
  if (!box || !scale || left === undefined || top === undefined) throw new Error("The elevation is not there.");
  return (x, y) => [box.x + left + x * scale, box.y + top + y * scale];
}

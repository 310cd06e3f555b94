import type { CDPSession, Page } from "playwright-core";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { getMockup, saveMockup } from "#shared/contracts/mockups.ts";
import { pathData } from "#shared/drawing/path-data.ts";
import { placePath } from "#shared/geometry/placement.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { castShadows } from "../../src/features/mockup/model/cast-shadows.ts";
import { startTestApp } from "../support/app.ts";
import { type Measure, summarise } from "../support/benchmark.ts";
import { launchBrowser } from "../support/browser.ts";
import { mockup } from "../support/drivers/mockup.ts";
import { buildWorld } from "../support/factories/work.ts";
import { largeSign } from "../support/large-sign.ts";
import { takeSignedInSeat } from "../support/signed-in-seat.ts";

const frames = 120;
const edits = 500;

/** A filled outline with the shadow that it throws, all in mm of the board. */
type Shape = {
  readonly d: string;
  readonly colour: string;
  readonly dx: number;
  readonly dy: number;
  readonly blur: number;
};

async function shapesOf(document: MockupDocument): Promise<Shape[]> {
  const shadows = castShadows(document, computeFigures(document, await loadKernel()));
  return document.layers.flatMap(({ stock, pieces }) =>
    pieces.map(({ id, path, placement }) => ({
      d: pathData(placePath(path, placement)),
      colour: stock.colour,
      ...(shadows.get(id) ?? { dx: 0, dy: 0, blur: 0 }),
    })),
  );
}

/** How long each frame takes that redraws every outline with its shadow by plain Canvas 2D calls, one of them moving; ms. */
function timePlainRedraw(page: Page, shapes: readonly Shape[]): Promise<number[]> {
  return page.evaluate(
    async ([list, count]) => {
      const shown = document.querySelector<HTMLCanvasElement>('[role="application"] canvas');
      const context = document.createElement("canvas").getContext("2d");
      if (!shown || !context) throw new Error("There is no canvas.");
      const { canvas } = context;
      [canvas.width, canvas.height] = [shown.width, shown.height];
      canvas.style.cssText = "position: fixed; inset: 0; z-index: 99";
      document.body.append(canvas);
      const scale = Math.min(canvas.width / 1600, canvas.height / 600);
      const paths = list.map((shape) => ({ ...shape, path: new Path2D(shape.d) }));
      const took: number[] = [];
      let before = performance.now();
      for (let frame = 0; frame < count; frame += 1) {
        context.setTransform(1, 0, 0, 1, 0, 0);
        context.clearRect(0, 0, canvas.width, canvas.height);
        for (const [index, { path, colour, dx, dy, blur }] of paths.entries()) {
          const by = index === 40 ? frame % 60 : 0;
          context.setTransform(scale, 0, 0, scale, by, by / 2);
          context.fillStyle = colour;
          context.shadowColor = "rgba(26, 18, 8, 0.46)";
          context.shadowOffsetX = dx * scale;
          context.shadowOffsetY = dy * scale;
          context.shadowBlur = blur * scale;
          context.fill(path, "evenodd");
        }
        await new Promise(requestAnimationFrame);
        const now = performance.now();
        took.push(now - before);
        before = now;
      }
      canvas.remove();
      return took;
    },
    [shapes, frames] as const,
  );
}

/** How long each frame takes in which a hand drags what lies under it on the desk's elevation; ms. */
async function timeDrag(page: Page, from: { readonly x: number; readonly y: number }): Promise<number[]> {
  await page.mouse.move(from.x, from.y);
  await page.mouse.down();
  await page.mouse.move(from.x + 8, from.y + 6, { steps: 3 });
  const took = await page.evaluate(
    async ([start, count]) => {
      const canvas = document.querySelector('[role="application"] canvas.upper-canvas');
      const lasted: number[] = [];
      let before = performance.now();
      for (let frame = 0; frame < count; frame += 1) {
        const by = 8 + (frame % 60);
        const at = { clientX: start.x + by, clientY: start.y + by / 2, pointerId: 1, pointerType: "mouse", buttons: 1 };
        canvas?.dispatchEvent(new PointerEvent("pointermove", { ...at, bubbles: true, cancelable: true }));
        await new Promise(requestAnimationFrame);
        const now = performance.now();
        lasted.push(now - before);
        before = now;
      }
      return lasted;
    },
    [from, frames] as const,
  );
  await page.mouse.up();
  return took;
}

/** What is in use of the page's heap after its garbage was collected, MB. */
async function usedMb(session: CDPSession): Promise<number> {
  await session.send("HeapProfiler.collectGarbage");
  await session.send("HeapProfiler.collectGarbage");
  const { usedSize } = await session.send("Runtime.getHeapUsage");
  return usedSize / 1e6;
}

const isAtRest = (page: Page) => page.locator('section[aria-label="Dry fit"][aria-busy="false"]').waitFor();

/** Opens a mockup anew and gives how long it took to its first dry fit, ms. */
async function timeOpening(page: Page, address: string): Promise<number> {
  const before = performance.now();
  await page.goto(address);
  await isAtRest(page);
  return performance.now() - before;
}

/** Edits that each are a step of their own: two layers are chosen by turns and moved by a tap of an arrow. */
async function editAndUndo(page: Page, count: number): Promise<void> {
  const { undo } = mockup(page);
  await page.evaluate(async (steps) => {
    const elevation = document.querySelector('[role="application"]');
    const keyOf = (key: string) => document.querySelector<HTMLElement>(`button[aria-label^="Choose ${key},"]`);
    const press = (key: string, more: KeyboardEventInit = {}) =>
      elevation?.dispatchEvent(new KeyboardEvent("keydown", { key, bubbles: true, cancelable: true, ...more }));
    const shown = () => new Promise((resolve) => setTimeout(resolve));
    for (let step = 0; step < steps; step += 1) {
      keyOf(step % 2 === 0 ? "B" : "E")?.click();
      await shown();
      press(step % 4 < 2 ? "ArrowRight" : "ArrowLeft");
      await shown();
    }
    for (let step = 0; step < steps; step += 1) {
      press("z", { ctrlKey: true });
      await shown();
    }
  }, count);
  await isAtRest(page);
  if (await undo().isEnabled()) throw new Error("Not every edit was undone.");
}

/**
 * The desk in a browser with a sign of 300 pieces and 20,000 nodes, shadows on: a frame of dragging one piece against a
 * frame that redraws the same outlines and shadows by plain Canvas 2D calls; opening it against opening an empty one; the
 * heap after 500 edits and their undos against the heap before.
 */
export const measure: Measure = async () => {
  const [app, browser] = await Promise.all([startTestApp({ poolMax: 8 }), launchBrowser()]);
  try {
    const world = await buildWorld(app);
    const params = { ...world.params, jobId: world.job.id };
    const address = `/shop/${params.shop}/jobs/${params.jobId}/mockup`;
    const { page, context } = await takeSignedInSeat(browser, { baseUrl: app.baseUrl, email: world.owner.email });
    // What compiles this file names the functions in it by a helper that the page lacks.
    await context.addInitScript("globalThis.__name = (named) => named;");
    await timeOpening(page, address);
    const empty = [
      await timeOpening(page, address),
      await timeOpening(page, address),
      await timeOpening(page, address),
    ];
    const sign = largeSign();
    const { version } = await world.visitors.owner.get(getMockup, { params });
    await world.visitors.owner.get(saveMockup, { params, body: { version, document: sign } });
    const opening = [
      await timeOpening(page, address),
      await timeOpening(page, address),
      await timeOpening(page, address),
    ];
    const session = await context.newCDPSession(page);

    const from = await placeOfPiece(page, sign, "Leaf-62");
    await page.mouse.dblclick(from.x, from.y);
    const drag = await timeDrag(page, from);
    const plain = await timePlainRedraw(page, await shapesOf(sign));
    await isAtRest(page);
    // The piece may not have come down exactly where it was taken up.
    while (await mockup(page).undo().isEnabled()) await mockup(page).undo().click();
    await isAtRest(page);

    const before = await usedMb(session);
    await editAndUndo(page, edits);
    const after = await usedMb(session);
    const dragging = summarise("a frame of dragging one of 300 pieces on the desk", "ms", drag);
    const redraw = summarise("a frame of redrawing them all by plain Canvas 2D", "ms", plain);
    const opened = summarise("opening the mockup of 300 pieces, to its dry fit", "ms", opening);
    const openedEmpty = summarise("opening an empty mockup, to its dry fit", "ms", empty);
    return [
      dragging,
      redraw,
      summarise("  dragging over redrawing", "×", [dragging.median / redraw.median]),
      opened,
      openedEmpty,
      summarise("  opening it over opening an empty one", "×", [opened.median / openedEmpty.median]),
      summarise(`heap after ${edits} edits and their undos`, "MB", [after]),
      summarise("  over the heap before", "×", [after / before]),
    ];
  } finally {
    await browser.close();
    await app.stop();
  }
};

/** Where the middle of a piece lies in the window, px. */
async function placeOfPiece(page: Page, { layers }: MockupDocument, pieceId: string) {
  const piece = layers.flatMap(({ pieces }) => pieces).find(({ id }) => id === pieceId);
  const elevation = page.getByRole("application", { name: /elevation/i });
  const box = await elevation.boundingBox();
  const [scale, x, y] = ((await elevation.getAttribute("data-view")) ?? "").split(" ").map(Number);
  if (!piece || !box || !scale || x === undefined || y === undefined) throw new Error(`${pieceId} is not to be seen.`);
  return { x: box.x + x + piece.placement.x * scale, y: box.y + y + piece.placement.y * scale };
}

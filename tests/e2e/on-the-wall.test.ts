import { mkdir } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import AxeBuilder from "@axe-core/playwright";
import type { Browser, Locator, Page } from "playwright-core";
import { afterAll, beforeAll, expect, it, vi } from "vitest";
import { getMockup, saveMockup } from "#shared/contracts/mockups.ts";
import type { Point } from "#shared/geometry/path.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { launchBrowser } from "../support/browser.ts";
import { buildMember } from "../support/factories/member.ts";
import { buildWorld, type World } from "../support/factories/work.ts";
import { type KnownCamera, seenBy } from "../support/known-camera.ts";
import { orreryBooks } from "../support/orrery-books.ts";
import type { SeatSize } from "../support/seat.ts";
import { patienceMs } from "../support/served-app.ts";
import { takeSignedInSeat } from "../support/signed-in-seat.ts";
import { photographWall } from "../support/wall-scene.ts";

/** A photo of the wall is brought in, its sheet marked, and the sign hung: it is seen where the camera would see it. With SCREENS=1 with pictures. */

let app: TestApp;
let browser: Browser;
let world: World;
/** The demo sign, of pieces that belong to no file. */
const drawn = orreryBooks();
const sign: MockupDocument = {
  ...drawn,
  layers: drawn.layers.map((layer) => ({
    ...layer,
    pieces: layer.pieces.map((piece) => ({ ...piece, source: { kind: "plate" as const } })),
  })),
};
const folder = join(tmpdir(), "standproud-screens");
const camera: KnownCamera = {
  focal: 1500,
  widthPx: 1600,
  heightPx: 1200,
  distance: 2100,
  aside: 28,
  above: 6,
  roll: 1,
  lookAt: { x: 150, y: -60 },
};
const sheet: readonly Point[] = [
  { x: -105, y: -148.5 },
  { x: 105, y: -148.5 },
  { x: 105, y: 148.5 },
  { x: -105, y: 148.5 },
];

async function sit(size: SeatSize) {
  const { email } = await buildMember({ shop: world.owner.shop, role: "maker" });
  const seat = await takeSignedInSeat(browser, { baseUrl: app.baseUrl, email, size });
  await seat.open(`/shop/${world.params.shop}/jobs/${world.job.id}/mockup`);
  return seat;
}

async function keep(page: Page, name: string, within: string) {
  const { violations } = await new AxeBuilder({ page }).include(within).analyze();
  const grave = violations.filter(({ impact }) => impact === "serious" || impact === "critical");
  expect(grave.map(({ id, nodes }) => `${id}: ${nodes[0]?.html}`)).toEqual([]);
  if (!process.env.SCREENS) return;
  await mkdir(folder, { recursive: true });
  await page.screenshot({ path: join(folder, `on-the-wall-${name}.png`) });
}

/** Where the board's face lies in the photo, px, by the sides of the box round it. */
async function boardIn(within: Locator): Promise<number[]> {
  // Both at one moment: what lies above may still be growing.
  const boxes = await within.evaluate((element) =>
    ["img[alt]", '[data-sign] [data-id="board"]'].map((found) => {
      const box = element.querySelector(found)?.getBoundingClientRect();
      return box ? { x: box.x, y: box.y, width: box.width, height: box.height } : null;
    }),
  );
  const [frame, board] = boxes;
  if (!frame || !board) throw new Error("The sign is not on the photo.");
  const shown = frame.width / camera.widthPx;
  const [x, y] = [board.x - frame.x, board.y - frame.y];
  return [x, y, x + board.width, y + board.height].map((side) => side / shown);
}

/** The same by the camera itself; `at` is the board's middle on the wall, `off` how far its face stands off. */
function boardSeen(at: Point, off: number): number[] {
  const { width, height } = sign.board;
  const corners = [
    { x: -width / 2, y: -height / 2 },
    { x: width / 2, y: -height / 2 },
    { x: width / 2, y: height / 2 },
    { x: -width / 2, y: height / 2 },
  ].map(({ x, y }) => seenBy(camera, { x: at.x + x, y: at.y + y }, off));
  const [xs, ys] = [corners.map(({ x }) => x), corners.map(({ y }) => y)];
  return [Math.min(...xs), Math.min(...ys), Math.max(...xs), Math.max(...ys)];
}

const farthest = (a: readonly number[], b: readonly number[]) =>
  Math.max(...a.map((value, index) => Math.abs(value - (b[index] ?? Number.NaN))));

const stored = async () => {
  const params = { ...world.params, jobId: world.job.id };
  return (await world.visitors.owner.get(getMockup, { params })).document.presentation.photo;
};

beforeAll(async () => {
  [app, browser] = await Promise.all([startTestApp({ poolMax: 8 }), launchBrowser()]);
  world = await buildWorld(app);
  const params = { ...world.params, jobId: world.job.id };
  await world.visitors.owner.get(saveMockup, { params, body: { version: 0, document: sign } });
}, 120_000);

afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

it("hangs the sign on the client's wall where the camera would see it", async () => {
  const { page, faults, leave } = await sit("desk");
  await page.getByRole("button", { name: "On the wall" }).click();
  const view = page.getByRole("dialog", { name: "On the wall" });
  await view.getByRole("img", { name: "The sign on a plain wall, from the front" }).waitFor();
  await keep(page, "1-plain", "[role=dialog]");

  const photo = await photographWall(camera);
  await view
    .getByLabel("Photo of the wall")
    .setInputFiles({ name: "lobby.jpg", mimeType: "image/jpeg", buffer: Buffer.from(photo) });
  await view.getByLabel("Upper left, across").waitFor();
  const names = ["Upper left", "Upper right", "Lower right", "Lower left"];
  for (const [index, name] of names.entries()) {
    const { x, y } = seenBy(camera, sheet[index] ?? { x: 0, y: 0 });
    await view.getByLabel(`${name}, across`).fill(x.toFixed(2));
    await view.getByLabel(`${name}, down`).fill(y.toFixed(2));
  }
  await view.getByText(/^The corners are 0 px from where a camera would see/).waitFor();
  const mark = view.getByRole("button", { name: /^Upper left corner of the sheet/ });
  const before = await mark.getAttribute("aria-label");
  await mark.press("ArrowRight");
  expect(await mark.getAttribute("aria-label")).not.toBe(before);
  await keep(page, "2-marked", "[role=dialog]");
  await page.keyboard.press("Control+z");
  await vi.waitFor(async () => expect(await mark.getAttribute("aria-label")).toBe(before), { timeout: patienceMs });
  // By the hand, and back by one step.
  const spot = await mark.boundingBox();
  if (!spot) throw new Error("The mark can be taken.");
  await page.mouse.move(spot.x + 22, spot.y + 22);
  await page.mouse.down();
  await page.mouse.move(spot.x + 30, spot.y + 40);
  await page.mouse.up();
  await view.getByText(/^The corners are \d+(\.\d)? px from .* look at each corner again/).waitFor();
  await page.keyboard.press("Control+z");
  await vi.waitFor(async () => expect(await mark.getAttribute("aria-label")).toBe(before), { timeout: patienceMs });

  await view.getByRole("radio", { name: "Hang the sign" }).check();
  await view.getByRole("textbox", { name: "Right of the sheet" }).fill("600");
  await view.getByRole("textbox", { name: "Below the sheet" }).fill("-120");
  await view.getByRole("textbox", { name: "Below the sheet" }).blur();
  const off = sign.hanging.gap + sign.backer.thickness;
  await vi.waitFor(
    async () => expect(farthest(await boardIn(view), boardSeen({ x: 600, y: -120 }, off))).toBeLessThan(1.5),
    {
      timeout: patienceMs,
    },
  );
  await keep(page, "3-hung", "[role=dialog]");

  // By the hand: as far along the wall as the pointer goes.
  const handle = view.getByRole("button", { name: /^The sign on the wall/ });
  const box = await handle.boundingBox();
  if (!box) throw new Error("The sign can be taken.");
  const [x, y] = [box.x + box.width / 2, box.y + box.height / 2];
  await page.mouse.move(x, y);
  await page.mouse.down();
  await page.mouse.move(x - 30, y + 20);
  await page.mouse.move(x - 60, y + 40);
  await page.mouse.up();
  await handle.press("ArrowUp");
  await vi.waitFor(
    async () => {
      const hung = await stored();
      expect(hung?.at.x).toBeLessThan(560);
      expect(hung?.at.y).toBeGreaterThan(-110);
    },
    { timeout: patienceMs, interval: 200 },
  );
  const hung = await stored();
  if (!hung) throw new Error("The mockup was saved with its photo.");
  expect(farthest(await boardIn(view), boardSeen(hung.at, off))).toBeLessThan(1.5);
  expect(faults).toEqual([]);
  await leave();
});

it("is looked at, not changed, on a phone", async () => {
  const { page, faults, leave } = await sit("phone");
  const section = page.locator("section", { has: page.getByRole("heading", { name: "On the wall" }) });
  await section.locator('[data-sign] [data-id="board"]').waitFor();
  const hung = await stored();
  const off = sign.hanging.gap + sign.backer.thickness;
  await vi.waitFor(
    async () => expect(farthest(await boardIn(section), boardSeen(hung?.at ?? { x: 0, y: 0 }, off))).toBeLessThan(1.5),
    { timeout: patienceMs },
  );
  expect(await section.getByRole("button").count()).toBe(0);
  await section.scrollIntoViewIfNeeded();
  await keep(page, "4-phone", "main");
  expect(faults).toEqual([]);
  await leave();
});

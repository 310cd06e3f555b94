import { mkdir } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import AxeBuilder from "@axe-core/playwright";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it, vi } from "vitest";
import { runQueue } from "#server/jobs/run-queue.ts";
import { getMockup } from "#shared/contracts/mockups.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { launchBrowser } from "../support/browser.ts";
import { mockup } from "../support/drivers/mockup.ts";
import { buildWorld, type World } from "../support/factories/work.ts";
import type { Seat } from "../support/seat.ts";
import { pdfOf } from "../support/seeded-pdf.ts";
import { patienceMs } from "../support/served-app.ts";
import { takeSignedInSeat } from "../support/signed-in-seat.ts";

/** Artwork at the mockup's desk: dropped, looked at colour by colour, put in place of another. With SCREENS=1 it is kept as pictures. */

let app: TestApp;
let browser: Browser;
let world: World;
let seat: Seat;
let stopQueue: () => Promise<void>;

/** Discs of so many colours in rows of eight, the last two so near to the first two that no eye tells them apart, and a bar. */
function chartOf(colours: number): string {
  const discs = Array.from({ length: colours }, (_, at) => {
    const twin = at - (colours - 2);
    const hue = (twin < 0 ? at : twin) * (360 / colours);
    const fill = `hsl(${hue},${twin < 0 ? 70 : 71}%,${35 + ((twin < 0 ? at : twin) % 4) * 10}%)`;
    return `<circle cx="${20 + (at % 8) * 40}" cy="${20 + Math.floor(at / 8) * 40}" r="15" fill="${fill}"/>`;
  });
  return `<svg xmlns="http://www.w3.org/2000/svg" width="320mm" height="120mm" viewBox="0 0 320 120">${discs.join("")}<rect x="2" y="112" width="316" height="6" fill="hsl(0,70%,35%)"/></svg>`;
}

const layersOnServer = async () => {
  const params = { ...world.params, jobId: world.job.id };
  const { document } = await world.visitors.owner.get(getMockup, { params });
  return document.layers;
};
const saved = (expected: (layers: Awaited<ReturnType<typeof layersOnServer>>) => void) =>
  vi.waitFor(async () => expected(await layersOnServer()), { timeout: patienceMs, interval: 200 });

/** Lets files fall on the drawing, as a hand does from the desktop. */
async function drop(page: Page, file: { name: string; type: string; content: Uint8Array }) {
  const data = await page.evaluateHandle(
    ({ name, type, bytes }) => {
      const transfer = new DataTransfer();
      transfer.items.add(new File([Uint8Array.from(bytes)], name, { type }));
      return transfer;
    },
    { name: file.name, type: file.type, bytes: [...file.content] },
  );
  const ground = page.getByRole("region", { name: "Drawing" });
  await ground.dispatchEvent("dragover", { dataTransfer: data });
  await ground.getByText("Drop it to bring it in as artwork").waitFor();
  await ground.dispatchEvent("drop", { dataTransfer: data });
}

async function keepPicture(page: Page, name: string) {
  if (process.env.SCREENS !== "1") return;
  const folder = join(tmpdir(), "standproud-screens");
  await mkdir(folder, { recursive: true });
  for (const width of [1920, 1440]) {
    await page.setViewportSize({ width, height: width === 1920 ? 1080 : 900 });
    await page.screenshot({ path: join(folder, `${name}-${width}.png`) });
  }
}

beforeAll(async () => {
  app = await startTestApp({ poolMax: 6 });
  const queue = await runQueue(app.services);
  stopQueue = () => queue.stop();
  world = await buildWorld(app);
  browser = await launchBrowser();
  seat = await takeSignedInSeat(browser, { baseUrl: app.baseUrl, email: world.owner.person.email });
  await seat.open(`/shop/${world.params.shop}/jobs/${world.job.id}/mockup`);
  await mockup(seat.page).dryFit().waitFor();
}, 120_000);
afterAll(async () => {
  await browser?.close();
  await stopQueue?.();
  await app?.stop();
});

describe("artwork at the desk", () => {
  it("is dropped on the drawing, and its colours are joined, split, sent on and left out before they become layers", async () => {
    const { page } = seat;
    const dialog = page.getByRole("dialog", { name: "Bring in artwork" });
    if (process.env.SCREENS === "1") {
      await drop(page, { name: "many.svg", type: "image/svg+xml", content: new TextEncoder().encode(chartOf(24)) });
      await dialog.getByRole("button", { name: "Bring in 24 layers" }).waitFor();
      await keepPicture(page, "bring-in-24");
      await page.keyboard.press("Escape");
    }
    await drop(page, { name: "chart.svg", type: "image/svg+xml", content: new TextEncoder().encode(chartOf(6)) });
    await dialog.getByRole("button", { name: "Bring in 6 layers" }).waitFor();
    await dialog.getByRole("button", { name: "Join what looks the same" }).click();
    await dialog.getByRole("button", { name: "Bring in 4 layers" }).waitFor();
    // The bar has the first disc's colour: picked from the list, it gets a layer of its own.
    await dialog.getByText("Pieces as a list").click();
    const first = (await dialog.getByRole("rowheader").first().textContent())?.split(",")[0] ?? "";
    await dialog.getByLabel("Pieces of").selectOption(first);
    await dialog.getByLabel(/^Piece \d+, 316 × 6 mm/).check();
    await dialog.getByRole("button", { name: "Give them a layer of their own" }).click();
    await dialog.getByRole("button", { name: "Bring in 5 layers" }).waitFor();
    await dialog.getByLabel(`Stock of ${first} (2)`).selectOption({ index: 1 });
    await dialog.getByLabel(`Where ${first} (2) goes`).selectOption("out");
    await keepPicture(page, "bring-in-few");
    const { violations } = await new AxeBuilder({ page }).include('[role="dialog"]').analyze();
    expect(
      violations.filter(({ impact }) => impact === "serious" || impact === "critical").map(({ id }) => id),
    ).toEqual([]);
    await dialog.getByRole("button", { name: "Bring in 4 layers" }).click();
    await dialog.waitFor({ state: "detached" });
    await saved((layers) => {
      expect(layers.map(({ pieces }) => pieces.length).sort()).toEqual([1, 1, 2, 2]);
    });
  });

  it("is sized by one known length, and a PDF of it takes the place of the drawing with the layers kept", async () => {
    const { page } = seat;
    const before = await layersOnServer();
    // The same discs on a page of 320 by 120 mm, the first of them larger; the colours differ a little, as a PDF's do.
    const perMm = 72 / 25.4;
    const discs = [0, 1, 2].map((at) => {
      const [x, y, r] = [(20 + at * 40) * perMm, 100 * perMm, (at === 0 ? 18 : 15) * perMm];
      return `${0.6 - at * 0.2} 0.1 0.1 rg\n${x - r} ${y - r} ${2 * r} ${2 * r} re\nf`;
    });
    const pdf = await pdfOf(discs.join("\n"), { size: [320 * perMm, 120 * perMm] });
    await drop(page, { name: "chart.pdf", type: "application/pdf", content: pdf });
    const dialog = page.getByRole("dialog", { name: "Bring in artwork" });
    await dialog.getByText("True size: 113 × 36 mm").waitFor();
    await dialog.getByLabel("It is").fill("226");
    await dialog.getByText("All becomes 226 × 72 mm.").waitFor();
    await dialog.getByRole("button", { name: "Set the true size" }).click();
    await dialog.getByText("True size: 226 × 72 mm").waitFor();
    await dialog.getByLabel("It is").fill("113");
    await dialog.getByRole("button", { name: "Set the true size" }).click();
    await dialog.getByText("True size: 113 × 36 mm").waitFor();
    await dialog.getByLabel("What becomes of it").selectOption("it takes the place of chart.svg");
    await dialog.getByRole("button", { name: "Put it in place" }).waitFor();
    await keepPicture(page, "replace");
    await dialog.getByRole("button", { name: "Put it in place" }).click();
    await dialog.waitFor({ state: "detached" });
    await saved((layers) => {
      expect(layers.map(({ key, stock, hold }) => ({ key, stock, hold }))).toEqual(
        before.map(({ key, stock, hold }) => ({ key, stock, hold })),
      );
      const sources = new Set(
        layers.flatMap(({ pieces }) => pieces.map(({ source }) => (source.kind === "artwork" ? source.artworkId : ""))),
      );
      expect(sources.size).toBe(1);
      expect(layers).not.toEqual(before);
    });
    await mockup(page).undo().click();
    await saved((layers) => expect(layers).toEqual(before));
    expect(seat.faults).toEqual([]);
  });
});

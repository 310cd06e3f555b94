import { createHash } from "node:crypto";
import { mkdir } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import AxeBuilder from "@axe-core/playwright";
import type { Browser } from "playwright-core";
import { afterAll, beforeAll, expect, it, vi } from "vitest";
import { getMockup } from "#shared/contracts/mockups.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { launchBrowser } from "../support/browser.ts";
import { mockup } from "../support/drivers/mockup.ts";
import { buildWorld, type World } from "../support/factories/work.ts";
import { fileOfFace } from "../support/open-faces.ts";
import type { Seat } from "../support/seat.ts";
import { patienceMs } from "../support/served-app.ts";
import { takeSignedInSeat } from "../support/signed-in-seat.ts";

/**
 * Words set as pieces where only a browser shows it: the worker that fetches a face under the served policy, the dialog, and the
 * words read back. With SCREENS=1 dialog and desk are kept as pictures.
 */

let app: TestApp;
let browser: Browser;
let world: World;
let maker: Seat;

const jobParams = () => ({ ...world.params, jobId: world.job.id });

beforeAll(async () => {
  [app, browser] = await Promise.all([startTestApp({ poolMax: 8 }), launchBrowser()]);
  world = await buildWorld(app, { words: "ORRERY\nBOOKS" });
  maker = await takeSignedInSeat(browser, { baseUrl: app.baseUrl, email: world.owner.email });
}, 120_000);

afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

async function picture(name: string) {
  if (!process.env.SCREENS) return;
  const folder = join(tmpdir(), "standproud-screens");
  await mkdir(folder, { recursive: true });
  await maker.page.screenshot({ path: join(folder, `lettering-${name}.png`) });
}

it("words of the brief become letters, are set again in a bowl, and are read back", async () => {
  const { page, open, faults } = maker;
  await open(`/shop/${world.params.shop}/jobs/${world.job.id}/mockup`);
  await page.locator('section[aria-label="Dry fit"][aria-busy="false"]').waitFor();
  const desk = mockup(page);

  await page.getByRole("button", { name: "lettering", exact: true }).click();
  const dialog = page.getByRole("dialog", { name: "Set lettering" });
  expect(await dialog.getByLabel("Words", { exact: true }).inputValue()).toBe("ORRERY");
  await dialog.getByRole("button", { name: "all 2 lines" }).click();
  await dialog.getByRole("radio", { name: "Cinzel, extra bold" }).check();
  await dialog.getByLabel("Capitals, high").fill("42");
  await dialog.getByLabel("Runs", { exact: true }).selectOption("over an arc");
  await dialog.getByLabel("Radius", { exact: true }).fill("230");
  await dialog.getByText(/^11 letters, in all [\d.]+ mm wide and [\d.]+ mm high\.$/).waitFor();
  await picture("dialog");
  const { violations } = await new AxeBuilder({ page }).include('[role="dialog"]').analyze();
  expect(violations.filter(({ impact }) => impact === "serious" || impact === "critical")).toEqual([]);
  await dialog.getByRole("button", { name: "Set the words" }).click();
  await dialog.waitFor({ state: "detached" });

  const list = page.getByRole("region", { name: "Pieces of B", exact: true });
  await list.getByRole("button", { name: "Letter 6: Y", exact: true }).waitFor();
  await page.getByRole("button", { name: "Words: read as the brief, 11 letters" }).waitFor();
  const setAgain = list.getByRole("button", { name: "Set “ORRERY BOOKS” again" });
  await setAgain.click();
  const second = page.getByRole("dialog", { name: "Set “ORRERY BOOKS” again" });
  await second.getByLabel("Words", { exact: true }).fill("ORERY → BOOKS");
  await second.getByText("Cinzel, extra bold has no letter for → (U+2192).", { exact: false }).waitFor();
  expect(await second.getByRole("button", { name: "Set again" }).isDisabled()).toBe(true);
  await second.getByLabel("Words", { exact: true }).fill("ORERY\nBOOKS");
  await second.getByRole("radio", { name: "Lobster, bold script" }).check();
  await second.getByLabel("Runs", { exact: true }).selectOption("in a bowl");
  await second.getByText(/^10 letters, in all/).waitFor();
  await second.getByRole("button", { name: "Set again" }).click();
  await second.waitFor({ state: "detached" });

  const words = page.getByRole("button", { name: "Words: not as the brief in 1 place" });
  await words.click();
  await page.getByText("R in the brief, nothing on the sign, not alike").waitFor({ state: "attached" });
  await picture("read-back");
  await vi.waitFor(
    async () => {
      const { document } = await world.visitors.owner.get(getMockup, { params: jobParams() });
      expect(document.lettering).toMatchObject([
        {
          words: "ORERY\nBOOKS",
          face: "lobster-400",
          fontSha256: createHash("sha256").update(fileOfFace("lobster-400")).digest("hex"),
          along: { kind: "arc", radius: 230, side: "under" },
        },
      ]);
      expect(document.layers[0]?.pieces.map(({ reads }) => reads).join("")).toBe("ORERYBOOKS");
    },
    { timeout: patienceMs, interval: 200 },
  );
  await desk.undo().click();
  await page.getByRole("button", { name: "Words: read as the brief, 11 letters" }).waitFor();
  expect(faults).toEqual([]);
});

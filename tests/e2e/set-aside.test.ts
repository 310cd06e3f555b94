import { mkdir } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import AxeBuilder from "@axe-core/playwright";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, expect, it, vi } from "vitest";
import { saveMockup } from "#shared/contracts/mockups.ts";
import { standardAdhesives } from "#shared/materials/standard-stock.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { launchBrowser } from "../support/browser.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { mockup } from "../support/drivers/mockup.ts";
import { buildMember } from "../support/factories/member.ts";
import { buildWorld, type World } from "../support/factories/work.ts";
import type { Seat, SeatSize } from "../support/seat.ts";
import { patienceMs } from "../support/served-app.ts";
import { takeSignedInSeat } from "../support/signed-in-seat.ts";

/** A stop is set aside by keyboard, passes, wakes when the piece moves, and is read by those who only look on. With SCREENS=1 with pictures. */

let app: TestApp;
let browser: Browser;
let world: World;
const folder = join(tmpdir(), "standproud-screens");

async function sit(email: string, size: SeatSize): Promise<Seat> {
  const seat = await takeSignedInSeat(browser, { baseUrl: app.baseUrl, email, size });
  await seat.open(`/shop/${world.params.shop}/jobs/${world.job.id}/mockup`);
  await seat.page.locator('section[aria-label="Dry fit"][aria-busy="false"]').waitFor();
  return seat;
}

async function keep(page: Page, name: string) {
  const { violations } = await new AxeBuilder({ page }).include('section[aria-label="Dry fit"]').analyze();
  const grave = violations.filter(({ impact }) => impact === "serious" || impact === "critical");
  expect(grave.map(({ id, nodes }) => `${id}: ${nodes[0]?.html}`)).toEqual([]);
  if (!process.env.SCREENS) return;
  await mkdir(folder, { recursive: true });
  await page.screenshot({ path: join(folder, `set-aside-${name}.png`), fullPage: true });
}

beforeAll(async () => {
  [app, browser] = await Promise.all([startTestApp({ poolMax: 8 }), launchBrowser()]);
  world = await buildWorld(app);
  // Bonded, with nothing to find the place by: a caution. Half over the board's edge: a stop and a caution.
  const adhesive = standardAdhesives.find(({ family }) => family === "epoxy");
  if (!adhesive) throw new Error("The standard stock has an epoxy.");
  const hold = { kind: "bond", adhesive, tack: null } as const;
  const document = buildSign([
    buildLayer("B", [plate("disc", 200, 150, [300, 200])], { name: "Disc", hold, locate: "none" }),
    buildLayer("C", [plate("arm", 100, 50, [0, 60], { name: "Arm" })], { name: "Arms", hold }),
  ]);
  const params = { ...world.params, jobId: world.job.id };
  await world.visitors.owner.get(saveMockup, { params, body: { version: 0, document } });
}, 120_000);

afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

it("is set aside with a reason by keyboard, passes, and wakes when the piece moves", async () => {
  const { email } = await buildMember({ shop: world.owner.shop, role: "maker" });
  const { page, faults } = await sit(email, "desk");
  const desk = mockup(page);
  const fit = desk.dryFit();
  const opener = fit.getByRole("button", { name: "Set aside: Unsupported" });
  const stops = async () => Number(/(\d+) stop/.exec((await fit.getByRole("status").textContent()) ?? "")?.[1] ?? 0);
  expect(await stops()).toBe(1);
  await keep(page, "1-found");

  await opener.focus();
  await page.keyboard.press("Enter");
  await fit.getByRole("form", { name: "Set aside: Unsupported" }).waitFor();
  await page.keyboard.type("The arm rests on the shelf beside the board");
  await keep(page, "2-asked");
  await page.keyboard.press("Escape");
  expect(await opener.evaluate((element) => element === document.activeElement)).toBe(true);
  await page.keyboard.press("Enter");
  await page.keyboard.type("The arm rests on the shelf beside the board");
  await page.keyboard.press("Tab");
  await page.keyboard.press("Enter");
  const aside = page.getByRole("region", { name: "Set aside" });
  await aside.getByText("“The arm rests on the shelf beside the board”").waitFor();
  await vi.waitFor(async () => expect(await stops()).toBe(0), patienceMs);
  expect(await aside.getByRole("heading").evaluate((element) => element === document.activeElement)).toBe(true);
  await keep(page, "3-set-aside");

  await desk.chooseLayer("C");
  await desk.write("x of Arm", "4");
  await fit.getByText("The value was 50 % then, it is 46 % now.").waitFor();
  await vi.waitFor(async () => expect(await stops()).toBe(1), patienceMs);
  await keep(page, "4-woken");
  await desk.undo().click();
  await aside.waitFor();

  await aside.getByRole("button", { name: "Take back: Unsupported" }).focus();
  await page.keyboard.press("Enter");
  await aside.waitFor({ state: "detached" });
  await vi.waitFor(async () => expect(await stops()).toBe(1), patienceMs);
  await opener.focus();
  await page.keyboard.press("Enter");
  await page.keyboard.type("The arm rests on the shelf after all");
  await page.keyboard.press("Tab");
  await page.keyboard.press("Enter");
  await aside.waitFor();
  await desk.issueButton("A").click();
  await page.getByRole("dialog").getByText("1 finding set aside").waitFor();
  if (process.env.SCREENS) await page.screenshot({ path: join(folder, "set-aside-5-issue.png") });
  await page.keyboard.press("Escape");
  expect(faults).toEqual([]);
});

it("is read by a rep and in the hand, with nothing to press", async () => {
  const { email } = await buildMember({ shop: world.owner.shop, role: "rep" });
  const seats = [await sit(email, "desk"), await sit(world.owner.email, "phone")];
  for (const [index, { page, faults }] of seats.entries()) {
    const aside = page.getByRole("region", { name: "Set aside" });
    await aside.getByText("“The arm rests on the shelf after all”").waitFor();
    const buttons = await mockup(page).dryFit().getByRole("button").allInnerTexts();
    expect(buttons.filter((text) => /Set aside|Take back/.test(text))).toEqual([]);
    await keep(page, index === 0 ? "6-rep" : "7-phone");
    expect(faults).toEqual([]);
  }
});

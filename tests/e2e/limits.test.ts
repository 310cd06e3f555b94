import type { Browser } from "playwright-core";
import { afterAll, beforeAll, expect, it } from "vitest";
import { ShopLimits } from "#server/models/shop-limits.ts";
import { getMockup, saveMockup } from "#shared/contracts/mockups.ts";
import { paths } from "@/app/paths.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { launchBrowser } from "../support/browser.ts";
import { keyboard } from "../support/drivers/keyboard.ts";
import { mockup } from "../support/drivers/mockup.ts";
import { buildMember } from "../support/factories/member.ts";
import { buildWorld, type World } from "../support/factories/work.ts";
import { takeSignedInSeat } from "../support/signed-in-seat.ts";
import { signWithFigures } from "../unit/src/features/mockup/sign-with-figures.ts";

let app: TestApp;
let browser: Browser;
let world: World;

const sit = (email: string) => takeSignedInSeat(browser, { baseUrl: app.baseUrl, email });

beforeAll(async () => {
  [app, browser] = await Promise.all([startTestApp({ poolMax: 8 }), launchBrowser()]);
  world = await buildWorld(app);
  const params = { ...world.params, jobId: world.job.id };
  const { version } = await world.visitors.owner.get(getMockup, { params });
  await world.visitors.owner.get(saveMockup, { params, body: { version, document: signWithFigures().document } });
}, 120_000);
afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

it("an owner sets the bed by keyboard, and the dry fit on a maker's desk keeps to it", async () => {
  const shop = world.params.shop;
  const maker = await buildMember({ shop: world.owner.shop, role: "maker" });
  const atDesk = await sit(maker.person.email);
  const desk = async () => {
    await atDesk.open(paths.mockup(shop, world.job.id));
    await atDesk.page.locator('section[aria-label="Dry fit"][aria-busy="false"]').waitFor();
    return mockup(atDesk.page).dryFit();
  };
  expect(await (await desk()).getByText("the bed takes").count()).toBe(0);

  const { page, open, faults } = await sit(world.owner.person.email);
  const keys = keyboard(page);
  await open(paths.shop(shop));
  await keys.go(page.getByRole("link", { name: "Look at the limits" }), "Enter");
  const write = async (label: string, text: string) => {
    await keys.go(page.getByLabel(label, { exact: true }), "Control+A");
    await page.keyboard.type(text);
  };
  await write("Width of the bed", "25 cm");
  await write("Height of the bed", "0");
  await keys.go(page.getByRole("button", { name: "Save the limits" }), "Enter");
  await page.getByText("Over 0 mm, up to 10000 mm.").waitFor();
  // The hand is led to the first field that is refused.
  await page.locator('input[aria-invalid="true"]:focus').waitFor();
  await page.keyboard.press("Control+A");
  await page.keyboard.type("200");
  await keys.go(page.getByRole("button", { name: "Save the limits" }), "Enter");
  await page.getByText("Saved. Mockups keep to them from now on").waitFor();
  expect((await ShopLimits.findByPk(world.owner.shop.id))?.own).toEqual({ bedWidthMm: 250, bedHeightMm: 200 });
  expect(await page.getByText("2 of").textContent()).toMatch(/^2 of \d+ limits are the shop’s own\.$/);

  await (await desk()).getByText("the bed takes 250 × 200 mm").first().waitFor();
  await atDesk.open(paths.limits(shop));
  await atDesk.page.getByText("You may look at the limits. Owners set them.").waitFor();
  expect(await atDesk.page.getByRole("listitem").filter({ hasText: "Width of the bed" }).textContent()).toContain(
    "250 mm",
  );
  await atDesk.page.getByRole("link", { name: "Rule 6 how we work it out" }).first().click();
  await atDesk.page.getByRole("heading", { name: /Hole window$/ }).waitFor();
  expect([...faults, ...atDesk.faults]).toEqual([]);
});

import type { Browser } from "playwright-core";
import { afterAll, beforeAll, expect, it } from "vitest";
import { PriceBook } from "#server/models/price-book.ts";
import { getMockup, saveMockup } from "#shared/contracts/mockups.ts";
import { paths } from "@/app/paths.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { launchBrowser } from "../support/browser.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { keyboard } from "../support/drivers/keyboard.ts";
import { mockup } from "../support/drivers/mockup.ts";
import { buildMember } from "../support/factories/member.ts";
import { buildWorld, type World } from "../support/factories/work.ts";
import { takeSignedInSeat } from "../support/signed-in-seat.ts";

let app: TestApp;
let browser: Browser;
let world: World;

const sit = (email: string) => takeSignedInSeat(browser, { baseUrl: app.baseUrl, email });

beforeAll(async () => {
  [app, browser] = await Promise.all([startTestApp({ poolMax: 8 }), launchBrowser()]);
  world = await buildWorld(app);
  const params = { ...world.params, jobId: world.job.id };
  const { version } = await world.visitors.owner.get(getMockup, { params });
  const document = { ...buildSign([buildLayer("B", [plate("b", 200, 100, [300, 200])])]), quantity: 3 };
  await world.visitors.owner.get(saveMockup, { params, body: { version, document } });
}, 120_000);
afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

it("an owner writes prices by keyboard, a maker's desk reckons with them as the sign changes, and a rep sees none", async () => {
  const shop = world.params.shop;
  const maker = await sit((await buildMember({ shop: world.owner.shop, role: "maker" })).person.email);
  const cost = maker.page.getByRole("region", { name: "Cost" });
  await maker.open(paths.mockup(shop, world.job.id));
  await cost.getByText("the shop has no prices. An owner writes them.").waitFor();

  const { page, open, faults } = await sit(world.owner.person.email);
  const keys = keyboard(page);
  await open(paths.mockup(shop, world.job.id));
  await keys.go(page.getByRole("link", { name: "Write the prices" }), "Enter");
  await page.getByRole("heading", { level: 1, name: "Prices" }).waitFor();
  const write = async (label: string, text: string) => {
    await keys.go(page.getByLabel(label, { exact: true }), "Control+A");
    await page.keyboard.type(text);
  };
  await write("Find by name", "midnight");
  await write("Midnight, 3 mm, Price", "60,005");
  await keys.go(page.getByRole("button", { name: "Save the prices" }), "Enter");
  await page.getByText("EUR has 2 decimals at most: write 12.50.").waitFor();
  // The hand is led to the field that is refused.
  await page.locator('input[aria-invalid="true"]:focus').waitFor();
  await page.keyboard.press("Control+A");
  await page.keyboard.type("60,00");
  await keys.go(page.getByRole("button", { name: "Save the prices" }), "Enter");
  await page.getByText("Saved. Mockups reckon with them from now on.").waitFor();
  expect((await PriceBook.findByPk(world.owner.shop.id))?.book.materials).toMatchObject([
    { name: "Midnight, 3 mm", unit: "m²", price: 6000, waste: 0.5 },
  ]);

  await maker.open(paths.mockup(shop, world.job.id));
  const fold = cost.getByRole("button", { name: /^Costs / });
  await fold.waitFor();
  // 0.02 m² and half of it for waste, three times, at 60: 0.09 m² are 5.40.
  expect((await fold.textContent())?.replaceAll("\u00a0", " ")).toMatch(
    /^Costs 1\.80 EUR a sign, 3 signs 5\.40 EUR, \d+ things/,
  );
  await fold.click();
  await cost.getByText("No price yet, and not in the sum:").waitFor();
  await mockup(maker.page).addPlate({
    shape: "rectangle",
    name: "Second",
    width: "100",
    height: "100",
    stock: "Midnight",
    thickness: "3",
    hold: "Standoff 19 × 12",
  });
  // Half as much again.
  await cost.getByRole("button", { name: /^Costs 2\.70.EUR a sign, 3 signs 8\.10.EUR/ }).waitFor();

  const rep = await sit((await buildMember({ shop: world.owner.shop, role: "rep" })).person.email);
  await rep.open(paths.mockup(shop, world.job.id));
  await rep.page.getByRole("heading", { name: "Schedule" }).waitFor();
  expect(await rep.page.getByRole("region", { name: "Cost" }).count()).toBe(0);
  expect(await rep.page.getByText("EUR").count()).toBe(0);
  expect(await rep.page.getByRole("link", { name: "Prices" }).count()).toBe(0);
  await rep.open(paths.prices(shop));
  await rep.page.getByRole("heading", { name: /not/i }).waitFor();
  expect([...faults, ...maker.faults, ...rep.faults]).toEqual([]);
});

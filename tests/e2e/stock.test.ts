import type { Browser } from "playwright-core";
import { afterAll, beforeAll, expect, it } from "vitest";
import { StockItem } from "#server/models/stock-item.ts";
import { paths } from "@/app/paths.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { launchBrowser } from "../support/browser.ts";
import { entrance } from "../support/drivers/entrance.ts";
import { keyboard } from "../support/drivers/keyboard.ts";
import { buildMember } from "../support/factories/member.ts";
import { testPassword } from "../support/factories/person.ts";
import { buildWorld, type World } from "../support/factories/work.ts";
import { type Seat, takeSeat } from "../support/seat.ts";

/** A maker keeps the stock by keyboard alone, and the mockup offers what stands there. */

let app: TestApp;
let browser: Browser;
let world: World;
let maker: Seat;

beforeAll(async () => {
  [app, browser] = await Promise.all([startTestApp({ poolMax: 8 }), launchBrowser()]);
  world = await buildWorld(app);
  const { email } = await buildMember({ shop: world.owner.shop, role: "maker" });
  maker = await takeSeat(browser, { baseUrl: app.baseUrl, size: "desk" });
  await entrance(maker.page).signIn({ email, password: testPassword });
}, 120_000);

afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

it("lets a sheet be added, changed, taken out and brought back without the mouse", async () => {
  const { page, faults, open } = maker;
  const keys = keyboard(page);
  const dialog = page.getByRole("dialog");
  await open(`${paths.stock(world.params.shop)}?kind=acrylic&q=heather`);
  await page.getByText("Nothing here has “heather” in its name.").waitFor();

  await keys.go(page.getByRole("button", { name: "Add an acrylic sheet" }), "Enter");
  await keys.go(dialog.getByLabel("Name", { exact: true }));
  await page.keyboard.type("Heather");
  await keys.go(dialog.getByLabel("Colour", { exact: true }), "Control+a");
  await page.keyboard.type("#7d6b8f");
  await keys.go(dialog.getByLabel("Thickness", { exact: true }));
  await page.keyboard.type("3");
  await page.keyboard.press("Enter");
  await keys.go(dialog.getByRole("button", { name: "Add to stock" }), "Enter");
  await page.getByText("Heather is in stock.").waitFor();
  await page.getByRole("button", { name: "Add an acrylic sheet" }).and(page.locator(":focus")).waitFor();

  const change = page.getByRole("button", { name: "Change Heather" });
  await keys.go(change, "Enter");
  await keys.go(dialog.getByRole("button", { name: "Add a sheet size" }), "Enter");
  await keys.back(dialog.getByLabel("How many"));
  await page.keyboard.type("2");
  await keys.back(dialog.getByLabel("Wide"));
  await page.keyboard.type("610");
  await keys.back(dialog.getByLabel("Long"));
  await page.keyboard.type("1220");
  // What was written is not lost to one press of Escape.
  await page.keyboard.press("Escape");
  await keys.go(page.getByRole("button", { name: "Go on writing" }), "Enter");
  await keys.go(dialog.getByRole("button", { name: "Save" }), "Enter");
  await page.getByText("Heather is saved.").waitFor();
  await change.and(page.locator(":focus")).waitFor();
  await page.getByText("3 mm, 1220 × 610 mm: 2").waitFor();

  await keys.go(page.getByRole("button", { name: "Take Heather out of stock" }), "Enter");
  const undo = page.getByRole("button", { name: "Bring it back" });
  await undo.and(page.locator(":focus")).waitFor();
  const kept = await StockItem.findOne({ where: { name: "Heather" }, rejectOnEmpty: true });
  expect(kept.retiredAt).not.toBeNull();
  await page.keyboard.press("Enter");
  await page.getByText("Heather is back in stock.").waitFor();

  await open(paths.mockup(world.params.shop, world.job.id));
  await page.getByRole("button", { name: "a plate" }).click();
  await dialog.getByLabel("Stock").selectOption("Heather");
  expect(await dialog.getByLabel("Thickness").getByRole("option").allTextContents()).toEqual(["3"]);
  expect(faults).toEqual([]);
});

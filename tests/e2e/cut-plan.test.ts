import AxeBuilder from "@axe-core/playwright";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { Job } from "#server/models/job.ts";
import { Mockup } from "#server/models/mockup.ts";
import { demoAccounts, demoPassword } from "#server/start/demo-accounts.mjs";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { readDocument } from "#shared/mockup/upgrade.ts";
import { slatsOf } from "#shared/stack/backer.ts";
import { paths } from "@/app/paths.ts";
import { launchBrowser } from "../support/browser.ts";
import { entrance } from "../support/drivers/entrance.ts";
import { type Seat, takeSeat } from "../support/seat.ts";
import { type ServedApp, startServedApp } from "../support/served-app.ts";

/** The demo shop's maker opens the cut plan of the bookshop's sign, as built and served, worker and content policy included. */

const shop = "copperlark-signs";
let app: ServedApp;
let browser: Browser;
let maker: Seat;
let jobId: string;
let document: MockupDocument;

beforeAll(async () => {
  [app, browser] = await Promise.all([startServedApp({ demo: true }), launchBrowser()]);
  const job = (await Job.findAll()).find(({ number }) => number.endsWith("142"));
  if (!job) throw new Error("The demo shop has no job 142.");
  jobId = job.id;
  const { document: text } = await Mockup.findOne({ where: { jobId }, rejectOnEmpty: true });
  const read = readDocument(JSON.parse(text));
  if (!read.ok) throw new Error(read.reason);
  document = read.document;
  const account = demoAccounts.find(({ role }) => role === "maker");
  if (!account) throw new Error("The demo shop has no maker.");
  maker = await takeSeat(browser, { baseUrl: app.baseUrl, size: "desk" });
  await entrance(maker.page).signIn({ email: account.email, password: demoPassword });
}, 180_000);

afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

const planned = (page: Page) => page.locator('[aria-busy="false"]:has(#to-buy)');

it("places every piece on a sheet and lists every slat, and says that nothing is agreed yet", async () => {
  const { page, open, faults } = maker;
  await open(paths.cutPlan(shop, jobId));
  await page.getByText(/nothing is agreed yet, do not cut/).waitFor();
  await planned(page).waitFor({ timeout: 120_000 });
  const pieces = document.layers.flatMap((layer) => layer.pieces.map(({ id }) => id));
  expect(pieces.length).toBeGreaterThan(5);
  const drawn = await page
    .locator('[data-id^="piece:"]')
    .evaluateAll((all) => all.map((one) => one.getAttribute("data-id")?.replace("piece:", "")));
  expect(drawn.toSorted()).toEqual(pieces.flatMap((id) => Array<string>(document.quantity).fill(id)).toSorted());

  const slats = slatsOf(document, await loadKernel());
  const laid = slats?.ok ? slats.value.slats.length : 0;
  expect(laid).toBeGreaterThan(0);
  const list = page.getByRole("table", { name: "Slats in the order they are laid" }).getByRole("row");
  const spine = slats?.ok && slats.value.spine ? 1 : 0;
  expect(await list.count()).toBe(1 + spine + laid);

  const { violations } = await new AxeBuilder({ page }).analyze();
  expect(violations.filter(({ impact }) => impact === "serious" || impact === "critical")).toEqual([]);
  expect(faults).toEqual([]);
});

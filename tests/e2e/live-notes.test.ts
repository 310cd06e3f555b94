import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it, vi } from "vitest";
import { paths } from "@/app/paths.ts";
import { launchBrowser } from "../support/browser.ts";
import { entrance } from "../support/drivers/entrance.ts";
import { sheet } from "../support/drivers/sheet.ts";
import { buildMember } from "../support/factories/member.ts";
import { type KillableServer, prepareServer } from "../support/killable-server.ts";
import { mailsIn, tokenIn } from "../support/mail.ts";
import { type Seat, takeSeat } from "../support/seat.ts";
import { patienceMs } from "../support/served-app.ts";
import { openShopUnderFire, type ShopUnderFire } from "../support/shop-under-fire.ts";
import { takeSignedInSeat } from "../support/signed-in-seat.ts";

/** Two processes over one database: the maker sits at one, the client's phone is with the other. */
let makers: KillableServer;
let clients: KillableServer;
let shop: ShopUnderFire;
let browser: Browser;
let maker: Seat;
let client: Seat;
/** All that the server ever sent to the client's page. */
const sentToClient: Promise<string>[] = [];

beforeAll(async () => {
  makers = await prepareServer();
  await makers.start();
  [shop, clients, browser] = await Promise.all([
    openShopUnderFire(makers),
    prepareServer({ beside: makers }),
    launchBrowser(),
  ]);
  const [revision, { email }] = await Promise.all([
    shop.issue(120),
    buildMember({ shop: shop.shop, role: "maker" }),
    clients.start(),
  ]);
  const path = paths.sheet(shop.shop.slug, revision?.id ?? "");
  client = await takeSeat(browser, { baseUrl: clients.baseUrl, size: "phone" });
  client.page.on("response", (answer) => {
    if (answer.url().includes("/notes")) sentToClient.push(answer.text().catch(() => "cut"));
  });
  // Mailed once the drawing stands.
  const link = await vi.waitFor(async () => `/link/${tokenIn((await mailsIn(makers.mailDir))[0]?.text ?? "")}`, {
    timeout: patienceMs,
    interval: 100,
  });
  await entrance(client.page).openLink(link, shop.shop.name, /\/sheets\//);
  maker = await takeSignedInSeat(browser, { baseUrl: makers.baseUrl, email });
  await maker.open(path);
  for (const { page } of [maker, client]) {
    await sheet(page).isOut();
    await page.evaluate(() => Object.assign(window, { neverLoadedAgain: true }));
  }
});

afterAll(async () => {
  await browser.close();
  await shop.close();
  await clients.clear();
  await makers.clear();
});

const shows = (page: Page, text: string) =>
  page
    .getByRole("region", { name: /^Notes/ })
    .getByText(text)
    .waitFor();
const wasNeverLoadedAgain = (page: Page) => page.evaluate(() => "neverLoadedAgain" in window);

describe("two people before one sheet, each with a process of their own", () => {
  it("see what the other writes as it is written", async () => {
    await sheet(client.page).addNoteAt({ across: 0.4, down: 0.4 }, { kind: "Question", text: "Is it heavy?" });
    await shows(maker.page, "Is it heavy?");
    await sheet(maker.page).balloon(1).waitFor();
    await sheet(maker.page).reply(1, "Two kilograms.");
    await shows(client.page, "Two kilograms.");
    await expect.poll(() => sheet(client.page).note(1).textContent(), { timeout: patienceMs }).toContain("answered");
  });

  it("keep apart what is the shop’s alone", async () => {
    const secret = "Charge for the odd size.";
    await sheet(maker.page).addNoteAt({ across: 0.7, down: 0.7 }, { kind: "Question", text: secret, shopOnly: true });
    await shows(maker.page, secret);
    // The next thing that is the client's too shows that the secret one has had its time to come.
    await sheet(maker.page).addNoteAt({ across: 0.2, down: 0.2 }, { kind: "Fine as is", text: "Rounded corners." });
    await shows(client.page, "Rounded corners.");
    const all = (await Promise.all(sentToClient)).join();
    expect(all).toContain("Rounded corners.");
    expect(all + (await client.page.content())).not.toContain(secret);
  });

  it("go on after the client’s process was killed and started anew", async () => {
    await clients.kill();
    await sheet(maker.page).reply(1, "Hung on two screws.");
    await clients.start();
    await shows(client.page, "Hung on two screws.");
  });

  it("and never had to load the page again", async () => {
    expect(await wasNeverLoadedAgain(client.page)).toBe(true);
    expect(await wasNeverLoadedAgain(maker.page)).toBe(true);
    expect(maker.faults).toEqual([]);
  });
});

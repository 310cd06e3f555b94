import { mkdir } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import AxeBuilder from "@axe-core/playwright";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it, vi } from "vitest";
import { loadStandardStock } from "#server/commands/load-standard-stock.ts";
import { connect } from "#server/db/connection.ts";
import { initModels } from "#server/models/init-models.ts";
import { openJob } from "#shared/contracts/jobs.ts";
import { getMockup, saveMockup } from "#shared/contracts/mockups.ts";
import { launchBrowser } from "../support/browser.ts";
import { mockup } from "../support/drivers/mockup.ts";
import { buildClient } from "../support/factories/client.ts";
import { buildMember, type Member } from "../support/factories/member.ts";
import { testPassword } from "../support/factories/person.ts";
import { holdJob } from "../support/hold-job.ts";
import { type KillableServer, prepareServer } from "../support/killable-server.ts";
import { type Seat, sizes } from "../support/seat.ts";
import { patienceMs } from "../support/served-app.ts";
import { takeSignedInSeat } from "../support/signed-in-seat.ts";
import { Visitor } from "../support/visitor.ts";
import { signWithFigures } from "../unit/src/features/mockup/sign-with-figures.ts";

/**
 * What nobody may lose: a connection that goes, a tab that is closed or dies, a server that is killed in the middle of a save,
 * a sign-in that lapses; drafts with a name, and a job opened like another. With SCREENS=1 pictures are kept.
 */

let server: KillableServer;
let sequelize: ReturnType<typeof connect>;
let browser: Browser;
let owner: Member;
let visitor: Visitor;
let seat: Seat;

beforeAll(async () => {
  [server, browser] = await Promise.all([prepareServer(), launchBrowser()]);
  await server.start();
  sequelize = connect(server.database.ownerUrl, { poolMax: 1 });
  initModels(sequelize);
  owner = await buildMember();
  await sequelize.transaction((transaction) =>
    loadStandardStock({ shopId: owner.shop.id, now: new Date(), transaction }),
  );
  visitor = new Visitor(server.baseUrl);
  await visitor.signIn("password", { email: owner.email, password: testPassword });
  seat = await takeSignedInSeat(browser, { baseUrl: server.baseUrl, email: owner.email });
}, 120_000);

afterAll(async () => {
  await browser?.close();
  await sequelize?.close();
  await server?.clear();
});

const params = () => ({ shop: owner.shop.slug });

/** A job with a saved mockup of three layers, B, C and D. */
async function newJob(title: string) {
  const client = await buildClient({ shop: owner.shop });
  const { id } = await visitor.get(openJob, { params: params(), body: { clientId: client.id, title } });
  const of = { ...params(), jobId: id };
  const { document } = signWithFigures();
  await visitor.get(saveMockup, { params: of, body: { version: 0, document } });
  const onServer = async () => (await visitor.get(getMockup, { params: of })).document;
  return {
    id,
    client,
    address: `/shop/${of.shop}/jobs/${id}`,
    onServer,
    /** Waits until a layer has a name on the server. */
    named: (name: string) =>
      vi.waitFor(async () => expect((await onServer()).layers.map((layer) => layer.name)).toContain(name), {
        timeout: patienceMs,
        interval: 100,
      }),
  };
}
type TestJob = Awaited<ReturnType<typeof newJob>>;

async function openDesk(page: Page, { address }: TestJob) {
  await page.goto(`${address}/mockup`);
  const desk = mockup(page);
  await desk.cell("Name of D").waitFor();
  return desk;
}

const offered = (page: Page) => page.getByText(/was kept on this device and never saved/);

/** Waits until the browser itself holds a draft with these words, whatever the page says. */
const keptInBrowser = (page: Page, words: string) =>
  vi.waitFor(
    async () => {
      const kept = await page.evaluate(
        () =>
          new Promise<string>((resolve) => {
            const opening = indexedDB.open("standproud");
            opening.onsuccess = () => {
              const all = opening.result.transaction("drafts").objectStore("drafts").getAll();
              all.onsuccess = () => {
                opening.result.close();
                resolve(JSON.stringify(all.result));
              };
            };
          }),
      );
      expect(kept).toContain(words);
    },
    { timeout: patienceMs, interval: 50 },
  );

/** The page can't save: the connection is cut for that alone, so that the page itself can be opened. */
const cutSaves = (page: Page) =>
  page.route(/\/mockup$/, (route) => (route.request().method() === "PUT" ? route.abort() : route.continue()));

/** No grave finding of axe; with SCREENS=1 a picture. */
async function lookAt(page: Page, name: string, within = "body") {
  const { violations } = await new AxeBuilder({ page }).include(within).analyze();
  const grave = violations.filter(({ impact }) => impact === "serious" || impact === "critical");
  expect(grave.map(({ id, nodes }) => `${id}: ${nodes[0]?.html}`)).toEqual([]);
  if (!process.env.SCREENS) return;
  const folder = join(tmpdir(), "standproud-screens");
  await mkdir(folder, { recursive: true });
  await page.screenshot({ path: join(folder, `safety-${name}.png`) });
}

describe("work that never reached the server", () => {
  it("outlives a lost connection and a closed tab, is compared with what the server has, and saved when taken up", async () => {
    const job = await newJob("Offline");
    const page = await seat.context.newPage();
    const desk = await openDesk(page, job);
    // The part that draws has come, too.
    await page.locator('section[aria-label="Dry fit"][aria-busy="false"]').waitFor();
    await seat.context.setOffline(true);
    await desk.write("Name of D", "Kept sun");
    await desk.write("Name of C", "Kept ring");
    await page.getByText("No connection. Kept on this device").waitFor();
    await page.close();
    await seat.context.setOffline(false);

    const again = await seat.context.newPage();
    const second = await openDesk(again, job);
    await offered(again).waitFor();
    await again
      .getByText(/^It is 2 changes, the last of them “.+”\. It began from version 1, which is the one you see/)
      .waitFor();
    await again.getByText("D, Kept sun: called Sun before").waitFor();
    await lookAt(again, "kept-draft", '[role="status"]:has(button)');
    await again.getByRole("button", { name: "Take it up" }).click();
    await job.named("Kept sun");
    await second.saved();
    await second.undo().click();
    await job.named("Sun");
    await again.reload();
    await second.cell("Name of D").waitFor();
    expect(await offered(again).count()).toBe(0);
    await again.close();
  });

  it("outlives a tab that dies in the middle of a save, and two tabs keep theirs beside each other", async () => {
    const job = await newJob("Crash");
    const [first, second] = [await seat.context.newPage(), await seat.context.newPage()];
    for (const page of [first, second]) await cutSaves(page);
    const desk = await openDesk(first, job);
    await desk.write("Name of D", "First tab");
    await keptInBrowser(first, "First tab");
    const other = await openDesk(second, job);
    // The first tab is open: its work is its own.
    expect(await offered(second).count()).toBe(0);
    await other.write("Name of D", "Second tab");
    await keptInBrowser(second, "Second tab");
    for (const page of [first, second]) {
      const crashed = page.waitForEvent("crash");
      const devtools = await seat.context.newCDPSession(page);
      // It answers to nobody any more.
      void devtools.send("Page.crash").catch(() => undefined);
      await crashed;
      await page.close();
    }

    const page = await seat.context.newPage();
    await openDesk(page, job);
    await vi.waitFor(async () => expect(await offered(page).count()).toBe(2), { timeout: patienceMs });
    // The newest first.
    await page.getByRole("button", { name: "Throw it away" }).first().click();
    await page.getByRole("alertdialog").getByRole("button", { name: "Throw it away" }).click();
    await vi.waitFor(async () => expect(await offered(page).count()).toBe(1));
    await page.getByRole("button", { name: "Take it up" }).click();
    await job.named("First tab");
    await page.close();
  });

  it("is saved by itself once a server is back that was killed in the middle of a save", async () => {
    const job = await newJob("Kill");
    const page = await seat.context.newPage();
    const desk = await openDesk(page, job);
    const held = await holdJob(server.database, job.id);
    await desk.write("Name of D", "Through the fire");
    await held.waiters(1);
    await keptInBrowser(page, "Through the fire");
    await server.kill();
    await page.getByText("No connection. Kept on this device").waitFor();
    await held.release();
    await server.start();
    expect((await job.onServer()).layers[2]?.name).toBe("Sun");
    await page.evaluate(() => window.dispatchEvent(new Event("online")));
    await job.named("Through the fire");
    await desk.saved();
    await page.reload();
    await desk.cell("Name of D").waitFor();
    expect(await offered(page).count()).toBe(0);
    await page.close();
  });

  it("is no conflict with itself when the window is made narrow and wide, or the mockup opened again, during a save", async () => {
    const job = await newJob("Narrow");
    const page = await seat.context.newPage();
    await page.setViewportSize(sizes.desk);
    const desk = await openDesk(page, job);
    const leaveDuringSave = async (name: string, leave: () => Promise<void>) => {
      const held = await holdJob(server.database, job.id);
      await desk.write("Name of D", name);
      await held.waiters(1);
      await leave();
      await page.getByText("The mockup opens as soon as that is done.").waitFor();
      await held.release();
      await desk.cell("Name of D").waitFor();
      expect(await desk.cell("Name of D").inputValue()).toBe(name);
      await desk.write("Name of C", `Beside ${name}`);
      await job.named(`Beside ${name}`);
      await desk.saved();
      expect(await offered(page).count()).toBe(0);
    };
    await leaveDuringSave("Narrow", async () => {
      await page.setViewportSize(sizes.phone);
      await desk.cell("Name of D").waitFor({ state: "detached" });
      await page.setViewportSize(sizes.desk);
    });
    await leaveDuringSave("Away", async () => {
      await page.getByRole("heading", { level: 1 }).getByRole("link").click();
      await page
        .getByRole("link", { name: /mockup/i })
        .first()
        .click();
    });
    await page.close();
  });

  it("is said not to be kept while the browser has no room, and is offered after a sign-in that lapsed meanwhile", async () => {
    const job = await newJob("Lapsed");
    const own = await takeSignedInSeat(browser, { baseUrl: server.baseUrl, email: owner.email });
    const devtools = await own.context.newCDPSession(own.page);
    const origin = server.baseUrl;
    await devtools.send("Storage.overrideQuotaForOrigin", { origin, quotaSize: 1 });
    const desk = await openDesk(own.page, job);
    await desk.write("Name of D", "No room");
    await own.page.getByText(/^Saved .+\. No copy on this device: no room left$/).waitFor();
    // Said in one row with all that an owner finds there: at 1440 px the header is as high as ever.
    expect((await own.page.getByRole("banner").boundingBox())?.height).toBeLessThan(60);
    await job.named("No room");
    await devtools.send("Storage.overrideQuotaForOrigin", { origin });

    await own.context.clearCookies();
    await desk.write("Name of D", "Signed out");
    await own.page.waitForURL(/\/sign-in\?next=/);
    await own.page.getByLabel("E-mail address").first().fill(owner.email);
    await own.page.getByLabel("Password").fill(testPassword);
    await own.page.getByRole("button", { name: "Sign in" }).click();
    await own.page.waitForURL(/\/mockup$/);
    await offered(own.page).waitFor();
    await own.page.getByRole("button", { name: "Take it up" }).click();
    await job.named("Signed out");
    await own.leave();
  });
});

describe("steps and drafts", () => {
  it("lead back by keyboard, also after a visit to the job's page, and a draft is one more step", async () => {
    const job = await newJob("Steps");
    const page = await seat.context.newPage();
    const desk = await openDesk(page, job);
    const nameOfD = (name: string) =>
      vi.waitFor(async () => expect(await desk.cell("Name of D").inputValue()).toBe(name), { timeout: patienceMs });
    for (const name of ["One", "Two", "Three"]) await desk.write("Name of D", name);
    await page.getByRole("button", { name: "Steps" }).press("Enter");
    await page.getByRole("dialog", { name: "Steps, the newest first" }).waitFor();
    await lookAt(page, "steps", '[role="dialog"]');
    for (const key of ["ArrowDown", "ArrowDown", "ArrowDown", "Enter", "Escape"]) await page.keyboard.press(key);
    await nameOfD("Sun");
    await desk.redo().click();
    await nameOfD("One");
    await job.named("One");
    await desk.saved();
    await page.getByRole("heading", { level: 1 }).getByRole("link").click();
    await page
      .getByRole("link", { name: /mockup/i })
      .first()
      .click();
    await nameOfD("One");
    await desk.undo().click();
    await nameOfD("Sun");

    await page.getByRole("button", { name: "Drafts", exact: true }).click();
    const dialog = page.getByRole("dialog", { name: "Drafts" });
    await dialog.getByText("No draft is kept yet.").waitFor();
    await dialog.getByLabel("Name of the draft").fill("First idea");
    await dialog.getByRole("button", { name: "Keep as a draft" }).click();
    await dialog.getByText("“First idea” is kept.").waitFor();
    await dialog.getByRole("button", { name: "Close", exact: true }).click();
    await desk.write("Name of D", "Second idea");
    await page.getByRole("button", { name: "Drafts", exact: true }).click();
    await dialog.getByRole("button", { name: "Look at First idea" }).click();
    await dialog.getByRole("application", { name: /The draft “First idea”, from the front/ }).waitFor();
    await dialog.getByText("D, Sun: called Second idea before").waitFor();
    await lookAt(page, "drafts", '[role="dialog"]');
    await dialog.getByRole("button", { name: "Go back to First idea" }).click();
    await dialog.waitFor({ state: "detached" });
    await nameOfD("Sun");
    await desk.undo().click();
    await nameOfD("Second idea");
    await job.named("Second idea");
    await page.close();
  });
});

describe("another like this", () => {
  it("says what comes along and what stays, and opens a job whose mockup begins with it", async () => {
    const job = await newJob("First of its kind");
    const other = await buildClient({ shop: owner.shop });
    const page = await seat.context.newPage();
    await page.setViewportSize(sizes.phone);
    await page.goto(job.address);
    await page.getByRole("button", { name: "Open another like this" }).click();
    const dialog = page.getByRole("dialog", { name: /^Another like / });
    await dialog.getByRole("checkbox", { name: "Take the artwork along" }).waitFor();
    await lookAt(page, "another-phone", '[role="dialog"]');
    await page.setViewportSize(sizes.desk);
    await dialog.getByLabel("For whom").selectOption({ label: other.name });
    expect(await dialog.getByRole("checkbox").count()).toBe(0);
    await dialog.getByLabel("What the sign is").fill("Second of its kind");
    await dialog.getByLabel("The words exactly as they shall read").fill("NEW WORDS");
    await lookAt(page, "another-desk", '[role="dialog"]');
    await dialog.getByRole("button", { name: "Open the job" }).click();
    await page.getByRole("heading", { level: 1, name: "Second of its kind" }).waitFor();
    await page.getByText("NEW WORDS").first().waitFor();
    await page.goto(`${new URL(page.url()).pathname}/mockup`);
    await mockup(page).cell("Name of D").waitFor();
    expect(await mockup(page).cell("Name of D").inputValue()).toBe("Layer D");
    await page.close();
    // The browser's own lines about requests that were cut on purpose are none of the page's.
    expect(seat.faults.filter((fault) => !/Failed to load resource/.test(fault))).toEqual([]);
  });
});

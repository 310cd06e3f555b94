import { mkdir } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import AxeBuilder from "@axe-core/playwright";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it, onTestFailed } from "vitest";
import { Client } from "#server/models/client.ts";
import { Job } from "#server/models/job.ts";
import { Revision } from "#server/models/revision.ts";
import { demoAccounts, demoPassword } from "#server/start/demo-accounts.mjs";
import { listShareLinks, makeShareLink, revokeShareLink } from "#shared/contracts/portfolio.ts";
import { paths } from "@/app/paths.ts";
import { launchBrowser } from "../support/browser.ts";
import { entrance } from "../support/drivers/entrance.ts";
import { keyboard } from "../support/drivers/keyboard.ts";
import { sheet } from "../support/drivers/sheet.ts";
import { jobOf, screens, sheetOf, shop, state, type Who } from "../support/screen-table.ts";
import { type Seat, type SeatSize, type StorageState, sizes, takeSeat } from "../support/seat.ts";
import { type ServedApp, startServedApp } from "../support/served-app.ts";

/** Every screen of the application with the demo shop in it, on a desk and in the hand. With SCREENS=1 each is kept as a picture. */

const folder = join(tmpdir(), "standproud-screens");
let app: ServedApp;
let browser: Browser;
const sessions = new Map<Who, StorageState>();
const seats = new Map<string, Seat>();

async function seatOf(who: Who, size: SeatSize): Promise<Seat> {
  const taken = seats.get(`${who} ${size}`);
  if (taken) return taken;
  const storageState = sessions.get(who);
  const seat = await takeSeat(browser, { baseUrl: app.baseUrl, size, ...(storageState ? { storageState } : {}) });
  seats.set(`${who} ${size}`, seat);
  return seat;
}

/** Lets someone sign in through the page once; both screens share the session. */
async function signedIn(who: Who, signIn: (page: Page) => Promise<void>): Promise<void> {
  const seat = await takeSeat(browser, { baseUrl: app.baseUrl, size: "desk" });
  await signIn(seat.page);
  sessions.set(who, await seat.context.storageState());
  await seat.leave();
}

async function askForLink(page: Page, email: string): Promise<string> {
  await page.goto(paths.signIn());
  await page.getByLabel("E-mail address").last().fill(email);
  await page.getByRole("button", { name: "Mail me a link" }).click();
  return app.linkMailedTo(email, /^Your link/);
}

beforeAll(async () => {
  [app, browser] = await Promise.all([startServedApp({ demo: true }), launchBrowser()]);
  for (const { id, number } of await Job.findAll()) state.jobs.set(number.replace(/^\D*0*/, ""), id);
  for (const { id, letter, jobId } of await Revision.findAll()) {
    const [number = ""] = [...state.jobs].find(([, job]) => job === jobId) ?? [];
    state.sheets.set(`${number} ${letter}`, id);
  }
  state.links.set("client", (await Client.findOne({ where: { name: "Orrery Books" }, rejectOnEmpty: true })).id);
  for (const { role, email } of demoAccounts) {
    if (role === "client") continue;
    await signedIn(role, (page) => entrance(page).signIn({ email, password: demoPassword }));
  }
  for (const [who, email] of [
    ["client", "client@orrery.example"],
    ["captain", "captain@saltgrass.example"],
  ] as const) {
    await signedIn(who, async (page) => {
      const link = await askForLink(page, email);
      await entrance(page).openLink(link, "Copperlark Signs", /\/shop\//);
      if (who === "client") state.links.set("spent", link);
    });
  }
  await signedIn("newcomer", async (page) => {
    await entrance(page).register({
      shopName: "Alder & Awl",
      name: "Wren Alder",
      email: "wren@alderawl.example",
      password: "six small planes sing",
    });
    const slug = new URL(page.url()).pathname.split("/")[2] ?? "";
    for (const place of ["bench", "clients", "portfolio", "prices"] as const)
      state.links.set(`new ${place}`, paths[place](slug));
    await page.goto(paths.team(slug));
    await page.getByLabel("E-mail address").fill("heath@alderawl.example");
    await page.getByRole("button", { name: "Send the invitation" }).click();
    state.links.set("join", await app.linkMailedTo("heath@alderawl.example", /^Join/));
    state.links.set("open", await askForLink(page, "treasurer@saltgrass.example"));
  });
  const rep = app.visitor();
  await rep.signIn("password", { email: "rep@copperlark.example", password: demoPassword });
  const body = { label: "The next client", jobIds: [jobOf("135")], days: 30 };
  const open = await rep.get(makeShareLink, { params: { shop }, body });
  state.links.set("share", new URL(open.url).pathname);
  const closed = await rep.get(makeShareLink, { params: { shop }, body: { ...body, label: "Someone before" } });
  state.links.set("closed", new URL(closed.url).pathname);
  await rep.get(revokeShareLink, { params: { shop, linkId: closed.link.id } });
  expect((await rep.get(listShareLinks, { params: { shop } })).items).toHaveLength(2);
  await mkdir(folder, { recursive: true });
}, 180_000);

afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

it("leaves no address out", () => {
  expect(new Set(screens.map(({ at }) => at))).toEqual(new Set(Object.keys(paths)));
});

describe.each(["desk", "phone"] as const)("on the %s", (size) => {
  it.each(screens.filter(({ only = size }) => only === size))("$who sees $name as it should be", async (screen) => {
    const { page, faults } = await seatOf(screen.who, size);
    const before = faults.length;
    const path = join(folder, `${size}-${screen.who}-${screen.name}.png`);
    onTestFailed(async () => {
      await page.screenshot({ path });
    });
    await page.goto(screen.path());
    await screen.ready(page).waitFor();
    await screen.open?.(page);
    await page.evaluate(() => document.fonts.ready);
    if (process.env.SCREENS) await page.screenshot({ path, fullPage: !screen.open });
    expect(faults.slice(before)).toEqual([]);
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(sizes[size].width);
    const { violations } = await new AxeBuilder({ page }).setLegacyMode().analyze();
    const grave = violations.filter(({ impact }) => impact === "serious" || impact === "critical");
    expect(grave.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(" ")}`)).toEqual([]);
  });
});

describe("by keyboard alone", () => {
  it("lets an approver leave a note at a piece, settle it and approve", async () => {
    const { page, faults } = await seatOf("captain", "desk");
    const keys = keyboard(page);
    const notes = page.getByRole("region", { name: /^Notes/ });
    await page.goto(paths.sheet(shop, sheetOf("137 B")));
    await sheet(page).isOut();
    await keys.go(notes.getByRole("button", { name: "Add a note" }), "Enter");
    const form = page.getByRole("form", { name: "A new note" });
    // The list begins with nothing chosen, then the whole sign, then the pieces.
    await keys.go(form.getByLabel("or choose from the list"), "ArrowDown", "ArrowDown");
    // Backwards a group that has nothing chosen is entered at its end; the next arrow comes round to its beginning.
    await keys.back(form.getByRole("radio").last(), "ArrowRight");
    await keys.go(form.getByLabel("Your note"));
    await page.keyboard.type("Is the blade long enough?");
    await keys.go(form.getByRole("button", { name: "Add the note" }), "Enter");
    await sheet(page).note(1).getByText("Is the blade long enough?").waitFor();
    expect(await sheet(page).note(1).textContent()).toMatch(/Must change, zone [A-Z]\d+, Piece 1 on layer B/);
    // The form is gone: the hand goes on from the new line.
    await sheet(page).note(1).locator("button:focus").waitFor();

    await keys.go(page.getByRole("button", { name: "Approve revision B" }), "Enter");
    const { approveDialog, acknowledgements } = sheet(page);
    await approveDialog.waitFor();
    for (const line of await acknowledgements().all()) await keys.go(line, "Space");
    await keys.go(approveDialog.getByLabel("Settled: this drawing does it"), "Space");
    await keys.go(approveDialog.getByLabel("Your name, typed as your signature"));
    await page.keyboard.type("Aurel Brandt");
    await keys.go(approveDialog.getByRole("button", { name: "Approve revision B" }), "Enter");
    await page.getByText("Revision B is approved.").waitFor();
    expect(await Revision.findByPk(sheetOf("137 B"))).toMatchObject({ state: "approved" });
    expect(faults).toEqual([]);
  });
});

import { mkdir } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import AxeBuilder from "@axe-core/playwright";
import type { Browser, Locator, Page } from "playwright-core";
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
import { type Seat, type SeatSize, type StorageState, sizes, takeSeat } from "../support/seat.ts";
import { type ServedApp, startServedApp } from "../support/served-app.ts";

/** Every screen of the application with the demo shop in it, on a desk and in the hand. */

type Who = "owner" | "maker" | "rep" | "client" | "captain" | "nobody" | "newcomer";

type Screen = {
  readonly who: Who;
  readonly name: string;
  /** Whose address it is in the list of all addresses. */
  readonly at: keyof typeof paths;
  readonly path: () => string;
  /** What has to stand there before the screen is looked at. */
  readonly ready: (page: Page) => Locator;
  /** What is opened on the screen. */
  readonly open?: (page: Page) => Promise<void>;
  readonly only?: SeatSize;
};

const shop = "copperlark-signs";
const folder = join(tmpdir(), "standproud-screens");
const state = { jobs: new Map<string, string>(), sheets: new Map<string, string>(), links: new Map<string, string>() };
const found = (map: ReadonlyMap<string, string>, key: string): string => {
  const value = map.get(key);
  if (value === undefined) throw new Error(`The demo shop has no ${key}.`);
  return value;
};
const jobOf = (number: string) => found(state.jobs, number);
const sheetOf = (name: string) => found(state.sheets, name);
const linkOf = (name: string) => found(state.links, name);

const heading = (name: string | RegExp) => (page: Page) => page.getByRole("heading", { level: 1, name });
const text = (words: string | RegExp) => (page: Page) => page.getByText(words).first();
const group = (title: string) => (page: Page) => page.getByRole("heading", { level: 2, name: new RegExp(`^${title}`) });
const picture = (name: string | RegExp) => (page: Page) => page.getByRole("img", { name }).first();
const drawn = (page: Page) => page.getByRole("region", { name: "Dry fit" }).getByText(/\d+ fine/);
const press = (name: string | RegExp) => (page: Page) => page.getByRole("button", { name }).first().click();
const openDialog = (name: string | RegExp) => async (page: Page) => {
  await press(name)(page);
  await page.getByRole("dialog").waitFor();
};

const screens: readonly Screen[] = [
  { who: "nobody", name: "sign-in", at: "signIn", path: paths.signIn, ready: heading("Sign in") },
  { who: "nobody", name: "home", at: "home", path: paths.home, ready: heading("Sign in") },
  { who: "nobody", name: "register", at: "register", path: paths.register, ready: text("Open the shop") },
  { who: "nobody", name: "forgot", at: "forgotPassword", path: paths.forgotPassword, ready: heading(/password/i) },
  { who: "nobody", name: "link-open", at: "link", path: () => linkOf("open"), ready: text(/^Open Copperlark/) },
  { who: "nobody", name: "link-spent", at: "link", path: () => linkOf("spent"), ready: heading(/has been used/) },
  {
    who: "nobody",
    name: "link-unknown",
    at: "link",
    path: () => paths.link("x".repeat(43)),
    ready: heading(/is not known/),
  },
  { who: "nobody", name: "link-join", at: "link", path: () => linkOf("join"), ready: heading(/^Join/) },
  { who: "nobody", name: "share", at: "share", path: () => linkOf("share"), ready: picture(/./) },
  { who: "nobody", name: "share-closed", at: "share", path: () => linkOf("closed"), ready: heading(/no longer open/) },
  { who: "nobody", name: "nowhere", at: "home", path: () => "/no/such/page", ready: heading(/./) },

  { who: "owner", name: "bench", at: "bench", path: () => paths.bench(shop), ready: group("Our move") },
  {
    who: "owner",
    name: "open-job",
    at: "bench",
    path: () => paths.bench(shop),
    ready: group("Our move"),
    open: openDialog("Open a job"),
  },
  {
    who: "owner",
    name: "bench-nothing-found",
    at: "bench",
    path: () => `${paths.bench(shop)}?q=zzzz`,
    ready: text("No job matches"),
  },
  { who: "owner", name: "job-out", at: "job", path: () => paths.job(shop, jobOf("142")), ready: text("Revision B:") },
  {
    who: "owner",
    name: "job-approved",
    at: "job",
    path: () => paths.job(shop, jobOf("135")),
    ready: text("Certificate"),
  },
  { who: "owner", name: "job-mockup", at: "job", path: () => paths.job(shop, jobOf("139")), ready: text("wheat.svg") },
  {
    who: "owner",
    name: "sheet",
    at: "sheet",
    path: () => paths.sheet(shop, sheetOf("142 B")),
    ready: picture("Front elevation"),
  },
  {
    who: "owner",
    name: "sheet-superseded",
    at: "sheet",
    path: () => paths.sheet(shop, sheetOf("142 A")),
    ready: text("Revision A is superseded."),
  },
  {
    who: "owner",
    name: "compare",
    at: "compare",
    path: () => paths.compare(shop, jobOf("142"), sheetOf("142 A"), sheetOf("142 B")),
    ready: picture("Revision B, front"),
  },
  { who: "owner", name: "clients", at: "clients", path: () => paths.clients(shop), ready: text("Orrery Books") },
  {
    who: "owner",
    name: "client",
    at: "client",
    path: () => paths.client(shop, found(state.links, "client")),
    ready: text("client@orrery.example"),
  },
  { who: "owner", name: "stock", at: "stock", path: () => paths.stock(shop), ready: text("Midnight") },
  { who: "owner", name: "team", at: "team", path: () => paths.team(shop), ready: text("maker@copperlark.example") },
  { who: "owner", name: "shop", at: "shop", path: () => paths.shop(shop), ready: heading(/./) },
  { who: "owner", name: "mail", at: "outgoingMail", path: () => paths.outgoingMail(shop), ready: text("Look again") },
  {
    who: "owner",
    name: "mail-open",
    at: "outgoingMail",
    path: () => paths.outgoingMail(shop),
    ready: text("Look again"),
    open: async (page) => {
      await page
        .getByRole("link", { name: /^Revision B of “Lobby sign/ })
        .first()
        .click();
      await page.getByRole("link", { name: "Open the link" }).waitFor();
    },
  },
  { who: "owner", name: "account", at: "account", path: paths.account, ready: text("Where you are signed in") },
  { who: "owner", name: "nowhere", at: "bench", path: () => `/shop/${shop}/nothing`, ready: heading(/./) },

  {
    who: "maker",
    name: "mockup",
    at: "mockup",
    path: () => paths.mockup(shop, jobOf("142")),
    ready: drawn,
    only: "desk",
  },
  {
    who: "maker",
    name: "mockup",
    at: "mockup",
    path: () => paths.mockup(shop, jobOf("142")),
    ready: picture(/elevation/i),
    only: "phone",
  },
  {
    who: "maker",
    name: "mockup-empty",
    at: "mockup",
    path: () => paths.mockup(shop, jobOf("139")),
    ready: drawn,
    only: "desk",
  },
  {
    who: "maker",
    name: "mockup-bring-in",
    at: "mockup",
    path: () => paths.mockup(shop, jobOf("139")),
    ready: text("Nothing is on the board yet."),
    open: async (page) => {
      await page.getByRole("button", { name: "artwork" }).first().click();
      await page.getByRole("button", { name: /^Bring in \d/ }).waitFor();
    },
    only: "desk",
  },
  {
    who: "maker",
    name: "mockup-layer",
    at: "mockup",
    path: () => paths.mockup(shop, jobOf("142")),
    ready: drawn,
    open: press(/^Choose B,/),
    only: "desk",
  },
  {
    who: "maker",
    name: "mockup-issue",
    at: "mockup",
    path: () => paths.mockup(shop, jobOf("137")),
    ready: drawn,
    open: openDialog(/^Issue revision/),
    only: "desk",
  },
  {
    who: "rep",
    name: "mockup-look-only",
    at: "mockup",
    path: () => paths.mockup(shop, jobOf("142")),
    ready: picture(/elevation/i),
  },
  { who: "rep", name: "job", at: "job", path: () => paths.job(shop, jobOf("137")), ready: text("Revision B:") },
  {
    who: "rep",
    name: "portfolio",
    at: "portfolio",
    path: () => paths.portfolio(shop),
    ready: picture(/Boat rack plates/),
  },
  {
    who: "rep",
    name: "portfolio-link",
    at: "portfolio",
    path: () => paths.portfolio(shop),
    ready: picture(/Boat rack plates/),
    open: press("Make a link"),
  },

  {
    who: "client",
    name: "bench",
    at: "bench",
    path: () => paths.bench(shop),
    ready: text("Lobby sign, rings and planets"),
  },
  { who: "client", name: "job", at: "job", path: () => paths.job(shop, jobOf("142")), ready: text("Revision B:") },
  {
    who: "client",
    name: "sheet",
    at: "sheet",
    path: () => paths.sheet(shop, sheetOf("142 B")),
    ready: picture("Front elevation"),
  },
  {
    who: "client",
    name: "sheet-note",
    at: "sheet",
    path: () => paths.sheet(shop, sheetOf("142 B")),
    ready: picture("Front elevation"),
    open: press("Add a note"),
  },
  {
    who: "client",
    name: "sheet-ask",
    at: "sheet",
    path: () => paths.sheet(shop, sheetOf("142 B")),
    ready: picture("Front elevation"),
    open: openDialog("Ask for a revision"),
  },
  {
    who: "client",
    name: "sheet-approve",
    at: "sheet",
    path: () => paths.sheet(shop, sheetOf("142 B")),
    ready: picture("Front elevation"),
    open: openDialog(/^Approve/),
  },
  {
    who: "client",
    name: "sheet-side",
    at: "sheet",
    path: () => paths.sheet(shop, sheetOf("142 B")),
    ready: picture("Front elevation"),
    open: (page) => page.getByRole("tab", { name: "From the side" }).click(),
    only: "phone",
  },
  {
    who: "client",
    name: "sheet-materials",
    at: "sheet",
    path: () => paths.sheet(shop, sheetOf("142 B")),
    ready: picture("Front elevation"),
    open: (page) => page.getByRole("tab", { name: "Materials" }).click(),
    only: "phone",
  },
  {
    who: "client",
    name: "compare",
    at: "compare",
    path: () => paths.compare(shop, jobOf("142"), sheetOf("142 A"), sheetOf("142 B")),
    ready: picture("Revision B, front"),
  },
  { who: "client", name: "account", at: "account", path: paths.account, ready: text("Where you are signed in") },
  {
    who: "client",
    name: "not-theirs",
    at: "team",
    path: () => paths.team(shop),
    ready: heading(/./),
  },
  {
    who: "captain",
    name: "sheet-approved",
    at: "sheet",
    path: () => paths.sheet(shop, sheetOf("135 A")),
    ready: text("Revision A is approved."),
  },
  {
    who: "captain",
    name: "job-approved",
    at: "job",
    path: () => paths.job(shop, jobOf("135")),
    ready: text("Certificate"),
  },

  { who: "newcomer", name: "bench", at: "bench", path: () => linkOf("new bench"), ready: text("Open the first job") },
  {
    who: "newcomer",
    name: "clients",
    at: "clients",
    path: () => linkOf("new clients"),
    ready: text("Add the first client"),
  },
  {
    who: "newcomer",
    name: "portfolio",
    at: "portfolio",
    path: () => linkOf("new portfolio"),
    ready: text("No approved piece yet"),
  },
];

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
    for (const place of ["bench", "clients", "portfolio"] as const) state.links.set(`new ${place}`, paths[place](slug));
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
    await page.screenshot({ path, fullPage: !screen.open });
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
    expect(await page.evaluate(() => document.activeElement?.getAttribute("aria-label"))).toMatch(/^Note 1/);

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

import type { Page } from "playwright-core";
import { expect } from "vitest";
import { issueUnsubscribeToken } from "#server/auth/unsubscribe-tokens.ts";
import { Client } from "#server/models/client.ts";
import { Job } from "#server/models/job.ts";
import { Person } from "#server/models/person.ts";
import { Revision } from "#server/models/revision.ts";
import { Shop } from "#server/models/shop.ts";
import { demoAccounts, demoPassword } from "#server/start/demo-accounts.mjs";
import { listShareLinks, makeShareLink, revokeShareLink } from "#shared/contracts/portfolio.ts";
import { paths } from "@/app/paths.ts";
import { launchBrowser } from "./browser.ts";
import { entrance } from "./drivers/entrance.ts";
import { jobOf, shop, state, type Who } from "./screen-table.ts";
import { type Seat, type SeatSize, type StorageState, takeSeat } from "./seat.ts";
import { startServedApp } from "./served-app.ts";

export type ScreenStage = {
  /** The seat of someone at a desk or with a phone, signed in already; the same one each time. */
  readonly seatOf: (who: Who, size: SeatSize) => Promise<Seat>;
  readonly stop: () => Promise<void>;
};

/** The application with the demo shop in it and everyone of the screen table signed in; fills the table's `state`. */
export async function setScreenStage(): Promise<ScreenStage> {
  const sessions = new Map<Who, StorageState>();
  const seats = new Map<string, Seat>();
  const [app, browser] = await Promise.all([startServedApp({ demo: true }), launchBrowser()]);

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
  const reader = await Person.findOne({ where: { email: "client@orrery.example" }, rejectOnEmpty: true });
  const demoShop = await Shop.findOne({ where: { slug: shop }, rejectOnEmpty: true });
  const token = await app.services.sequelize.transaction((transaction) =>
    issueUnsubscribeToken(
      app.services.env,
      { personId: reader.id, shopId: demoShop.id },
      { now: new Date(), transaction },
    ),
  );
  state.links.set("unsubscribe", paths.unsubscribe(token));
  const rep = app.visitor();
  await rep.signIn("password", { email: "rep@copperlark.example", password: demoPassword });
  const body = { label: "The next client", jobIds: [jobOf("135")], days: 30 };
  const open = await rep.get(makeShareLink, { params: { shop }, body });
  state.links.set("share", new URL(open.url).pathname);
  const closed = await rep.get(makeShareLink, { params: { shop }, body: { ...body, label: "Someone before" } });
  state.links.set("closed", new URL(closed.url).pathname);
  await rep.get(revokeShareLink, { params: { shop, linkId: closed.link.id } });
  expect((await rep.get(listShareLinks, { params: { shop } })).items).toHaveLength(2);
  return {
    seatOf,
    stop: async () => {
      await browser.close();
      await app.stop();
    },
  };
}

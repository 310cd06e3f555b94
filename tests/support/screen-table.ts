import type { Locator, Page } from "playwright-core";
import { paths } from "@/app/paths.ts";
import type { SeatSize } from "./seat.ts";

/** Who looks: the demo shop's staff, two contacts of its clients, somebody without a session, the owner of an empty shop. */
export type Who = "owner" | "maker" | "rep" | "client" | "captain" | "nobody" | "newcomer";

/** Those who mostly work at a desk. */
export const atTheDesk: ReadonlySet<Who> = new Set(["owner", "maker", "newcomer"]);

export type Screen = {
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

export const shop = "copperlark-signs";
/** What the demo shop turned out to hold: jobs by number, sheets by number and letter, addresses by name. */
export const state = {
  jobs: new Map<string, string>(),
  sheets: new Map<string, string>(),
  links: new Map<string, string>(),
};
const found = (map: ReadonlyMap<string, string>, key: string): string => {
  const value = map.get(key);
  if (value === undefined) throw new Error(`The demo shop has no ${key}.`);
  return value;
};
export const jobOf = (number: string) => found(state.jobs, number);
export const sheetOf = (name: string) => found(state.sheets, name);
const linkOf = (name: string) => found(state.links, name);

const heading = (name: string | RegExp) => (page: Page) => page.getByRole("heading", { level: 1, name });
const text = (words: string | RegExp) => (page: Page) => page.getByText(words).first();
const group = (title: string) => (page: Page) => page.getByRole("heading", { level: 2, name: new RegExp(`^${title}`) });
const picture = (name: string | RegExp) => (page: Page) => page.getByRole("img", { name }).first();
const drawn = (page: Page) => page.getByRole("region", { name: "Dry fit" }).getByText(/\d+ fine/);
const planned = (page: Page) => page.locator('[aria-busy="false"]:has(#to-buy)');
const press = (name: string | RegExp) => (page: Page) => page.getByRole("button", { name }).first().click();
const openDialog = (name: string | RegExp) => async (page: Page) => {
  await press(name)(page);
  await page.getByRole("dialog").waitFor();
};

export const screens: readonly Screen[] = [
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
  {
    who: "nobody",
    name: "unsubscribe",
    at: "unsubscribe",
    path: () => linkOf("unsubscribe"),
    ready: heading(/^Stop mails from/),
  },
  {
    who: "nobody",
    name: "unsubscribe-unknown",
    at: "unsubscribe",
    path: () => paths.unsubscribe("x".repeat(43)),
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
  {
    who: "owner",
    name: "stock-change-sheet",
    at: "stock",
    path: () => paths.stock(shop),
    ready: text("Midnight"),
    open: openDialog("Change Midnight"),
  },
  {
    who: "owner",
    name: "stock-change-standoff",
    at: "stock",
    path: () => `${paths.stock(shop)}?kind=hardware`,
    ready: text("Standoff 15 × 19"),
    open: async (page) => {
      await openDialog("Change Standoff 15 × 19")(page);
      await page.getByRole("textbox", { name: /Bore, deep/ }).focus();
    },
  },
  {
    who: "owner",
    name: "stock-add-wood",
    at: "stock",
    path: () => `${paths.stock(shop)}?kind=wood`,
    ready: text("Black walnut"),
    open: async (page) => {
      await openDialog("Add a wood")(page);
      await page.getByLabel("Species").selectOption({ label: "Yellow birch" });
      await page.getByRole("button", { name: "Add to stock" }).click();
      await page.getByText("Add at least one thickness.").waitFor();
    },
  },
  {
    who: "owner",
    name: "stock-change-screw",
    at: "stock",
    path: () => `${paths.stock(shop)}?kind=screw`,
    ready: text("No. 6 × 16, flat head"),
    open: openDialog("Change No. 6 × 16, flat head"),
  },
  {
    who: "owner",
    name: "stock-change-adhesive",
    at: "stock",
    path: () => `${paths.stock(shop)}?kind=adhesive`,
    ready: text("Slow epoxy"),
    open: openDialog("Change Slow epoxy"),
  },
  {
    who: "owner",
    name: "stock-nothing-found",
    at: "stock",
    path: () => `${paths.stock(shop)}?q=zzzz`,
    ready: text("Nothing here has “zzzz” in its name."),
  },
  { who: "rep", name: "stock-look-only", at: "stock", path: () => paths.stock(shop), ready: text("Midnight") },
  { who: "owner", name: "team", at: "team", path: () => paths.team(shop), ready: text("maker@copperlark.example") },
  { who: "owner", name: "shop", at: "shop", path: () => paths.shop(shop), ready: heading(/./) },
  {
    who: "owner",
    name: "limits",
    at: "limits",
    path: () => paths.limits(shop),
    ready: (page) => page.getByLabel("Reach over its support"),
  },
  {
    who: "owner",
    name: "limits-refused",
    at: "limits",
    path: () => paths.limits(shop),
    ready: (page) => page.getByLabel("Reach over its support"),
    open: async (page) => {
      await page.getByLabel("Area off its support, for a caution").fill("45");
      await page.getByLabel("Cover of cap and barrel over the hole's edge").fill("wide");
      await page.getByLabel("Width of the bed").fill("1220");
      await press("Save the limits")(page);
      await page.getByText("Not over 30 %").waitFor();
    },
  },
  {
    who: "rep",
    name: "limits-to-read",
    at: "limits",
    path: () => paths.limits(shop),
    ready: text("You may look at the limits. Owners set them."),
  },
  {
    who: "client",
    name: "limits-not-theirs",
    at: "limits",
    path: () => paths.limits(shop),
    ready: heading(/not/i),
  },
  {
    who: "owner",
    name: "prices",
    at: "prices",
    path: () => paths.prices(shop),
    ready: (page) => page.getByLabel("Midnight, 3 mm, Price", { exact: true }),
  },
  {
    who: "owner",
    name: "prices-refused",
    at: "prices",
    path: () => paths.prices(shop, [{ group: "finishes", id: "coat Bees wax", name: "Bees wax" }]),
    ready: (page) => page.getByLabel("Midnight, 3 mm, Price", { exact: true }),
    open: async (page) => {
      await page.getByLabel("Midnight, 3 mm, Price", { exact: true }).fill("12,505");
      await page.getByLabel("Midnight, 4.5 mm, Waste", { exact: true }).fill("lots");
      await page.getByLabel("Bees wax, Price for a m²", { exact: true }).fill("4,20");
      await press("Save the prices")(page);
      await page.getByText("EUR has 2 decimals at most: write 12.50.").waitFor();
    },
  },
  {
    who: "owner",
    name: "prices-wanted",
    at: "prices",
    path: () => `${paths.prices(shop, [{ group: "finishes", id: "coat Hard wax", name: "Hard wax" }])}#prices-finishes`,
    ready: (page) => page.getByLabel("Hard wax, Price for a m²", { exact: true }),
    open: async (page) => {
      await press("Add the strip")(page);
      await page.getByText("Over 0, up to 500 mm.").first().waitFor();
    },
  },
  {
    who: "newcomer",
    name: "prices",
    at: "prices",
    path: () => linkOf("new prices"),
    ready: (page) => page.getByLabel("Midnight, 3 mm, Price", { exact: true }),
  },
  {
    who: "maker",
    name: "prices-to-read",
    at: "prices",
    path: () => paths.prices(shop),
    ready: (page) => page.getByRole("rowheader", { name: "Midnight, 3 mm" }),
  },
  { who: "rep", name: "prices-not-theirs", at: "prices", path: () => paths.prices(shop), ready: heading(/not/i) },
  { who: "client", name: "prices-not-theirs", at: "prices", path: () => paths.prices(shop), ready: heading(/not/i) },
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
  {
    who: "owner",
    name: "how-we-work-it-out",
    at: "howWeWorkItOut",
    path: () => paths.howWeWorkItOut(shop),
    ready: (page) => page.getByRole("row", { name: "At the thinnest 2.3 mm" }),
  },
  {
    who: "owner",
    name: "how-we-work-it-out-one",
    at: "howWeWorkItOut",
    path: () => paths.howWeWorkItOut(shop, "hole-window"),
    ready: (page) => page.getByRole("article", { name: /Hole window$/ }).getByRole("row", { name: "From 6.5 mm" }),
    only: "desk",
  },
  {
    who: "owner",
    name: "how-we-work-it-out-nothing-found",
    at: "howWeWorkItOut",
    path: () => paths.howWeWorkItOut(shop),
    ready: heading("How we work it out"),
    open: async (page) => {
      await page.getByLabel("Find a calculation").fill("zzzz");
      await page.getByText("No calculation has").waitFor();
    },
  },
  {
    who: "client",
    name: "how-we-work-it-out-not-theirs",
    at: "howWeWorkItOut",
    path: () => paths.howWeWorkItOut(shop),
    ready: heading(/not/i),
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
    ready: picture("Section, from the side"),
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
    name: "mockup-cost",
    at: "mockup",
    path: () => paths.mockup(shop, jobOf("142")),
    ready: (page) => page.getByRole("button", { name: /^Costs / }),
    open: async (page) => {
      const fold = page.getByRole("button", { name: /^Costs / });
      if ((await fold.getAttribute("aria-expanded")) === "false") await fold.click();
      await page.getByRole("rowheader", { name: "To ask" }).waitFor();
      await fold.evaluate((element) => element.scrollIntoView());
    },
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
  {
    who: "maker",
    name: "cut-plan",
    at: "cutPlan",
    path: () => paths.cutPlan(shop, jobOf("142")),
    ready: planned,
  },
  {
    who: "maker",
    name: "cut-plan-approved",
    at: "cutPlan",
    path: () => paths.cutPlan(shop, jobOf("135")),
    ready: planned,
    only: "desk",
  },
  {
    who: "maker",
    name: "cut-plan-empty",
    at: "cutPlan",
    path: () => paths.cutPlan(shop, jobOf("139")),
    ready: text("Nothing to cut yet"),
  },
  {
    who: "rep",
    name: "cut-plan-look-only",
    at: "cutPlan",
    path: () => paths.cutPlan(shop, jobOf("139")),
    ready: text("You may look at the figures. Owners and makers set them."),
  },
  {
    who: "client",
    name: "cut-plan-not-theirs",
    at: "cutPlan",
    path: () => paths.cutPlan(shop, jobOf("142")),
    ready: heading(/not/i),
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
  {
    who: "client",
    name: "compare-from-the-side",
    at: "compare",
    path: () => paths.compare(shop, jobOf("142"), sheetOf("142 A"), sheetOf("142 B")),
    ready: picture("Revision B, front"),
    open: async (page) => {
      await press("From the side")(page);
      const letters = page.getByRole("img", { name: "Revision B, from the side" }).locator("text");
      await letters.first().waitFor();
      const heights = await letters.evaluateAll((texts) => texts.map((text) => text.getBoundingClientRect().height));
      // A line's box is higher than its letters of 12.5 px.
      if (Math.min(...heights) < 12.5) throw new Error("The sections are lettered too small to read.");
    },
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

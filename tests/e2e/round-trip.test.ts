import { createHash } from "node:crypto";
import { readFile } from "node:fs/promises";
import { createRequire } from "node:module";
import { tmpdir } from "node:os";
import { join } from "node:path";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, beforeEach, describe, expect, it, onTestFailed, vi } from "vitest";
import { Certificate } from "#server/models/certificate.ts";
import { Decision } from "#server/models/decision.ts";
import { Job } from "#server/models/job.ts";
import { Note } from "#server/models/note.ts";
import { Revision } from "#server/models/revision.ts";
import { ShareLink } from "#server/models/share-link.ts";
import { StoredFile } from "#server/models/stored-file.ts";
import { launchBrowser } from "../support/browser.ts";
import { bench } from "../support/drivers/bench.ts";
import { compare } from "../support/drivers/compare.ts";
import { entrance } from "../support/drivers/entrance.ts";
import { job } from "../support/drivers/job.ts";
import { mockup } from "../support/drivers/mockup.ts";
import { portfolio } from "../support/drivers/portfolio.ts";
import { sheet } from "../support/drivers/sheet.ts";
import { shop } from "../support/drivers/shop.ts";
import { popplerText } from "../support/poppler.ts";
import { type Seat, takeSeat } from "../support/seat.ts";
import { patienceMs, type ServedApp, startServedApp } from "../support/served-app.ts";

/** From a shop that does not exist yet to a piece that its next client sees: the whole job through the screens alone. */

const people = {
  owner: { name: "Isolde Farrow", email: "isolde@fenwood.example", password: "nine slow herons wade" },
  maker: { name: "Bram Tillet", email: "bram@fenwood.example", password: "two cold chisels ring" },
  rep: { name: "Ottilie Crane", email: "ottilie@fenwood.example", password: "four red kites turn" },
  client: { name: "Odile Marsh", email: "odile@sunfield.example" },
};
const shopName = "Fenwood Signs";
const company = "Sunfield Seeds";
const title = "Shop sign, sunflower";

/** Flat colour icons by an open set (CC BY 4.0), as clients send them: no size, colours on top of one another. */
const icons = createRequire(import.meta.url)
  .resolve("@twemoji/svg/package.json")
  .replace("package.json", "");
const sunflower = { name: "sunflower.svg", file: `${icons}1f33b.svg` };
const leaf = { name: "leaf.svg", file: `${icons}1f341.svg` };

let app: ServedApp;
let browser: Browser;
let owner: Seat;
let maker: Seat;
let rep: Seat;
let phone: Seat;
let desk: Seat;
let proof: { sha256: string; text: string };
let broken = false;

const seat = (size: "desk" | "phone") => takeSeat(browser, { baseUrl: app.baseUrl, size });
const bytesOf = async (page: Page, name: string | RegExp): Promise<Buffer> => {
  const [download] = await Promise.all([
    page.waitForEvent("download"),
    page.getByRole("link", { name }).first().click(),
  ]);
  return readFile(await download.path());
};
const sha256 = (bytes: Buffer): string => createHash("sha256").update(bytes).digest("hex");
/** Waits for words on a screen; the assertion tells what stood there instead. */
const shows = (locator: ReturnType<Page["locator"]>, words: string | RegExp) =>
  vi.waitFor(async () => expect(await locator.textContent()).toMatch(words), { timeout: patienceMs, interval: 100 });
const counts = (locator: ReturnType<Page["locator"]>, count: number) =>
  vi.waitFor(async () => expect(await locator.count()).toBe(count), { timeout: patienceMs, interval: 100 });
/** Waits for what a field holds. */
const holds = (locator: ReturnType<Page["locator"]>, value: string) =>
  vi.waitFor(async () => expect(await locator.inputValue()).toBe(value), { timeout: patienceMs, interval: 100 });

beforeAll(async () => {
  [app, browser] = await Promise.all([startServedApp(), launchBrowser()]);
  [owner, maker, rep, desk] = await Promise.all([seat("desk"), seat("desk"), seat("desk"), seat("desk")]);
  phone = await seat("phone");
}, 120_000);

afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

beforeEach(({ skip }) => {
  if (broken) skip("a step before it failed");
  onTestFailed(async () => {
    broken = true;
    await Promise.all(
      Object.entries({ owner, maker, rep, phone, desk }).map(([name, { page }]) =>
        page.screenshot({ path: join(tmpdir(), "standproud-e2e", `${name}.png`) }),
      ),
    );
  });
});

describe("the round trip from artwork to an approved proof", () => {
  it("opens a shop, and a maker and a rep join it by mailed links", async () => {
    await entrance(owner.page).register({ shopName, ...people.owner });
    for (const [role, newcomer] of [
      ["maker", maker],
      ["rep", rep],
    ] as const) {
      const person = people[role];
      await shop(owner.page).invite({ email: person.email, role });
      const link = await app.linkMailedTo(person.email, /Join Fenwood Signs/);
      await entrance(newcomer.page).look(link);
      await shows(newcomer.page.getByRole("main"), new RegExp(`You are invited as ${role}`));
      await entrance(newcomer.page).join(link, { shopName, ...person });
      await shows(entrance(newcomer.page).heading(), /No move is ours/);
    }
    expect(await maker.page.getByRole("navigation", { name: "Shop" }).textContent()).not.toContain("Team");
  });

  it("takes the brief and the artwork at its true size", async () => {
    const { page } = maker;
    await shop(page).addClient({ name: company, contact: people.client });
    await shop(page).go("Bench");
    await bench(page).openJob({ client: company, title, dueOn: "2031-05-06" });
    await shows(page.getByRole("region", { name: "Brief" }), /Still missing: .*who approves/);
    await job(page).fillBrief({
      words: "SUNFIELD",
      width: "600",
      height: "400",
      place: "Inside",
      distance: "4",
      approver: people.client.name,
    });
    await job(page).bringIn({ name: sunflower.name, content: await readFile(sunflower.file) });
    await job(page).bringIn({ name: leaf.name, content: await readFile(leaf.file) });
    await job(page).setTrueSize(sunflower.name, { side: "Height", length: "18 cm" });
    await job(page).setTrueSize(leaf.name, { side: "Width", length: "6 cm" });
    await shows(job(page).artwork(sunflower.name), /× 180 mm, \d+ pieces in 3 colours/);
    await shows(job(page).artwork(leaf.name), /60 × [\d.]+ mm, 1 piece in 1 colour/);
  });

  it("stacks layers: a plate on four standoffs, raised in the section, and the colours bonded on it", async () => {
    const { page } = maker;
    const table = mockup(page);
    await job(page).openMockup();
    await table.addPlate({
      shape: "rectangle",
      name: "Plate",
      width: "300",
      height: "210",
      stock: "Chalk",
      thickness: "6",
      hold: "Standoff 19 × 12",
    });
    await counts(page.getByLabel(/^Diameter of Hole/), 4);
    await table.raise("B", { thicknessMm: 6, byMm: 7 });
    await holds(table.cell("Offset of B"), "19");
    await table.bringIn(/sunflower/, [
      { colour: "#FFAC33", stock: "Marigold", thickness: "3", hold: "bond, Bodied cement", solid: true },
      { colour: "#732700", stock: "Rust", thickness: "3", hold: "bond, Bodied cement" },
      { colour: "#3E721D", stock: "Fern", thickness: "3", hold: "bond, Bodied cement" },
    ]);
    await table.bringIn(/leaf/, [{ colour: "#DD2E44", stock: "Brick", hold: "bond, Slow epoxy" }]);
    await table.nudge("F", "ArrowLeft", 22);
    await holds(page.getByLabel(/^x of /).first(), "80");
    await table.undo().click();
    await holds(page.getByLabel(/^x of /).first(), "300");
    await table.redo().click();
    await holds(page.getByLabel(/^x of /).first(), "80");
    await table.saved();
  });

  it("does not issue while the dry fit has a stop, and says why", async () => {
    const { page } = maker;
    const table = mockup(page);
    await table.chooseLayer("B");
    await table.write("Diameter of Hole 1", "11.6");
    await shows(
      table.findings("Stop").first(),
      /A hole of B, Plate is 11\.6 mm wide; over 11\.5 mm it can show round the 19 mm cap/,
    );
    await shows(table.whyNot(), /The dry fit has 1 stop\./);
    expect(await table.issueButton("A").isDisabled()).toBe(true);
    await table.press("Fit the diameters");
    await counts(table.findings("Stop"), 0);
    await table.saved();
    await page.reload();
    await counts(table.rows(), 7);
    await table.chooseLayer("B");
    await holds(table.cell("Offset of B"), "19");
  });

  it("issues revision A with a message, and mails it once the PDF stands", async () => {
    const { page } = maker;
    await mockup(page).issue("A", "The plate stands 19 mm off the board.");
    await sheet(page).isOut();
    await shows(sheet(page).titleBlock(), /waiting for the client/);
    const { text } = await app.mailTo(people.client.email, /^Revision A of “Shop sign, sunflower”/);
    expect(text).toContain("The plate stands 19 mm off the board.");
  });

  it("lets the client in by the mailed link, which opening alone does not spend", async () => {
    const { page } = phone;
    const link = await app.linkMailedTo(people.client.email, /^Revision A/);
    expect((await fetch(app.baseUrl + link)).status).toBe(200);
    await entrance(page).look(link);
    await shows(page.getByRole("main"), /This link was mailed to o.*@sunfield\.example/);
    await entrance(page).openLink(link, shopName, /\/sheets\//);
    await sheet(page).isOut();
    await shows(
      sheet(page).reader(),
      /Fenwood Signs for Sunfield Seeds\. You are reading as Odile Marsh, who decides\./,
    );
  });

  it("takes a note at the very spot and the wish for a revision, on a phone", async () => {
    const { page } = phone;
    await sheet(page).addNoteAt(
      { across: 0.5, down: 0.33 },
      { kind: "Must change", text: "Could the petals be thicker? They look thin beside the plate." },
    );
    await shows(sheet(page).note(1), /Must change, zone [A-Z]\d+, Marigold on layer C/);
    await sheet(page).balloon(1).waitFor();
    await sheet(page).askForRevision("The rest is lovely.");
    await shows(page.getByRole("main"), /A revision of A is asked for\./);
    expect(await page.getByRole("button", { name: "Approve" }).count()).toBe(0);
  });

  it("shows the maker that it is their move, and lets them answer, change and issue B", async () => {
    const { page } = maker;
    await shop(page).go("Bench");
    await shows(bench(page).group("Our move").first(), /Sunfield Seeds/);
    await bench(page).openRow(company);
    await job(page).openSheet("A");
    await sheet(page).reply(1, "They are cut from 4.5 mm sheet now.");
    await shows(sheet(page).note(1), /answered/);
    await shop(page).go("Bench");
    await bench(page).openRow(company);
    await job(page).openMockup();
    await mockup(page).cell("Thickness of C").selectOption("4.5");
    await mockup(page).saved();
    await mockup(page).issue("B", "Thicker petals, as you asked.");
    await sheet(page).isOut();
    await shows(sheet(page).titleBlock(), /waiting for the client/);
  });

  it.each([
    ["maker", () => maker],
    ["client", () => phone],
  ] as const)("compares A and B for the %s, with the change in words", async (_who, who) => {
    const { page } = who();
    if (who() === phone) {
      await page.reload();
      await shows(page.getByRole("main"), /Revision A is superseded\./);
      await page.getByRole("link", { name: "Go to revision B" }).click();
      await sheet(page).isOut();
    }
    await page.getByRole("link", { name: "Compare with A" }).click();
    await shows(compare(page).heading(), /From A to B/);
    await shows(compare(page).changes().first(), /C, Marigold: thickness 3 mm becomes 4\.5 mm/);
    await compare(page).picture("A").waitFor();
    await compare(page).picture("B").waitFor();
  });

  it("takes the approval with every line read back and the note settled", async () => {
    const { page } = desk;
    await entrance(page).openLink(await app.linkMailedTo(people.client.email, /^Revision B/), shopName, /\/sheets\//);
    await sheet(page).isOut();
    const bytes = await bytesOf(page, "Download PDF");
    await sheet(page).openAgain(1);
    proof = { sha256: sha256(bytes), text: await popplerText(bytes, "pdftotext") };
    await sheet(page).beginApproval("B");
    const { approveDialog, acknowledgements } = sheet(page);
    const lines = await acknowledgements().all();
    expect(lines.length).toBeGreaterThanOrEqual(5);
    for (const line of lines) await line.check();
    await approveDialog.getByRole("button", { name: "Approve revision B" }).click();
    await shows(approveDialog, /Say whether it is settled\.[\s\S]*Type your name\./);
    await approveDialog.getByLabel("Settled: this drawing does it").check();
    await approveDialog.getByLabel("Your name, typed as your signature").fill(people.client.name);
    await approveDialog.getByLabel(/may show this sign in its portfolio/).check();
    await approveDialog.getByRole("button", { name: "Approve revision B" }).click();
    await shows(page.getByRole("main"), /Revision B is approved\./);
  });

  it("makes a certificate and shows the maker that B is approved", async () => {
    const certificate = await bytesOf(desk.page, "Download the certificate");
    const text = await popplerText(certificate, "pdftotext");
    expect(text).toContain("Odile Marsh");
    expect(text.replace(/\s/g, "")).toContain(proof.sha256);
    expect(proof.text).toContain("SUNFIELD");
    await shop(maker.page).go("Bench");
    await bench(maker.page).openRow(company);
    await shows(job(maker.page).revision("B"), /approved/i);
    await shows(job(maker.page).revision("A"), /superseded/i);
    await shows(job(maker.page).consent(), /The client agreed/);
  });

  it("shares the piece by a link that a guest opens, and closes it again", async () => {
    await shop(rep.page).go("Portfolio");
    const link = await portfolio(rep.page).makeLink({ piece: title, label: "the garden centre" });
    for (const size of ["phone", "desk"] as const) {
      const guest = await seat(size);
      await guest.open(link);
      await shows(guest.page.getByRole("main"), /Fenwood Signs[\s\S]*Shop sign, sunflower[\s\S]*600 × 400 mm/);
      expect(await guest.page.getByRole("main").textContent()).not.toMatch(/petals|Odile|SHA|sunfield\.example/);
      expect(guest.faults).toEqual([]);
      await guest.leave();
    }
    await portfolio(rep.page).closeLink("the garden centre");
    const guest = await seat("phone");
    await guest.open(link);
    await shows(guest.page.getByRole("main"), /This link is no longer open[\s\S]*gladly send a fresh one/);
    await guest.leave();
  });

  it("keeps all of it in the rows, tied to the very PDF", async () => {
    const [a, b] = await Revision.findAll({ order: ["sequence"] });
    expect([a?.letter, a?.state, b?.letter, b?.state]).toEqual(["A", "superseded", "B", "approved"]);
    const decisions = await Decision.findAll({ order: ["decidedAt"] });
    expect(decisions.map(({ kind, revisionId }) => [kind, revisionId])).toEqual([
      ["revision asked", a?.id],
      ["approved", b?.id],
    ]);
    const approval = decisions[1];
    expect(approval?.pdfSha256).toBe(proof.sha256);
    expect(approval?.snapshotSha256).toBe(b?.snapshotSha256);
    expect(approval?.typedName).toBe(people.client.name);
    const file = await StoredFile.findByPk(b?.pdfFileId ?? "");
    expect(file?.sha256).toBe(proof.sha256);
    expect(await Certificate.count({ where: { decisionId: approval?.id ?? "" } })).toBe(1);
    const [note] = await Note.findAll();
    expect(note).toMatchObject({ kind: "must change", state: "settled" });
    expect(await Job.findOne()).toMatchObject({ state: "approved" });
    const [share] = await ShareLink.findAll();
    expect(share?.revokedAt).toBeInstanceOf(Date);
  });

  it("never made a page complain", () => {
    expect([owner, maker, rep, phone, desk].flatMap(({ faults }) => faults)).toEqual([]);
  });
});

import { mkdir } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import AxeBuilder from "@axe-core/playwright";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it, vi } from "vitest";
import { changeJob, openJob } from "#shared/contracts/jobs.ts";
import { getMockup, saveMockup } from "#shared/contracts/mockups.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { boardInWindow } from "../support/board-in-window.ts";
import { launchBrowser } from "../support/browser.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { mockup } from "../support/drivers/mockup.ts";
import { buildMember } from "../support/factories/member.ts";
import { buildWorld, type World } from "../support/factories/work.ts";
import type { Seat } from "../support/seat.ts";
import { patienceMs } from "../support/served-app.ts";
import { takeSignedInSeat } from "../support/signed-in-seat.ts";
import { signWithFigures } from "../unit/src/features/mockup/sign-with-figures.ts";

/**
 * What hands do at the mockup's desk: dragging on the canvas, laying slats, two people at one mockup. With
 * SCREENS=1 the slats are kept as pictures.
 */

let app: TestApp;
let browser: Browser;
let world: World;
let owner: Seat;
let maker: Seat;

const jobParams = () => ({ ...world.params, jobId: world.job.id });
const address = () => `/shop/${world.params.shop}/jobs/${world.job.id}/mockup`;
const onServer = () => world.visitors.owner.get(getMockup, { params: jobParams() });
const holds = (locator: ReturnType<Page["locator"]>, value: string) =>
  vi.waitFor(async () => expect(await locator.inputValue()).toBe(value), { timeout: patienceMs, interval: 100 });

const sit = (email: string) => takeSignedInSeat(browser, { baseUrl: app.baseUrl, email });

/** Opens the mockup and waits for the first dry fit, so that the picture is there. */
async function openDesk({ page, open }: Seat) {
  await open(address());
  await page.locator('section[aria-label="Dry fit"][aria-busy="false"]').waitFor();
  return mockup(page);
}

/** Has the middle of the board shown in the middle of the canvas, and tells how many px a mm is there. */
async function lookAtMiddle(page: Page) {
  await mockup(page)
    .dryFit()
    .getByRole("button", { name: /^Show: Locate/ })
    .first()
    .click();
  const canvas = await page.getByRole("application", { name: /elevation/i }).boundingBox();
  const disc = await page.getByRole("slider", { name: /^Raise B,/ }).boundingBox();
  if (canvas === null || disc === null) throw new Error("The canvas or the section is not there.");
  // The handle lies round the disc of 275 mm with 4 px to spare on each side.
  return { x: canvas.x + canvas.width / 2, y: canvas.y + canvas.height / 2, pxPerMm: (disc.height - 8) / 275 };
}

beforeAll(async () => {
  [app, browser] = await Promise.all([startTestApp({ poolMax: 8 }), launchBrowser()]);
  world = await buildWorld(app);
  const { document } = signWithFigures();
  await world.visitors.owner.get(saveMockup, { params: jobParams(), body: { version: 0, document } });
  const { email } = await buildMember({ shop: world.owner.shop, role: "maker" });
  [owner, maker] = await Promise.all([sit(world.owner.email), sit(email)]);
}, 120_000);

afterAll(async () => {
  await browser?.close();
  await app?.stop();
});

describe("the canvas", () => {
  it("takes hold of the piece nearest the viewer, and a drag is one step", async () => {
    const { page } = owner;
    const desk = await openDesk(owner);
    const { x, y, pxPerMm } = await lookAtMiddle(page);
    await page.mouse.move(x, y);
    await page.keyboard.down("Alt");
    await page.mouse.down();
    await page.mouse.move(x + 40, y, { steps: 3 });
    await page.mouse.move(x + 90, y - 30, { steps: 5 });
    await page.mouse.up();
    await page.keyboard.up("Alt");
    const across = page.getByLabel("x of Sun", { exact: true });
    const down = page.getByLabel("y of Sun", { exact: true });
    await vi.waitFor(async () => expect(Number(await across.inputValue())).toBeCloseTo(300 + 90 / pxPerMm, 0));
    expect(Number(await down.inputValue())).toBeCloseTo(200 - 30 / pxPerMm, 0);
    expect(await page.getByRole("region", { name: "Pieces of D", exact: true }).isVisible()).toBe(true);
    await desk.undo().click();
    await holds(across, "300");
    expect(await desk.undo().isDisabled()).toBe(true);
    await desk.saved();
  });

  it("lets go of a drag at Escape and leaves everything where it was", async () => {
    const { page } = owner;
    const desk = await openDesk(owner);
    const { x, y } = await lookAtMiddle(page);
    await page.mouse.move(x, y);
    await page.mouse.down();
    await page.mouse.move(x + 70, y + 40, { steps: 5 });
    await page.keyboard.press("Escape");
    await page.mouse.up();
    await holds(page.getByLabel("x of Sun", { exact: true }), "300");
    expect(await desk.undo().isDisabled()).toBe(true);
  });

  it("chooses by a box what lies wholly in it, and catches the margin with it", async () => {
    const { page } = owner;
    const desk = await openDesk(owner);
    // Round the ring of 220 mm and the sun in the middle of the board, from bare wood; the disc of 275 mm reaches out of it.
    const at = await boardInWindow(page.getByRole("application", { name: /elevation/i }));
    await page.mouse.move(...at(176, 324));
    await page.keyboard.down("Control");
    await page.mouse.down();
    await page.mouse.move(...at(424, 76), { steps: 4 });
    await page.mouse.up();
    await page.keyboard.up("Control");
    const place = page.getByRole("region", { name: "Place of what is chosen" });
    await place.getByText("2 pieces", { exact: false }).waitFor();
    // The ring begins at 190: after 168.6 mm it is 1.4 from the margin of 20.
    await page.mouse.move(...at(300, 200));
    await page.mouse.down();
    await page.mouse.move(...at(200, 203), { steps: 4 });
    await page.mouse.move(...at(131.4, 200.5), { steps: 4 });
    await page.mouse.up();
    const across = page.getByLabel("x of what is chosen");
    await holds(across, "130");
    await holds(page.getByLabel("y of what is chosen"), "200");
    await desk.undo().click();
    await holds(across, "300");
    expect(await desk.undo().isDisabled()).toBe(true);
    await desk.saved();
  });
});

describe("the board", () => {
  it("takes outline, coats and fixings from its dialog in one step, and the server holds them", async () => {
    const { page } = owner;
    const desk = await openDesk(owner);
    await page.getByRole("button", { name: /^Finish of the backer/ }).click();
    const dialog = page.getByRole("dialog", { name: "Board" });
    await dialog.getByRole("button", { name: "stain", exact: true }).click();
    await page.keyboard.press("ControlOrMeta+a");
    await page.keyboard.type("Umber");
    await dialog.getByRole("button", { name: "sanding", exact: true }).click();
    await dialog.getByRole("button", { name: "Coat 2 earlier" }).press("Enter");
    await dialog.getByLabel("Outline", { exact: true }).selectOption("rounded");
    await dialog.getByRole("button", { name: "Spread them evenly" }).click();
    await dialog.getByLabel("The wall’s fixing carries").fill("25");
    await dialog.getByRole("button", { name: "Change the board" }).click();
    await dialog.waitFor({ state: "detached" });
    await page.getByRole("button", { name: "Finish of the backer: sanded to 180, Umber" }).waitFor();
    await vi.waitFor(async () => {
      const { board, hanging } = (await onServer()).document;
      expect(board.outline.kind).toBe("rounded");
      expect(hanging).toMatchObject({
        carriesKg: 25,
        points: [
          { x: 150, y: 30 },
          { x: 450, y: 30 },
        ],
      });
    }, patienceMs);
    await desk.undo().click();
    await page.getByRole("button", { name: "Finish of the backer: bare" }).waitFor();
    expect(await desk.undo().isDisabled()).toBe(true);
    await vi.waitFor(async () => expect((await onServer()).document.backer.finish).toEqual([]), patienceMs);
  });
});

/** No grave finding of axe in the board's dialog; with SCREENS=1 a picture of the page. */
async function lookAt(page: Page, name: string) {
  const dialog = '[role="dialog"]';
  if ((await page.locator(dialog).count()) > 0) {
    const { violations } = await new AxeBuilder({ page }).include(dialog).analyze();
    const grave = violations.filter(({ impact }) => impact === "serious" || impact === "critical");
    expect(grave.map(({ id, nodes }) => `${id}: ${nodes[0]?.html}`)).toEqual([]);
  }
  if (!process.env.SCREENS) return;
  const folder = join(tmpdir(), "standproud-screens");
  await mkdir(folder, { recursive: true });
  await page.screenshot({ path: join(folder, `slats-${name}.png`) });
}

describe("slats and a frame", () => {
  it("are written in the board's dialog, lie on the desk without a stop, and are issued", async () => {
    const { params, job, visitors } = world;
    const { client, dueOn } = job;
    const { id: jobId } = await visitors.owner.get(openJob, {
      params,
      body: { clientId: client.id, title: "Chevron sign", dueOn: dueOn ?? "2031-05-06" },
    });
    const brief = { widthMm: 600, heightMm: 400, place: "inside" as const, viewingDistanceMm: 4000, words: "" };
    const body = { brief, approverIds: [world.approver.contact.id] };
    await visitors.owner.get(changeJob, { params: { ...params, jobId }, body });
    const document = buildSign([buildLayer("B", [plate("bar", 220, 90, [300, 200])], { name: "Bar" })]);
    await visitors.owner.get(saveMockup, { params: { ...params, jobId }, body: { version: 0, document } });
    const kept = async () => (await visitors.owner.get(getMockup, { params: { ...params, jobId } })).document;

    const { page, open } = owner;
    await open(`/shop/${params.shop}/jobs/${jobId}/mockup`);
    const desk = mockup(page);
    const isFitted = page.locator('section[aria-label="Dry fit"][aria-busy="false"]');
    await isFitted.waitFor();
    await page.getByRole("button", { name: "Change the board" }).click();
    const dialog = page.getByRole("dialog", { name: "Board" });
    const choose = (label: string, option: string) =>
      dialog.getByLabel(label, { exact: true }).selectOption({ label: option });
    const write = (label: string, text: string) => dialog.getByLabel(label, { exact: true }).fill(text);
    await choose("Backer is", "slats on a substrate");
    await dialog.getByText("numbered as they are laid").waitFor();
    await lookAt(page, "1-first");
    await choose("Wood of the slats", "Ponderosa pine");
    await write("Width of a slat", "900");
    await dialog.getByText("A slat of 900 mm is wider than the board: choose 400 mm at most.").waitFor();
    await lookAt(page, "2-refused");
    await write("Width of a slat", "38");
    await choose("Frame is", "of wood");
    await choose("Wood of the frame", "Black walnut");
    // 12 + 9 less 0.3 of sanding.
    await holds(dialog.getByLabel("Depth of the frame", { exact: true }), "20.7");
    await dialog.getByText("Body 564 × 364 mm, overall 600 × 400 mm.").waitFor();
    await dialog.getByRole("button", { name: "Take the best start" }).press("Enter");
    await dialog.getByRole("button", { name: "This is the best start" }).waitFor();
    await lookAt(page, "3-framed");
    await dialog.getByRole("button", { name: "Change the board" }).click();
    await dialog.waitFor({ state: "detached" });

    const row = page.getByRole("region", { name: "Schedule" }).getByRole("row", { name: /^A / });
    await row.getByText("Eastern white pine, slats of Ponderosa pine").waitFor();
    await row.getByText("slats at 45°, framed in Black walnut 18 × 20.7").waitFor();
    await vi.waitFor(async () => {
      const { backer, board, frame } = await kept();
      expect(backer).toMatchObject({ thickness: 12, slats: { thickness: 9, angle: 45, start: { kind: "height" } } });
      expect(board).toMatchObject({ width: 564, height: 364, measures: "overall" });
      expect(frame).toMatchObject({ width: 18, depth: 20.7, mitred: true });
    }, patienceMs);
    await isFitted.waitFor();
    await vi.waitFor(async () => expect(await desk.findings("Stop").count()).toBe(0), patienceMs);
    await lookAt(page, "4-desk");
    await desk.undo().click();
    await row.getByText("Eastern white pine", { exact: true }).waitFor();
    expect(await desk.undo().isDisabled()).toBe(true);
    await desk.redo().click();
    await row.getByText("Eastern white pine, slats of Ponderosa pine").waitFor();

    await desk.saved();
    await desk.issue("A", "Slats of ponderosa pine, framed in walnut.");
    expect(owner.faults.filter((fault) => fault.includes(jobId))).toEqual([]);
  });
});

describe("two people at one mockup", () => {
  it("are told, and the second keeps theirs with Undo bringing back the own work, or saves over it", async () => {
    const first = await openDesk(owner);
    const second = await openDesk(maker);
    await first.write("Name of C", "Outer ring");
    await vi.waitFor(async () => expect((await onServer()).document.layers[1]?.name).toBe("Outer ring"), patienceMs);

    await second.write("Name of D", "Evening sun");
    const asks = maker.page.getByRole("alertdialog", { name: "Someone saved a newer version" });
    await asks.getByRole("button", { name: "Keep theirs" }).click();
    await holds(second.cell("Name of C"), "Outer ring");
    await holds(second.cell("Name of D"), "Sun");
    await second.undo().click();
    await holds(second.cell("Name of D"), "Evening sun");
    await vi.waitFor(async () => expect((await onServer()).document.layers[2]?.name).toBe("Evening sun"), patienceMs);

    await first.write("Name of B", "Sky");
    const tells = owner.page.getByRole("alertdialog");
    await tells.getByText("D, Evening sun: called Sun before").waitFor();
    await tells.getByRole("button", { name: "Keep mine" }).click();
    await vi.waitFor(async () => expect((await onServer()).document.layers[0]?.name).toBe("Sky"), patienceMs);
    expect((await onServer()).document.layers[2]?.name).toBe("Sun");
  });
});

import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { queueReminders } from "#server/commands/queue-reminders.ts";
import { enqueue } from "#server/jobs/queue.ts";
import { runQueue } from "#server/jobs/run-queue.ts";
import { Job } from "#server/models/job.ts";
import { MailChoices } from "#server/models/mail-choices.ts";
import { OutgoingMail } from "#server/models/outgoing-mail.ts";
import { Revision } from "#server/models/revision.ts";
import { Shop } from "#server/models/shop.ts";
import { inspectLink } from "#shared/contracts/account.ts";
import { addNote } from "#shared/contracts/notes.ts";
import { askForRevision } from "#shared/contracts/revisions.ts";
import { addDays, needsYesBy } from "#shared/lifecycle/needs-yes-by.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildIssued } from "../support/factories/issued.ts";
import { buildRevision, buildWorld, type World } from "../support/factories/work.ts";
import { type Caught, caughtMails, tokenIn } from "../support/mail.ts";
import { runSql } from "../support/run-sql.ts";

let app: TestApp;
let world: World;
let template: string;
beforeAll(async () => {
  app = await startTestApp({ poolMax: 10 });
  world = await buildWorld(app);
  template = (await buildRevision(app, world)).id;
  // Its own day is the tests' to choose; the revision that is copied is nobody's to decide on.
  await Job.update({ dueOn: null }, { where: { id: world.job.id } });
  await Shop.update({ buildDays: 0, freightDays: 0 }, { where: { id: world.owner.shop.id } });
});
afterAll(() => app.stop());

const today = new Date().toISOString().slice(0, 10);
const yesBy = addDays(today, 10);
/** Each with the day a yes is needed by ten days from now, so that the others' clocks don't touch it. */
async function issued(dueOn = yesBy): Promise<{ own: World; revisionId: string }> {
  const built = await buildIssued(app, world, template, { approverIds: [world.approver.contact.id] });
  await Job.update({ dueOn }, { where: { id: built.own.job.id } });
  return built;
}
const lookAt = (day: string, time = "09:00"): Promise<number> =>
  queueReminders({ services: app.services, now: new Date(`${day}T${time}:00Z`) });
const kindsOf = async ({ own }: { own: World }): Promise<string[]> =>
  (await OutgoingMail.findAll({ where: { jobId: own.job.id }, order: ["createdAt"] })).map(({ kind }) => kind);
const mailsOf = async ({ own }: { own: World }): Promise<Caught[]> =>
  (await caughtMails(app)).filter(({ subject }) => subject.includes(`(${own.job.number})`));
/** Takes a job out of the way of the tests after it. */
const done = ({ own }: { own: World }) => Job.update({ dueOn: null }, { where: { id: own.job.id } });

describe("a reminder that a yes is needed", () => {
  it("goes out at nine two days before and the day after, once each, however often somebody looks", async () => {
    const job = await issued();
    expect(await lookAt(addDays(yesBy, -3))).toBe(0);
    expect(await lookAt(addDays(yesBy, -2), "08:45")).toBe(0);
    expect(await lookAt(addDays(yesBy, -2))).toBe(1);
    expect(await lookAt(addDays(yesBy, -2), "09:15")).toBe(0);
    expect(await lookAt(addDays(yesBy, -1))).toBe(0);
    expect(await lookAt(addDays(yesBy, 1))).toBe(1);
    expect(await lookAt(addDays(yesBy, 2))).toBe(0);
    // A clock that jumps back, and forth again.
    expect(await lookAt(addDays(yesBy, -2))).toBe(0);
    expect(await lookAt(addDays(yesBy, 1))).toBe(0);
    expect(await kindsOf(job)).toEqual(["yes needed soon", "yes was needed"]);

    await app.runJobs();
    const [after, before] = await mailsOf(job);
    expect(before).toMatchObject({ to: world.approver.email });
    expect(before?.subject).toMatch(/^A yes to “.+” \(.+\) is needed by \w+day \d+ \w+ \d{4}$/);
    expect(after?.subject).toMatch(/^A yes to .+ was needed by /);
    const visitor = app.visitor();
    const { goTo } = await visitor.get(inspectLink, { body: { token: tokenIn(before?.text ?? "") } });
    expect(goTo).toBe(`/shop/${world.params.shop}/sheets/${job.revisionId}`);
    await done(job);
  });

  it("is made once when ten look at the same moment", async () => {
    const job = await issued();
    const counts = await Promise.all(Array.from({ length: 10 }, () => lookAt(addDays(yesBy, -2))));
    expect(counts.reduce((sum, count) => sum + count, 0)).toBe(1);
    await done(job);
  });

  it("counts back over the shop's working days, freight, and what the sign dries", async () => {
    const shopId = world.owner.shop.id;
    await Shop.update({ buildDays: 3, freightDays: 2 }, { where: { id: shopId } });
    const dueOn = addDays(today, 40);
    const job = await issued(dueOn);
    await Revision.update({ dryingHours: 30 }, { where: { id: job.revisionId } });
    const day = needsYesBy(dueOn, { buildDays: 3, freightDays: 2, dryingHours: 30 });
    expect(await lookAt(addDays(day, -3))).toBe(0);
    expect(await lookAt(addDays(day, -2))).toBe(1);
    await Shop.update({ buildDays: 0, freightDays: 0 }, { where: { id: shopId } });
    await done(job);
  });

  it("goes by the shop's own morning", async () => {
    const shopId = world.owner.shop.id;
    await Shop.update({ timeZone: "Asia/Tokyo" }, { where: { id: shopId } });
    const job = await issued();
    // 00:00 UTC is nine o'clock in Tokyo, which keeps no summer time.
    expect(await lookAt(addDays(yesBy, -3), "23:45")).toBe(0);
    expect(await lookAt(addDays(yesBy, -2), "00:00")).toBe(1);
    await Shop.update({ timeZone: "UTC" }, { where: { id: shopId } });
    await done(job);
  });

  it("is not made while the move is the shop's, once it was decided, or for who has stopped them", async () => {
    const noted = await issued();
    const asked = await issued();
    const stopped = await issued();
    const { approver } = world.visitors;
    const body = { kind: "question" as const, text: "Which wall?", anchor: { on: "whole" as const } };
    await approver.get(addNote, { params: { ...world.params, revisionId: noted.revisionId }, body });
    await approver.get(askForRevision, {
      params: { ...world.params, revisionId: asked.revisionId },
      body: { summary: "Higher." },
    });
    const choices = { personId: world.approver.person.id, shopId: world.owner.shop.id, changedAt: new Date() };
    const row = await MailChoices.create({ ...choices, notes: true, reminders: false });
    expect(await lookAt(addDays(yesBy, -2))).toBe(0);
    await row.update({ reminders: true });
    expect(await lookAt(addDays(yesBy, -2))).toBe(1);
    expect(await kindsOf(stopped)).toEqual(["yes needed soon"]);
    for (const job of [noted, asked, stopped]) await done(job);
  });

  it("that was queued is dropped with its reason when the decision comes first", async () => {
    const job = await issued();
    expect(await lookAt(addDays(yesBy, -2))).toBe(1);
    await world.visitors.approver.get(askForRevision, {
      params: { ...world.params, revisionId: job.revisionId },
      body: { summary: "Higher." },
    });
    await app.runJobs();
    const row = await OutgoingMail.findOne({ where: { jobId: job.own.job.id, kind: "yes needed soon" } });
    expect(row).toMatchObject({ state: "dropped", lastError: "Nobody waits for the client's yes any more." });
    await done(job);
  });

  it("is looked for by a job of the queue", async () => {
    const job = await issued(addDays(today, -1));
    await app.services.sequelize.transaction((transaction) => enqueue(transaction, "remind", {}));
    await app.runJobs();
    // Out today and due yesterday: nobody is reminded of what they had no time for.
    expect(await kindsOf(job)).toEqual([]);
    expect((await app.queuedJobs()).filter(({ task }) => task === "remind")).toEqual([]);
    await done(job);
  });

  it("is looked for by the clock, a quarter of an hour after the other", async () => {
    const queue = await runQueue(app.services);
    await queue.stop();
    const known = await runSql(app.database.ownerUrl, "select identifier from graphile_worker._private_known_crontabs");
    expect(known).toEqual([{ identifier: "remind" }]);
  });
});

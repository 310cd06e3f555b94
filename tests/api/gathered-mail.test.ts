import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { sendMail } from "#server/jobs/send-mail.ts";
import { MailChoices } from "#server/models/mail-choices.ts";
import { OutgoingMail } from "#server/models/outgoing-mail.ts";
import { addNote, editNote, type Note, replyToNote, setNoteState } from "#shared/contracts/notes.ts";
import { getSheet, withdrawRevision } from "#shared/contracts/revisions.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildIssued } from "../support/factories/issued.ts";
import { buildRevision, buildWorld, type World } from "../support/factories/work.ts";
import { type Caught, caughtMails, sendGathered } from "../support/mail.ts";
import { runSql } from "../support/run-sql.ts";
import type { Visitor } from "../support/visitor.ts";

let app: TestApp;
let world: World;
let template: string;
beforeAll(async () => {
  app = await startTestApp({ poolMax: 10 });
  world = await buildWorld(app);
  template = (await buildRevision(app, world)).id;
});
afterAll(() => app.stop());

type Issued = { own: World; revisionId: string };
const issued = (): Promise<Issued> => buildIssued(app, world, template, { approverIds: [world.approver.contact.id] });

const say = (visitor: Visitor, { own, revisionId }: Issued, text: string): Promise<Note> =>
  visitor.get(addNote, {
    params: { ...own.params, revisionId },
    body: { kind: "must change", text, anchor: { on: "whole" } },
  });

const rowsOf = ({ own }: Issued): Promise<OutgoingMail[]> =>
  OutgoingMail.findAll({ where: { jobId: own.job.id, kind: "notes gathered" }, order: ["createdAt", "id"] });

const mailsOf = async ({ own }: Issued): Promise<Caught[]> =>
  (await caughtMails(app)).filter(({ subject }) => subject.includes(`(${own.job.number})`));

describe("what happens to notes within ten minutes", () => {
  it("is told in one mail, ten minutes after the first of it", async () => {
    const job = await issued();
    const { maker, owner } = job.own.visitors;
    const before = Date.now();
    const first = await say(maker, job, "One");
    await say(owner, job, "Two");
    await maker.get(replyToNote, { params: { ...job.own.params, noteId: first.id }, body: { text: "And more." } });
    const [row, ...others] = await rowsOf(job);
    expect(others).toEqual([]);
    expect(row?.dueAt?.getTime()).toBeGreaterThanOrEqual(before + 600_000);
    const [queued] = await runSql<{ seconds: number }>(
      app.database.ownerUrl,
      `select extract(epoch from run_at - created_at)::int as seconds from graphile_worker._private_jobs
       where payload->>'mailId' = $1`,
      [row?.id],
    );
    // Less what the request itself took.
    expect(queued?.seconds).toBeGreaterThan(570);
    expect(queued?.seconds).toBeLessThanOrEqual(600);
    await app.runJobs();
    expect(await mailsOf(job)).toEqual([]);

    await sendGathered(app);
    const [mail, ...more] = await mailsOf(job);
    expect(more).toEqual([]);
    expect(mail?.subject).toMatch(/^2 notes, 1 answer on /);
    expect(mail?.text).toContain("> One");
    expect(mail?.text).toContain("> And more.");
    expect(mail?.text).toContain("> Two");
    expect((await rowsOf(job)).map(({ state }) => state)).toEqual(["sent"]);
  });

  it("goes to each approver and each of the team in a mail of their own, and never to who did it", async () => {
    const job = await issued();
    await say(job.own.visitors.approver, job, "From the client");
    await say(job.own.visitors.maker, job, "From the shop");
    await sendGathered(app);
    const mails = await mailsOf(job);
    expect(mails).toHaveLength(4);
    for (const { to, text } of mails) {
      const forClient = to === world.approver.email;
      expect(text.includes("From the shop")).toBe(forClient);
      expect(text.includes("From the client")).toBe(!forClient);
    }
  });

  it("reads as it is when the mail leaves: put right, answered and settled", async () => {
    const job = await issued();
    const { maker } = job.own.visitors;
    const note = await say(maker, job, "Sevn holes");
    const params = { ...job.own.params, noteId: note.id };
    await maker.get(editNote, { params, body: { text: "Seven holes", kind: "question" } });
    await maker.get(setNoteState, { params, body: { state: "settled" } });
    await sendGathered(app);
    const [mail] = await mailsOf(job);
    expect(mail?.text).toContain("Note 1, question, settled");
    expect(mail?.text).toContain("> Seven holes");
    expect(mail?.text).not.toContain("Sevn");
  });

  it("tells a note that was settled alone, and nothing when it was opened again meanwhile", async () => {
    const job = await issued();
    const { approver } = job.own.visitors;
    const note = await say(approver, job, "Wider");
    await sendGathered(app);
    const params = { ...job.own.params, noteId: note.id };
    await approver.get(setNoteState, { params, body: { state: "settled" } });
    await sendGathered(app);
    const settled = (await mailsOf(job)).filter(({ subject }) => subject.startsWith("1 note settled on "));
    expect(settled).toHaveLength(3);
    expect(settled[0]?.text).toContain("Note 1, must change, settled");

    await approver.get(setNoteState, { params, body: { state: "open" } });
    await approver.get(setNoteState, { params, body: { state: "settled" } });
    await sendGathered(app);
    expect(await mailsOf(job)).toHaveLength(6);
    const dropped = (await rowsOf(job)).filter(({ state }) => state === "dropped");
    expect(dropped.map(({ lastError }) => lastError)).toEqual(Array(3).fill("There was nothing left to tell."));
  });

  it("is told to nobody once its revision was withdrawn", async () => {
    const job = await issued();
    const { maker } = job.own.visitors;
    await say(maker, job, "Too late");
    await maker.get(withdrawRevision, {
      params: { ...job.own.params, revisionId: job.revisionId },
      body: { reason: "Wrong size." },
    });
    await sendGathered(app);
    expect(await mailsOf(job)).toEqual([]);
    expect((await rowsOf(job)).map(({ state, lastError }) => [state, lastError])).toEqual([
      ["dropped", "The revision it was about was withdrawn."],
    ]);
  });

  it("is not told to who has opened the sheet since, but what comes after that is", async () => {
    const job = await issued();
    const { maker, approver } = job.own.visitors;
    const params = { ...job.own.params, revisionId: job.revisionId };
    await say(maker, job, "Seen");
    await approver.get(getSheet, { params });
    await say(maker, job, "Unseen");
    await sendGathered(app);
    const [mail] = await mailsOf(job);
    expect(mail?.subject).toMatch(/^1 note on /);
    expect(mail?.text).toContain("> Unseen");
    await say(maker, job, "Seen too");
    await approver.get(getSheet, { params });
    await sendGathered(app);
    expect(await mailsOf(job)).toHaveLength(1);
    expect((await rowsOf(job)).at(-1)).toMatchObject({
      state: "dropped",
      lastError: "Its reader has seen all of it on the sheet.",
    });
  });

  it("is told in the next mail when it comes while one leaves, so that none is lost and none told twice", async () => {
    const job = await issued();
    const { maker } = job.own.visitors;
    await say(maker, job, "Early");
    const [first] = await rowsOf(job);
    // The words are made, but the mail is not marked as sent yet: as when the process dies in between.
    await OutgoingMail.update({ closedAt: new Date() }, { where: { id: first?.id ?? "" } });
    await say(maker, job, "Late");
    const rows = await rowsOf(job);
    expect(rows.map(({ data }) => data.news?.length)).toEqual([1, 1]);
    await sendGathered(app);
    const texts = (await mailsOf(job)).map(({ text }) => text);
    expect(texts.filter((text) => text.includes("Early") && !text.includes("Late"))).toHaveLength(1);
    expect(texts.filter((text) => text.includes("Late") && !text.includes("Early"))).toHaveLength(1);
  });

  it("is not told to who has stopped these mails, before or while it waits", async () => {
    const job = await issued();
    const choices = {
      personId: world.approver.person.id,
      shopId: world.owner.shop.id,
      notes: false,
      reminders: true,
      changedAt: new Date(),
    };
    await say(job.own.visitors.maker, job, "Waits");
    const row = await MailChoices.create(choices);
    await say(job.own.visitors.maker, job, "Never queued");
    await sendGathered(app);
    await row.update({ notes: true });
    expect(await mailsOf(job)).toEqual([]);
    const [mail] = await rowsOf(job);
    expect(mail).toMatchObject({ state: "dropped", lastError: "Its reader has stopped these mails." });
    expect(mail?.data.news).toHaveLength(1);
  });
});

describe("ten notes at once", () => {
  it.each(Array.from({ length: 10 }, (_, index) => index + 1))(
    "gather in one mail for each reader, round %i",
    async () => {
      const job = await issued();
      const { maker, owner } = job.own.visitors;
      await Promise.all(
        Array.from({ length: 10 }, (_, index) => say(index % 2 === 0 ? maker : owner, job, `Note of ${index}`)),
      );
      const rows = await rowsOf(job);
      expect(rows.map(({ data }) => data.news?.length)).toEqual([10]);
    },
  );

  it("and the mail that leaves meanwhile: each is told once", async () => {
    const job = await issued();
    const { maker } = job.own.visitors;
    await say(maker, job, "Note of first");
    const [row] = await rowsOf(job);
    await Promise.all([
      sendMail(app.services, { mailId: row?.id ?? "" }),
      ...Array.from({ length: 10 }, (_, index) => say(maker, job, `Note of ${index}.`)),
    ]);
    await sendGathered(app);
    const told = (await mailsOf(job)).flatMap(({ text }) => text.match(/> Note of \S+/g) ?? []);
    expect(told.sort()).toEqual(
      ["> Note of first", ...Array.from({ length: 10 }, (_, index) => `> Note of ${index}.`)].sort(),
    );
  });
});

import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { issueUnsubscribeToken } from "#server/auth/unsubscribe-tokens.ts";
import { queueReminders } from "#server/commands/queue-reminders.ts";
import { sendMail } from "#server/jobs/send-mail.ts";
import { Job } from "#server/models/job.ts";
import { MailChoices } from "#server/models/mail-choices.ts";
import { OutgoingMail } from "#server/models/outgoing-mail.ts";
import { UnsubscribeToken } from "#server/models/unsubscribe-token.ts";
import { requestLink } from "#shared/contracts/account.ts";
import { changeMailChoices, inspectUnsubscribe, listMailChoices } from "#shared/contracts/mail-choices.ts";
import { addNote } from "#shared/contracts/notes.ts";
import { approveRevision } from "#shared/contracts/revisions.ts";
import { addDays } from "#shared/lifecycle/needs-yes-by.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { approvalOf } from "../support/decide.ts";
import { buildClient, buildContact } from "../support/factories/client.ts";
import { buildMember } from "../support/factories/member.ts";
import { buildRevision, buildWorld, type World } from "../support/factories/work.ts";
import { type Caught, caughtMails, sendGathered } from "../support/mail.ts";
import { signInAs, signInByMail } from "../support/sign-in.ts";

let app: TestApp;
let world: World;
let revisionId: string;
beforeAll(async () => {
  app = await startTestApp();
  world = await buildWorld(app);
  revisionId = (await buildRevision(app, world)).id;
});
afterAll(() => app.stop());

const stopOf = ({ text }: Caught): string => /\/unsubscribe\/([A-Za-z0-9_-]{43})\b/.exec(text)?.[1] ?? "";
const stopping = (mails: Caught[]) => mails.filter(({ parsed }) => parsed.headers.has("list"));
const mailsTo = async (address: string): Promise<Caught[]> =>
  (await caughtMails(app)).filter(({ to }) => to === address);
/** As the reader's mail program does it: a form, no cookie, no header of ours. */
const press = (token: string) =>
  fetch(`${app.baseUrl}/unsubscribe/${token}`, {
    method: "POST",
    headers: { "Content-Type": "application/x-www-form-urlencoded", Origin: "https://mail.example" },
    body: "List-Unsubscribe=One-Click",
    redirect: "manual",
  });

async function say(text: string): Promise<void> {
  await world.visitors.maker.get(addNote, {
    params: { ...world.params, revisionId },
    body: { kind: "question", text, anchor: { on: "whole" } },
  });
  await sendGathered(app);
}

describe("a mail that is not needed", () => {
  it("says in its header and in its words how it is stopped, and one that is needed does not", async () => {
    await say("Which wall?");
    const mails = await mailsTo(world.approver.email);
    const [gathered, ...more] = stopping(mails);
    expect(more).toEqual([]);
    expect(gathered?.subject).toMatch(/^1 note on /);
    const url = `${app.baseUrl}/unsubscribe/${stopOf(gathered as Caught)}`;
    expect(gathered?.source.replace(/\r\n\s+/g, " ")).toContain(`List-Unsubscribe: <${url}>`);
    expect(gathered?.html).toContain(`href="${url}"`);
    const needed = mails.filter((mail) => mail !== gathered);
    expect(needed.map(({ subject }) => subject.split(" ")[0]).sort()).toEqual(["Revision", "Your"]);
    for (const { source } of needed) expect(source).not.toMatch(/unsubscribe/i);
    // Of the token no more than its hash is kept.
    const rows = await UnsubscribeToken.findAll();
    expect(JSON.stringify(rows)).not.toContain(stopOf(gathered as Caught));
    expect(rows).toHaveLength(1);
  });

  it("promises the one click when people reach us by https, as RFC 8058 asks", async () => {
    await world.visitors.maker.get(addNote, {
      params: { ...world.params, revisionId },
      body: { kind: "question", text: "Screws or glue?", anchor: { on: "whole" } },
    });
    const where = { kind: "notes gathered" as const, state: "queued" as const };
    const { id } = await OutgoingMail.findOne({ where, rejectOnEmpty: true });
    const env = { ...app.services.env, PUBLIC_URL: "https://proofs.example" };
    await sendMail({ ...app.services, env }, { mailId: id });
    const [mail] = stopping(await mailsTo(world.approver.email));
    const headers = mail?.source
      .replace(/\r\n\s+/g, " ")
      .split("\r\n\r\n")[0]
      ?.split("\r\n");
    expect(headers).toContain(`List-Unsubscribe: <https://proofs.example/unsubscribe/${stopOf(mail as Caught)}>`);
    expect(headers).toContain("List-Unsubscribe-Post: List-Unsubscribe=One-Click");
  });

  it("is stopped by one press of the mail program, for this shop and this reader, and twice does no harm", async () => {
    const [gathered] = stopping(await mailsTo(world.approver.email));
    const token = stopOf(gathered as Caught);
    const choices = { shop: world.params.shop, shopName: world.owner.shop.name };
    for (let times = 0; times < 2; times += 1) {
      const answer = await press(token);
      expect([answer.status, await answer.text()]).toEqual([200, ""]);
    }
    expect((await world.visitors.approver.get(listMailChoices)).items).toEqual([
      { ...choices, notes: false, reminders: false },
    ]);
    expect((await world.visitors.otherContact.get(listMailChoices)).items).toEqual([
      { ...choices, notes: true, reminders: true },
    ]);
    await say("And how high?");
    const today = new Date().toISOString().slice(0, 10);
    await Job.update({ dueOn: addDays(today, 40) }, { where: { id: world.job.id } });
    for (let day = 20; day < 45; day += 1) {
      await queueReminders({ services: app.services, now: new Date(`${addDays(today, day)}T10:00:00Z`) });
    }
    await app.runJobs();
    expect(stopping(await mailsTo(world.approver.email))).toHaveLength(2);
  });

  it("is not stopped by looking at the page: a mail scanner does that too", async () => {
    await world.visitors.approver.get(changeMailChoices, { params: world.params, body: { notes: true } });
    const [gathered] = stopping(await mailsTo(world.approver.email));
    const token = stopOf(gathered as Caught);
    await fetch(`${app.baseUrl}/unsubscribe/${token}`);
    const { addressHint, ...looked } = await app.visitor().get(inspectUnsubscribe, { body: { token } });
    expect(looked).toEqual({ shopName: world.owner.shop.name, notes: true, reminders: false });
    expect(addressHint).toMatch(/^.•••••@/);
    await say("Still there?");
    expect(stopping(await mailsTo(world.approver.email))).toHaveLength(3);
  });

  it("is not stopped by a token that nobody made", async () => {
    const unknown = "A".repeat(43);
    expect((await press(unknown)).status).toBe(404);
    expect((await press("short")).status).toBe(404);
    const inspected = await app.visitor().refusal(inspectUnsubscribe, { body: { token: unknown } });
    expect(inspected.code).toBe("not_found");
    expect(app.logged.join("")).not.toContain(unknown);
  });
});

describe("who has stopped everything", () => {
  it("still gets what is needed: sign-in links and, as the shop, decisions", async () => {
    const { approver, owner } = world.visitors;
    const nothing = { notes: false, reminders: false };
    for (const visitor of [approver, owner])
      await visitor.get(changeMailChoices, { params: world.params, body: nothing });
    await app.visitor().get(requestLink, { body: { email: world.approver.email } });
    await approver.get(approveRevision, {
      params: { ...world.params, revisionId },
      body: { ...(await approvalOf(world, revisionId)) },
    });
    await app.runJobs();
    expect((await mailsTo(world.approver.email))[0]?.subject).toMatch(/^Your link to /);
    expect((await mailsTo(world.owner.email))[0]?.subject).toMatch(/^Approved: /);
  });
});

describe("the choice of one person", () => {
  it("is made for each of their shops apart, and kept field by field", async () => {
    const here = await buildMember();
    const there = await buildMember({ person: here.person });
    const visitor = await signInAs(app, here);
    await visitor.get(changeMailChoices, { params: { shop: here.shop.slug }, body: { notes: false } });
    await visitor.get(changeMailChoices, { params: { shop: here.shop.slug }, body: { reminders: false } });
    await visitor.get(changeMailChoices, { params: { shop: there.shop.slug }, body: {} });
    const { items } = await visitor.get(listMailChoices);
    expect(Object.fromEntries(items.map(({ shop, notes, reminders }) => [shop, [notes, reminders]]))).toEqual({
      [here.shop.slug]: [false, false],
      [there.shop.slug]: [true, true],
    });
  });

  it("can't be made in a shop where one has no place, and a token stops nothing elsewhere", async () => {
    const contact = await buildContact({ client: await buildClient() });
    const visitor = await signInByMail(app, contact);
    const refused = await visitor.refusal(changeMailChoices, { params: world.params, body: { notes: false } });
    expect(refused.code).toBe("not_found");
    const whom = { personId: contact.person.id, shopId: contact.client.shopId };
    const token = await app.services.sequelize.transaction((transaction) =>
      issueUnsubscribeToken(app.services.env, whom, { now: new Date(), transaction }),
    );
    expect((await press(token)).status).toBe(200);
    expect(await MailChoices.count({ where: { personId: contact.person.id } })).toBe(1);
  });
});

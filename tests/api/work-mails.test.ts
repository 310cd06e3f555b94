import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { queueMail } from "#server/commands/queue-mail.ts";
import { OutgoingMail } from "#server/models/outgoing-mail.ts";
import { inspectLink, sendFreshLink, whoAmI } from "#shared/contracts/account.ts";
import { addNote, listNotes, replyToNote } from "#shared/contracts/notes.ts";
import { askForRevision, type Revision } from "#shared/contracts/revisions.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildRevision, buildWorld, type World } from "../support/factories/work.ts";
import { type Caught, caughtMails, sendGathered, tokenIn } from "../support/mail.ts";

let app: TestApp;
let world: World;
let revision: Revision;
beforeAll(async () => {
  app = await startTestApp();
  world = await buildWorld(app);
  revision = await buildRevision(app, world);
  await app.runJobs();
});
afterAll(() => app.stop());

const sheetPath = (): string => `/shop/${world.params.shop}/sheets/${revision.id}`;

async function mailAbout(address: string, start: string): Promise<Caught> {
  await app.runJobs();
  const mail = (await caughtMails(app)).find(({ to, subject }) => to === address && subject.startsWith(start));
  if (!mail) throw new Error(`No mail to ${address} about ${start}`);
  return mail;
}

describe("a proof that is out", () => {
  it("is mailed to the approver alone, with a link that signs in and leads to the sheet", async () => {
    const mail = await mailAbout(world.approver.email, "Revision A");
    expect(mail.subject).toBe(`Revision A of “Lobby sign” (${world.job.number}) is ready to look at`);
    expect((await caughtMails(app)).filter(({ subject }) => subject.startsWith("Revision A"))).toHaveLength(1);
    const visitor = app.visitor();
    const token = tokenIn(mail.text);
    expect((await visitor.get(inspectLink, { body: { token } })).goTo).toBe(sheetPath());
    await visitor.signIn("link", { token });
    expect((await visitor.get(whoAmI)).person?.email).toBe(world.approver.email);
  });

  it("a fresh link for it leads to the sheet as well", async () => {
    const spent = tokenIn((await mailAbout(world.approver.email, "Revision A")).text);
    await app.visitor().get(sendFreshLink, { body: { token: spent } });
    const fresh = tokenIn((await mailAbout(world.approver.email, "Your link to")).text);
    expect((await app.visitor().get(inspectLink, { body: { token: fresh } })).goTo).toBe(sheetPath());
  });

  it("is not mailed any more once it can't be seen", async () => {
    const data = { contactId: world.approver.contact.id, revisionId: "11111111-1111-4111-8111-111111111111" };
    const shopId = world.owner.shop.id;
    await app.services.sequelize.transaction((transaction) =>
      queueMail(
        { now: new Date(), transaction },
        { kind: "proof issued", address: world.approver.email, shopId, data },
      ),
    );
    await app.runJobs();
    const order: [string, string][] = [["createdAt", "DESC"]];
    const row = await OutgoingMail.findOne({ where: { kind: "proof issued", shopId }, order, rejectOnEmpty: true });
    expect(row.state).toBe("dropped");
  });
});

describe("notes", () => {
  const noteParams = () => ({ ...world.params, revisionId: revision.id });
  const anchor = { on: "whole" as const };
  const about = () => `on “Lobby sign” (${world.job.number}), revision A`;

  it("of the client are mailed to each of the team, to the plain page", async () => {
    await world.visitors.approver.get(addNote, {
      params: noteParams(),
      body: { kind: "must change", text: "Wider <gap>,\nplease", anchor },
    });
    await app.runJobs();
    expect((await caughtMails(app)).some(({ subject }) => subject.startsWith("1 note"))).toBe(false);
    await sendGathered(app);
    const mail = await mailAbout(world.owner.email, "1 note on");
    expect(mail.subject).toBe(`1 note ${about()}`);
    expect(mail.text).toContain("Note 1, must change, open");
    expect(mail.text).toContain("> Wider <gap>,\n> please");
    expect(mail.html).toContain("Wider &lt;gap&gt;,<br>please");
    expect(mail.text).toContain(`${app.baseUrl}${sheetPath()}`);
    expect(mail.text).not.toContain("/link/");
    const others = (await caughtMails(app)).filter(({ subject }) => subject.startsWith("1 note on"));
    expect(others).toHaveLength(3);
  });

  it("of the shop are mailed to the approver with a link of their own; a shop-only one to nobody", async () => {
    const { maker } = world.visitors;
    const body = { kind: "question" as const, text: "Which wall?", anchor };
    await maker.get(addNote, { params: noteParams(), body });
    await maker.get(addNote, { params: noteParams(), body: { ...body, text: "He pays late", shopOnly: true } });
    await sendGathered(app);
    const mail = await mailAbout(world.approver.email, "1 note on");
    expect(mail.text).toContain("Note 2, question, open");
    expect(tokenIn(mail.text)).toHaveLength(43);
    expect((await caughtMails(app)).some(({ source }) => source.includes("pays late"))).toBe(false);
  });

  it("that are answered are mailed to the other side with both wordings; one for the shop alone to nobody", async () => {
    const { maker, approver } = world.visitors;
    const { items } = await maker.get(listNotes, { params: noteParams() });
    const [ofClient, , shopOnly] = items;
    if (!ofClient || !shopOnly) throw new Error("The notes above are missing.");
    const to = (noteId: string) => ({ ...world.params, noteId });
    await maker.get(replyToNote, { params: to(ofClient.id), body: { text: "Widened by 5 mm." } });
    await maker.get(replyToNote, { params: to(shopOnly.id), body: { text: "Ask for a deposit" } });
    await sendGathered(app);
    const mail = await mailAbout(world.approver.email, "1 answer");
    expect(mail.subject).toBe(`1 answer ${about()}`);
    expect(mail.text).toContain("Note 1, must change, answered");
    expect(mail.text).toContain("> Wider <gap>, please");
    expect(mail.text).toContain("answered:\n> Widened by 5 mm.");
    expect((await app.visitor().get(inspectLink, { body: { token: tokenIn(mail.text) } })).goTo).toBe(sheetPath());
    await approver.get(replyToNote, { params: to(ofClient.id), body: { text: "Thank you." } });
    await sendGathered(app);
    const back = await mailAbout(world.owner.email, "1 answer");
    expect(back.text).toContain("> Thank you.");
    expect(back.text).not.toContain("/link/");
    expect((await caughtMails(app)).some(({ source }) => source.includes("deposit"))).toBe(false);
  });
});

describe("a revision that was asked for", () => {
  it("is mailed to the team with what the client wrote", async () => {
    await world.visitors.approver.get(askForRevision, {
      params: { ...world.params, revisionId: revision.id },
      body: { summary: "The oars should cross higher." },
    });
    const mail = await mailAbout(world.owner.email, "Revision asked");
    expect(mail.subject).toBe(`Revision asked: “Lobby sign” (${world.job.number})`);
    expect(mail.text).toContain("> The oars should cross higher.");
    expect(mail.text).toContain(`${app.baseUrl}${sheetPath()}`);
  });
});

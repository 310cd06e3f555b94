import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { queueMail } from "#server/commands/queue-mail.ts";
import { OutgoingMail } from "#server/models/outgoing-mail.ts";
import { inspectLink, sendFreshLink, whoAmI } from "#shared/contracts/account.ts";
import { addNote, listNotes, replyToNote } from "#shared/contracts/notes.ts";
import { askForRevision, type Revision } from "#shared/contracts/revisions.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildRevision, buildWorld, type World } from "../support/factories/work.ts";
import { type Caught, caughtMails, tokenIn } from "../support/mail.ts";

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

describe("a note", () => {
  const noteParams = () => ({ ...world.params, revisionId: revision.id });
  const anchor = { on: "whole" as const };

  it("of the client is mailed to each of the team, to the plain page", async () => {
    await world.visitors.approver.get(addNote, {
      params: noteParams(),
      body: { kind: "must change", text: "Wider <gap>,\nplease", anchor },
    });
    const mail = await mailAbout(world.owner.email, "Note 1");
    expect(mail.text).toContain("> Wider <gap>,\n> please");
    expect(mail.html).toContain("Wider &lt;gap&gt;,<br>please");
    expect(mail.text).toContain(`${app.baseUrl}${sheetPath()}`);
    expect(mail.text).not.toContain("/link/");
    const others = (await caughtMails(app)).filter(({ subject }) => subject.startsWith("Note 1"));
    expect(others).toHaveLength(3);
  });

  it("of the shop is mailed to the approver with a link of their own; a shop-only one to nobody", async () => {
    const { maker } = world.visitors;
    const body = { kind: "question" as const, text: "Which wall?", anchor };
    await maker.get(addNote, { params: noteParams(), body });
    await maker.get(addNote, { params: noteParams(), body: { ...body, text: "He pays late", shopOnly: true } });
    const mail = await mailAbout(world.approver.email, "Note 2");
    expect(tokenIn(mail.text)).toHaveLength(43);
    expect((await caughtMails(app)).some(({ source }) => source.includes("pays late"))).toBe(false);
  });

  it("that is answered is mailed to the other side with both wordings; one for the shop alone to nobody", async () => {
    const { maker, approver } = world.visitors;
    const { items } = await maker.get(listNotes, { params: noteParams() });
    const [ofClient, , shopOnly] = items;
    if (!ofClient || !shopOnly) throw new Error("The notes above are missing.");
    const to = (noteId: string) => ({ ...world.params, noteId });
    await maker.get(replyToNote, { params: to(ofClient.id), body: { text: "Widened by 5 mm." } });
    await maker.get(replyToNote, { params: to(shopOnly.id), body: { text: "Ask for a deposit" } });
    const subject = `Answer to note 1 on “Lobby sign” (${world.job.number}), revision A`;
    const mail = await mailAbout(world.approver.email, "Answer to note 1");
    expect(mail.subject).toBe(subject);
    expect(mail.text).toContain("answered note 1 (“Wider <gap>, please”)");
    expect(mail.text).toContain("> Widened by 5 mm.");
    expect((await app.visitor().get(inspectLink, { body: { token: tokenIn(mail.text) } })).goTo).toBe(sheetPath());
    await approver.get(replyToNote, { params: to(ofClient.id), body: { text: "Thank you." } });
    const back = await mailAbout(world.owner.email, "Answer to note 1");
    expect(back.text).toContain("> Thank you.");
    expect(back.text).not.toContain("/link/");
    expect((await caughtMails(app)).some(({ source }) => source.includes("deposit"))).toBe(false);
  });

  it("fills no mailbox: past thirty within the hour it stands on the sheet only", async () => {
    const where = { address: world.approver.email, kind: "note added" as const };
    const body = { kind: "question" as const, text: "And this?", anchor };
    for (let number = 0; number < 32; number += 1) {
      await world.visitors.maker.get(addNote, { params: noteParams(), body });
    }
    expect(await OutgoingMail.count({ where })).toBe(30);
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

import type { AddressInfo } from "node:net";
import { SMTPServer } from "smtp-server";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { queueMail } from "#server/commands/queue-mail.ts";
import { sendMail } from "#server/jobs/send-mail.ts";
import { Event } from "#server/models/event.ts";
import { OneTimeLink } from "#server/models/one-time-link.ts";
import { type MailData, type MailKind, OutgoingMail } from "#server/models/outgoing-mail.ts";
import { forgotPassword, requestLink } from "#shared/contracts/account.ts";
import { getOutgoingMail, listOutgoingMail } from "#shared/contracts/outgoing-mail.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { type BuiltContact, buildClient, buildContact } from "../support/factories/client.ts";
import { buildMember, type Member } from "../support/factories/member.ts";
import { buildShop } from "../support/factories/shop.ts";
import { caughtMails, tokenIn } from "../support/mail.ts";
import { signInAs, signInByMail } from "../support/sign-in.ts";

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.stop());

async function ownerWithContact(): Promise<BuiltContact & { owner: Member }> {
  const owner = await buildMember();
  return { owner, ...(await buildContact({ client: await buildClient({ shop: owner.shop }) })) };
}

async function queue(
  where: TestApp,
  mail: { kind: MailKind; address: string; shopId: string; data: MailData },
): Promise<OutgoingMail> {
  await where.services.sequelize.transaction((transaction) => queueMail({ now: new Date(), transaction }, mail));
  const order: [string, string][] = [["createdAt", "DESC"]];
  return OutgoingMail.findOne({ where: { address: mail.address }, order, rejectOnEmpty: true });
}

describe("the page of outgoing mail", () => {
  it("shows an owner what was sent for their shop, newest first and by pages", async () => {
    const { owner, email } = await ownerWithContact();
    const elsewhere = await ownerWithContact();
    for (const address of [email, elsewhere.email, email, email]) {
      await app.visitor().get(requestLink, { body: { email: address } });
      await app.runJobs();
    }
    const visitor = await signInAs(app, owner);
    const params = { shop: owner.shop.slug };
    const first = await visitor.get(listOutgoingMail, { params, query: { limit: 2 } });
    const second = await visitor.get(listOutgoingMail, { params, query: { limit: 2, cursor: first.next ?? "" } });
    const rows = [...first.items, ...second.items];
    expect(rows.map(({ to }) => to)).toEqual([email, email, email]);
    expect(rows.map(({ at }) => at)).toEqual(
      rows
        .map(({ at }) => at)
        .sort()
        .reverse(),
    );
    expect(second.next).toBeNull();

    const mail = await visitor.get(getOutgoingMail, { params: { ...params, mailId: rows[0]?.id ?? "" } });
    expect(mail.links).toEqual([`${app.baseUrl}/link/${tokenIn(mail.text)}`]);
    expect(mail.subject).toBe(`Your link to ${owner.shop.name}`);

    const other = await signInAs(app, elsewhere.owner);
    const otherParams = { shop: elsewhere.owner.shop.slug, mailId: rows[0]?.id ?? "" };
    expect((await other.refusal(getOutgoingMail, { params: otherParams })).code).toBe("not_found");
  });

  it("is not there for anyone else, nor for anyone without a session", async () => {
    const { owner, client, email } = await ownerWithContact();
    const params = { shop: owner.shop.slug };
    expect((await app.visitor().refusal(listOutgoingMail, { params })).code).toBe("not_signed_in");
    const maker = await signInAs(app, await buildMember({ shop: owner.shop, role: "maker" }));
    const stranger = await signInAs(app, await buildMember());
    const contact = await signInByMail(app, { email });
    expect(client.shopId).toBe(owner.shop.id);
    for (const visitor of [maker, stranger, contact]) {
      expect((await visitor.refusal(listOutgoingMail, { params })).code).toBe("not_found");
    }
  });

  it("hides a link that would open another shop as well", async () => {
    const { owner, person, email } = await ownerWithContact();
    await buildContact({ person });
    await app.visitor().get(requestLink, { body: { email } });
    const member = await buildMember({ shop: owner.shop, role: "maker" });
    await buildMember({ person: member.person });
    await app.visitor().get(forgotPassword, { body: { email: member.email } });
    await app.runJobs();
    expect((await caughtMails(app)).filter(({ to }) => [email, member.email].includes(to))).toHaveLength(3);
    const visitor = await signInAs(app, owner);
    expect((await visitor.get(listOutgoingMail, { params: { shop: owner.shop.slug } })).items).toEqual([]);
  });
});

describe("a mail", () => {
  it("goes out once, however often its job runs, with an id that is always the same", async () => {
    const { owner, contact, email } = await ownerWithContact();
    const mail = await queue(app, {
      kind: "sign in link",
      address: email,
      shopId: owner.shop.id,
      data: { contactId: contact.id },
    });
    await sendMail(app.services, { mailId: mail.id });
    await sendMail(app.services, { mailId: mail.id });
    await app.runJobs();
    const caught = (await caughtMails(app)).filter(({ to }) => to === email);
    expect(caught).toHaveLength(1);
    expect(caught[0]?.parsed.messageId).toBe(`<${mail.id}@standproud.example>`);
    await mail.reload();
    expect(mail).toMatchObject({ state: "sent", attempts: 1, lastError: null });
    expect(await OneTimeLink.count({ where: { mailId: mail.id } })).toBe(1);
    const events = await Event.findAll({ where: { shopId: owner.shop.id } });
    expect(events.map(({ kind, side, data }) => ({ kind, side, data }))).toEqual([
      { kind: "mail sent", side: "system", data: { kind: "sign in link", to: email } },
    ]);
  });

  it("carries what people wrote as text: no header and no markup comes of it", async () => {
    const shop = await buildShop({ name: "Bad\r\nBcc: thief@evil.example <b>&\u2028Co" });
    const built = await buildContact({
      client: await buildClient({ shop }),
      name: '<img src=x onerror="x">\r\nX-Evil: 1',
    });
    await queue(app, {
      kind: "sign in link",
      address: built.email,
      shopId: shop.id,
      data: { contactId: built.contact.id },
    });
    await app.runJobs();
    const mail = (await caughtMails(app)).find(({ to }) => to === built.email);
    expect(mail?.subject).toBe("Your link to Bad Bcc: thief@evil.example <b>& Co");
    expect([...(mail?.parsed.headers.keys() ?? [])]).not.toContain("bcc");
    expect([...(mail?.parsed.headers.keys() ?? [])]).not.toContain("x-evil");
    expect(mail?.parsed.from?.value).toEqual([
      { name: "Bad Bcc: thief@evil.example <b>& Co", address: "noreply@standproud.example" },
    ]);
    expect(mail?.html).toContain("&lt;img src=x onerror=&quot;x&quot;&gt;");
    expect(mail?.html).not.toContain("<img");
    expect(mail?.html).not.toContain("<b>");
  });
});

// From here on other applications are opened; models are bound to the one opened last.
describe("with a mail server, the page of outgoing mail", () => {
  it("is not there, even for an owner", async () => {
    const real = await startTestApp({ env: { SMTP_URL: "smtp://127.0.0.1:9" } });
    try {
      const owner = await buildMember();
      const visitor = await signInAs(real, owner);
      expect((await visitor.refusal(listOutgoingMail, { params: { shop: owner.shop.slug } })).code).toBe("not_found");
    } finally {
      await real.stop();
    }
  });
});

describe("a mail server that does not take a mail", () => {
  async function withServer(
    answer: { code: number; words: string } | null,
    run: (real: TestApp, received: string[]) => Promise<void>,
  ): Promise<void> {
    const received: string[] = [];
    let refusing = answer;
    const server = new SMTPServer({
      authOptional: true,
      disabledCommands: ["STARTTLS"],
      onRcptTo({ address }, _session, done) {
        if (!refusing) return done();
        const error = Object.assign(new Error(refusing.words), { responseCode: refusing.code });
        // A delay is for the first try only.
        if (refusing.code < 500) refusing = null;
        received.push(`refused ${address}`);
        done(error);
      },
      onData(stream, session, done) {
        stream.resume();
        stream.on("end", () => {
          received.push(session.envelope.rcptTo.map(({ address }) => address).join());
          done();
        });
      },
    });
    await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
    const { port } = server.server.address() as AddressInfo;
    const real = await startTestApp({ env: { SMTP_URL: `smtp://127.0.0.1:${port}` } });
    try {
      await run(real, received);
    } finally {
      await real.stop();
      await new Promise<void>((resolve) => server.close(() => resolve()));
    }
  }

  it("for good: the mail is refused, its link is dead, the log says why and nothing is tried again", async () => {
    await withServer({ code: 550, words: "No such person" }, async (real, received) => {
      const { owner, contact, email } = await ownerWithContact();
      const data = { contactId: contact.id };
      const mail = await queue(real, { kind: "sign in link", address: email, shopId: owner.shop.id, data });
      await real.runJobs();
      await mail.reload();
      expect(mail).toMatchObject({ state: "refused", attempts: 1 });
      expect(mail.lastError).toContain("No such person");
      expect(received).toEqual([`refused ${email}`]);
      expect(await OneTimeLink.count({ where: { mailId: mail.id, killedAt: null } })).toBe(0);
      const event = await Event.findOne({ where: { shopId: owner.shop.id, kind: "mail refused" } });
      expect(event?.data).toMatchObject({ kind: "sign in link", to: email });
      expect(await real.queuedJobs()).toEqual([]);
    });
  });

  it("for now: the mail stays queued with its reason, and goes out at the next try", async () => {
    await withServer({ code: 451, words: "Later please" }, async (real, received) => {
      const { owner, contact, email } = await ownerWithContact();
      const data = { contactId: contact.id };
      const mail = await queue(real, { kind: "sign in link", address: email, shopId: owner.shop.id, data });
      await real.runJobs();
      await mail.reload();
      expect(mail).toMatchObject({ state: "queued", attempts: 1 });
      expect(mail.lastError).toContain("Later please");
      const [job] = await real.queuedJobs();
      expect(job?.lastError).toContain("Later please");
      await sendMail(real.services, { mailId: mail.id });
      await mail.reload();
      expect(mail).toMatchObject({ state: "sent", attempts: 2, lastError: null });
      expect(received).toEqual([`refused ${email}`, email]);
    });
  });
});

import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Contact } from "#server/models/contact.ts";
import { Event } from "#server/models/event.ts";
import { OutgoingMail } from "#server/models/outgoing-mail.ts";
import type { Shop } from "#server/models/shop.ts";
import { inspectLink, requestLink, sendFreshLink, whoAmI } from "#shared/contracts/account.ts";
import { addContact, changeContact, getClient, inviteContact, removeContact } from "#shared/contracts/clients.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { type BuiltContact, buildClient, buildContact } from "../support/factories/client.ts";
import { buildMember } from "../support/factories/member.ts";
import { caughtMails, tokenIn } from "../support/mail.ts";
import { signInAs, signInByMail } from "../support/sign-in.ts";
import type { Visitor } from "../support/visitor.ts";

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.stop());

async function repWithContact(): Promise<BuiltContact & { shop: Shop; rep: Visitor }> {
  const member = await buildMember({ role: "rep" });
  const built = await buildContact({ client: await buildClient({ shop: member.shop }) });
  return { ...built, shop: member.shop, rep: await signInAs(app, member) };
}

const kindsIn = async (shopId: string): Promise<string[]> =>
  (await Event.findAll({ where: { shopId }, order: ["id"] })).map(({ kind }) => kind);

async function newestMailTo(address: string) {
  await app.runJobs();
  return (await caughtMails(app)).find(({ to }) => to === address);
}

describe("a contact", () => {
  it("is added by staff; the address may be known elsewhere but not twice at one client", async () => {
    const { client, shop, rep } = await repWithContact();
    const other = await buildContact();
    const params = { shop: shop.slug, clientId: client.id };
    const body = { name: "Second Hand", email: other.email };
    const added = await rep.get(addContact, { params, body });
    expect(added).toEqual({ id: added.id, name: "Second Hand", email: other.email, lastSeenAt: null });
    const problem = await rep.refusal(addContact, { params, body });
    expect(problem).toMatchObject({ code: "already_exists", errors: [{ pointer: "/email" }] });
    const bad = await rep.refusal(addContact, { params, body: { name: "a\u0007b", email: "a@b\nBcc: c@d.example" } });
    expect(bad.errors?.map(({ pointer }) => pointer)).toEqual(["/name", "/email"]);
    expect(await Contact.count({ where: { clientId: client.id } })).toBe(2);
    expect(await OutgoingMail.count({ where: { shopId: shop.id } })).toBe(0);
  });

  it("is nobody's business without a session, in another shop, or to other contacts", async () => {
    const { client, contact, shop, email } = await repWithContact();
    const self = await signInByMail(app, { email });
    const stranger = await signInAs(app, await buildMember());
    const params = { shop: shop.slug, clientId: client.id, contactId: contact.id };
    const body = { name: "X", email: "x@y.example" };
    for (const endpoint of [addContact, changeContact, removeContact, inviteContact]) {
      const given = endpoint === addContact || endpoint === changeContact ? { params, body } : { params };
      expect((await app.visitor().ask(endpoint, given)).status).toBe(401);
      for (const visitor of [self, stranger]) expect((await visitor.ask(endpoint, given)).status).toBe(404);
    }
    await contact.reload();
    expect(contact.endedAt).toBeNull();
  });

  it("gets a link by mail when staff ask for it, and is seen in this shop only", async () => {
    const { client, contact, person, shop, rep, email } = await repWithContact();
    const params = { shop: shop.slug, contactId: contact.id };
    await rep.get(inviteContact, { params });
    expect((await app.queuedJobs()).map(({ task }) => task)).toEqual(["send-mail"]);
    const mail = await newestMailTo(email);
    expect(mail?.subject).toBe(`Your link to ${shop.name}`);
    expect(await app.queuedJobs()).toEqual([]);
    await app.visitor().signIn("link", { token: tokenIn(mail?.text ?? "") });
    expect(await kindsIn(shop.id)).toEqual(["signed in", "contact sent a link", "mail sent", "signed in"]);

    const here = await rep.get(getClient, { params: { shop: shop.slug, clientId: client.id } });
    expect(here.contacts[0]?.lastSeenAt).not.toBeNull();
    const elsewhere = await buildMember();
    const there = await buildClient({ shop: elsewhere.shop });
    await buildContact({ client: there, person });
    const other = await signInAs(app, elsewhere);
    const seen = await other.get(getClient, { params: { shop: elsewhere.shop.slug, clientId: there.id } });
    expect(seen.contacts).toMatchObject([{ email, lastSeenAt: null }]);
  });
});

describe("a contact's new address", () => {
  it("signs the old one out, kills open links, tells the old address and stands in the log", async () => {
    const { contact, shop, rep, email } = await repWithContact();
    const signedIn = await signInByMail(app, { email });
    await app.visitor().get(requestLink, { body: { email } });
    const openLink = tokenIn((await newestMailTo(email))?.text ?? "");
    expect((await app.visitor().get(inspectLink, { body: { token: openLink } })).state).toBe("open");

    const params = { shop: shop.slug, contactId: contact.id };
    const changed = await rep.get(changeContact, { params, body: { email: "new.desk@reading.example" } });
    expect(changed).toMatchObject({ id: contact.id, name: contact.name, email: "new.desk@reading.example" });

    expect((await signedIn.get(whoAmI)).person).toBeNull();
    expect((await app.visitor().get(inspectLink, { body: { token: openLink } })).state).toBe("expired");
    expect((await app.visitor().signIn("link", { token: openLink })).search).toContain("error");
    const told = await newestMailTo(email);
    expect(told?.subject).toBe(`${shop.name} writes to another address now`);
    expect(told?.text).not.toContain("/link/");
    expect(told?.source).not.toContain("new.desk");
    const event = await Event.findOne({ where: { shopId: shop.id, kind: "contact address changed" } });
    expect(event?.data).toEqual({ name: contact.name, from: email, to: "new.desk@reading.example" });

    // Neither the dead link nor the old address brings a new one; the new address does.
    const before = await OutgoingMail.count();
    await app.visitor().get(sendFreshLink, { body: { token: openLink } });
    await app.visitor().get(requestLink, { body: { email } });
    expect(await OutgoingMail.count()).toBe(before);
    const reader = await signInByMail(app, { email: "new.desk@reading.example" });
    expect((await reader.get(whoAmI)).contactOf).toHaveLength(1);
  });

  it("leaves a session of the old address that still speaks for another client", async () => {
    const { contact, person, shop, rep, email } = await repWithContact();
    const other = await buildContact({ person });
    const signedIn = await signInByMail(app, { email });
    expect((await signedIn.get(whoAmI)).contactOf).toHaveLength(2);
    const params = { shop: shop.slug, contactId: contact.id };
    await rep.get(changeContact, { params, body: { email: "moved@reading.example" } });
    const left = (await signedIn.get(whoAmI)).contactOf;
    expect(left).toHaveLength(1);
    expect(left[0]?.client).toBe(other.client.name);
  });

  it("drops a mail that was still on its way to the old address", async () => {
    const { contact, shop, rep, email } = await repWithContact();
    const params = { shop: shop.slug, contactId: contact.id };
    await rep.get(inviteContact, { params });
    await rep.get(changeContact, { params, body: { email: "quick@reading.example" } });
    await app.runJobs();
    const rows = await OutgoingMail.findAll({ where: { shopId: shop.id }, order: ["createdAt"] });
    expect(rows.map(({ kind, state, address }) => ({ kind, state, address }))).toEqual([
      { kind: "sign in link", state: "dropped", address: email },
      { kind: "address changed", state: "sent", address: email },
    ]);
    expect((await caughtMails(app)).filter(({ to }) => to === email)).toHaveLength(1);
  });

  it("is not turned to and fro to fill a mailbox: the sixth time within the hour it is refused", async () => {
    const { contact, email, shop, rep } = await repWithContact();
    const params = { shop: shop.slug, contactId: contact.id };
    const other = `other.${email}`;
    for (let time = 0; time < 5; time += 1) {
      await rep.get(changeContact, { params, body: { email: other } });
      await rep.get(changeContact, { params, body: { email } });
    }
    expect((await rep.refusal(changeContact, { params, body: { email: other } })).code).toBe("too_many_requests");
    expect(await OutgoingMail.count({ where: { address: email, kind: "address changed" } })).toBe(5);
    expect((await rep.get(changeContact, { params, body: { name: "Still There" } })).email).toBe(email);
  });

  it("may not be one that the client has already", async () => {
    const { contact, client, shop, rep } = await repWithContact();
    const twin = await buildContact({ client });
    const params = { shop: shop.slug, contactId: contact.id };
    expect((await rep.refusal(changeContact, { params, body: { email: twin.email } })).code).toBe("already_exists");
    await contact.reload();
    expect(contact.personId).not.toBe(twin.person.id);
  });
});

describe("removing a contact", () => {
  it("ends the access at once and keeps the row for what they wrote", async () => {
    const { contact, client, shop, rep, email } = await repWithContact();
    const signedIn = await signInByMail(app, { email });
    const params = { shop: shop.slug, contactId: contact.id };
    await rep.get(inviteContact, { params });
    await rep.get(removeContact, { params });
    expect((await signedIn.get(whoAmI)).person).toBeNull();
    await app.runJobs();
    expect(await OutgoingMail.count({ where: { shopId: shop.id, state: "dropped" } })).toBe(1);
    await contact.reload();
    expect(contact.endedAt).not.toBeNull();
    expect((await rep.get(getClient, { params: { shop: shop.slug, clientId: client.id } })).contacts).toEqual([]);
    expect((await rep.refusal(removeContact, { params })).code).toBe("not_found");
    expect(await kindsIn(shop.id)).toContain("contact removed");
  });
});

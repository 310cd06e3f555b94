import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Event } from "#server/models/event.ts";
import { Person } from "#server/models/person.ts";
import { Session } from "#server/models/session.ts";
import { StockItem } from "#server/models/stock-item.ts";
import {
  changeAccount,
  changePassword,
  endSession,
  listSessions,
  registerShop,
  whoAmI,
} from "#shared/contracts/account.ts";
import { getShop } from "#shared/contracts/shop.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildClient, buildContact } from "../support/factories/client.ts";
import { buildMember } from "../support/factories/member.ts";
import { buildPerson, testPassword } from "../support/factories/person.ts";
import { signInAs, signInByMail } from "../support/sign-in.ts";

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.stop());

const sessionCookie = "authjs.session-token";

describe("signing in with a password", () => {
  it("begins a session, keeps it in an HttpOnly cookie and logs it in the shop", async () => {
    const { person, shop, email } = await buildMember({ role: "maker" });
    const visitor = app.visitor();
    const url = await visitor.signIn("password", { email: email.toUpperCase(), password: testPassword });
    expect(url.searchParams.get("error")).toBeNull();

    const me = await visitor.get(whoAmI);
    expect(me).toMatchObject({ person: { id: person.id, email }, session: "password" });
    expect(me.memberOf).toEqual([{ shop: shop.slug, shopName: shop.name, role: "maker" }]);
    const sessions = await Session.findAll({ where: { personId: person.id } });
    expect(sessions).toHaveLength(1);
    const hours = ((sessions[0]?.expiresAt.getTime() ?? 0) - (sessions[0]?.createdAt.getTime() ?? 0)) / 3_600_000;
    expect(hours).toBe(12);
    const events = await Event.findAll({ where: { shopId: shop.id } });
    expect(events.map(({ kind, data, who }) => ({ kind, data, who }))).toEqual([
      { kind: "signed in", data: { by: "password" }, who: person.name },
    ]);
  });

  it.each([
    { what: "a wrong password", email: (known: string) => known, password: "heron-on-the-wier" },
    { what: "an unknown address", email: () => "nobody@people.example", password: testPassword },
    { what: "no address at all", email: () => "", password: testPassword },
  ])("is refused alike for $what, and begins no session", async ({ email, password }) => {
    const member = await buildMember();
    const visitor = app.visitor();
    const url = await visitor.signIn("password", { email: email(member.email), password });
    expect(url.pathname + url.search).toBe("/sign-in?error=CredentialsSignin&code=credentials");
    expect(visitor.cookies.has(sessionCookie)).toBe(false);
    expect(await Session.count({ where: { personId: member.person.id } })).toBe(0);
  });

  it("is refused for a person who never set a password", async () => {
    const { email } = await buildContact();
    const url = await app.visitor().signIn("password", { email, password: testPassword });
    expect(url.searchParams.get("error")).toBe("CredentialsSignin");
  });

  it("is refused without the token that the page fetched before", async () => {
    const { email } = await buildMember();
    const visitor = app.visitor();
    await visitor.send("POST", "/auth/callback/password", { body: { email, password: testPassword, csrfToken: "x" } });
    expect(visitor.cookies.has(sessionCookie)).toBe(false);
  });

  it("takes the place of the session that the browser had", async () => {
    const member = await buildMember();
    const visitor = await signInAs(app, member);
    const before = visitor.cookies.get(sessionCookie) ?? "";
    await visitor.signIn("password", { email: member.email, password: testPassword });
    const thief = app.visitor();
    thief.cookies.set(sessionCookie, before);
    expect((await thief.get(whoAmI)).person).toBeNull();
    expect((await visitor.get(whoAmI)).person?.email).toBe(member.email);
  });
});

describe("a session", () => {
  it("is over for every copy of its cookie once signed out", async () => {
    const visitor = await signInAs(app, await buildMember());
    const copy = app.visitor();
    copy.cookies.set(sessionCookie, visitor.cookies.get(sessionCookie) ?? "");
    expect((await copy.get(whoAmI)).person).not.toBeNull();
    await visitor.signOut();
    expect(visitor.cookies.has(sessionCookie)).toBe(false);
    expect((await copy.get(whoAmI)).person).toBeNull();
  });

  it("ends after its time although the cookie would still hold", async () => {
    const member = await buildMember();
    const visitor = await signInAs(app, member);
    await Session.update({ expiresAt: new Date(Date.now() - 1000) }, { where: { personId: member.person.id } });
    expect((await visitor.get(whoAmI)).person).toBeNull();
    expect((await visitor.refusal(listSessions)).code).toBe("not_signed_in");
    expect(JSON.parse((await visitor.send("GET", "/auth/session")).text)).toBeNull();
  });

  it.each([
    { began: "password" as const, age: 1, lasts: 12 },
    { began: "password" as const, age: 14 * 24 - 5, lasts: 5 },
    { began: "link" as const, age: 10 * 24, lasts: 20 * 24 },
  ])("begun by $began $age hours ago and used now lasts $lasts hours more", async ({ began, age, lasts }) => {
    const member = await buildMember();
    const visitor = await signInAs(app, member);
    const hour = 3_600_000;
    const createdAt = new Date(Date.now() - age * hour);
    const soon = new Date(Date.now() + hour);
    const where = { personId: member.person.id };
    await Session.update({ began, createdAt, lastSeenAt: new Date(Date.now() - 600_000), expiresAt: soon }, { where });
    await visitor.get(whoAmI);
    const session = await Session.findOne({ where, rejectOnEmpty: true });
    expect(Math.round((session.expiresAt.getTime() - Date.now()) / 60_000)).toBe(lasts * 60);
  });

  it("does not read a cookie that somebody else encrypted", async () => {
    const visitor = app.visitor();
    visitor.cookies.set(sessionCookie, "eyJhbGciOiJkaXIiLCJlbmMiOiJBMjU2Q0JDLUhTNTEyIn0..AAAA.AAAA.AAAA");
    expect((await visitor.get(whoAmI)).person).toBeNull();
  });

  it("is listed and ended by its own person only", async () => {
    const member = await buildMember();
    const here = await signInAs(app, member);
    const there = await signInAs(app, member);
    const { items } = await here.get(listSessions);
    expect(
      items.map(({ current, began }) => ({ current, began })).sort((a, b) => Number(a.current) - Number(b.current)),
    ).toEqual([
      { current: false, began: "password" },
      { current: true, began: "password" },
    ]);
    const other = items.find(({ current }) => !current)?.id ?? "";
    const stranger = await signInAs(app, await buildMember());
    expect((await stranger.refusal(endSession, { params: { sessionId: other } })).code).toBe("not_found");
    expect((await there.get(whoAmI)).person).not.toBeNull();
    await here.get(endSession, { params: { sessionId: other } });
    expect((await there.get(whoAmI)).person).toBeNull();
    expect((await here.get(whoAmI)).person).not.toBeNull();
  });
});

describe("one's account", () => {
  it("is changed by its person: the new name counts at once", async () => {
    const visitor = await signInAs(app, await buildMember());
    const me = await visitor.get(changeAccount, { body: { name: "Tamsin Vane" } });
    expect(me.person?.name).toBe("Tamsin Vane");
    expect((await app.visitor().refusal(changeAccount, { body: { name: "Nobody" } })).code).toBe("not_signed_in");
    expect((await visitor.refusal(changeAccount, { body: { name: "  " } })).errors).toEqual([
      { pointer: "/name", detail: "Write a name." },
    ]);
  });

  it("gets a new password for the old one, and every other session ends", async () => {
    const member = await buildMember();
    const here = await signInAs(app, member);
    const there = await signInAs(app, member);
    const wrong = await here.refusal(changePassword, { body: { current: "not it at all", password: "kingfisher-2" } });
    expect(wrong.errors).toEqual([{ pointer: "/current", detail: "That is not your password now." }]);
    const short = await here.refusal(changePassword, { body: { current: testPassword, password: "short" } });
    expect(short.errors).toEqual([{ pointer: "/password", detail: "A password has at least 10 characters." }]);

    await here.get(changePassword, { body: { current: testPassword, password: "kingfisher-2" } });
    expect((await here.get(whoAmI)).person).not.toBeNull();
    expect((await there.get(whoAmI)).person).toBeNull();
    const again = app.visitor();
    expect((await again.signIn("password", { email: member.email, password: testPassword })).search).toContain("error");
    expect((await again.signIn("password", { email: member.email, password: "kingfisher-2" })).search).toBe("");
  });
});

describe("whom a session speaks for", () => {
  it("a session begun by a link acts for the client only, even when its person is on the team", async () => {
    const { person, shop, email } = await buildMember({ role: "owner" });
    await buildContact({ client: await buildClient({ shop, name: "Tern & Daughters" }), person });
    const byLink = await signInByMail(app, { email });
    const me = await byLink.get(whoAmI);
    expect(me).toMatchObject({ session: "link", memberOf: [] });
    expect(me.contactOf).toEqual([{ shop: shop.slug, shopName: shop.name, client: "Tern & Daughters" }]);
    expect((await byLink.get(getShop, { params: { shop: shop.slug } })).can.manageTeam).toBe(false);
    const byPassword = await signInAs(app, { email });
    expect((await byLink.refusal(changeAccount, { body: { name: "Reader" } })).code).toBe("not_allowed");
    const staffSession = (await byPassword.get(listSessions)).items.find(({ began }) => began === "password")?.id ?? "";
    expect((await byLink.get(listSessions)).items.map(({ began }) => began)).toEqual(["link"]);
    expect((await byLink.refusal(endSession, { params: { sessionId: staffSession } })).code).toBe("not_found");
    expect((await byPassword.get(getShop, { params: { shop: shop.slug } })).can.manageTeam).toBe(true);
  });

  it("whoever only typed an address does not become its contact", async () => {
    const victim = "captain@lagoon.example";
    const squatter = app.visitor();
    const shopName = "Squatter Signs";
    await squatter.get(registerShop, {
      body: { shopName, name: "S. Quat", email: victim, password: "squatting-here" },
    });
    await squatter.signIn("password", { email: victim, password: "squatting-here" });

    const { shop } = await buildMember();
    const client = await buildClient({ shop });
    const person = await Person.findOne({ where: { email: victim }, rejectOnEmpty: true });
    await buildContact({ client, person });

    expect((await squatter.get(whoAmI)).contactOf).toEqual([]);
    expect((await squatter.refusal(getShop, { params: { shop: shop.slug } })).code).toBe("not_found");
    const reader = await signInByMail(app, { email: victim });
    expect((await reader.get(whoAmI)).contactOf).toHaveLength(1);
  });
});

describe("opening a shop", () => {
  it("makes its first person the owner and gives the shop an address, a prefix and stock", async () => {
    const visitor = app.visitor();
    const body = {
      shopName: "Über Söhne & Co.",
      name: "Ida Falk",
      email: "Ida@Falk.example",
      password: "oak-and-acrylic",
    };
    expect(await visitor.get(registerShop, { body })).toEqual({ shop: "uber-sohne-co" });
    await visitor.signIn("password", { email: "ida@falk.example", password: "oak-and-acrylic" });
    const shop = await visitor.get(getShop, { params: { shop: "uber-sohne-co" } });
    expect(shop).toMatchObject({ name: "Über Söhne & Co.", jobPrefix: "USC", demo: false });
    expect(shop.can).toMatchObject({ changeShop: true, manageTeam: true });
    expect(await StockItem.count()).toBeGreaterThan(10);

    // A second shop of the same name, by the same person.
    expect(await visitor.get(registerShop, { body })).toEqual({ shop: "uber-sohne-co-2" });
    expect((await visitor.get(whoAmI)).memberOf.map(({ role }) => role)).toEqual(["owner", "owner"]);
  });

  it("names both bad fields", async () => {
    const body = { shopName: "", name: "Ida", email: "no address", password: "long enough" };
    const { status, errors } = await app.visitor().refusal(registerShop, { body });
    expect(status).toBe(422);
    expect(errors).toEqual([
      { pointer: "/shopName", detail: "Write the shop's name." },
      { pointer: "/email", detail: "Write an e-mail address, like name@example.com." },
    ]);
  });

  it("does not hand over an address that is known already", async () => {
    const { email, person } = await buildContact();
    const body = { shopName: "Takeover", name: "T.", email, password: "mine-from-now-on" };
    expect((await app.visitor().refusal(registerShop, { body })).code).toBe("already_exists");
    const known = await buildPerson();
    expect((await app.visitor().refusal(registerShop, { body: { ...body, email: known.email } })).code).toBe(
      "already_exists",
    );
    await person.reload();
    expect(person.passwordHash).toBeNull();
  });
});

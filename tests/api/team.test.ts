import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Event } from "#server/models/event.ts";
import { Invitation } from "#server/models/invitation.ts";
import { Membership } from "#server/models/membership.ts";
import { OutgoingMail } from "#server/models/outgoing-mail.ts";
import { Session } from "#server/models/session.ts";
import { whoAmI } from "#shared/contracts/account.ts";
import {
  changeMember,
  changeShop,
  getShop,
  inviteMember,
  listInvitations,
  listMembers,
  removeMember,
} from "#shared/contracts/shop.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildClient, buildContact } from "../support/factories/client.ts";
import { buildMember } from "../support/factories/member.ts";
import { signInAs, signInByMail } from "../support/sign-in.ts";

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp({ poolMax: 4 });
});
afterAll(() => app.stop());

async function logOf(shopId: string): Promise<{ kind: string; data: unknown }[]> {
  const events = await Event.findAll({ where: { shopId }, order: ["id"] });
  return events.map(({ kind, data }) => ({ kind, data })).filter(({ kind }) => kind !== "signed in");
}

describe("the team", () => {
  it("is nobody's without a session, of no other shop, and of no member but an owner", async () => {
    const { shop } = await buildMember();
    const params = { shop: shop.slug };
    const maker = await signInAs(app, await buildMember({ shop, role: "maker" }));
    const rep = await signInAs(app, await buildMember({ shop, role: "rep" }));
    const stranger = await signInAs(app, await buildMember());
    const contact = await signInByMail(app, await buildContact({ client: await buildClient({ shop }) }));
    const body = { email: "x@y.example", role: "owner" as const };
    expect((await app.visitor().refusal(listMembers, { params })).code).toBe("not_signed_in");
    expect((await app.visitor().refusal(inviteMember, { params, body })).code).toBe("not_signed_in");
    for (const visitor of [maker, rep, stranger, contact]) {
      expect((await visitor.refusal(listMembers, { params })).code).toBe("not_found");
      expect((await visitor.refusal(inviteMember, { params, body })).code).toBe("not_found");
    }
    expect(await Invitation.count({ where: { shopId: shop.id } })).toBe(0);
  });

  it("is listed by pages, the longest there first", async () => {
    const owner = await buildMember();
    const { shop } = owner;
    const ids = [owner.membership.id];
    for (const role of ["maker", "rep", "maker"] as const) ids.push((await buildMember({ shop, role })).membership.id);
    const visitor = await signInAs(app, owner);
    const params = { shop: shop.slug };
    const first = await visitor.get(listMembers, { params, query: { limit: 3 } });
    expect(first.items.map(({ id }) => id)).toEqual(ids.slice(0, 3));
    expect(first.items[0]).toMatchObject({ role: "owner", isYou: true, can: { changeRole: false, remove: false } });
    expect(first.items[1]).toMatchObject({ role: "maker", isYou: false, can: { changeRole: true, remove: true } });
    const second = await visitor.get(listMembers, { params, query: { limit: 3, cursor: first.next ?? "" } });
    expect(second.items.map(({ id }) => id)).toEqual(ids.slice(3));
    expect(second.next).toBeNull();
    const forged = Buffer.from('["yesterday","; drop table"]').toString("base64url");
    for (const cursor of ["nonsense", forged]) {
      expect((await visitor.refusal(listMembers, { params, query: { cursor } })).code).toBe("malformed_request");
    }
  });
});

describe("inviting", () => {
  it("names both bad fields", async () => {
    const owner = await buildMember();
    const visitor = await signInAs(app, owner);
    const body = { email: "nobody", role: "boss" as "maker" };
    const { errors } = await visitor.refusal(inviteMember, { params: { shop: owner.shop.slug }, body });
    expect(errors?.map(({ pointer }) => pointer)).toEqual(["/email", "/role"]);
  });

  it("writes the invitation, its mail and its job; inviting again sends a fresh link for the new role", async () => {
    const owner = await buildMember();
    const visitor = await signInAs(app, owner);
    const params = { shop: owner.shop.slug };
    const email = "joiner@bench.example";
    const invitation = await visitor.get(inviteMember, { params, body: { email, role: "rep" } });
    expect(invitation).toMatchObject({ email, role: "rep", by: owner.person.name });
    const [mail] = await OutgoingMail.findAll({ where: { shopId: owner.shop.id } });
    expect(mail).toMatchObject({ kind: "invitation", address: email, state: "queued" });
    expect(mail?.data).toEqual({ invitationId: invitation.id });
    expect(await app.queuedJobs()).toContainEqual({
      task: "send-mail",
      payload: { mailId: mail?.id },
      lastError: null,
    });
    const again = await visitor.get(inviteMember, { params, body: { email, role: "maker" } });
    expect(again).toMatchObject({ id: invitation.id, role: "maker" });
    expect((await visitor.get(listInvitations, { params })).items).toHaveLength(1);
    expect(await logOf(owner.shop.id)).toEqual([
      { kind: "member invited", data: { email, role: "rep" } },
      { kind: "member invited", data: { email, role: "maker" } },
    ]);
  });

  it("refuses an address that is on the team", async () => {
    const owner = await buildMember();
    const maker = await buildMember({ shop: owner.shop, role: "maker" });
    const visitor = await signInAs(app, owner);
    const body = { email: maker.email, role: "rep" as const };
    const problem = await visitor.refusal(inviteMember, { params: { shop: owner.shop.slug }, body });
    expect(problem).toMatchObject({ code: "already_exists", status: 409 });
  });
});

describe("removing a member", () => {
  it("ends their session at once, and says so in the log", async () => {
    const owner = await buildMember();
    const { shop } = owner;
    const maker = await buildMember({ shop, role: "maker" });
    const visitor = await signInAs(app, owner);
    const removed = await signInAs(app, maker);
    await removed.get(getShop, { params: { shop: shop.slug } });
    await visitor.get(removeMember, { params: { shop: shop.slug, memberId: maker.membership.id } });
    expect((await removed.refusal(getShop, { params: { shop: shop.slug } })).code).toBe("not_signed_in");
    expect((await removed.get(whoAmI)).person).toBeNull();
    await maker.membership.reload();
    expect(maker.membership.endedAt).not.toBeNull();
    expect(await Session.count({ where: { personId: maker.person.id, endedAt: null } })).toBe(0);
    expect(await logOf(shop.id)).toEqual([{ kind: "member removed", data: { name: maker.person.name } }]);
    expect(
      (await visitor.refusal(removeMember, { params: { shop: shop.slug, memberId: maker.membership.id } })).code,
    ).toBe("not_found");
  });

  it("leaves a session that opens another shop, but without this one", async () => {
    const owner = await buildMember();
    const rep = await buildMember({ shop: owner.shop, role: "rep" });
    const elsewhere = await buildMember({ person: rep.person, role: "owner" });
    const visitor = await signInAs(app, owner);
    const removed = await signInAs(app, rep);
    await visitor.get(removeMember, { params: { shop: owner.shop.slug, memberId: rep.membership.id } });
    expect((await removed.refusal(getShop, { params: { shop: owner.shop.slug } })).code).toBe("not_found");
    expect((await removed.get(getShop, { params: { shop: elsewhere.shop.slug } })).slug).toBe(elsewhere.shop.slug);
  });

  it("keeps the last owner, whatever is tried", async () => {
    const owner = await buildMember();
    const visitor = await signInAs(app, owner);
    const params = { shop: owner.shop.slug, memberId: owner.membership.id };
    expect((await visitor.refusal(removeMember, { params })).code).toBe("wrong_state");
    expect((await visitor.refusal(changeMember, { params, body: { role: "maker" } })).code).toBe("wrong_state");
    await owner.membership.reload();
    expect(owner.membership).toMatchObject({ role: "owner" });
    expect(owner.membership.endedAt).toBeNull();
  });

  it("leaves one owner when two remove each other at the same moment", async () => {
    const first = await buildMember();
    const second = await buildMember({ shop: first.shop });
    const [one, two] = [await signInAs(app, first), await signInAs(app, second)];
    const shop = first.shop.slug;
    const { sequelize } = app.services;
    // Holds both rows until both requests have begun, so that they really meet.
    const holding = await sequelize.transaction();
    const where = { shopId: first.shop.id };
    await Membership.findAll({ where, lock: holding.LOCK.UPDATE, transaction: holding });
    const asked = Promise.all([
      one.ask(removeMember, { params: { shop, memberId: second.membership.id } }),
      two.ask(removeMember, { params: { shop, memberId: first.membership.id } }),
    ]);
    for (let waiting = 0, round = 0; waiting < 2 && round < 1000; round += 1) {
      const [rows] = await sequelize.query(
        "select count(*)::int as n from pg_stat_activity where datname = current_database() and wait_event_type = 'Lock'",
      );
      waiting = (rows[0] as { n: number }).n;
    }
    await holding.commit();
    const answers = await asked;
    expect(answers.filter(({ status }) => status === 204)).toHaveLength(1);
    expect(await Membership.count({ where: { shopId: first.shop.id, role: "owner", endedAt: null } })).toBe(1);
  });

  it("finds no member of another shop", async () => {
    const visitor = await signInAs(app, await buildMember());
    const mine = (await visitor.get(whoAmI)).memberOf[0]?.shop ?? "";
    const other = await buildMember({ role: "maker" });
    const params = { shop: mine, memberId: other.membership.id };
    expect((await visitor.refusal(removeMember, { params })).code).toBe("not_found");
    expect((await visitor.refusal(changeMember, { params, body: { role: "rep" } })).code).toBe("not_found");
  });
});

describe("a role", () => {
  it("counts from the next request on", async () => {
    const owner = await buildMember();
    const { shop } = owner;
    const member = await buildMember({ shop, role: "rep" });
    const visitor = await signInAs(app, owner);
    const changed = await signInAs(app, member);
    const params = { shop: shop.slug, memberId: member.membership.id };
    expect(await visitor.get(changeMember, { params, body: { role: "owner" } })).toMatchObject({ role: "owner" });
    expect((await changed.get(getShop, { params: { shop: shop.slug } })).can.manageTeam).toBe(true);
    expect(await logOf(shop.id)).toEqual([
      { kind: "role changed", data: { name: member.person.name, from: "rep", to: "owner" } },
    ]);
  });
});

describe("the shop", () => {
  it("is changed by an owner only; what is not given stays", async () => {
    const owner = await buildMember();
    const { shop } = owner;
    const params = { shop: shop.slug };
    const maker = await signInAs(app, await buildMember({ shop, role: "maker" }));
    expect((await maker.refusal(changeShop, { params, body: { name: "Mine" } })).code).toBe("not_allowed");
    expect((await app.visitor().refusal(changeShop, { params, body: { name: "Mine" } })).code).toBe("not_signed_in");
    const visitor = await signInAs(app, owner);
    const bad = await visitor.refusal(changeShop, {
      params,
      body: { jobPrefix: "toolong", paper: "A0" as "A4", colour: "red" } as object,
    });
    expect(bad.errors?.map(({ pointer }) => pointer)).toEqual(["/jobPrefix", "/paper", "/colour"]);
    const changed = await visitor.get(changeShop, { params, body: { unit: "in", jobPrefix: "OAK" } });
    expect(changed).toMatchObject({ name: shop.name, unit: "in", jobPrefix: "OAK", paper: "A4" });
    expect(await logOf(shop.id)).toEqual([{ kind: "shop changed", data: { fields: ["unit", "job numbers"] } }]);
  });

  it("says to each reader what they may do", async () => {
    const { shop } = await buildMember();
    const rep = await signInAs(app, await buildMember({ shop, role: "rep" }));
    const contact = await signInByMail(app, await buildContact({ client: await buildClient({ shop }) }));
    const params = { shop: shop.slug };
    expect((await rep.get(getShop, { params })).can).toEqual({
      changeShop: false,
      manageTeam: false,
      openJob: true,
      seeClients: true,
      seeStock: true,
      changeStock: false,
      seePrices: false,
      seePortfolio: true,
      sharePortfolio: true,
      seeOutgoingMail: false,
    });
    expect(new Set(Object.values((await contact.get(getShop, { params })).can))).toEqual(new Set([false]));
  });
});

import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Client } from "#server/models/client.ts";
import { Event } from "#server/models/event.ts";
import { addClient, changeClient, getClient, listClients } from "#shared/contracts/clients.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildClient, buildContact } from "../support/factories/client.ts";
import { buildMember } from "../support/factories/member.ts";
import { signInAs, signInByMail } from "../support/sign-in.ts";

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.stop());

describe("clients", () => {
  it("are nobody's without a session, nor of another shop, nor of a client's contact", async () => {
    const { shop } = await buildMember();
    const client = await buildClient({ shop });
    const contact = await signInByMail(app, await buildContact({ client }));
    const stranger = await signInAs(app, await buildMember());
    const params = { shop: shop.slug, clientId: client.id };
    const body = { name: "New" };
    expect((await app.visitor().refusal(listClients, { params })).code).toBe("not_signed_in");
    for (const visitor of [contact, stranger]) {
      expect((await visitor.refusal(listClients, { params })).code).toBe("not_found");
      expect((await visitor.refusal(getClient, { params })).code).toBe("not_found");
      expect((await visitor.refusal(addClient, { params, body })).code).toBe("not_found");
      expect((await visitor.refusal(changeClient, { params, body })).code).toBe("not_found");
    }
    expect(await Client.count({ where: { shopId: shop.id } })).toBe(1);
  });

  it("of another shop are not found under one's own address either", async () => {
    const member = await buildMember();
    const visitor = await signInAs(app, member);
    const client = await buildClient();
    const params = { shop: member.shop.slug, clientId: client.id };
    expect((await visitor.refusal(getClient, { params })).code).toBe("not_found");
    expect((await visitor.refusal(changeClient, { params, body: { name: "Stolen" } })).code).toBe("not_found");
    await client.reload();
    expect(client.name).not.toBe("Stolen");
  });

  it.each(["owner", "maker", "rep"] as const)("are added and changed by %s, and the log says so", async (role) => {
    const member = await buildMember({ role });
    const visitor = await signInAs(app, member);
    const params = { shop: member.shop.slug };
    const added = await visitor.get(addClient, { params, body: { name: " Harbour Lights ", remarks: "a\r\nb" } });
    expect(added).toMatchObject({ name: "Harbour Lights", remarks: "a\nb", contacts: [], openJobs: 0 });
    const oneClient = { ...params, clientId: added.id };
    expect(await visitor.get(changeClient, { params: oneClient, body: { name: "Harbour Light" } })).toMatchObject({
      name: "Harbour Light",
      remarks: "a\nb",
    });
    await visitor.get(changeClient, { params: oneClient, body: { name: "Harbour Light" } });
    const events = await Event.findAll({ where: { shopId: member.shop.id }, order: ["id"] });
    expect(events.map(({ kind, data }) => [kind, data]).slice(1)).toEqual([
      ["client added", { name: "Harbour Lights" }],
      ["client changed", { name: "Harbour Light" }],
    ]);
  });

  it("names both bad fields and one that is not known", async () => {
    const member = await buildMember();
    const visitor = await signInAs(app, member);
    const body = { name: " ", remarks: "x".repeat(2001), shopId: "11111111-1111-4111-8111-111111111111" };
    const { errors } = await visitor.refusal(addClient, { params: { shop: member.shop.slug }, body });
    expect(errors).toEqual([
      { pointer: "/name", detail: "Write the client's name." },
      { pointer: "/remarks", detail: "At most 2000 characters." },
      { pointer: "/shopId", detail: "This field is not known." },
    ]);
  });

  it("are listed by name in pages, upper and lower case alike", async () => {
    const member = await buildMember();
    const { shop } = member;
    for (const name of ["walnut", "Birch", "ash", "Éclair", "birch"]) await buildClient({ shop, name });
    const visitor = await signInAs(app, member);
    const params = { shop: shop.slug };
    const names: string[] = [];
    let cursor: string | null = "";
    do {
      const page: { items: { name: string }[]; next: string | null } = await visitor.get(listClients, {
        params,
        query: { limit: 2, ...(cursor ? { cursor } : {}) },
      });
      names.push(...page.items.map(({ name }) => name));
      cursor = page.next;
    } while (cursor);
    expect(names.map((name) => name.toLowerCase())).toEqual(["ash", "birch", "birch", "walnut", "éclair"]);
    expect((await visitor.refusal(listClients, { params, query: { cursor: "???" } })).code).toBe("malformed_request");
    expect((await visitor.refusal(listClients, { params, query: { limit: 101 } })).code).toBe("validation_failed");
  });

  it("are found by their name and by their contacts, signs of a pattern taken as they are", async () => {
    const member = await buildMember();
    const { shop } = member;
    const plain = await buildClient({ shop, name: "100% Rye" });
    const byContact = await buildClient({ shop, name: "Quiet" });
    await buildContact({ client: byContact, name: "Ottoline Rye" });
    await buildClient({ shop, name: "Other" });
    await buildClient({ name: "Rye of another shop" });
    const visitor = await signInAs(app, member);
    const found = async (q: string): Promise<string[]> =>
      (await visitor.get(listClients, { params: { shop: shop.slug }, query: { q } })).items.map(({ name }) => name);
    expect(await found("rye")).toEqual([plain.name, byContact.name]);
    expect(await found("%")).toEqual([plain.name]);
    expect(await found("_")).toEqual([]);
  });
});

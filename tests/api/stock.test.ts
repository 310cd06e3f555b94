import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Event } from "#server/models/event.ts";
import { StockItem } from "#server/models/stock-item.ts";
import { dryFitContext } from "#server/queries/dry-fit-context.ts";
import { getMockup, saveMockup } from "#shared/contracts/mockups.ts";
import {
  addStockItem,
  addUsualStock,
  changeStockItem,
  countStockItem,
  type StockItem as Item,
  listStock,
  setStockState,
} from "#shared/contracts/stock.ts";
import type { StockEntry } from "#shared/contracts/stock-entry.ts";
import { stockOfItems } from "#shared/contracts/stock-on-hand.ts";
import { standardHardware, standardScrews } from "#shared/materials/standard-stock.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildLayer, buildSign, plate } from "../support/build-sign.ts";
import { buildMember } from "../support/factories/member.ts";
import { unique } from "../support/factories/unique.ts";
import { buildWorld } from "../support/factories/work.ts";
import { signInAs } from "../support/sign-in.ts";

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.stop());

const teal = (changes: Partial<Extract<StockEntry, { kind: "acrylic" }>["acrylic"]> = {}) => ({
  kind: "acrylic" as const,
  acrylic: {
    name: "Teal",
    colour: "#1f7a7a",
    look: "opaque" as const,
    process: "cast" as const,
    facesDiffer: false,
    densityKgM3: 1190,
    ...changes,
  },
  thicknessesMm: [6, 3],
  sheets: [{ thicknessMm: 3, widthMm: 1220, heightMm: 610, quantity: 2 }],
});
const screw = (name = "No. 6 × 16, flat head") => {
  const [first] = standardScrews;
  if (!first) throw new Error("There are usual screws.");
  return { kind: "screw" as const, screw: { ...first, name }, quantity: null };
};

/** An owner with an empty list, signed in. */
async function emptyShop() {
  const member = await buildMember();
  return { member, visitor: await signInAs(app, member), params: { shop: member.shop.slug } };
}
/** What the log says of the stock. */
const eventsOf = async (shopId: string) =>
  (await Event.findAll({ where: { shopId }, order: ["id"] }))
    .filter(({ kind }) => kind.includes("stock"))
    .map(({ kind, data }) => [kind, data]);

describe("an item of the stock", () => {
  it("is added with its name trimmed, its colour in capitals and its thicknesses in order", async () => {
    const { member, visitor, params } = await emptyShop();
    const added = await visitor.get(addStockItem, { params, body: { entry: teal({ name: "  Teal " }) } });
    expect(added).toMatchObject({
      kind: "acrylic",
      name: "Teal",
      version: 1,
      retiredAt: null,
      acrylic: { kind: "acrylic", name: "Teal", colour: "#1F7A7A", stockId: added.id },
      thicknessesMm: [3, 6],
      sheets: [{ thicknessMm: 3, widthMm: 1220, heightMm: 610, quantity: 2 }],
    });
    expect((await visitor.get(listStock, { params })).items).toEqual([added]);
    expect(await eventsOf(member.shop.id)).toEqual([["stock added", { name: "Teal" }]]);
  });

  it("has a name once in its kind, whatever its capitals", async () => {
    const { member, visitor, params } = await emptyShop();
    await visitor.get(addStockItem, { params, body: { entry: teal() } });
    const again = await visitor.refusal(addStockItem, { params, body: { entry: teal({ name: "TEAL" }) } });
    expect(again).toMatchObject({ code: "already_exists", errors: [{ pointer: "/entry/acrylic/name" }] });
    await visitor.get(addStockItem, { params, body: { entry: screw("Teal") } });
    expect(await StockItem.count({ where: { shopId: member.shop.id } })).toBe(2);
  });

  it("changes as a whole, once; the same again is no change", async () => {
    const { member, visitor, params } = await emptyShop();
    const { id } = await visitor.get(addStockItem, { params, body: { entry: teal() } });
    const itemId = { ...params, itemId: id };
    const entry = teal({ name: "Teal, deep", colour: "#0F5A5A" });
    const changed = await visitor.get(changeStockItem, { params: itemId, body: { version: 1, entry } });
    expect(changed).toMatchObject({
      name: "Teal, deep",
      version: 2,
      acrylic: { name: "Teal, deep", colour: "#0F5A5A" },
    });
    expect(await visitor.get(changeStockItem, { params: itemId, body: { version: 2, entry } })).toEqual(changed);
    expect((await eventsOf(member.shop.id)).slice(1)).toEqual([["stock changed", { name: "Teal, deep" }]]);
  });

  it("that someone else changed meanwhile stays as they saved it, and is shown", async () => {
    const { visitor, params } = await emptyShop();
    const { id } = await visitor.get(addStockItem, { params, body: { entry: teal() } });
    const itemId = { ...params, itemId: id };
    const theirs = await visitor.get(changeStockItem, {
      params: itemId,
      body: { version: 1, entry: teal({ look: "frosted" }) },
    });
    const late = await visitor.refusal(changeStockItem, {
      params: itemId,
      body: { version: 1, entry: teal({ look: "mirror" }) },
    });
    expect(late).toMatchObject({ code: "stale", extra: { newer: theirs } });
    expect((await visitor.get(listStock, { params })).items).toEqual([theirs]);
  });

  it("keeps its kind", async () => {
    const { visitor, params } = await emptyShop();
    const { id } = await visitor.get(addStockItem, { params, body: { entry: teal() } });
    const refused = await visitor.refusal(changeStockItem, {
      params: { ...params, itemId: id },
      body: { version: 1, entry: screw() },
    });
    expect(refused).toMatchObject({ code: "validation_failed", errors: [{ pointer: "/entry/kind" }] });
  });

  it("of another shop is not found, whatever is asked of it", async () => {
    const { visitor, params } = await emptyShop();
    const other = await emptyShop();
    const { id } = await other.visitor.get(addStockItem, { params: other.params, body: { entry: screw() } });
    const itemId = { ...params, itemId: id };
    for (const refused of [
      await visitor.refusal(changeStockItem, { params: itemId, body: { version: 1, entry: screw("Mine") } }),
      await visitor.refusal(countStockItem, { params: itemId, body: { version: 1, quantity: 1 } }),
      await visitor.refusal(setStockState, { params: itemId, body: { state: "retired" } }),
    ])
      expect(refused.code).toBe("not_found");
    expect(await StockItem.findByPk(id)).toMatchObject({ name: screw().screw.name, quantity: null, retiredAt: null });
  });

  it("a rep looks at, and changes nothing", async () => {
    const { member, visitor: owner, params } = await emptyShop();
    const { id } = await owner.get(addStockItem, { params, body: { entry: screw() } });
    const rep = await signInAs(app, await buildMember({ shop: member.shop, role: "rep" }));
    expect((await rep.get(listStock, { params })).items).toHaveLength(1);
    const count = { params: { ...params, itemId: id }, body: { version: 1, quantity: 3 } };
    expect(await rep.refusal(countStockItem, count)).toMatchObject({
      code: "not_allowed",
      detail: "The stock is kept by owners and makers.",
    });
    expect((await rep.refusal(addStockItem, { params, body: { entry: teal() } })).code).toBe("not_allowed");
    expect(await StockItem.count({ where: { shopId: member.shop.id } })).toBe(1);
  });
});

describe("counting", () => {
  it("says how many there are, takes a count back, and is logged", async () => {
    const { member, visitor, params } = await emptyShop();
    const { id, name } = await visitor.get(addStockItem, { params, body: { entry: screw() } });
    const itemId = { ...params, itemId: id };
    await visitor.get(countStockItem, { params: itemId, body: { version: 1, quantity: 240 } });
    const back = await visitor.get(countStockItem, { params: itemId, body: { version: 2, quantity: null } });
    expect(back).toMatchObject({ quantity: null, version: 3 });
    const late = await visitor.refusal(countStockItem, { params: itemId, body: { version: 1, quantity: 7 } });
    expect(late).toMatchObject({ code: "stale", extra: { newer: { version: 3 } } });
    expect((await eventsOf(member.shop.id)).slice(1)).toEqual([
      ["stock counted", { name, from: null, to: 240 }],
      ["stock counted", { name, from: 240, to: null }],
    ]);
  });

  it.each([-1, 0.5, 1_000_001, "many"])("does not take %s", async (quantity) => {
    const { visitor, params } = await emptyShop();
    const { id } = await visitor.get(addStockItem, { params, body: { entry: screw() } });
    const refused = await visitor.refusal(countStockItem, {
      params: { ...params, itemId: id },
      body: { version: 1, quantity: quantity as number },
    });
    expect(refused).toMatchObject({ code: "validation_failed", errors: [{ pointer: "/quantity" }] });
  });

  it("is not for what is not counted by the piece", async () => {
    const { visitor, params } = await emptyShop();
    const { id } = await visitor.get(addStockItem, { params, body: { entry: teal() } });
    const given = { params: { ...params, itemId: id }, body: { version: 1, quantity: 3 } };
    expect((await visitor.refusal(countStockItem, given)).code).toBe("validation_failed");
  });
});

describe("what is written wrongly", () => {
  const [barrel] = standardHardware;
  if (barrel?.kind !== "capStud") throw new Error("The first of the usual standoffs is a cap and stud.");
  const { stockId: _, ...hardware } = barrel;
  it.each<{ what: string; entry: unknown; at: string[] }>([
    { what: "a blank name", entry: teal({ name: "  " }), at: ["/entry/acrylic/name"] },
    { what: "a name too long", entry: teal({ name: "x".repeat(121) }), at: ["/entry/acrylic/name"] },
    { what: "a colour in words", entry: teal({ colour: "teal" }), at: ["/entry/acrylic/colour"] },
    { what: "an absurd density", entry: teal({ densityKgM3: 1e9 }), at: ["/entry/acrylic/densityKgM3"] },
    { what: "no thickness", entry: { ...teal(), thicknessesMm: [], sheets: [] }, at: ["/entry/thicknessesMm"] },
    {
      what: "a thickness twice and a sheet of none that is listed",
      entry: { ...teal(), thicknessesMm: [5, 5] },
      at: ["/entry/sheets/0/thicknessMm", "/entry/thicknessesMm/1"],
    },
    {
      what: "a sheet longer than any",
      entry: { ...teal(), sheets: [{ thicknessMm: 3, widthMm: 10_001, heightMm: 0, quantity: 1.5 }] },
      at: ["/entry/sheets/0/heightMm", "/entry/sheets/0/quantity", "/entry/sheets/0/widthMm"],
    },
    { what: "a field of nobody's", entry: { ...teal(), price: 3 }, at: ["/entry/price"] },
    { what: "an id of the asker's choice", entry: { ...teal(), id: unique() }, at: ["/entry/id"] },
    { what: "a kind of nothing", entry: { kind: "paint" }, at: ["/entry/kind"] },
    {
      what: "a barrel that does not add up with a floor hole too narrow",
      entry: { kind: "hardware", hardware: { ...hardware, boreDepth: 20, floorHole: 2 }, quantity: 4 },
      at: ["/entry/hardware/barrelLength", "/entry/hardware/floorHole"],
    },
    { what: "a count below nothing", entry: { ...screw(), quantity: -1 }, at: ["/entry/quantity"] },
  ])("$what is refused at its field", async ({ entry, at }) => {
    const { member, visitor, params } = await emptyShop();
    const refused = await visitor.refusal(addStockItem, { params, body: { entry: entry as StockEntry } });
    expect(refused.code).toBe("validation_failed");
    expect(refused.errors?.map(({ pointer }) => pointer).sort()).toEqual(at);
    expect(await StockItem.count({ where: { shopId: member.shop.id } })).toBe(0);
  });

  it("a change without its version is refused", async () => {
    const { visitor, params } = await emptyShop();
    const { id } = await visitor.get(addStockItem, { params, body: { entry: teal() } });
    const body = { entry: teal() } as unknown as { version: number; entry: StockEntry };
    const refused = await visitor.refusal(changeStockItem, { params: { ...params, itemId: id }, body });
    expect(refused.errors?.map(({ pointer }) => pointer)).toEqual(["/version"]);
  });
});

describe("an item taken out of stock", () => {
  it("leaves the list, keeps the drawings that name it, and comes back", async () => {
    const world = await buildWorld(app);
    const { params, visitors } = world;
    const { items } = await visitors.owner.get(listStock, { params, query: { kind: "acrylic", q: "midnight" } });
    const [midnight] = items;
    if (midnight?.kind !== "acrylic") throw new Error("Midnight is in the usual stock.");
    const layer = buildLayer("B", [plate("p1", 90, 40, [200, 200])]);
    const document = buildSign([{ ...layer, stock: midnight.acrylic }]);
    const job = { ...params, jobId: world.job.id };
    await visitors.maker.get(saveMockup, { params: job, body: { version: 0, document } });

    const itemId = { ...params, itemId: midnight.id };
    const retired = await visitors.maker.get(setStockState, { params: itemId, body: { state: "retired" } });
    expect(retired.retiredAt).not.toBeNull();
    const namesOf = async (state: "in stock" | "retired") =>
      (await visitors.rep.get(listStock, { params, query: { q: "idnigh", state } })).items.map(({ name }) => name);
    expect([await namesOf("in stock"), await namesOf("retired")]).toEqual([[], ["Midnight"]]);
    const kept = await visitors.owner.get(getMockup, { params: job });
    expect(kept.document.layers[0]?.stock).toEqual(midnight.acrylic);

    // Twice is once.
    await visitors.maker.get(setStockState, { params: itemId, body: { state: "retired" } });
    const back = await visitors.owner.get(setStockState, { params: itemId, body: { state: "in stock" } });
    expect(back).toEqual({ ...midnight, version: 3 });
    const kinds = (await eventsOf(world.owner.shop.id)).map(([kind]) => kind);
    expect(kinds).toEqual(["stock taken out", "stock brought back"]);
  });

  it("does not come back beside another of its name", async () => {
    const { visitor, params } = await emptyShop();
    const old = await visitor.get(addStockItem, { params, body: { entry: teal() } });
    const itemId = { ...params, itemId: old.id };
    await visitor.get(setStockState, { params: itemId, body: { state: "retired" } });
    await visitor.get(addStockItem, { params, body: { entry: teal() } });
    const refused = await visitor.refusal(setStockState, { params: itemId, body: { state: "in stock" } });
    expect(refused).toMatchObject({ code: "already_exists" });
    expect((await visitor.get(listStock, { params, query: { state: "retired" } })).items).toHaveLength(1);
  });
});

describe("the usual list", () => {
  it("fills in what is missing, and leaves what was changed or taken out", async () => {
    const world = await buildWorld(app);
    const { params, visitors } = world;
    const all = async (): Promise<Item[]> =>
      (await visitors.owner.get(listStock, { params, query: { limit: 100 } })).items;
    const before = await all();
    expect(before.filter(({ kind }) => kind === "screw").map(({ name }) => name)).toEqual(
      standardScrews.map(({ name }) => name).sort(),
    );
    expect(await visitors.maker.get(addUsualStock, { params })).toEqual({ added: 0 });

    const [rust, epoxy] = ["Rust", "Slow epoxy"].map((name) => before.find((item) => item.name === name)?.id ?? "");
    await visitors.owner.get(setStockState, { params: { ...params, itemId: rust ?? "" }, body: { state: "retired" } });
    await visitors.owner.get(changeStockItem, {
      params: { ...params, itemId: epoxy ?? "" },
      body: { version: 1, entry: { kind: "adhesive", adhesive: { name: "Our epoxy", family: "epoxy" } } },
    });
    expect(await visitors.maker.get(addUsualStock, { params })).toEqual({ added: 1 });
    const names = (await all()).map(({ name }) => name);
    expect(names).toHaveLength(before.length);
    expect(names).toEqual(expect.arrayContaining(["Our epoxy", "Slow epoxy"]));
    expect(names).not.toContain("Rust");
    expect((await eventsOf(world.owner.shop.id)).at(-1)).toEqual(["usual stock added", { count: 1 }]);
  });
});

describe("the list", () => {
  it("finds a part of a name, with signs that a search takes for its own", async () => {
    const { visitor, params } = await emptyShop();
    for (const name of ["Blue 50%", "Blue 500", "Blue_50"])
      await visitor.get(addStockItem, { params, body: { entry: teal({ name }) } });
    const found = async (q: string) =>
      (await visitor.get(listStock, { params, query: { q } })).items.map((one) => one.name);
    expect(await found("50%")).toEqual(["Blue 50%"]);
    expect(await found("e_5")).toEqual(["Blue_50"]);
    expect(await found(" blue ")).toHaveLength(3);
  });

  it("is read page by page within a kind", async () => {
    const { params, visitors } = await buildWorld(app);
    const first = await visitors.owner.get(listStock, { params, query: { kind: "screw", limit: 4 } });
    const second = await visitors.owner.get(listStock, {
      params,
      query: { kind: "screw", limit: 4, ...(first.next ? { cursor: first.next } : {}) },
    });
    expect([first.items.length, second.items.length, second.next]).toEqual([4, 3, null]);
    expect(new Set([...first.items, ...second.items].map(({ id }) => id)).size).toBe(7);
  });
});

describe("the dry fit", () => {
  it("knows what is in stock as the mockup does: sheets, counts and the shop's own screws", async () => {
    const { params, visitors, owner, job } = await buildWorld(app);
    const list = async (query: { kind?: Item["kind"]; q?: string } = {}) =>
      (await visitors.owner.get(listStock, { params, query: { limit: 100, ...query } })).items;
    const [first, ...others] = await list({ kind: "screw" });
    if (first?.kind !== "screw") throw new Error("There are usual screws.");
    for (const { id } of others)
      await visitors.owner.get(setStockState, { params: { ...params, itemId: id }, body: { state: "retired" } });
    await visitors.owner.get(addStockItem, { params, body: { entry: { ...screw("Brass, box 4"), quantity: 80 } } });
    await visitors.owner.get(addStockItem, { params, body: { entry: teal() } });

    const { stock } = await dryFitContext({}, { shop: owner.shop, brief: job.brief });
    expect(stock.screws.map(({ name }) => name).sort()).toEqual(["Brass, box 4", first.name]);
    expect(stock.acrylics.find(({ acrylic }) => acrylic.name === "Teal")?.sheets).toEqual(teal().sheets);
    expect(stock).toEqual(stockOfItems(await list()));
  });
});

import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { Event } from "#server/models/event.ts";
import { PriceBook } from "#server/models/price-book.ts";
import { presentEvent } from "#server/presenters/event.ts";
import { changePrices, getPrices, pricesSchema } from "#shared/contracts/prices.ts";
import { startTestApp, type TestApp } from "../support/app.ts";
import { buildPriceBook } from "../support/build-price-book.ts";
import { buildWorld } from "../support/factories/work.ts";

let app: TestApp;
beforeAll(async () => {
  app = await startTestApp();
});
afterAll(() => app.stop());

const logOf = (shopId: string) => Event.findAll({ where: { shopId, kind: "prices changed" }, order: ["id"] });

describe("a shop's price book", () => {
  it("is not there until an owner saves one; a maker sees it, a rep and a client know nothing of it", async () => {
    const { params, visitors, owner } = await buildWorld(app);
    expect(await visitors.owner.get(getPrices, { params })).toEqual({
      version: 0,
      book: null,
      savedAt: null,
      savedBy: null,
      can: { change: true },
    });
    const book = buildPriceBook();
    const saved = await visitors.owner.get(changePrices, { params, body: { version: 0, book } });
    expect(saved).toMatchObject({ version: 1, book, savedBy: owner.person.name, can: { change: true } });
    expect(await visitors.maker.get(getPrices, { params })).toEqual({ ...saved, can: { change: false } });
    expect(await PriceBook.findByPk(owner.shop.id)).toMatchObject({ version: 1, book });
    for (const visitor of [visitors.rep, visitors.approver]) {
      expect((await visitor.refusal(getPrices, { params })).code).toBe("not_found");
      const refusal = await visitor.refusal(changePrices, { params, body: { version: 1, book } });
      expect(refusal.code).toBe("not_found");
    }
    const refusal = await visitors.maker.refusal(changePrices, { params, body: { version: 1, book } });
    expect(refusal).toMatchObject({
      status: 403,
      code: "not_allowed",
      detail: "Only an owner sets the shop's prices.",
    });
    expect(await PriceBook.findByPk(owner.shop.id)).toMatchObject({ version: 1 });
  });

  it("is one shop's and not another's", async () => {
    const [mine, other] = [await buildWorld(app), await buildWorld(app)];
    await mine.visitors.owner.get(changePrices, { params: mine.params, body: { version: 0, book: buildPriceBook() } });
    expect((await other.visitors.owner.get(getPrices, { params: other.params })).book).toBeNull();
    expect((await other.visitors.owner.refusal(getPrices, { params: mine.params })).code).toBe("not_found");
  });

  it("stands in the log by what changed and never by how much; saved unchanged it is nothing new", async () => {
    const { params, visitors, owner } = await buildWorld(app);
    const book = buildPriceBook();
    await visitors.owner.get(changePrices, { params, body: { version: 0, book } });
    const [ply, strip, ...materials] = book.materials;
    if (!ply || !strip) throw new Error("The book has no materials.");
    const changed = { ...book, materials: [{ ...ply, price: 4321 }, ...materials], markup: 0.4 };
    await visitors.owner.get(changePrices, { params, body: { version: 1, book: changed } });
    const again = await visitors.owner.get(changePrices, { params, body: { version: 2, book: changed } });
    expect(again.version).toBe(2);
    const [first, second, ...more] = await logOf(owner.shop.id);
    expect(more).toEqual([]);
    expect(second?.data).toEqual({ entries: ["Oak plywood 12 mm", "Oak strip 38 × 9", "markup"] });
    expect(second && presentEvent(second).text).toBe("Changed prices: Oak plywood 12 mm; Oak strip 38 × 9; markup");
    expect(JSON.stringify([first, second])).not.toMatch(/4321|43\.21|4200/);
  });

  it("is refused with every fault at its field, and nothing is saved", async () => {
    const { params, visitors, owner } = await buildWorld(app);
    const book = buildPriceBook();
    const refused = async (written: unknown) => {
      const { status, text } = await visitors.owner.send("PUT", `/api/shops/${params.shop}/prices`, {
        body: { version: 0, book: written },
      });
      expect(status).toBe(422);
      return (JSON.parse(text) as { errors: { pointer: string; detail: string }[] }).errors;
    };
    const [ply] = book.materials;
    const [standoff] = book.hardware;
    const faults = await refused({
      ...book,
      materials: [
        { ...ply, price: -1 },
        { ...ply, waste: 6 },
      ],
      hardware: [{ ...standoff, price: 12.5, pack: 0 }],
      currency: "DOUBLOON",
      markup: 11,
    });
    expect(faults).toEqual(
      expect.arrayContaining([
        { pointer: "/book/materials/0/price", detail: "A price can't be below 0." },
        { pointer: "/book/materials/1/waste", detail: "Waste is a share, 0.15 for 15 %; 5 at most." },
        { pointer: "/book/hardware/0/price", detail: "A price is given in whole minor units, as cents." },
        { pointer: "/book/hardware/0/pack", detail: "A pack holds at least 1." },
        {
          pointer: "/book/currency",
          detail: "This isn't the code of a currency: three capitals, as EUR or USD.",
        },
        { pointer: "/book/markup", detail: "Markup is a share, 0.15 for 15 %; 10 at most." },
      ]),
    );
    expect((await refused({ ...book, materials: [ply, ply] })).map(({ detail }) => detail)).toEqual([
      "“ply” is there twice.",
    ]);
    expect((await refused({ ...book, discount: 3 })).map(({ pointer }) => pointer)).toEqual(["/book/discount"]);
    expect(
      (await refused({ ...book, hardware: [{ ...standoff, price: 1e12 }] })).map(({ pointer }) => pointer),
    ).toEqual(["/book/hardware/0/price"]);
    expect(await PriceBook.count({ where: { shopId: owner.shop.id } })).toBe(0);
    expect(await logOf(owner.shop.id)).toEqual([]);
  });

  it("that somebody else saved meanwhile is not overwritten; the newer one comes with the refusal", async () => {
    const { params, visitors, owner } = await buildWorld(app);
    const theirs = await visitors.owner.get(changePrices, { params, body: { version: 0, book: buildPriceBook() } });
    for (const version of [0, 2, 9]) {
      const body = { version, book: buildPriceBook({ markup: 0.9 }) };
      const problem = await visitors.owner.refusal(changePrices, { params, body });
      expect(problem).toMatchObject({ status: 409, code: "stale" });
      expect(pricesSchema.parse(problem.extra?.newer)).toEqual(theirs);
    }
    expect(await PriceBook.findByPk(owner.shop.id)).toMatchObject({ version: 1, book: { markup: 0.35 } });
  });

  it("takes a book of five hundred entries", async () => {
    const { params, visitors } = await buildWorld(app);
    const materials = Array.from({ length: 500 }, (_, index) => ({
      id: `sheet 0d1f5b9e-6a53-4d6c-9a3f-2f1b7c0c8a11 ${index}`,
      name: `A colour with a longish name, ${index} mm`,
      unit: "m²" as const,
      price: 8150 + index,
      waste: 0.5,
    }));
    const saved = await visitors.owner.get(changePrices, {
      params,
      body: { version: 0, book: buildPriceBook({ materials }) },
    });
    expect(saved.book?.materials).toHaveLength(500);
  });
});

import { describe, expect, it } from "vitest";
import { demoPrices } from "#server/db/demo/demo-prices.ts";
import type { PriceBook } from "#shared/cost/price-book.ts";
import { thingsToPrice } from "#shared/cost/things-to-price.ts";
import { standardStock } from "#shared/materials/standard-stock.ts";
import { foundRows } from "@/features/prices/model/find-rows.ts";
import { countChanges, layOver } from "@/features/prices/model/lay-over.ts";
import { bookOfDraft, draftOf, type PriceDraft } from "@/features/prices/model/price-draft.ts";
import { fieldsOf, isAsked, type PriceGroup } from "@/features/prices/model/price-fields.ts";

const things = thingsToPrice(standardStock, "mm");
const full = (): PriceBook => demoPrices(standardStock);
const midnight = "sheet Midnight 3";

function write(draft: PriceDraft, group: PriceGroup, id: string, fields: Record<string, string>): PriceDraft {
  const rows = draft.rows[group].map((row) => (row.id === id ? { ...row, fields: { ...row.fields, ...fields } } : row));
  return { ...draft, rows: { ...draft.rows, [group]: rows } };
}

describe("a draft of the price book", () => {
  it("has a row for each sheet and thickness in stock, each board, standoff and work", () => {
    const draft = draftOf(null, things, { unit: "mm" });
    const sheets = standardStock.acrylics.reduce((sum, { thicknessesMm }) => sum + thicknessesMm.length, 0);
    expect(draft.rows.sheets).toHaveLength(sheets);
    expect(draft.rows.sheets[0]).toEqual({
      id: midnight,
      name: "Midnight, 3 mm",
      fields: { price: "", unit: "m²", waste: "50" },
      entry: null,
      isStocked: true,
    });
    expect(draft.rows.boards.map(({ name }) => name)).toContain("Black walnut, 25 mm");
    expect(draft.rows.hardware.map(({ name }) => name)).toEqual(expect.arrayContaining(["Brads", "Cleat, a pair"]));
    expect(draft.rows.strips).toEqual([]);
    expect(draft).toMatchObject({ currency: "EUR", markup: "0", taxShare: "0" });
    expect(draftOf(null, things, { unit: "in" }).currency).toBe("USD");
  });

  it("comes back as the very book that it was made of, in millimetres and in inches", () => {
    const sorted = ({ materials, ...rest }: PriceBook) => ({
      ...rest,
      materials: materials.toSorted((a, b) => (a.id < b.id ? -1 : 1)),
    });
    for (const unit of ["mm", "in"] as const) {
      const { book, faults } = bookOfDraft(draftOf(full(), thingsToPrice(standardStock, unit), { unit }), unit);
      expect([...faults]).toEqual([]);
      if (!book) throw new Error("The book has faults.");
      // What an adhesive is counted in is written out; a name follows the stock list's words in the shop's unit.
      const named = (one: PriceBook) =>
        JSON.parse(JSON.stringify(sorted(one)).replaceAll(/"name":"[^"]*"/g, '"name":""'));
      const stated = { ...full(), adhesives: full().adhesives.map((one) => ({ ...one, unit: one.unit ?? "ml" })) };
      expect(named(book)).toEqual(named(stated));
    }
  });

  it("takes money with a comma or a point; a row without money is no entry", () => {
    const first = write(draftOf(null, things, { unit: "mm" }), "sheets", midnight, { price: "52,50", waste: "42,5" });
    const { book } = bookOfDraft(write(first, "labour", "sign", { perHour: "48" }), "mm");
    expect(book?.materials).toEqual([{ id: midnight, name: "Midnight, 3 mm", unit: "m²", price: 5250, waste: 0.425 }]);
    expect(book?.labour).toMatchObject([{ id: "sign", perHour: 4800, minutesEach: 5 }]);
    expect(book?.machines).toEqual([]);
  });

  it("says every fault where it stands", () => {
    const draft = {
      ...write(
        write(draftOf(null, things, { unit: "mm" }), "sheets", midnight, { price: "-1", waste: "900" }),
        "hardware",
        "brads",
        { price: "7", pack: "2.5" },
      ),
      markup: "",
      taxShare: "120",
      taxName: " ",
    };
    const { book, faults } = bookOfDraft(draft, "mm");
    expect(book).toBeNull();
    expect(Object.fromEntries(faults)).toEqual({
      [`sheets/${midnight}/price`]: "A price can't be below 0.",
      [`sheets/${midnight}/waste`]: "Waste is a share, 0.15 for 15 %; 5 at most.",
      "hardware/brads/pack": "A pack holds whole things.",
      markup: "Fill this in.",
      taxName: expect.any(String),
      taxShare: "Tax is a share, 0.15 for 15 %; 1 at most.",
    });
  });

  it("keeps what the stock has no more, and has a row for what a drawing asks a price for", () => {
    const [gone] = full().materials;
    if (!gone) throw new Error("The book is empty.");
    const book = { ...full(), materials: [{ ...gone, id: "sheet Indigo 3", name: "Indigo, 3 mm" }] };
    const wanted = [
      { group: "finishes", id: "coat Bees wax", name: "Bees wax" },
      { group: "materials", id: "strip Black walnut 18 24", name: "Black walnut, strip 18 × 24 mm" },
      { group: "materials", id: midnight, name: "Midnight, 3 mm" },
    ];
    const { rows } = draftOf(book, things, { unit: "mm", wanted });
    expect(rows.sheets.filter(({ isStocked }) => !isStocked).map(({ name }) => name)).toEqual(["Indigo, 3 mm"]);
    expect(rows.finishes.map(({ name }) => name)).toContain("Bees wax");
    expect(rows.strips.map(({ name }) => name)).toEqual(["Black walnut, strip 18 × 24 mm"]);
    expect(rows.sheets.filter(({ id }) => id === midnight)).toHaveLength(1);
  });

  it("lays one's own changes over a newer book, field by field", () => {
    const base = draftOf(full(), things, { unit: "mm" });
    const mine = write(base, "sheets", midnight, { price: "99.00" });
    const theirBook = { ...full(), markup: 0.5, materials: full().materials.map((one) => ({ ...one, waste: 0.25 })) };
    const theirs = draftOf(theirBook, things, { unit: "mm" });
    const laid = layOver(theirs, mine, base);
    expect(laid.rows.sheets.find(({ id }) => id === midnight)?.fields).toEqual({
      price: "99.00",
      unit: "m²",
      waste: "25",
    });
    expect(laid.markup).toBe("50");
    expect(countChanges(laid, theirs)).toBe(1);
    expect(countChanges(mine, base)).toBe(1);
    expect(countChanges(base, base)).toBe(0);
    const without = { ...base, rows: { ...base.rows, finishes: base.rows.finishes.slice(1) } };
    expect(countChanges(without, base)).toBe(1);
    expect(layOver(theirs, without, base).rows.finishes).toHaveLength(base.rows.finishes.length - 1);
  });

  it("is narrowed by name and to what has no price, but never away from a fault", () => {
    const base = draftOf(full(), things, { unit: "mm" });
    const on = { base: base.rows.sheets, faults: new Map<string, string>(), unit: "mm" } as const;
    const names = (search: { text: string; unpricedOnly: boolean }, faults = on.faults) =>
      foundRows("sheets", base.rows.sheets, { ...on, faults, search }).map(({ name }) => name);
    expect(names({ text: "midNIGHT", unpricedOnly: false })).toEqual([
      "Midnight, 3 mm",
      "Midnight, 4.5 mm",
      "Midnight, 6 mm",
    ]);
    expect(names({ text: "", unpricedOnly: true })).toEqual(["Rust, 3 mm", "Rust, 4.5 mm", "Rust, 6 mm"]);
    expect(names({ text: "4.5", unpricedOnly: true }, new Map([[`sheets/${midnight}/price`, "No."]]))).toEqual([
      "Midnight, 3 mm",
      "Rust, 4.5 mm",
    ]);
  });

  it("asks a machine only for the paces of what it does", () => {
    const asked = (id: string) =>
      fieldsOf("machines", "mm").flatMap((one) => (isAsked("machines", id, one) ? [one.key] : []));
    expect(asked("sheet cutting")).toEqual(["perHour", "cutMmPerMinute", "setUpMinutes"]);
    expect(asked("engraving")).toEqual(["perHour", "pocketMm2PerMinute", "setUpMinutes"]);
    expect(asked("routing")).toHaveLength(4);
  });
});

import { describe, expect, it } from "vitest";
import { parsePriceBook } from "#shared/cost/price-book.ts";
import { emptyPriceBook } from "#shared/cost/works.ts";

const bookWith = (entry: { id?: string; name?: string }, tax = "Tax") => ({
  ...emptyPriceBook("USD"),
  hardware: [{ id: "brads", name: "Brads", price: 450, pack: 100, ...entry }],
  tax: { name: tax, share: 0.1 },
});

describe("text in a price book", () => {
  it("loses what no record can hold", () => {
    const outcome = parsePriceBook(bookWith({ name: "Brads\u0000and\nnails \ud800" }, "Sales\u001btax"));
    if (!outcome.ok) throw new Error(outcome.problems[0]?.words);
    expect([outcome.value.hardware[0]?.name, outcome.value.tax.name]).toEqual(["Brads and nails", "Sales tax"]);
  });

  it("has ids that a record can hold", () => {
    expect(parsePriceBook(bookWith({ id: "brads\u0000" }))).toEqual({
      ok: false,
      problems: [{ field: "hardware.0.id", words: "An id has no control characters." }],
    });
  });

  it("says what an entry without a name lacks", () => {
    expect(parsePriceBook(bookWith({ name: " \u0007 " }))).toEqual({
      ok: false,
      problems: [{ field: "hardware.0.name", words: "Every entry needs a name." }],
    });
  });
});

// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { createMemoryRouter, RouterProvider } from "react-router-dom";
import { afterAll, beforeAll, beforeEach, describe, expect, it } from "vitest";
import type { Prices } from "#shared/contracts/prices.ts";
import { thingsToPrice } from "#shared/cost/things-to-price.ts";
import { emptyPriceBook } from "#shared/cost/works.ts";
import { standardStock } from "#shared/materials/standard-stock.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { PricesForm } from "@/features/prices/components/prices-form.tsx";
import { PricesToRead } from "@/features/prices/components/prices-to-read.tsx";
import { type Answer, startAnswers } from "../../support/answers.ts";
import { claimNoSizes } from "../../support/no-sizes.ts";
import { button, field, press, render, type, until } from "../../support/render.tsx";

const [acrylic, brass] = standardStock.acrylics;
const [wood] = standardStock.woods;
const stock = {
  ...standardStock,
  acrylics: [acrylic, brass].flatMap((row) => (row ? [row] : [])),
  woods: wood ? [wood] : [],
  hardware: [],
};

const bookWith = (price: number, markup = 0.35) => ({
  ...emptyPriceBook("EUR"),
  materials: [{ id: "sheet Midnight 3", name: "Midnight, 3 mm", unit: "m²" as const, price, waste: 0.5 }],
  markup,
});
const setWith = (book: Prices["book"], version: number): Prices => ({
  version,
  book,
  savedAt: version === 0 ? null : "2026-11-30T09:12:00.000Z",
  savedBy: version === 0 ? null : "Hazel Thornbury",
  can: { change: true },
});

let answer: Answer;
let server: Awaited<ReturnType<typeof startAnswers>>;
beforeAll(async () => {
  claimNoSizes();
  server = await startAnswers(() => answer);
});
afterAll(() => server.end());
beforeEach(() => {
  server.asked.length = 0;
  answer = { status: 200, json: setWith(bookWith(5250), 2) };
});

const sent = () => server.asked.filter(({ method }) => method === "PUT").map(({ body }) => body);
const page = () => document.body.textContent ?? "";
const says = (words: string) => until(() => page().includes(words));

async function open(
  prices: Prices,
  { unit = "mm" as LengthUnit, wanted = [] as { group: string; id: string; name: string }[] } = {},
) {
  const form = <PricesForm shop="copperlark-signs" unit={unit} prices={prices} stock={stock} wanted={wanted} />;
  await render(
    <QueryClientProvider client={new QueryClient()}>
      <RouterProvider router={createMemoryRouter([{ path: "/", element: form }])} />
    </QueryClientProvider>,
  );
}

describe("the prices as a form", () => {
  it("has a field for each thickness in stock and saves the whole book onto the version it began from", async () => {
    await open(setWith(bookWith(5250), 1));
    expect(field("Midnight, 3 mm, Price").value).toBe("52.50");
    expect(field("Brass, 4.5 mm, Price").value).toBe("");
    expect(page()).toContain("1 of 6 with a price");
    expect(button("Save the prices").disabled).toBe(true);
    await type(field("Midnight, 3 mm, Price"), "61,5");
    await type(field("Brass, 4.5 mm, Price"), "74.50");
    await says("2 changes not saved yet.");
    const [midnight] = bookWith(6150).materials;
    const saved = {
      ...bookWith(6150),
      materials: [midnight, { id: "sheet Brass 4.5", name: "Brass, 4.5 mm", unit: "m²", price: 7450, waste: 0.5 }],
    };
    answer = { status: 200, json: setWith(saved as Prices["book"], 2) };
    await press(button("Save the prices"));
    await says("Saved. Mockups reckon with them from now on.");
    expect(sent()).toEqual([{ version: 1, book: saved }]);
    await type(field("Markup on the cost"), "40");
    await press(button("Save the prices"));
    await until(() => sent().length === 2);
    expect(sent()[1]).toMatchObject({ version: 2, book: { markup: 0.4 } });
  });

  it("begins without a book, in the shop's own units", async () => {
    await open(setWith(null, 0), { unit: "in" });
    expect(page()).toContain("USD");
    expect(page()).toContain("in/min");
    await type(field("Midnight, 1/8″, Price"), "4.20");
    await press(button("Save the prices"));
    await until(() => sent().length === 1);
    expect(sent()[0]).toMatchObject({
      version: 0,
      book: { currency: "USD", materials: [{ unit: "ft²", price: 420, waste: 0.5 }], labour: [] },
    });
  });

  it("says at each field what is wrong and sends nothing", async () => {
    await open(setWith(bookWith(5250), 1));
    await type(field("Midnight, 3 mm, Price"), "52,505");
    await type(field("Midnight, 3 mm, Waste"), "lots");
    await type(field("Tax on cost and markup"), "");
    await press(button("Save the prices"));
    await says("EUR has 2 decimals at most: write 12.50.");
    expect(page()).toContain("Write a number, like 2.5.");
    expect(page()).toContain("3 figures to mend first.");
    expect(field("Midnight, 3 mm, Price").getAttribute("aria-invalid")).toBe("true");
    expect(sent()).toEqual([]);
    await type(field("Midnight, 3 mm, Price"), "52,50");
    await says("2 figures to mend first.");
  });

  it("adds a strip and a finish, takes one away, and has a row for what a drawing asks for", async () => {
    await open(setWith(bookWith(5250), 1), { wanted: [{ group: "finishes", id: "coat Bees wax", name: "Bees wax" }] });
    await type(field("Bees wax, Price for a m²"), "4");
    await type(field("Bees wax, An hour of it"), "48");
    await press(button("Add the strip"));
    await says("Over 0, up to 500 mm.");
    await type(field("Wide"), "38");
    await type(field("Thick"), "6");
    await press(button("Add the strip"));
    await type(field("Eastern white pine, strip 38 × 6 mm, Price"), "1.80");
    await type(field("Finish, as mockups name it"), "Hard oil");
    await press(button("Add the finish"));
    expect(field("Hard oil, Price for a m²").value).toBe("");
    await press(button("Take away Hard oil"));
    expect(page()).not.toContain("Hard oil");
    await press(button("Save the prices"));
    await until(() => sent().length === 1);
    expect(sent()[0]).toMatchObject({
      book: {
        materials: [
          { id: "sheet Midnight 3" },
          { id: "strip Eastern white pine 38 6", name: "Eastern white pine, strip 38 × 6 mm", unit: "m", price: 180 },
        ],
        finishes: [{ id: "coat Bees wax", name: "Bees wax", pricePerM2: 400, minutesPerM2: 10, perHour: 4800 }],
      },
    });
  });

  it("lays a newer book before the reader: one's own changes go over it, or it is taken", async () => {
    const newer = setWith(bookWith(7000, 0.5), 2);
    const stale = {
      type: "/problems/stale",
      title: "Someone saved a newer version.",
      status: 409,
      code: "stale",
      extra: { newer },
    };
    await open(setWith(bookWith(5250), 1));
    await type(field("Brass, 3 mm, Price"), "60");
    answer = { status: 409, json: stale };
    await press(button("Save the prices"));
    await says("Not saved: the prices were changed meanwhile.");
    expect(page()).toContain("Hazel Thornbury saved others");
    await press(button("Lay my changes over theirs"));
    expect(field("Brass, 3 mm, Price").value).toBe("60");
    expect(field("Midnight, 3 mm, Price").value).toBe("70.00");
    expect(field("Markup on the cost").value).toBe("50");
    await press(button("Save the prices"));
    await says("Not saved: the prices were changed meanwhile.");
    expect(sent()[1]).toMatchObject({ version: 2 });
    await press(button("Take theirs"));
    expect(field("Brass, 3 mm, Price").value).toBe("");
    expect(button("Save the prices").disabled).toBe(true);
  });

  it("puts the server's refusal under its field", async () => {
    await open(setWith(bookWith(5250), 1));
    await type(field("Midnight, 3 mm, Price"), "99");
    answer = {
      status: 422,
      json: {
        type: "/problems/validation",
        title: "Check the highlighted fields.",
        status: 422,
        code: "validation_failed",
        errors: [{ pointer: "/book/materials/0/price", detail: "Dearer than gold." }],
      },
    };
    await press(button("Save the prices"));
    await says("Dearer than gold.");
    expect(field("Midnight, 3 mm, Price").getAttribute("aria-invalid")).toBe("true");
    expect(field("Midnight, 3 mm, Price").value).toBe("99");
  });

  it("finds a row by its name", async () => {
    await open(setWith(bookWith(5250), 1));
    await type(field("Find by name"), "brass");
    expect(page()).toContain("3 of 6 shown.");
    expect(page()).not.toContain("Midnight, 3 mm");
    await press(field("Only what has no price"));
    await type(field("Find by name"), "");
    expect(page()).toContain("5 of 6 shown.");
  });
});

it("those who do not set prices read them, with no field and no button", async () => {
  const list = <PricesToRead book={bookWith(5250)} things={thingsToPrice(stock, "mm")} unit="mm" />;
  await render(<RouterProvider router={createMemoryRouter([{ path: "/", element: list }])} />);
  expect(document.querySelectorAll("input, button, select")).toHaveLength(0);
  expect(page()).toContain("Markup 35 %, Tax 0 %.");
  expect(page().replaceAll("\u00a0", " ")).toContain("Midnight, 3 mm52.50 EURm²50 %");
  expect(page()).not.toContain("Brass");
});

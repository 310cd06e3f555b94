// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { createMemoryRouter, RouterProvider } from "react-router-dom";
import { afterAll, beforeAll, beforeEach, describe, expect, it } from "vitest";
import type { Prices } from "#shared/contracts/prices.ts";
import type { SawSet } from "#shared/contracts/saws.ts";
import type { SignMeasures } from "#shared/cost/measure-sign.ts";
import type { PriceBook } from "#shared/cost/price-book.ts";
import { emptyPriceBook } from "#shared/cost/works.ts";
import { usualSaws } from "#shared/cut-plan/shop-saws.ts";
import { standardAcrylics, standardWoods } from "#shared/materials/standard-stock.ts";
import { CostPanel } from "@/features/mockup/panels/cost-panel.tsx";
import { type Answer, startAnswers } from "../../support/answers.ts";
import { claimNoSizes } from "../../support/no-sizes.ts";
import { press, render, until } from "../../support/render.tsx";

function first<T>([one]: readonly T[]): T {
  if (one === undefined) throw new Error("The list is empty.");
  return one;
}

/** A plate of 0.02 m² on a board of 0.24 m² with three pieces in all, hung on nothing. */
const measures: SignMeasures = {
  sheets: [{ stock: first(standardAcrylics).acrylic, thicknessMm: 3, areaMm2: 20_000, cutMm: 600 }],
  board: { stock: first(standardWoods).wood, thicknessMm: 18, areaMm2: 240_000, outlineMm: 2000, isRectangle: true },
  strips: [],
  pocketsMm2: { routed: 0, engraved: 0 },
  standoffs: [],
  hanging: "none",
  brads: 0,
  bonds: [],
  woodGlueMm2: 0,
  faceMm2: 240_000,
  coats: [],
  pieces: 3,
  slats: 0,
  framePieces: 0,
};

const book: PriceBook = {
  ...emptyPriceBook("EUR"),
  materials: [
    { id: "sheet Midnight 3", name: "Midnight, 3 mm", unit: "m²", price: 6000, waste: 0.5 },
    { id: "board Eastern white pine 18", name: "Pine, 18 mm", unit: "m²", price: 3500, waste: 0 },
  ],
  labour: [{ id: "piece", name: "Setting a piece", perHour: 4800, minutesEach: 5 }],
  markup: 0.5,
  tax: { name: "VAT", share: 0.2 },
};
const prices = (over: Partial<Prices>): Prices => ({
  version: 1,
  book,
  savedAt: "2026-11-30T09:12:00.000Z",
  savedBy: "Hazel Thornbury",
  can: { change: true },
  ...over,
});
const saws: SawSet = { version: 0, saws: usualSaws, savedAt: null, savedBy: null, can: { change: true } };

let answer: Answer;
let server: Awaited<ReturnType<typeof startAnswers>>;
beforeAll(async () => {
  claimNoSizes();
  server = await startAnswers(({ path }) => (path.endsWith("/saws") ? { status: 200, json: saws } : answer));
});
afterAll(() => server.end());
beforeEach(() => window.sessionStorage.clear());

const page = () => (document.body.textContent ?? "").replaceAll("\u00a0", " ");
const says = (words: string) => until(() => page().includes(words));
const rows = () =>
  [...document.querySelectorAll("tr")].map((row) =>
    [...row.children].map((cell) => (cell.textContent ?? "").replaceAll("\u00a0", " ")),
  );

async function open(set: Prices, { signs = 1 } = {}) {
  answer = { status: 200, json: set };
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  const panel = (of: SignMeasures) => (
    <QueryClientProvider client={client}>
      <RouterProvider
        key={of.pieces}
        router={createMemoryRouter([
          {
            path: "/",
            element: (
              <CostPanel
                shop="copperlark-signs"
                unit="mm"
                measures={of}
                signs={signs}
                stock={[]}
                pricesPath={(wanted) => `/prices?${wanted.map(({ id }) => id).join("&")}`}
              />
            ),
          },
        ])}
      />
    </QueryClientProvider>
  );
  const drawn = await render(panel(measures));
  return { redraw: (of: SignMeasures) => drawn.redraw(panel(of)) };
}

const fold = () => until(() => document.querySelector<HTMLButtonElement>("button[aria-expanded]"));

describe("the cost beside the schedule", () => {
  it("stands in a line and opens to what, how much, at which rate, markup, tax and total", async () => {
    await open(prices({}), { signs: 3 });
    // Sheet 3·0.02·1.5 = 0.09 m² at 60; board 0.72 m² at 35; 9 pieces of 5 minutes at 48 an hour: 5.40 + 25.20 + 36.00.
    await says("Costs 22.20 EUR a sign, 3 signs 66.60 EUR");
    const summary = await fold();
    expect(summary.getAttribute("aria-expanded")).toBe("false");
    await press(summary);
    expect(summary.getAttribute("aria-expanded")).toBe("true");
    expect(rows().slice(1, 4)).toEqual([
      [
        "Midnight, 3 mm0.09 m², 50 % waste in it at 60.00 EUR a m²",
        "0.09 m², 50 % waste in it",
        "60.00 EUR a m²",
        "5.40 EUR",
        "",
      ],
      ["Pine, 18 mm0.72 m² at 35.00 EUR a m²", "0.72 m²", "35.00 EUR a m²", "25.20 EUR", ""],
      ["Setting a piece45 min at 48.00 EUR an hour", "45 min", "48.00 EUR an hour", "36.00 EUR", ""],
    ]);
    // 66.60 and half of it, and a fifth of both.
    expect(rows().slice(-4)).toEqual([
      ["Cost", "", "66.60 EUR", "22.20 EUR"],
      ["Markup, 50 %", "", "33.30 EUR", "11.10 EUR"],
      ["VAT, 20 %", "", "19.98 EUR", "6.66 EUR"],
      ["To ask", "", "119.88 EUR", "39.96 EUR"],
    ]);
  });

  it("names what has no price and leads to where it gets one", async () => {
    await open(prices({}));
    await says("3 things without a price");
    await press(await fold());
    expect([...document.querySelectorAll("li")].map((item) => item.textContent)).toEqual([
      "Cutting sheet",
      "Sawing boards, slats and frames",
      "Sanding, hanging and packing, a sign",
    ]);
    expect(document.querySelector("a")?.textContent).toBe("Give them a price");
    expect(document.querySelector("a")?.getAttribute("href")).toContain("sheet cutting");
  });

  it("tells a maker that an owner gives prices", async () => {
    await open(prices({ can: { change: false } }));
    await press(await fold());
    expect(page()).toContain("An owner writes the prices.");
    expect(document.querySelector("a")?.textContent).toBe("Look at the prices");
  });

  it("says so while the shop has no prices at all", async () => {
    await open(prices({ version: 0, book: null, savedAt: null, savedBy: null }));
    await says("What it costs is not known yet: the shop has no prices.");
    expect(document.querySelector("a")?.textContent).toBe("Write the prices");
  });

  it("follows an edit", async () => {
    const { redraw } = await open(prices({}));
    await says("Costs 22.20 EUR a sign");
    await redraw({ ...measures, pieces: 4 });
    // One piece more: 5 minutes at 48.
    await says("Costs 26.20 EUR a sign");
  });

  it("says when what it costs can't be reckoned", async () => {
    const [sheet, ...materials] = book.materials;
    if (!sheet) throw new Error("The book is empty.");
    await open(prices({ book: { ...book, materials: [{ ...sheet, unit: "m" }, ...materials] } }));
    await says("What it costs can’t be reckoned: Midnight, 3 mm is priced by the m: give a length, not an area.");
  });
});

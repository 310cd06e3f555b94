import { noQuantities } from "../cost/cost-quantities.ts";
import { currencyDigits } from "../cost/currency.ts";
import { type CostEstimate, type CostOrder, estimateCost } from "../cost/estimate-cost.ts";
import { formatMoney } from "../cost/money.ts";
import type { PriceBook } from "../cost/price-book.ts";
import { type CalculationGroup, present, worked } from "./calculation.ts";

const currency = "EUR";
/** Made-up prices, to show how it is reckoned. */
const book: PriceBook = {
  version: 1,
  currency,
  materials: [{ id: "ply", name: "Plywood", unit: "m²", price: 4200, waste: 0.15 }],
  machines: [
    { id: "laser", name: "Laser", perHour: 6000, cutMmPerMinute: 600, pocketMm2PerMinute: 2000, setUpMinutes: 10 },
  ],
  hardware: [],
  adhesives: [],
  finishes: [],
  labour: [{ id: "piece", name: "Bonding", perHour: 4800, minutesEach: 6 }],
  markup: 0.35,
  tax: { name: "VAT", share: 0.19 },
};

export const costCalculations: CalculationGroup = {
  title: "Cost",
  calculations: [
    {
      id: "cost-line",
      title: "A line of an estimate",
      formula:
        "Quantity with its waste, rounded to the decimals it is printed with, times the rate, rounded once: half away from zero.",
      source: { text: "Our choice", status: "our choice" },
      limits:
        "Prices are whole minor units (cents) up to a thousand million. Whole sheets and bars get no waste on top.",
      example: () => {
        const mm2 = 360_000;
        const materials = [{ id: "ply", measure: { kind: "area", mm2 } }] as const;
        const { lines } = estimateOf({ book, each: { ...noQuantities, materials }, signs: 1 });
        const line = present(lines[0]);
        return worked(
          [
            ["Area", mm2, "mm²"],
            ["Waste", line.waste],
            ["A square metre", formatMoney(line.rate.amount, currency)],
          ],
          [
            ["Quantity", line.quantity, "m²"],
            ["Amount", formatMoney(line.amount, currency)],
          ],
        );
      },
    },
    {
      id: "machine-minutes",
      title: "Minutes of a machine",
      formula:
        "Cut length / cutting pace + pocket area / pocketing pace + set-ups · minutes each; times the hour's rate / 60.",
      source: { text: "Arithmetic; the paces are the shop's own", status: "calculated" },
      limits: "Moves without cutting and the turning of parts are in the paces.",
      example: () => {
        const cut = { id: "laser", cutMm: 13_500, pocketMm2: 10_800, setUps: 1 };
        const { lines } = estimateOf({ book, each: { ...noQuantities, machining: [cut] }, signs: 1 });
        const line = present(lines[0]);
        return worked(
          [
            ["Cut", cut.cutMm, "mm"],
            ["Pockets", cut.pocketMm2, "mm²"],
            ["Set-ups", cut.setUps],
            ["An hour", formatMoney(line.rate.amount, currency)],
          ],
          [
            ["Minutes", line.quantity, "min"],
            ["Amount", formatMoney(line.amount, currency)],
          ],
        );
      },
    },
    {
      id: "cost-total",
      title: "Markup, tax and total",
      formula:
        "Subtotal = the lines as rounded. Markup = a share of it, tax = a share of both, each rounded once. Total = the sum of the three. Per sign: each figure divided and rounded.",
      source: { text: "Our choice", status: "our choice" },
      limits: "Per-sign figures times their number may differ from the whole by one and a half minor units a sign.",
      example: () => {
        const signs = 3;
        const labour = [{ id: "piece", count: 7 }];
        const { whole, perSign } = estimateOf({ book, each: { ...noQuantities, labour }, signs });
        return worked(
          [
            ["Signs", signs],
            ["Subtotal", formatMoney(whole.subtotal, currency)],
            ["Markup", book.markup],
            ["Tax", book.tax.share],
          ],
          [
            ["Marked up by", formatMoney(whole.markup, currency)],
            ["Taxed", formatMoney(whole.tax, currency)],
            ["Total", formatMoney(whole.total, currency)],
            ["Per sign", formatMoney(perSign.total, currency)],
          ],
        );
      },
    },
    {
      id: "minor-units",
      title: "Minor units of a currency",
      formula: "Amounts are whole minor units; 10 to the power of the currency's digits make one.",
      source: { text: "ISO 4217, list one, from a public copy", status: "published" },
      limits: "Currencies in use; no metals and funds.",
      example: () =>
        worked(
          [["Amount", 123_450, "minor units"]],
          [
            ["In euros", formatMoney(123_450, "EUR")],
            ["Digits of the yen", present(currencyDigits("JPY"))],
            ["Digits of the Bahraini dinar", present(currencyDigits("BHD"))],
          ],
        ),
    },
  ],
};

function estimateOf(order: CostOrder): CostEstimate {
  const outcome = estimateCost(order);
  if (outcome.ok) return outcome.value;
  throw new Error(`An example is refused: ${outcome.problems.map(({ words }) => words).join(" ")}`);
}

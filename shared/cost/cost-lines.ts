import { inchesToMm } from "../units/length.ts";
import type { CombinedQuantities } from "./combine-quantities.ts";
import type { Rate } from "./money.ts";
import type { CostProblem, MaterialUnit, PriceBook } from "./price-book.ts";

export type CostGroup = "materials" | "machining" | "hardware" | "adhesives" | "finishes" | "labour";

/** A line before it is multiplied out: its quantity still unrounded. */
export type DraftLine = {
  readonly group: CostGroup;
  readonly id: string;
  readonly what: string;
  readonly quantity: number;
  /** Decimals that the quantity is printed and reckoned with. */
  readonly decimals: number;
  readonly unit: string;
  readonly rate: Rate;
  /** What the rate's amount is for, as "m²", "h" or "pack of 100". */
  readonly rateUnit: string;
  /** Share for waste that the quantity has in it. */
  readonly waste: number;
};

const mm2PerFoot2 = inchesToMm(12) ** 2;

/** By which measure a material's unit is counted, how many of it make one, and to how many decimals. */
const measures: Readonly<
  Record<MaterialUnit, { readonly by: "mm2" | "mm" | "count"; readonly per: number; readonly decimals: number }>
> = {
  "m²": { by: "mm2", per: 1e6, decimals: 4 },
  "ft²": { by: "mm2", per: mm2PerFoot2, decimals: 3 },
  m: { by: "mm", per: 1000, decimals: 3 },
  ft: { by: "mm", per: inchesToMm(12), decimals: 2 },
  sheet: { by: "count", per: 1, decimals: 2 },
  bar: { by: "count", per: 1, decimals: 0 },
  each: { by: "count", per: 1, decimals: 0 },
};
const measureNames = { mm2: "an area", mm: "a length", count: "a count" } as const;

/** The lines of an order in the order of the price book, and everything asked for that has no price. */
export function draftLines(
  book: PriceBook,
  quantities: CombinedQuantities,
): { lines: DraftLine[]; problems: CostProblem[] } {
  const problems = unpriced(book, quantities);
  const of = (group: CostGroup, id: string) => quantities[group].get(id) ?? {};
  const lines = [
    ...book.materials.map(({ id, name, unit, price, waste }): DraftLine => {
      const { by, per, decimals } = measures[unit];
      const amounts = of("materials", id);
      for (const [key, amount] of Object.entries(amounts)) {
        if (key === by || amount === 0) continue;
        const given = key in measureNames ? measureNames[key as keyof typeof measureNames] : key;
        problems.push({
          field: `materials.${id}`,
          words: `${name} is priced by the ${unit}: give ${measureNames[by]}, not ${given}.`,
        });
      }
      const share = by === "count" ? 0 : waste;
      const quantity = ((amounts[by] ?? 0) / per) * (1 + share);
      const rate = { amount: price, per: 1 };
      return { group: "materials", id, what: name, quantity, decimals, unit, rate, rateUnit: unit, waste: share };
    }),
    ...book.machines.map(({ id, name, perHour, cutMmPerMinute, pocketMm2PerMinute, setUpMinutes }) => {
      const { cutMm = 0, pocketMm2 = 0, setUps = 0 } = of("machining", id);
      const quantity = cutMm / cutMmPerMinute + pocketMm2 / pocketMm2PerMinute + setUps * setUpMinutes;
      return timeLine("machining", { id, name, perHour, minutes: quantity });
    }),
    ...book.hardware.map(({ id, name, price, pack }): DraftLine => {
      const { count: quantity = 0 } = of("hardware", id);
      const rateUnit = pack === 1 ? "each" : `pack of ${pack}`;
      const rate = { amount: price, per: pack };
      return { group: "hardware", id, what: name, quantity, decimals: 0, unit: "each", rate, rateUnit, waste: 0 };
    }),
    ...book.adhesives.map(({ id, name, price, unit = "ml", containerMl, mlPerM2, mlPerM }): DraftLine => {
      const { areaMm2 = 0, beadMm = 0 } = of("adhesives", id);
      const quantity = (areaMm2 / 1e6) * mlPerM2 + (beadMm / 1000) * mlPerM;
      const rate = { amount: price, per: containerMl };
      const rateUnit = `${containerMl} ${unit}`;
      return { group: "adhesives", id, what: name, quantity, decimals: 1, unit, rate, rateUnit, waste: 0 };
    }),
    ...book.finishes.flatMap(({ id, name, pricePerM2, minutesPerM2, perHour }): DraftLine[] => {
      const quantity = (of("finishes", id).coatMm2 ?? 0) / 1e6;
      const rate = { amount: pricePerM2, per: 1 };
      const coats = { quantity, decimals: 4, unit: "m² of one coat", rate, rateUnit: "m² of one coat", waste: 0 };
      const work = timeLine("finishes", {
        id,
        name: `${name}, the work of it`,
        perHour,
        minutes: quantity * minutesPerM2,
      });
      return [{ group: "finishes", id, what: name, ...coats }, work];
    }),
    ...book.labour.map(({ id, name, perHour, minutesEach }) =>
      timeLine("labour", { id, name, perHour, minutes: (of("labour", id).count ?? 0) * minutesEach }),
    ),
  ];
  return { lines: lines.filter(({ quantity }) => quantity > 0), problems };
}

function timeLine(
  group: CostGroup,
  { id, name, perHour, minutes }: { id: string; name: string; perHour: number; minutes: number },
): DraftLine {
  const rate = { amount: perHour, per: 60 };
  return { group, id, what: name, quantity: minutes, decimals: 2, unit: "min", rate, rateUnit: "h", waste: 0 };
}

/** Entries that are asked for and aren't in the book. */
function unpriced(book: PriceBook, quantities: CombinedQuantities): CostProblem[] {
  const groups: readonly (readonly [CostGroup, readonly { readonly id: string }[]])[] = [
    ["materials", book.materials],
    ["machining", book.machines],
    ["hardware", book.hardware],
    ["adhesives", book.adhesives],
    ["finishes", book.finishes],
    ["labour", book.labour],
  ];
  return groups.flatMap(([group, entries]) => {
    const known = new Set(entries.map(({ id }) => id));
    return [...quantities[group].keys()].flatMap((id) =>
      known.has(id)
        ? []
        : [{ field: `${group}.${id}`, words: `“${id}” has no entry under ${group} in the price book. Add its price.` }],
    );
  });
}

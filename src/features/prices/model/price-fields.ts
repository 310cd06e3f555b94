import { parseMoney, writtenMoney } from "#shared/cost/parse-money.ts";
import { adhesiveUnits } from "#shared/cost/price-book.ts";
import { machineWorks, usualPaces, usualWaste } from "#shared/cost/works.ts";
import { inchesToMm, type LengthUnit } from "#shared/units/length.ts";

/** How prices are laid out on the page: the book's materials stand under three headings. */
export const priceGroups = [
  "sheets",
  "boards",
  "strips",
  "hardware",
  "adhesives",
  "finishes",
  "machines",
  "labour",
] as const;
export type PriceGroup = (typeof priceGroups)[number];

/** Something for each group. */
export const byGroup = <T>(make: (group: PriceGroup) => T): Record<PriceGroup, T> =>
  Object.fromEntries(priceGroups.map((group) => [group, make(group)])) as Record<PriceGroup, T>;

export type PriceField = {
  /** Its name in the price book. */
  readonly key: string;
  readonly label: string;
  readonly kind: "money" | "percent" | "whole" | "number" | "cut pace" | "pocket pace" | "choice";
  readonly choices?: readonly string[];
  /** What stands after the field; money's is the currency. */
  readonly suffix?: string;
  /** What stands there until the shop writes something else; "" for money. */
  readonly usual: string;
};

/** What prices and figures are written in. */
export type Writing = { readonly currency: string; readonly unit: LengthUnit };

const money = (key: string, label: string): PriceField => ({ key, label, kind: "money", usual: "" });
const waste = (share: number): PriceField => ({
  key: "waste",
  label: "Waste",
  kind: "percent",
  suffix: "%",
  usual: String(share * 100),
});
const choice = (key: string, label: string, choices: readonly [string, ...string[]]): PriceField => ({
  key,
  label,
  kind: "choice",
  choices,
  usual: choices[0],
});
const minutes = (key: string, label: string, usual: string): PriceField => ({
  key,
  label,
  kind: "number",
  suffix: "min",
  usual,
});

/** The fields of a group's rows, the shop's own units first. */
export function fieldsOf(group: PriceGroup, unit: LengthUnit): readonly PriceField[] {
  const inch = unit === "in";
  const area = inch ? (["ft²", "m²"] as const) : (["m²", "ft²"] as const);
  switch (group) {
    case "sheets":
      return [money("price", "Price"), choice("unit", "For a", [...area, "sheet"]), waste(usualWaste.sheet)];
    case "boards":
      return [money("price", "Price"), choice("unit", "For a", [...area, "each"]), waste(usualWaste.board)];
    case "strips":
      return [
        money("price", "Price"),
        choice("unit", "For a", inch ? ["ft", "m", "bar"] : ["m", "ft", "bar"]),
        waste(usualWaste.strip),
      ];
    case "hardware":
      return [money("price", "Price of a pack"), { key: "pack", label: "In a pack", kind: "whole", usual: "1" }];
    case "adhesives":
      return [
        money("price", "Price of a container"),
        { key: "containerMl", label: "It holds", kind: "whole", usual: "250" },
        choice("unit", "Counted in", [...adhesiveUnits]),
        { key: "mlPerM2", label: "For a m²", kind: "number", usual: "200" },
        { key: "mlPerM", label: "For a m of bead", kind: "number", usual: "10" },
      ];
    case "finishes":
      return [
        money("pricePerM2", "Price for a m²"),
        minutes("minutesPerM2", "Work on a m²", "10"),
        money("perHour", "An hour of it"),
      ];
    case "machines":
      return [
        money("perHour", "An hour"),
        {
          key: "cutMmPerMinute",
          label: "Cuts",
          kind: "cut pace",
          suffix: inch ? "in/min" : "mm/min",
          usual: String(inch ? 24 : usualPaces.cutMmPerMinute),
        },
        {
          key: "pocketMm2PerMinute",
          label: "Clears",
          kind: "pocket pace",
          suffix: inch ? "in²/min" : "cm²/min",
          usual: String(inch ? 2 : usualPaces.pocketMm2PerMinute / 100),
        },
        minutes("setUpMinutes", "To set up", String(usualPaces.setUpMinutes)),
      ];
    case "labour":
      return [money("perHour", "An hour"), minutes("minutesEach", "For one", "5")];
  }
}

/** Whether a row is asked for a field: a machine that never clears an area has no pace for it. */
export function isAsked(group: PriceGroup, id: string, { kind }: PriceField): boolean {
  const work = group === "machines" ? Object.values(machineWorks).find((one) => one.id === id) : undefined;
  if (!work) return true;
  return kind === "cut pace" ? work.cuts : kind === "pocket pace" ? work.pockets : true;
}

/** How many of what is stored make one of what is written. */
function scaleOf({ kind }: PriceField, unit: LengthUnit): number {
  if (kind === "percent") return 0.01;
  if (kind === "cut pace") return unit === "in" ? inchesToMm(1) : 1;
  if (kind === "pocket pace") return unit === "in" ? inchesToMm(1) ** 2 : 100;
  return 1;
}

/** Figures with as many digits as people write; a binary hair does not show. */
const tidy = (value: number): number => Number(value.toPrecision(10));

/** A field of the price book as it is written on the page. */
export function writtenField(field: PriceField, stored: unknown, { currency, unit }: Writing): string {
  if (typeof stored === "string") return stored;
  if (typeof stored !== "number") return field.usual;
  if (field.kind === "money") return writtenMoney(stored, currency);
  const value = stored / scaleOf(field, unit);
  return String(field.kind === "cut pace" || field.kind === "pocket pace" ? Number(value.toPrecision(4)) : tidy(value));
}

export type FieldOutcome =
  | { readonly ok: true; readonly value: number | string }
  | { readonly ok: false; readonly words: string };

/** What is written, as the price book stores it. */
export function readField(
  field: PriceField,
  text: string,
  {
    currency,
    unit,
    stored,
  }: Writing & { /** What stands in the book and is kept while nobody wrote over it. */ readonly stored?: unknown },
): FieldOutcome {
  const written = text.trim();
  const isKept = typeof stored === "number" || typeof stored === "string";
  if (isKept && written === writtenField(field, stored, { currency, unit })) return { ok: true, value: stored };
  if (written === "") return { ok: false, words: "Fill this in." };
  if (field.kind === "choice") return { ok: true, value: written };
  if (field.kind === "money") return parseMoney(written, currency);
  const value = Number(written.replace(/[\s\u00a0]/g, "").replace(",", "."));
  if (!Number.isFinite(value)) return { ok: false, words: "Write a number, like 2.5." };
  return { ok: true, value: tidy(value * scaleOf(field, unit)) };
}

import { formatLimit, type LimitUnit } from "../dry-fit/limit-units.ts";
import type { LengthUnit } from "../units/length.ts";
import { type ShopSaws, shopSawsSchema, usualSaws } from "./shop-saws.ts";

export type SawKey = keyof ShopSaws;

/** One figure of how a shop cuts, as a form shows it. */
export type SawField = { readonly key: SawKey; readonly label: string; readonly unit: LimitUnit; readonly why: string };

/** What is wrong with one figure, in words that say what would be right. */
export type SawFault = { readonly key: SawKey; readonly detail: string };

/** Figures as a form holds them: null is empty, NaN is something that is no number. */
export type WrittenSaws = Readonly<Record<SawKey, number | null>>;

type Group = { readonly title: string; readonly fields: readonly SawField[] };

const length = (key: SawKey, label: string, why: string): SawField => ({ key, label, unit: "length", why });

/** Every figure once, sheets before bars. */
export const sawGroups: readonly Group[] = [
  {
    title: "Sheets",
    fields: [
      length("usualSheetWidthMm", "Sheet as bought, width", "Taken where the stock list counts no sheet."),
      length("usualSheetHeightMm", "Sheet as bought, height", "Taken where the stock list counts no sheet."),
      length("sheetMarginMm", "Clear of the sheet's edge", "Edges come chipped and out of square."),
      {
        key: "sheetSpacingMm",
        label: "Between neighbours, beside the kerf",
        unit: "small length",
        why: "Two cuts that run together burn or chip what stands between them.",
      },
      length("leastOffcutMm", "Least offcut that is kept", "Smaller ones are waste: both sides must reach it."),
    ],
  },
  {
    title: "Bars, for slats, spine and frame",
    fields: [
      length(
        "barLengthMm",
        "Length that bars are bought in",
        "All slats and frame pieces are cut from bars that long.",
      ),
      {
        key: "sawKerfMm",
        label: "Kerf of the saw",
        unit: "small length",
        why: "At a mitre it takes more along the bar.",
      },
      length("squaringMm", "Cut off to square a bar's end", "Kerf included; once a bar."),
      { key: "rejectShare", label: "Share lost to knots", unit: "percent", why: "Of every bar, for knots and flaws." },
    ],
  },
];

export const sawFields: readonly SawField[] = sawGroups.flatMap(({ fields }) => fields);

/** Every fault of a whole set, each figure at most once; lengths in words are in `unit`. */
export function checkSaws(written: WrittenSaws, unit: LengthUnit): SawFault[] {
  return sawFields.flatMap((field): SawFault[] => {
    const detail = faultOf(field, written[field.key], unit);
    return detail === null ? [] : [{ key: field.key, detail }];
  });
}

/** The set in force from what a shop stated at any time before: what the schema no longer takes falls back to its default. */
export function readSaws(kept: Readonly<Record<string, unknown>>): ShopSaws {
  return shopSawsSchema.parse(
    Object.fromEntries(sawFields.filter(({ key }) => isTaken(key, kept[key])).map(({ key }) => [key, kept[key]])),
  );
}

/** Only what differs from the defaults, so that a better default reaches every shop that did not state its own. */
export function ownSaws(saws: ShopSaws): Partial<ShopSaws> {
  return Object.fromEntries(
    sawFields.filter(({ key }) => saws[key] !== usualSaws[key]).map(({ key }) => [key, saws[key]]),
  );
}

function faultOf({ key, unit: figure }: SawField, value: number | null, unit: LengthUnit): string | null {
  if (value === null) return "Fill this in.";
  if (!Number.isFinite(value)) return "Write a number, like 2.5.";
  if (isTaken(key, value)) return null;
  const most = shopSawsSchema.shape[key].unwrap().maxValue ?? Number.POSITIVE_INFINITY;
  const words = (bound: number) => formatLimit(bound, figure, unit);
  return isTaken(key, 0) ? `From ${words(0)} to ${words(most)}.` : `Over ${words(0)}, up to ${words(most)}.`;
}

const isTaken = (key: SawKey, value: unknown): boolean =>
  value !== undefined && shopSawsSchema.shape[key].safeParse(value).success;

import type { ShopSaws } from "../cut-plan/shop-saws.ts";
import type { Stock } from "../materials/stock.ts";
import type { Acrylic, Wood } from "../mockup/document.ts";
import type { LengthUnit } from "../units/length.ts";
import type { CostGroup } from "./cost-lines.ts";
import type { SignMeasures } from "./measure-sign.ts";
import type { PriceBook } from "./price-book.ts";

/** Whole sheets and bars that the cut plan takes for all signs of the order. */
export type PlannedStock = {
  readonly sheets: readonly { readonly stock: Acrylic; readonly thicknessMm: number; readonly count: number }[];
  readonly bars: readonly {
    readonly stock: Wood;
    readonly widthMm: number;
    readonly thicknessMm: number;
    readonly count: number;
  }[];
};

/** Something that goes into the sign and has no price in the book yet. */
export type Unpriced = { readonly group: CostGroup; readonly id: string; readonly name: string };

export type PricedSign = {
  readonly measures: SignMeasures;
  readonly signs: number;
  readonly book: PriceBook;
  readonly stock: Stock;
  readonly saws: ShopSaws;
  readonly unit: LengthUnit;
  readonly plan?: PlannedStock;
};

/** What a quantity is of, before it is known whether it has a price. */
export type Asked<T> = { readonly name: string; readonly quantity: T & { readonly id: string } };

import type { StockItem } from "#shared/contracts/stock.ts";
import type { Acrylic, Adhesive, Hardware, Hold, Wood } from "#shared/mockup/document.ts";
import type { HoldChoice } from "./commands/new-layer.ts";
import { isSame } from "./same.ts";

/** The shop's stock by kind, as the mockup offers it. */
export type StockChoices = {
  readonly acrylics: readonly { readonly acrylic: Acrylic; readonly thicknessesMm: readonly number[] }[];
  readonly woods: readonly { readonly wood: Wood; readonly thicknessesMm: readonly number[] }[];
  readonly hardware: readonly Hardware[];
  readonly adhesives: readonly Adhesive[];
};

/** Hardware is offered by kind, the usual one first. */
const kinds: readonly Hardware["kind"][] = ["capStud", "throughScrew", "blindStud", "edgeGrip"];

export function stockChoices(items: readonly StockItem[]): StockChoices {
  return {
    acrylics: items.flatMap((item) =>
      item.kind === "acrylic"
        ? [{ acrylic: { ...item.acrylic, stockId: item.id }, thicknessesMm: sorted(item.thicknessesMm) }]
        : [],
    ),
    woods: items.flatMap((item) =>
      item.kind === "wood"
        ? [{ wood: { ...item.wood, stockId: item.id }, thicknessesMm: sorted(item.thicknessesMm) }]
        : [],
    ),
    hardware: items
      .flatMap((item) => (item.kind === "hardware" ? [{ ...item.hardware, stockId: item.id }] : []))
      .sort(
        (a, b) =>
          kinds.indexOf(a.kind) - kinds.indexOf(b.kind) ||
          a.barrelLength - b.barrelLength ||
          (a.name < b.name ? -1 : 1),
      ),
    adhesives: items.flatMap((item) => (item.kind === "adhesive" ? [{ ...item.adhesive, stockId: item.id }] : [])),
  };
}

/** The same sheet, wood, adhesive or hardware, whichever row of the stock list it was taken from. */
export function isSameStock<T extends { readonly stockId: string | null }>(a: T, b: T): boolean {
  return isSame({ ...a, stockId: null }, { ...b, stockId: null });
}

/** The choices with the one in the drawing put first when the stock has it no more, or has it changed since. */
export function withCurrent<T extends { readonly stockId: string | null }>(
  choices: readonly T[],
  current: T,
): readonly T[] {
  return choices.some((choice) => isSameStock(choice, current)) ? choices : [current, ...choices];
}

/** Thicknesses that a sheet comes in, with the layer's own where it is another. */
export function thicknessChoices(stocked: readonly number[], current: number): readonly number[] {
  return stocked.includes(current) ? stocked : sorted([...stocked, current]);
}

/** Every way to hold a new layer with what is in stock. */
export function optionsOfHold({
  adhesives,
  hardware,
}: Pick<StockChoices, "adhesives" | "hardware">): readonly HoldChoice[] {
  return [
    ...adhesives.map((adhesive) => ({ kind: "bond" as const, adhesive })),
    ...hardware.map((one) => ({ kind: "standoff" as const, hardware: one })),
    ...adhesives.map((adhesive) => ({ kind: "pocket" as const, adhesive })),
  ];
}

/** Every way to hold a layer with what is in stock, and its present one. */
export function holdChoices({ adhesives, hardware }: StockChoices, hold: Hold): readonly HoldChoice[] {
  return optionsOfHold({
    adhesives: hold.kind === "standoff" ? adhesives : withCurrent(adhesives, hold.adhesive),
    hardware: hold.kind === "standoff" ? withCurrent(hardware, hold.hardware) : hardware,
  });
}

function sorted(lengths: readonly number[]): readonly number[] {
  return lengths.toSorted((a, b) => a - b);
}

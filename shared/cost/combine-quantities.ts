import type { CostQuantities, MaterialMeasure } from "./cost-quantities.ts";

type Amounts = Readonly<Record<string, number>>;

/** Quantities of a whole order by group and entry of the price book; each entry's amounts added up. */
export type CombinedQuantities = Readonly<Record<keyof CostQuantities, ReadonlyMap<string, Amounts>>>;

/** What goes into all signs: so many times what goes into each, and what is there once for the whole order. */
export function combineQuantities(each: CostQuantities, once: CostQuantities, signs: number): CombinedQuantities {
  const gather = <T extends { readonly id: string }>(
    pick: (from: CostQuantities) => readonly T[],
    amounts: (item: T) => Amounts,
  ) => {
    const sums = new Map<string, Amounts>();
    for (const [from, times] of [[each, signs] as const, [once, 1] as const]) {
      for (const item of pick(from)) sums.set(item.id, added(sums.get(item.id) ?? {}, amounts(item), times));
    }
    return sums;
  };
  return {
    materials: gather(
      ({ materials }) => materials,
      ({ measure }) => measured(measure),
    ),
    machining: gather(
      ({ machining }) => machining,
      ({ cutMm, pocketMm2, setUps }) => ({ cutMm, pocketMm2, setUps }),
    ),
    hardware: gather(
      ({ hardware }) => hardware,
      ({ count }) => ({ count }),
    ),
    adhesives: gather(
      ({ adhesives }) => adhesives,
      ({ areaMm2, beadMm }) => ({ areaMm2, beadMm }),
    ),
    // An area with three coats is three areas with one.
    finishes: gather(
      ({ finishes }) => finishes,
      ({ areaMm2, coats }) => ({ coatMm2: areaMm2 * coats }),
    ),
    labour: gather(
      ({ labour }) => labour,
      ({ count }) => ({ count }),
    ),
  };
}

function measured(measure: MaterialMeasure): Amounts {
  if (measure.kind === "area") return { mm2: measure.mm2 };
  return measure.kind === "length" ? { mm: measure.mm } : { count: measure.count };
}

function added(sums: Amounts, amounts: Amounts, times: number): Amounts {
  const result: Record<string, number> = { ...sums };
  for (const [key, amount] of Object.entries(amounts)) result[key] = (result[key] ?? 0) + amount * times;
  return result;
}

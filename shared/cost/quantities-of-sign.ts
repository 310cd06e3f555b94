import type { Stock } from "../materials/stock.ts";
import type { CostGroup } from "./cost-lines.ts";
import type { CostQuantities } from "./cost-quantities.ts";
import { adhesiveId, adhesiveIdOfFamily, coatId, hangingId, hardwareId, screwId } from "./entry-ids.ts";
import { materialsOfSign } from "./materials-of-sign.ts";
import type { SignMeasures } from "./measure-sign.ts";
import type { Asked, PricedSign, Unpriced } from "./priced-sign.ts";
import { hangingNames } from "./things-to-price.ts";
import { bradEntry, labourWorks, machineWorks, sandingEntry } from "./works.ts";

export type SignQuantities = {
  readonly each: CostQuantities;
  /** What is there once for all signs: whole sheets and bars, setting machines up. */
  readonly once: CostQuantities;
  readonly unpriced: readonly Unpriced[];
};

type ListOf<G extends keyof CostQuantities> = readonly Asked<Omit<CostQuantities[G][number], "id">>[];

/**
 * The measures of a sign by the entries of the price book, each in what its entry is priced by. What has no entry is listed
 * by name and left out of the quantities, so that an estimate says what it lacks instead of counting it as nothing.
 */
export function quantitiesOfSign(sign: PricedSign): SignQuantities {
  const { measures, book, stock } = sign;
  const unpriced = new Map<string, Unpriced>();
  const priced = <T>(group: CostGroup, entries: readonly { readonly id: string }[], asked: readonly Asked<T>[]) => {
    const known = new Set(entries.map(({ id }) => id));
    return asked.flatMap(({ name, quantity }) => {
      if (known.has(quantity.id)) return [quantity];
      unpriced.set(`${group} ${quantity.id}`, { group, id: quantity.id, name });
      return [];
    });
  };
  const materials = materialsOfSign(sign);
  const runs = machineRuns(measures);
  const adhesives: ListOf<"adhesives"> = measures.bonds
    .filter(({ areaMm2, beadMm }) => areaMm2 + beadMm > 0)
    .map(({ adhesive, areaMm2, beadMm }) => ({
      name: adhesive.name,
      quantity: { id: adhesiveId(adhesive, stock), areaMm2, beadMm },
    }));
  const glue: ListOf<"adhesives"> =
    measures.woodGlueMm2 > 0
      ? [
          {
            name: "Wood glue",
            quantity: { id: adhesiveIdOfFamily("wood glue", stock), areaMm2: measures.woodGlueMm2, beadMm: 0 },
          },
        ]
      : [];
  const each: CostQuantities = {
    materials: priced("materials", book.materials, materials.each),
    machining: priced("machining", book.machines, runs.each),
    hardware: priced("hardware", book.hardware, hardwareOf(measures, stock)),
    adhesives: priced("adhesives", book.adhesives, [...adhesives, ...glue]),
    finishes: priced("finishes", book.finishes, coatsOf(measures)),
    labour: priced("labour", book.labour, labourOf(measures)),
  };
  const once: CostQuantities = {
    materials: priced("materials", book.materials, materials.once),
    machining: priced("machining", book.machines, runs.once),
    hardware: [],
    adhesives: [],
    finishes: [],
    labour: [],
  };
  return { each, once, unpriced: [...unpriced.values()] };
}

/** Cutting and clearing for each sign; setting up once: sheet by sheet material, the saw by its settings. */
function machineRuns({ sheets, board, strips, pocketsMm2 }: SignMeasures): {
  each: ListOf<"machining">;
  once: ListOf<"machining">;
} {
  const { sheetCutting, engraving, routing, sawing } = machineWorks;
  const total = (lengths: readonly number[]) => lengths.reduce((sum, length) => sum + length, 0);
  const sawsBoard = board.isRectangle;
  const runs = [
    { work: sheetCutting, cutMm: total(sheets.map(({ cutMm }) => cutMm)), pocketMm2: 0, setUps: sheets.length },
    { work: engraving, cutMm: 0, pocketMm2: pocketsMm2.engraved, setUps: 1 },
    { work: routing, cutMm: sawsBoard ? 0 : board.outlineMm, pocketMm2: pocketsMm2.routed, setUps: 1 },
    {
      work: sawing,
      cutMm: (sawsBoard ? board.outlineMm : 0) + total(strips.map(({ cutMm }) => cutMm)),
      pocketMm2: 0,
      setUps: (sawsBoard ? 1 : 0) + total(strips.map(({ settings }) => settings)),
    },
  ].filter(({ cutMm, pocketMm2 }) => cutMm + pocketMm2 > 0);
  const of = (set: "each" | "once") =>
    runs.map(({ work, cutMm, pocketMm2, setUps }) => ({
      name: work.name,
      quantity:
        set === "each" ? { id: work.id, cutMm, pocketMm2, setUps: 0 } : { id: work.id, cutMm: 0, pocketMm2: 0, setUps },
    }));
  return { each: of("each"), once: of("once") };
}

function hardwareOf({ standoffs, hanging, brads }: SignMeasures, stock: Stock): ListOf<"hardware"> {
  const screws = new Map<string, number>();
  for (const { hardware, count } of standoffs) {
    if (hardware.kind === "blindStud") continue;
    const { name } = hardware.screw;
    screws.set(name, (screws.get(name) ?? 0) + count);
  }
  const hangingName = hangingNames[hanging];
  return [
    ...standoffs.map(({ hardware, count }) => ({
      name: hardware.name,
      quantity: { id: hardwareId(hardware, stock), count },
    })),
    ...[...screws].map(([name, count]) => ({ name, quantity: { id: screwId({ name }), count } })),
    ...(brads > 0 ? [{ name: bradEntry.name, quantity: { id: bradEntry.id, count: brads } }] : []),
    ...(hangingName === null ? [] : [{ name: hangingName, quantity: { id: hangingId(hanging), count: 1 } }]),
  ];
}

function coatsOf({ coats, faceMm2 }: SignMeasures): ListOf<"finishes"> {
  const counts = new Map<string, { name: string; count: number }>();
  for (const coat of coats) {
    const id = coatId(coat);
    const name = coat.kind === "sanding" ? sandingEntry.name : coat.name;
    counts.set(id, { name, count: (counts.get(id)?.count ?? 0) + 1 });
  }
  return [...counts].map(([id, { name, count }]) => ({ name, quantity: { id, areaMm2: faceMm2, coats: count } }));
}

function labourOf({ pieces, standoffs, slats, framePieces }: SignMeasures): ListOf<"labour"> {
  const counts = [
    [labourWorks.piece, pieces],
    [labourWorks.standoff, standoffs.reduce((sum, { count }) => sum + count, 0)],
    [labourWorks.slat, slats],
    [labourWorks.frame, framePieces],
    [labourWorks.sign, 1],
  ] as const;
  return counts.filter(([, count]) => count > 0).map(([{ id, name }, count]) => ({ name, quantity: { id, count } }));
}

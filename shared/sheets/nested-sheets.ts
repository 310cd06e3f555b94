import type { Kernel } from "../geometry/kernel.ts";
import { boxOfCopies, compactField, endOf } from "./compact.ts";
import type { CutShape } from "./cut-shape.ts";
import type { Filling, LaidCopy, OpenField } from "./filler.ts";
import { layoutFaults } from "./layout-faults.ts";
import type { CuttingRules, NestedSheet, PiecePlacement } from "./nesting.ts";
import { offcutsOf } from "./offcuts.ts";

export type FinishedSheets = {
  readonly sheets: readonly NestedSheet[];
  readonly laid: readonly LaidCopy[];
  /** Copies that were laid where they must not stay, and were taken out. */
  readonly faulty: ReadonlySet<LaidCopy>;
};

/**
 * Sheets as they are cut: pieces slid together, every field checked with the kernel, offcuts found. Sheets that nothing
 * lies on are left out; of a sheet in parts all parts are given.
 */
export function nestedSheets(
  filling: Filling,
  open: readonly OpenField[],
  shapes: readonly CutShape[],
  rules: CuttingRules,
  kernel: Kernel,
): FinishedSheets {
  const gapMm = rules.kerfMm + rules.spacingMm;
  const faulty = new Set<LaidCopy>();
  const byField = open.map((field, on) => {
    const copies = filling.laid.filter((copy) => copy.on === on);
    const checked = (list: readonly LaidCopy[]) =>
      layoutFaults(list, field.field, { marginMm: rules.marginMm, gapMm }, kernel);
    const compact = compactField(copies, field);
    if (checked(compact).size === 0) return compact;
    const faults = checked(copies);
    for (const copy of faults) faulty.add(copy);
    return copies.filter((copy) => !faults.has(copy));
  });
  const used = new Set(open.filter((_, on) => (byField[on]?.length ?? 0) > 0).map(sheetKey));
  const sheets = open.flatMap((field, on): NestedSheet[] =>
    used.has(sheetKey(field)) ? [nestedSheet(byField[on] ?? [], field, shapes, rules, kernel)] : [],
  );
  return { sheets, laid: byField.flat(), faulty };
}

const sheetKey = ({ field, sheet }: OpenField): string => `${sheet} ${field.stock.id}`;

function nestedSheet(
  copies: readonly LaidCopy[],
  { field, sheet }: OpenField,
  shapes: readonly CutShape[],
  { kerfMm, leastOffcutMm }: CuttingRules,
  kernel: Kernel,
): NestedSheet {
  const usedBox = boxOfCopies(copies);
  const area = copies.reduce((sum, { item }) => sum + (shapes[item.shape]?.areaMm2 ?? 0), 0);
  return {
    stockId: field.stock.id,
    sheet,
    part: field.part,
    parts: field.parts,
    region: field.region,
    placements: copies
      .toSorted((a, b) => a.item.index - b.item.index)
      .map(({ item, laid, x, y }): PiecePlacement => {
        const pieceId = shapes[item.shape]?.piece.id ?? "";
        const at = { x: x - laid.box.x, y: y - laid.box.y };
        return { pieceId, copy: item.copy, ...at, turn: laid.turn, mirrored: laid.mirrored };
      }),
    use: area / field.areaMm2,
    usedBox,
    offcuts: offcutsOf(field.region, field.box, usedBox, { kerfMm, leastMm: leastOffcutMm }, kernel),
  };
}

/** What fields lose to what lies on them, mm²: all of a field, of the last that is used only up to its last piece. */
export function consumedMm2(laid: readonly LaidCopy[], open: readonly OpenField[]): number {
  const last = laid.reduce((most, { on }) => Math.max(most, on), -1);
  return open.slice(0, last + 1).reduce((sum, field, on) => {
    const { areaMm2, box, along } = field.field;
    if (on < last) return sum + areaMm2;
    const end = endOf(
      laid.filter((copy) => copy.on === on),
      field,
    );
    return sum + (areaMm2 * end) / (along === "x" ? box.width : box.height);
  }, 0);
}

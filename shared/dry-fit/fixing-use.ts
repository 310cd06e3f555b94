import { isShorter } from "../geometry/tolerance.ts";
import { type FixingAllowable, fixingAllowable, type Unproven } from "../hardware/fixing-allowable.ts";
import { type FixingRows, fixingLoads, fixingRows, weightN } from "../hardware/fixing-loads.ts";
import type { Hardware } from "../mockup/document.ts";
import type { Carried } from "./carried.ts";
import type { RuleInput } from "./rule.ts";
import { drivenAt, type FixingPlace } from "./screw-at.ts";

/** What a panel asks of its standoffs, against what each may carry. Forces in N, for one of them. */
export type FixingUse = {
  readonly across: { readonly loadN: number; readonly mayN: number };
  /** Of the upper row. */
  readonly along: { readonly loadN: number; readonly mayN: number };
  readonly rows: FixingRows;
  /** How deep they are in the wood that carries, at the least. */
  readonly holdingMm: number;
  readonly unproven: readonly Unproven[];
};

/**
 * What a panel asks of the standoffs that hold it. It is taken as hanging upright, which is the most whatever way it
 * leans; lying, it asks nothing. The shallowest of them stands for all. Null where a measure is out of range.
 */
export function fixingUse(
  places: readonly FixingPlace[],
  { hardware, offset }: { readonly hardware: Hardware; readonly offset: number },
  carried: Carried,
  { document, limits, figures }: RuleInput,
): FixingUse | null {
  const rows = fixingRows(
    places.map(({ hole }) => hole),
    hardware.barrelDiameter,
  );
  if (!rows) return null;
  const holdingMm = Math.min(...places.map((place) => drivenAt(place, hardware, { offset, limits })?.holdingMm ?? 0));
  const wood = document.backer.stock;
  const divisors = { lateral: limits.lateralDivisor, withdrawal: limits.withdrawalDivisor };
  const allowable = fixingAllowable(hardware, wood, holdingMm, divisors);
  const lies = document.hanging.pose === "lying";
  const loads = fixingLoads({
    weightN: lies ? 0 : weightN(carried.massG),
    centroidOff: Math.max(0, carried.heightMm - figures.backerTop.nominal),
    rows,
  });
  if (!allowable.ok || !loads.ok) return null;
  const { lateralN, withdrawalN, unproven }: FixingAllowable = allowable.value;
  return {
    across: { loadN: loads.value.shearN, mayN: lateralN },
    along: { loadN: loads.value.withdrawalN, mayN: withdrawalN },
    rows,
    holdingMm,
    unproven,
  };
}

/** Of a use's two directions the one that takes up more of what it may. */
export function tighter({ across, along }: Pick<FixingUse, "across" | "along">): "across" | "along" {
  return along.loadN * across.mayN > across.loadN * along.mayN ? "along" : "across";
}

/** Whether a load is more than a share of what may be carried. */
export const isOver = ({ loadN, mayN }: FixingUse["across"], share = 1): boolean => isShorter(share * mayN, loadN);

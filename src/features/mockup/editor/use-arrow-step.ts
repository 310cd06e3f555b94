import { useSyncExternalStore } from "react";
import type { LengthUnit } from "#shared/units/length.ts";
import { arrowSteps, usualArrowStep } from "../model/arrow-steps.ts";
import { browserStorage } from "./kept-aids.ts";

const keyOf = (unit: LengthUnit) => `standproud:arrow-step:${unit}`;
/** What was chosen since the page was loaded, so that it counts where the browser keeps nothing, too. */
const chosen = new Map<LengthUnit, number>();
const listeners = new Set<() => void>();

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

function stepOf(unit: LengthUnit): number {
  const kept = Number(browserStorage()?.getItem(keyOf(unit)));
  return chosen.get(unit) ?? arrowSteps(unit).find((mm) => mm === kept) ?? usualArrowStep(unit);
}

function chooseStep(unit: LengthUnit, mm: number): void {
  chosen.set(unit, mm);
  try {
    browserStorage()?.setItem(keyOf(unit), String(mm));
  } catch (error) {
    // No room: it counts until the page is left.
    if (!(error instanceof DOMException)) throw error;
  }
  for (const listener of listeners) listener();
}

/** By how much an arrow key moves, mm, as it was last chosen in this browser for shops that work in this unit. */
export function useArrowStep(unit: LengthUnit): readonly [number, (mm: number) => void] {
  const step = useSyncExternalStore(subscribe, () => stepOf(unit));
  return [step, (mm) => chooseStep(unit, mm)];
}

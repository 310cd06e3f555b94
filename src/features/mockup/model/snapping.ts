import { heldOffsetMm } from "#shared/hardware/standoff-parts.ts";
import type { Hardware } from "#shared/mockup/document.ts";
import { inchesToMm, type LengthUnit } from "#shared/units/length.ts";

/**
 * An offset typed this near to a barrel in stock, in mm, means that barrel. In inches it is half of the sixteenth that
 * lengths are read to: 1″ is what a 25 mm barrel is called there.
 */
export const typedReachMm: Readonly<Record<LengthUnit, number>> = { mm: 0.26, in: inchesToMm(1 / 32) };

/** Barrel lengths in stock, each once, shortest first. */
export function barrelLengths(stock: readonly Hardware[]): number[] {
  return [...new Set(stock.map(heldOffsetMm))].filter((length) => length !== null).sort((a, b) => a - b);
}

/**
 * Where a raised layer ends up: the nearest barrel length in stock when it is within `reachMm`, with the hardware that
 * has it, else the offset as it is. Of several the one most like `current` is taken: same barrel, same finish.
 */
export function catchBarrel(
  offset: number,
  { stock, current, reachMm }: { stock: readonly Hardware[]; current: Hardware; reachMm: number },
): { offset: number; hardware: Hardware | undefined } {
  const nearest = nearestTo(offset, barrelLengths([...stock, current]));
  if (nearest === undefined || Math.abs(nearest - offset) > reachMm) return { offset, hardware: undefined };
  return { offset: nearest, hardware: hardwareOfLength(nearest, stock, current) };
}

/** The barrel length next above or below `offset`, for steps by key; undefined past the last one. */
export function nextBarrel(offset: number, stock: readonly Hardware[], direction: "up" | "down"): number | undefined {
  const lengths = barrelLengths(stock);
  return direction === "up"
    ? lengths.find((length) => length > offset + 0.001)
    : lengths.findLast((length) => length < offset - 0.001);
}

/** The hardware with this barrel length that is most like `current`. */
export function hardwareOfLength(length: number, stock: readonly Hardware[], current: Hardware): Hardware | undefined {
  if (heldOffsetMm(current) === length) return current;
  const likeness = (hardware: Hardware) =>
    (hardware.kind === current.kind ? 4 : 0) +
    (hardware.barrelDiameter === current.barrelDiameter ? 2 : 0) +
    (hardware.finish === current.finish ? 1 : 0);
  let best: Hardware | undefined;
  for (const hardware of stock)
    if (heldOffsetMm(hardware) === length && (!best || likeness(hardware) > likeness(best))) best = hardware;
  return best;
}

function nearestTo(value: number, choices: readonly number[]): number | undefined {
  let nearest: number | undefined;
  for (const choice of choices)
    if (nearest === undefined || Math.abs(choice - value) < Math.abs(nearest - value)) nearest = choice;
  return nearest;
}

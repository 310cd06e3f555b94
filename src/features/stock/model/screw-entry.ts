import { flatHeadMm, woodScrewDiameterMm } from "#shared/materials/wood-screws.ts";
import type { Screw } from "#shared/mockup/document.ts";
import { formatLength } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import type { WrittenScrew } from "./written.ts";

/** Numbers that wood screws are made in (ASME B18.6.1, from memory). */
export const screwNumbers = [2, 3, 4, 5, 6, 7, 8, 9, 10, 12, 14, 16, 18, 20, 24] as const;

type Change = { readonly [K in keyof WrittenScrew]?: WrittenScrew[K] };

/**
 * A screw with one thing changed and what follows from it: a number gives the shank, number and flat head give the head
 * where the standard's table has it. The name follows as long as it is not the shop's own.
 */
export function changeScrew(before: WrittenScrew, change: Change, unit: LengthUnit): WrittenScrew {
  const after = { ...before, ...change };
  const byNumber = "gauge" in change && after.gauge !== null ? { diameter: woodScrewDiameterMm(after.gauge) } : {};
  const head = "gauge" in change || "head" in change ? headAfter(before, after) : {};
  const filled = { ...after, ...byNumber, ...head };
  const isOwnName = before.name !== "" && before.name !== usualName(before, unit);
  return "name" in change || isOwnName ? filled : { ...filled, name: usualName(filled, unit) };
}

/** The table's head for the new number; a head that was the table's for the old one goes with it. */
function headAfter(before: WrittenScrew, after: WrittenScrew): Partial<WrittenScrew> {
  const known = headOf(after);
  if (known) return known;
  const old = headOf(before);
  return old && old.headDiameter === after.headDiameter ? { headDiameter: null, headHeight: null } : {};
}

function headOf({ gauge, head }: WrittenScrew): Pick<Screw, "headDiameter" | "headHeight"> | null {
  const found = gauge === null || head !== "flat" ? null : flatHeadMm(gauge);
  return found && { headDiameter: found.diameter, headHeight: found.height };
}

/** "No. 6 × 16, flat head"; empty while there is too little to name it by. */
export function usualName({ gauge, head, diameter, length }: WrittenScrew, unit: LengthUnit): string {
  if (length === null || Number.isNaN(length)) return "";
  const size =
    gauge !== null ? `No. ${gauge}` : diameter !== null && !Number.isNaN(diameter) ? formatLength(diameter, unit) : "";
  return size === "" ? "" : `${size} × ${formatLength(length, unit)}, ${head} head`;
}

/** Whether two are one screw, name and all. */
export function isSameScrew(a: WrittenScrew, b: WrittenScrew): boolean {
  return (Object.keys(a) as (keyof WrittenScrew)[]).every((field) => a[field] === b[field]);
}

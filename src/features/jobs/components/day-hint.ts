import { daysUntil } from "@/lib/format.ts";

/** Asks about a due day that is past, which is mostly a wrong year: such a day is taken, since a job can be late. */
export function dayHint(dueOn: string | null | undefined, otherwise?: string): string | undefined {
  if (!dueOn) return otherwise;
  return daysUntil(dueOn) < 0 ? "That day is past. Is the year right?" : otherwise;
}

import { addDays } from "./needs-yes-by.ts";

export type Reminder = "before" | "after";

/** How long before the last day the first reminder is due, days: time to look at it and to ask back. */
const daysBefore = 2;
/** A reminder that could not be made on its day, since nothing ran, is still made this many days later, and then never. */
const daysLate = 2;
/** Hours of the day between which people are reminded, from and before. */
const hours = { from: 9, before: 18 } as const;

/**
 * Which reminder is due at this hour: the first two days before the day a yes is needed by, the second the day after it. None for a
 * revision that went out on the reminder's day or later: its own mail said it all. Days are those of the shop's zone, `hour` 0 to 23.
 */
export function reminderDue({
  yesBy,
  issuedOn,
  today,
  hour,
}: {
  readonly yesBy: string;
  readonly issuedOn: string;
  readonly today: string;
  readonly hour: number;
}): Reminder | null {
  if (hour < hours.from || hour >= hours.before) return null;
  const isDue = (day: string): boolean => issuedOn < day && today >= day && today <= addDays(day, daysLate);
  if (isDue(addDays(yesBy, -daysBefore))) return "before";
  return isDue(addDays(yesBy, 1)) ? "after" : null;
}

/** The day and hour that clocks in an IANA zone show at an instant. Throws a RangeError for a zone that is not known. */
export function clockIn(timeZone: string, at: Date): { readonly day: string; readonly hour: number } {
  const parts = new Intl.DateTimeFormat("en-CA", {
    timeZone,
    year: "numeric",
    month: "2-digit",
    day: "2-digit",
    hour: "2-digit",
    hourCycle: "h23",
  }).formatToParts(at);
  const part = (type: Intl.DateTimeFormatPartTypes): string => parts.find((each) => each.type === type)?.value ?? "";
  return { day: `${part("year")}-${part("month")}-${part("day")}`, hour: Number(part("hour")) };
}

/** Whether this runtime knows the zone by that name. */
export function isTimeZone(name: string): boolean {
  try {
    return new Intl.DateTimeFormat("en", { timeZone: name }).resolvedOptions().timeZone !== "";
  } catch {
    return false;
  }
}

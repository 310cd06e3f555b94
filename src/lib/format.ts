const locale = "en-GB";
const day = new Intl.DateTimeFormat(locale, { day: "numeric", month: "short", year: "numeric" });
const dayInYear = new Intl.DateTimeFormat(locale, { weekday: "short", day: "numeric", month: "short" });
const clock = new Intl.DateTimeFormat(locale, { hour: "2-digit", minute: "2-digit" });
const msOfDay = 86_400_000;

/** Local calendar day as a count of days, so that "yesterday" means the calendar's and not 24 hours. */
const dayNumber = (date: Date): number =>
  Math.round(Date.UTC(date.getFullYear(), date.getMonth(), date.getDate()) / msOfDay);

/** A calendar day given as 2026-11-30, read as local. */
const localDay = (iso: string): Date => new Date(`${iso}T00:00:00`);

/** 30 Nov 2026 */
export const formatDay = (iso: string): string => day.format(iso.length === 10 ? localDay(iso) : new Date(iso));

/** "today 09:12", "yesterday 17:40", "Mon 30 Nov 09:12", "30 Nov 2025". */
export function formatInstant(iso: string, now: Date = new Date()): string {
  const date = new Date(iso);
  const back = dayNumber(now) - dayNumber(date);
  const time = clock.format(date);
  if (back === 0) return `today ${time}`;
  if (back === 1) return `yesterday ${time}`;
  if (back > 0 && back < 200) return `${dayInYear.format(date).replace(",", "")} ${time}`;
  return day.format(date);
}

/** Full date and time, for titles and machine-checked places: 30 Nov 2026, 09:12. */
export const formatExact = (iso: string): string => `${day.format(new Date(iso))}, ${clock.format(new Date(iso))}`;

/** "due today", "due in 12 days", "3 days late". */
export function formatDue(iso: string, now: Date = new Date()): string {
  const ahead = dayNumber(localDay(iso)) - dayNumber(now);
  if (ahead === 0) return "due today";
  if (ahead === 1) return "due tomorrow";
  if (ahead === -1) return "1 day late";
  return ahead > 0 ? `due in ${ahead} days` : `${-ahead} days late`;
}

/** Days until a calendar day; negative when it is past. */
export const daysUntil = (iso: string, now: Date = new Date()): number => dayNumber(localDay(iso)) - dayNumber(now);

/** 812 bytes, 41 kB, 2.3 MB (powers of ten). */
export function formatBytes(bytes: number): string {
  if (bytes < 1000) return `${bytes} bytes`;
  if (bytes < 1_000_000) return `${Math.round(bytes / 1000)} kB`;
  return `${(bytes / 1_000_000).toFixed(1)} MB`;
}

const words = ["no", "one", "two", "three", "four", "five", "six", "seven", "eight", "nine", "ten", "eleven", "twelve"];

/** Numbers up to twelve in words: "two". */
export const countInWords = (count: number): string => words[count] ?? String(count);

/** "1 job", "2 jobs", "no jobs". */
export const counted = (count: number, one: string, many: string = `${one}s`): string =>
  count === 0 ? `no ${many}` : `${count} ${count === 1 ? one : many}`;

export const capitalised = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

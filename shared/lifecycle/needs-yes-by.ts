/** What lies between the yes and the day a sign is due. */
export type LeadTime = {
  /** Days the shop works on it, Monday to Friday. */
  readonly buildDays: number;
  /** Hours that finish and bonds take to dry, one after the other; they dry at weekends too. */
  readonly dryingHours: number;
  /** Days on the road, every day of the week. */
  readonly freightDays: number;
};

const dayMs = 86_400_000;

/**
 * The last day on which a yes still lets the sign be there when it is due: the due day less freight, drying (whole days begun) and as
 * many working days, all of them after the yes. Days are ISO dates without a time. No source: plain counting back, as a delivery is
 * planned.
 */
export function needsYesBy(dueOn: string, { buildDays, dryingHours, freightDays }: LeadTime): string {
  let day = addDays(dueOn, -freightDays - Math.ceil(dryingHours / 24));
  for (let left = buildDays; left > 0; day = addDays(day, -1)) {
    if (isWorkday(day)) left -= 1;
  }
  return day;
}

/** The day `count` days after `day`, before it when negative. */
export function addDays(day: string, count: number): string {
  return new Date(Date.parse(`${day}T00:00:00Z`) + count * dayMs).toISOString().slice(0, 10);
}

function isWorkday(day: string): boolean {
  const weekday = new Date(`${day}T00:00:00Z`).getUTCDay();
  return weekday !== 0 && weekday !== 6;
}

import { type BoundFinding, type SetAside, type Standing, subjectKey } from "#shared/dry-fit/set-aside.ts";

/**
 * Each standing with a key of its own that holds while the value changes, so that a form under a finding stays open;
 * several of one subject are counted.
 */
export function keyedStandings<F extends BoundFinding, S extends SetAside>(
  standings: readonly Standing<F, S>[],
): (Standing<F, S> & { readonly key: string })[] {
  const seen = new Map<string, number>();
  return standings.map((standing) => {
    const subject = subjectKey(standing.finding);
    const count = seen.get(subject) ?? 0;
    seen.set(subject, count + 1);
    return { ...standing, key: `${subject} ${count}` };
  });
}

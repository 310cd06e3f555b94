import type { BoundFinding, SetAside, Standing } from "#shared/dry-fit/set-aside.ts";

/** Findings of one rule, the first few and what can wait behind a press. */
export type FindingRun<S> = {
  readonly rule: number;
  readonly title: string;
  readonly first: readonly S[];
  readonly rest: readonly S[];
};

/** So many of a rule are read one by one. */
const mostOfRule = 3;

/** Neighbours of one rule together, in their order. A single one more than the first few is not hidden alone. */
export function runsOfRules<S extends Standing<BoundFinding, SetAside>>(standings: readonly S[]): FindingRun<S>[] {
  const runs: S[][] = [];
  for (const standing of standings) {
    const last = runs.at(-1);
    if (last?.[0]?.finding.rule === standing.finding.rule) last.push(standing);
    else runs.push([standing]);
  }
  return runs.flatMap((run): FindingRun<S>[] => {
    const [head] = run;
    if (!head) return [];
    const { rule, title } = head.finding;
    const cut = run.length > mostOfRule + 1 ? mostOfRule : run.length;
    return [{ rule, title, first: run.slice(0, cut), rest: run.slice(cut) }];
  });
}

import type { ReactNode } from "react";
import { type DescribedLimit, limitGroups } from "#shared/dry-fit/limit-descriptions.ts";
import { TextLink } from "@/components/ui/text-link.tsx";
import { groupAnchor } from "./limit-index.tsx";

type LimitGroupsProps = {
  /** Where a rule is explained, by its number; null for one of plain comparison. */
  readonly explanationOf: (rule: number) => string | null;
  readonly children: (limit: DescribedLimit) => ReactNode;
};

/** Every limit under the heading of what it is about, with the rules that keep to it. `children` draws a limit's row. */
export function LimitGroups({ explanationOf, children }: LimitGroupsProps) {
  return limitGroups.map(({ id, title, rules, limits }) => (
    <section key={id} aria-labelledby={groupAnchor(id)} className="mt-10">
      <div className="flex flex-wrap items-baseline justify-between gap-x-6 border-b-2 border-ink pb-2">
        <h2 id={groupAnchor(id)} tabIndex={-1} className="scroll-mt-4 font-serif text-lg font-bold text-ink">
          {title}
        </h2>
        <ul className="flex flex-wrap gap-x-4 text-sm tabular-nums text-graphite">
          {rules.map((rule) => (
            <li key={rule}>
              <RuleNumber rule={rule} to={explanationOf(rule)} />
            </li>
          ))}
        </ul>
      </div>
      <ul>{limits.map((limit) => children(limit))}</ul>
    </section>
  ));
}

function RuleNumber({ rule, to }: { readonly rule: number; readonly to: string | null }) {
  if (to === null) return <span className="inline-block py-2">Rule {rule}</span>;
  return (
    <TextLink to={to} className="inline-block py-2">
      Rule {rule} <span className="sr-only">how we work it out</span>
    </TextLink>
  );
}

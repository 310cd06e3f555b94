import { Fragment, type ReactNode } from "react";
import { type DescribedLimit, limitGroups } from "#shared/dry-fit/limit-descriptions.ts";
import { TextLink } from "@/components/ui/text-link.tsx";

type LimitGroupsProps = {
  /** Where a rule is explained, by its number; null for one of plain comparison. */
  readonly explanationOf: (rule: number) => string | null;
  readonly children: (limit: DescribedLimit) => ReactNode;
};

/** Every limit under the heading of what it is about, with the rules that keep to it. `children` draws a limit's row. */
export function LimitGroups({ explanationOf, children }: LimitGroupsProps) {
  return limitGroups.map(({ id, title, rules, limits }) => (
    <section key={id} aria-labelledby={`limits-${id}`} className="mt-10">
      <div className="flex flex-wrap items-baseline justify-between gap-x-6 border-b-2 border-ink pb-2">
        <h2 id={`limits-${id}`} className="font-serif text-lg font-bold text-ink">
          {title}
        </h2>
        <p className="text-sm tabular-nums text-graphite">
          {rules.length === 1 ? "Rule " : "Rules "}
          {rules.map((rule, place) => (
            <Fragment key={rule}>
              {place > 0 && ", "}
              <RuleNumber rule={rule} to={explanationOf(rule)} />
            </Fragment>
          ))}
        </p>
      </div>
      <ul>{limits.map((limit) => children(limit))}</ul>
    </section>
  ));
}

function RuleNumber({ rule, to }: { readonly rule: number; readonly to: string | null }) {
  if (to === null) return rule;
  return (
    <TextLink to={to} className="inline-block px-1 py-2">
      <span className="sr-only">How we work out rule </span>
      {rule}
    </TextLink>
  );
}

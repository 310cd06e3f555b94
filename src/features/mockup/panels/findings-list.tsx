import type { ReactNode } from "react";
import type { DeskStanding } from "../editor/use-standings.ts";
import { runsOfRules } from "../model/group-findings.ts";
import { Fold } from "./fold.tsx";

type KeyedStanding = DeskStanding & { readonly key: string };

type FindingsListProps = {
  /** What all of them are, for those who hear the page: "Stops". */
  readonly label: string;
  readonly standings: readonly KeyedStanding[];
  readonly renderItem: (standing: KeyedStanding) => ReactNode;
};

/** Findings of one severity. Of a rule that found many the first few are shown, the rest behind their count. */
export function FindingsList({ label, standings, renderItem }: FindingsListProps) {
  if (standings.length === 0) return null;
  return (
    <ul aria-label={label}>
      {runsOfRules(standings).map(({ rule, title, first, rest }) => [
        ...first.map(renderItem),
        rest.length > 0 && (
          <li key={`more of ${rule}`} className="border-b border-rule">
            <Fold name={`${label} ${rule}`} summary={`${rest.length} more: ${title}`} className="pl-22">
              <ul aria-label={`More: ${title}`}>{rest.map(renderItem)}</ul>
            </Fold>
          </li>
        ),
      ])}
    </ul>
  );
}

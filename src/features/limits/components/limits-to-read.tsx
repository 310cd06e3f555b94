import type { LimitSet } from "#shared/contracts/limits.ts";
import { formatLimit } from "#shared/dry-fit/limit-units.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { LimitGroups } from "./limit-groups.tsx";
import { LimitIndex } from "./limit-index.tsx";
import { LimitRow } from "./limit-row.tsx";

type LimitsToReadProps = {
  readonly unit: LengthUnit;
  readonly set: LimitSet;
  readonly explanationOf: (rule: number) => string | null;
};

/** The limits for those who work by them and do not set them. */
export function LimitsToRead({ unit, set, explanationOf }: LimitsToReadProps) {
  return (
    <>
      <p className="text-base text-ink">You may look at the limits. Owners set them.</p>
      <LimitIndex />
      <LimitGroups explanationOf={explanationOf}>
        {(limit) => (
          <LimitRow
            key={limit.key}
            limit={limit}
            unit={unit}
            value={set.limits[limit.key]}
            isUnsaved={false}
            onBack={null}
          >
            <p>
              <span className="block text-sm font-semibold text-ink">{limit.label}</span>
              <span className="mt-1 block font-serif text-base tabular-nums text-ink">
                {formatLimit(set.limits[limit.key], limit.unit, unit)}
              </span>
            </p>
          </LimitRow>
        )}
      </LimitGroups>
    </>
  );
}

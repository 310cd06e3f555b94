import type { ReactNode } from "react";
import type { LengthUnit } from "#shared/units/length.ts";
import { cx } from "@/lib/cx.ts";
import { groupWords } from "../model/group-words.ts";
import { isPriced, type PriceFaults, type PriceRow } from "../model/price-draft.ts";
import { fieldsOf, type PriceGroup } from "../model/price-fields.ts";
import { columnsOf } from "./price-columns.ts";
import { groupAnchor } from "./price-index.tsx";
import { PriceRowItem } from "./price-row-item.tsx";

type PriceGroupSectionProps = {
  readonly group: PriceGroup;
  readonly rows: readonly PriceRow[];
  /** Those of them that are looked for. */
  readonly shown: readonly PriceRow[];
  readonly base: readonly PriceRow[];
  readonly currency: string;
  readonly unit: LengthUnit;
  readonly faults: PriceFaults;
  readonly onWrite: (group: PriceGroup, id: string, key: string, text: string) => void;
  readonly onRemove: (group: PriceGroup, id: string) => void;
  /** How to add a row, where the stock list names none. */
  readonly children?: ReactNode;
};

/** A heading of the price book with its rows. */
export function PriceGroupSection(props: PriceGroupSectionProps) {
  const { group, rows, shown, base, currency, unit, faults, onWrite, onRemove, children } = props;
  const fields = fieldsOf(group, unit);
  const priced = rows.filter((row) => isPriced(group, row, unit)).length;
  const before = new Map(base.map((row) => [row.id, row]));
  const { title, under } = groupWords[group];
  return (
    <section aria-labelledby={groupAnchor(group)} className="mt-10">
      <div className="flex flex-wrap items-baseline justify-between gap-x-6">
        <h2 id={groupAnchor(group)} tabIndex={-1} className="scroll-mt-4 font-serif text-lg font-bold text-ink">
          {title}
        </h2>
        {rows.length > 0 && (
          <p className="text-sm tabular-nums text-graphite">
            {priced} of {rows.length} with a price
          </p>
        )}
      </div>
      <p className="mt-1 max-w-prose text-sm text-graphite">{under}</p>
      {shown.length < rows.length && (
        <p className="mt-1 text-sm text-graphite">
          {shown.length} of {rows.length} shown.
        </p>
      )}
      <div
        aria-hidden="true"
        className={cx("mt-2 hidden gap-x-4 border-b-2 border-ink pb-1 md:grid", columnsOf(fields.length))}
      >
        <span />
        {fields.map(({ key, label }) => (
          <span key={key} className="text-fine font-semibold text-graphite">
            {label}
          </span>
        ))}
      </div>
      <ul className="border-t-2 border-ink md:border-t-0">
        {shown.map((row) => {
          const old = before.get(row.id)?.fields;
          return (
            <PriceRowItem
              key={row.id}
              group={group}
              fields={fields}
              row={row}
              currency={currency}
              faults={faults}
              isUnsaved={Object.entries(row.fields).some(([key, text]) => old?.[key] !== text)}
              onWrite={onWrite}
              onRemove={onRemove}
            />
          );
        })}
      </ul>
      {children}
    </section>
  );
}

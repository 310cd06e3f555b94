import { memo } from "react";
import { Button } from "@/components/ui/button.tsx";
import { cx } from "@/lib/cx.ts";
import { type PriceFaults, type PriceRow, placeOf } from "../model/price-draft.ts";
import { isAsked, type PriceField, type PriceGroup } from "../model/price-fields.ts";
import { columnsOf } from "./price-columns.ts";
import { PriceFieldCell } from "./price-field-cell.tsx";

type PriceRowItemProps = {
  readonly group: PriceGroup;
  readonly fields: readonly PriceField[];
  readonly row: PriceRow;
  readonly currency: string;
  readonly faults: PriceFaults;
  readonly isUnsaved: boolean;
  readonly onWrite: (group: PriceGroup, id: string, key: string, text: string) => void;
  readonly onRemove: (group: PriceGroup, id: string) => void;
};

/** A thing with its price. A row that the stock list doesn't hold up can be taken away. */
export const PriceRowItem = memo(function PriceRowItem(props: PriceRowItemProps) {
  const { group, fields, row, currency, faults, isUnsaved, onWrite, onRemove } = props;
  return (
    <li
      className={cx(
        "grid grid-cols-2 items-start gap-x-4 gap-y-2 border-b border-rule py-2.5",
        columnsOf(fields.length),
      )}
    >
      <div className="col-span-2 flex min-w-0 flex-wrap items-center gap-x-3 md:col-span-1 md:mt-1 md:min-h-11">
        <span className="min-w-0 text-base text-ink">{row.name}</span>
        {isUnsaved && <span className="text-sm font-semibold text-ochre">Not saved yet</span>}
        {!row.isStocked && (
          <Button
            kind="bare"
            size="small"
            className="-ml-3"
            aria-label={`Take away ${row.name}`}
            onClick={() => onRemove(group, row.id)}
          >
            Take away
          </Button>
        )}
      </div>
      {fields.map((field) =>
        isAsked(group, row.id, field) ? (
          <PriceFieldCell
            key={field.key}
            field={field}
            rowName={row.name}
            currency={currency}
            value={row.fields[field.key] ?? ""}
            error={faults.get(placeOf(group, row.id, field.key))}
            onChange={(text) => onWrite(group, row.id, field.key, text)}
          />
        ) : (
          <span key={field.key} className="hidden md:block" />
        ),
      )}
    </li>
  );
});

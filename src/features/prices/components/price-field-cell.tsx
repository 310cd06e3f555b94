import { Field } from "@/components/ui/field.tsx";
import { Select } from "@/components/ui/select.tsx";
import type { PriceField } from "../model/price-fields.ts";

type PriceFieldCellProps = {
  readonly field: PriceField;
  /** Of the row, so that every field has a name of its own. */
  readonly rowName: string;
  readonly currency: string;
  readonly value: string;
  readonly error: string | undefined;
  readonly onChange: (text: string) => void;
};

/** One figure of a row. On a desk the head of the column names it, in the hand its own label. */
export function PriceFieldCell({ field, rowName, currency, value, error, onChange }: PriceFieldCellProps) {
  const label = (
    <>
      <span className="sr-only">{rowName}, </span>
      <span className="md:sr-only">{field.label}</span>
    </>
  );
  if (field.kind === "choice")
    return (
      <Select label={label} error={error} value={value} onChange={(event) => onChange(event.target.value)}>
        {(field.choices ?? []).map((choice) => (
          <option key={choice}>{choice}</option>
        ))}
      </Select>
    );
  const suffix = field.kind === "money" ? currency : field.suffix;
  return (
    <Field
      label={label}
      error={error}
      {...(suffix ? { suffix: <span className="whitespace-nowrap">{suffix}</span> } : {})}
      inputMode="decimal"
      autoComplete="off"
      value={value}
      onChange={(event) => onChange(event.target.value)}
    />
  );
}

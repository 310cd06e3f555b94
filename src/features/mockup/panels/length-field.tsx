import { useState } from "react";
import { formatLength } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { parseLength } from "#shared/units/parse-length.ts";
import { Field } from "@/components/ui/field.tsx";

type LengthFieldProps = {
  readonly label: string;
  readonly mm: number;
  readonly unit: LengthUnit;
  /** null while what is typed is no length within the bounds. */
  readonly onChange: (mm: number | null) => void;
  readonly least?: number;
  readonly most?: number;
};

/** A length in a form, in the shop's unit; other units are read when they are written out, as "60 cm" or 12 3/8″. */
export function LengthField({ label, mm, unit, onChange, least = 0.1, most = 10_000 }: LengthFieldProps) {
  const [text, setText] = useState(() => formatLength(mm, unit));
  const typed = parseLength(text, unit);
  const fits = typed !== null && typed >= least && typed <= most;

  return (
    <Field
      label={label}
      suffix={unit}
      inputMode="decimal"
      autoComplete="off"
      value={text}
      error={fits ? undefined : `Write a length from ${formatLength(least, unit)} to ${formatLength(most, unit)}.`}
      onChange={(event) => {
        const next = event.target.value;
        setText(next);
        const length = parseLength(next, unit);
        onChange(length !== null && length >= least && length <= most ? length : null);
      }}
    />
  );
}

import { type Ref, useEffect, useState } from "react";
import { formatFine, formatLength } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { parseLength } from "#shared/units/parse-length.ts";
import { Field } from "./field.tsx";

type LengthFieldProps = {
  readonly label: string;
  readonly unit: LengthUnit;
  /** mm; null is empty, NaN is something that is no length. */
  readonly value: number | null;
  readonly onChange: (mm: number | null) => void;
  readonly onFocus?: () => void;
  readonly onBlur?: () => void;
  readonly hint?: string;
  readonly error?: string | undefined;
  readonly disabled?: boolean;
  readonly name?: string;
  /** Shows what a sixteenth of an inch is too coarse for: hundredths of a mm, thousandths of an inch. */
  readonly fine?: boolean;
  readonly ref?: Ref<HTMLInputElement>;
};

/** A length as people write it: 600, 60 cm, 23 5/8. Keeps what was typed until the field is left. */
export function LengthField({
  label,
  unit,
  value,
  onChange,
  onFocus,
  onBlur,
  hint,
  error,
  disabled,
  name,
  fine = false,
  ref,
}: LengthFieldProps) {
  const [text, setText] = useState("");
  const [typing, setTyping] = useState(false);
  const unreadable = Number.isNaN(value);
  useEffect(() => {
    if (!typing && !unreadable) setText(value === null ? "" : written(value, unit, fine));
  }, [typing, unreadable, value, unit, fine]);
  return (
    <Field
      label={label}
      {...(hint ? { hint } : {})}
      error={
        unreadable && !typing ? `Write a length, like ${unit === "mm" ? "600 or 60 cm" : "23 5/8 or 60 cm"}.` : error
      }
      suffix={unit === "mm" ? "mm" : "inches"}
      inputMode={unit === "mm" ? "decimal" : "text"}
      autoComplete="off"
      disabled={disabled}
      name={name}
      ref={ref}
      value={text}
      onFocus={() => {
        setTyping(true);
        onFocus?.();
      }}
      onChange={(event) => {
        setText(event.target.value);
        const trimmed = event.target.value.trim();
        onChange(trimmed === "" ? null : (parseLength(trimmed, unit) ?? Number.NaN));
      }}
      onBlur={() => {
        setTyping(false);
        onBlur?.();
      }}
    />
  );
}

/** Without the unit that stands beside the field. */
function written(mm: number, unit: LengthUnit, fine: boolean): string {
  return fine ? formatFine(mm, unit).replace(/ mm$/, "") : formatLength(mm, unit);
}

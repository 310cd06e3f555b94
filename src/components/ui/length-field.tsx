import { useEffect, useState } from "react";
import { formatLength } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { parseLength } from "#shared/units/parse-length.ts";
import { Field } from "./field.tsx";

type LengthFieldProps = {
  readonly label: string;
  readonly unit: LengthUnit;
  /** mm; null is empty, NaN is something that is no length. */
  readonly value: number | null;
  readonly onChange: (mm: number | null) => void;
  readonly onBlur?: () => void;
  readonly hint?: string;
  readonly error?: string | undefined;
  readonly disabled?: boolean;
  readonly name?: string;
};

/** A length as people write it: 600, 60 cm, 23 5/8. Keeps what was typed until the field is left. */
export function LengthField({ label, unit, value, onChange, onBlur, hint, error, disabled, name }: LengthFieldProps) {
  const [text, setText] = useState("");
  const [typing, setTyping] = useState(false);
  const unreadable = Number.isNaN(value);
  useEffect(() => {
    if (!typing && !unreadable) setText(value === null ? "" : formatLength(value, unit));
  }, [typing, unreadable, value, unit]);
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
      value={text}
      onFocus={() => setTyping(true)}
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

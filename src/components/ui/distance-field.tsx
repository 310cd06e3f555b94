import { useState } from "react";
import { inchesToMm, type LengthUnit } from "#shared/units/length.ts";
import { Field } from "./field.tsx";

const mmOf: Record<LengthUnit, number> = { mm: 1000, in: inchesToMm(12) };

const shown = (mm: number | null, unit: LengthUnit): string =>
  mm === null ? "" : String(Number((mm / mmOf[unit]).toFixed(2)));

/** How far off the sign is read from, in metres or feet. `value` is in mm; NaN is something that is no number. */
export function DistanceField({
  label,
  unit,
  value,
  onChange,
  error,
  readOnly,
}: {
  readonly label: string;
  readonly unit: LengthUnit;
  readonly value: number | null;
  readonly onChange: (mm: number | null) => void;
  readonly error?: string | undefined;
  readonly readOnly?: boolean;
}) {
  const [text, setText] = useState<string | null>(null);
  const [typing, setTyping] = useState(false);
  const unreadable = Number.isNaN(value);
  return (
    <Field
      label={label}
      error={unreadable && !typing ? "Write a number, like 5." : error}
      suffix={unit === "mm" ? "m" : "feet"}
      inputMode="decimal"
      autoComplete="off"
      readOnly={readOnly}
      value={text ?? shown(value, unit)}
      onFocus={() => setTyping(true)}
      onChange={(event) => {
        const written = event.target.value.trim().replace(",", ".");
        setText(event.target.value);
        onChange(written === "" ? null : Number(written) * mmOf[unit]);
      }}
      onBlur={() => {
        setTyping(false);
        // What can't be read stays as it was typed, to be mended.
        if (!unreadable) setText(null);
      }}
    />
  );
}

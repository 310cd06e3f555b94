import { type Ref, useState } from "react";
import { type FigureUnit, figureUnits, shownFigure, storedFigure } from "#shared/dry-fit/limit-units.ts";
import { Field } from "@/components/ui/field.tsx";

type FigureFieldProps = {
  readonly label: string;
  readonly unit: FigureUnit;
  /** As it is stored; null is empty, NaN is something that is no number. */
  readonly value: number | null;
  readonly onChange: (stored: number | null) => void;
  readonly onBlur: () => void;
  readonly error: string | undefined;
  readonly ref: Ref<HTMLInputElement>;
};

/** A limit that is no length, written in its own unit: 10 for a tenth in percent. Keeps what was typed until it is left. */
export function FigureField({ label, unit, value, onChange, onBlur, error, ref }: FigureFieldProps) {
  const [text, setText] = useState("");
  const [typing, setTyping] = useState(false);
  const unreadable = Number.isNaN(value);
  const shown = value === null || unreadable ? "" : String(shownFigure(value, unit));
  return (
    <Field
      label={label}
      error={unreadable && !typing ? "Write a number, like 2.5." : error}
      suffix={<span className="whitespace-nowrap">{figureUnits[unit].suffix}</span>}
      inputMode="decimal"
      autoComplete="off"
      ref={ref}
      value={typing || unreadable ? text : shown}
      onFocus={() => {
        if (!unreadable) setText(shown);
        setTyping(true);
      }}
      onChange={(event) => {
        setText(event.target.value);
        const written = event.target.value.trim().replace(",", ".");
        onChange(written === "" ? null : storedFigure(Number(written), unit));
      }}
      onBlur={() => {
        setTyping(false);
        onBlur();
      }}
    />
  );
}

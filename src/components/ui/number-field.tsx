import { useState } from "react";
import { Field } from "./field.tsx";

type NumberFieldProps = {
  readonly label: string;
  /** null is empty, NaN is something that is no number. */
  readonly value: number | null;
  readonly onChange: (value: number | null) => void;
  readonly suffix?: string;
  readonly hint?: string;
  readonly error?: string | undefined;
  readonly className?: string;
  readonly labelHidden?: boolean;
};

/** A number that is no length, with a comma or a point. Keeps what was typed until the field is left. */
export function NumberField({ value, onChange, error, ...field }: NumberFieldProps) {
  const [text, setText] = useState("");
  const [typing, setTyping] = useState(false);
  const unreadable = Number.isNaN(value);
  const shown = value === null || unreadable ? "" : String(value);
  return (
    <Field
      {...field}
      error={unreadable && !typing ? "Write a number, like 2.5." : error}
      inputMode="decimal"
      autoComplete="off"
      value={typing || unreadable ? text : shown}
      onFocus={() => {
        if (!unreadable) setText(shown);
        setTyping(true);
      }}
      onChange={(event) => {
        setText(event.target.value);
        const written = event.target.value.trim().replace(",", ".");
        onChange(written === "" ? null : Number(written));
      }}
      onBlur={() => setTyping(false)}
    />
  );
}

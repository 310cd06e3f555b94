import { type ComponentProps, type KeyboardEvent, useState } from "react";
import { formatLength } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { parseLength } from "#shared/units/parse-length.ts";
import { cx } from "@/lib/cx.ts";

/** Reads as lettering in a table and shows by its underline that it can be changed. */
const cellClass =
  "h-7 w-full min-w-0 rounded-none border-0 border-b border-dotted border-graphite bg-transparent px-0.5 py-0 font-sans text-sm text-ink tabular-nums hover:border-solid hover:border-ink hover:bg-sheet focus:border-solid focus:bg-sheet aria-invalid:border-oxblood aria-invalid:text-oxblood disabled:border-transparent";

type CellTextProps = Omit<ComponentProps<"input">, "value" | "onChange" | "onBlur" | "onKeyDown"> & {
  readonly value: string;
  /** What was typed, on Enter or when the field is left. False when it can't be taken: the field then shows what was there. */
  readonly onCommit: (text: string) => boolean;
};

/** A line of text in a cell: Enter or leaving takes it, Escape puts back what was there. */
export function CellText({ value, onCommit, className, ...input }: CellTextProps) {
  const [draft, setDraft] = useState<string | null>(null);
  const [refused, setRefused] = useState(false);

  function take() {
    if (draft === null) return;
    const taken = draft === value || onCommit(draft);
    setRefused(!taken);
    if (taken) setDraft(null);
  }

  function handleKeyDown(event: KeyboardEvent<HTMLInputElement>) {
    if (event.key === "Enter") take();
    if (event.key !== "Escape" || draft === null) return;
    event.stopPropagation();
    setDraft(null);
    setRefused(false);
  }

  function handleBlur() {
    take();
    // Left with something that can't be taken, the field shows the drawing's own value again.
    setDraft(null);
    setRefused(false);
  }

  return (
    <input
      {...input}
      value={draft ?? value}
      aria-invalid={refused || undefined}
      onChange={(event) => setDraft(event.target.value)}
      onKeyDown={handleKeyDown}
      onBlur={handleBlur}
      className={cx(cellClass, className)}
    />
  );
}

type CellLengthProps = Omit<CellTextProps, "value" | "onCommit"> & {
  readonly mm: number;
  readonly unit: LengthUnit;
  readonly onCommit: (mm: number) => void;
};

/** A length in a cell, in the shop's unit; anything that is no length is put back. */
export function CellLength({ mm, unit, onCommit, ...input }: CellLengthProps) {
  function handleCommit(text: string): boolean {
    const length = parseLength(text, unit);
    if (length === null) return false;
    onCommit(length);
    return true;
  }
  return <CellText {...input} inputMode="decimal" value={formatLength(mm, unit)} onCommit={handleCommit} />;
}

/** One choice out of a few, in a cell. Options are the children. */
export function CellSelect({ className, children, ...select }: ComponentProps<"select">) {
  return (
    <select {...select} className={cx(cellClass, "cursor-pointer appearance-none truncate", className)}>
      {children}
    </select>
  );
}

type WordButtonProps = ComponentProps<"button"> & {
  /** Within a sentence it is as high as its line. */
  readonly inText?: boolean;
};

/** A word to press in a cell, a bar or a sentence. */
export function WordButton({ className, type = "button", inText = false, ...button }: WordButtonProps) {
  return (
    <button
      {...button}
      type={type}
      className={cx(
        "cursor-pointer rounded text-left font-sans text-sm text-indigo underline underline-offset-4 hover:bg-linen hover:text-ink disabled:cursor-not-allowed disabled:text-graphite disabled:no-underline",
        inText ? "inline" : "min-h-7 px-1",
        className,
      )}
    />
  );
}

/** A small square of a stock's own colour. The name beside it says the rest. */
export function Swatch({ colour }: { readonly colour: string }) {
  return (
    <svg aria-hidden="true" viewBox="0 0 12 12" className="size-3.5 shrink-0">
      <rect x="0.5" y="0.5" width="11" height="11" fill={colour} stroke="currentColor" />
    </svg>
  );
}

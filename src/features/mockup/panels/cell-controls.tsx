import { Popover } from "radix-ui";
import { type ComponentProps, type KeyboardEvent, useId, useState } from "react";
import { formatExact } from "#shared/units/format-exact.ts";
import { formatLength } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { parseLength } from "#shared/units/parse-length.ts";
import { cx } from "@/lib/cx.ts";
import { type Bounds, boundsProblem } from "../model/length-bounds.ts";

/** Reads as lettering in a table and shows by its underline that it can be changed. */
const cellClass =
  "h-7 w-full min-w-0 rounded-none border-0 border-b border-dotted border-graphite bg-transparent px-0.5 py-0 font-sans text-sm text-ink tabular-nums hover:border-solid hover:border-ink hover:bg-sheet focus:border-solid focus:bg-sheet aria-invalid:border-oxblood aria-invalid:text-oxblood disabled:border-transparent";

type CellTextProps = Omit<ComponentProps<"input">, "value" | "onChange" | "onBlur" | "onKeyDown"> & {
  readonly value: string;
  /** What was typed, on Enter or when the field is left. Gives why it can't be taken, or null when it was. */
  readonly onCommit: (text: string) => string | null;
};

/**
 * A line of text in a cell: Enter or leaving takes it, Escape puts back what was there. What can't be taken is said below
 * the cell; left with it, the field shows the drawing's own value again, and the words stay until the next press or key.
 */
export function CellText({ value, onCommit, className, ...input }: CellTextProps) {
  const [draft, setDraft] = useState<string | null>(null);
  const [refusal, setRefusal] = useState<string | null>(null);
  const refusalId = useId();

  function take() {
    if (draft === null) return;
    const why = draft === value ? null : onCommit(draft);
    setRefusal(why);
    if (why === null) setDraft(null);
  }

  function handleKeyDown(event: KeyboardEvent<HTMLInputElement>) {
    if (event.key === "Enter") take();
    if (event.key !== "Escape" || draft === null) return;
    event.stopPropagation();
    setDraft(null);
    setRefusal(null);
  }

  function handleBlur() {
    take();
    setDraft(null);
  }

  return (
    <Popover.Root open={refusal !== null} onOpenChange={(open) => open || setRefusal(null)}>
      <Popover.Anchor asChild>
        <input
          {...input}
          value={draft ?? value}
          // Nothing typed: undo is the desk's, not the field's.
          data-untouched={draft === null || undefined}
          aria-invalid={(draft !== null && refusal !== null) || input["aria-invalid"]}
          aria-describedby={refusal === null ? input["aria-describedby"] : refusalId}
          onChange={(event) => {
            setDraft(event.target.value);
            setRefusal(null);
          }}
          onKeyDown={handleKeyDown}
          onBlur={handleBlur}
          className={cx(cellClass, className)}
        />
      </Popover.Anchor>
      <Popover.Portal>
        <Popover.Content
          id={refusalId}
          role="alert"
          align="start"
          side="bottom"
          sideOffset={4}
          // The words are read where the hand is: the focus stays in the cell, or goes where it was going.
          onOpenAutoFocus={(event) => event.preventDefault()}
          onCloseAutoFocus={(event) => event.preventDefault()}
          onFocusOutside={(event) => event.preventDefault()}
          className="z-40 max-w-72 border-l-4 border-oxblood bg-sheet px-3 py-2 text-sm text-oxblood outline outline-rule"
        >
          {refusal}
        </Popover.Content>
      </Popover.Portal>
    </Popover.Root>
  );
}

type CellLengthProps = Omit<CellTextProps, "value" | "onCommit"> & {
  readonly mm: number;
  readonly unit: LengthUnit;
  readonly bounds: Bounds;
  /** Shows thousandths of a millimetre and sixty-fourths of an inch, for what is set out in figures. */
  readonly exact?: boolean;
  readonly onCommit: (mm: number) => void;
};

/** A length in a cell, in the shop's unit and within bounds. */
export function CellLength({ mm, unit, bounds, exact = false, onCommit, ...input }: CellLengthProps) {
  function handleCommit(text: string): string | null {
    const length = parseLength(text, unit);
    if (length === null) return `Write a length, like ${unit === "mm" ? "19 or 2.5 cm" : "3/4 or 19 mm"}.`;
    const problem = boundsProblem(length, bounds, unit);
    if (problem !== undefined) return problem;
    onCommit(length);
    return null;
  }
  const value = exact ? formatExact(mm, unit) : formatLength(mm, unit);
  return <CellText {...input} inputMode="decimal" value={value} onCommit={handleCommit} />;
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
        "cursor-pointer rounded text-left font-sans text-sm text-indigo underline underline-offset-4 hover:bg-linen hover:text-ink disabled:cursor-not-allowed disabled:text-graphite disabled:no-underline aria-disabled:cursor-not-allowed aria-disabled:text-graphite aria-disabled:no-underline",
        inText ? "inline" : "min-h-7 px-1",
        className,
      )}
    />
  );
}

/** A small square of a stock's own colour. The name beside it says the rest. */
export function Swatch({ colour, large = false }: { readonly colour: string; readonly large?: boolean }) {
  return (
    <svg aria-hidden="true" viewBox="0 0 12 12" className={cx("shrink-0", large ? "size-8" : "size-3.5")}>
      <rect x="0.5" y="0.5" width="11" height="11" fill={colour} stroke="currentColor" />
    </svg>
  );
}

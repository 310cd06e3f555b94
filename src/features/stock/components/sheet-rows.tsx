import { useRef } from "react";
import { formatFine } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Button } from "@/components/ui/button.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { NumberField } from "@/components/ui/number-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import type { Faults } from "../model/faults.ts";
import type { WrittenSheet } from "../model/written.ts";

/** Whole sheets on hand, a line for each thickness and size. */
export function SheetRows({
  unit,
  thicknessesMm,
  sheets,
  faults,
  onChange,
}: {
  readonly unit: LengthUnit;
  readonly thicknessesMm: readonly (number | null)[];
  readonly sheets: readonly WrittenSheet[];
  readonly faults: Faults;
  readonly onChange: (sheets: readonly WrittenSheet[]) => void;
}) {
  const add = useRef<HTMLButtonElement>(null);
  const there = thicknessesMm.filter((mm) => mm !== null);
  const [first] = there;
  // A line has no name but its place.
  const lines = sheets.map((sheet, index) => ({ sheet, index, key: `line ${index}` }));
  const change = (index: number, part: Partial<WrittenSheet>) =>
    onChange(sheets.map((sheet, place) => (place === index ? { ...sheet, ...part } : sheet)));
  return (
    <fieldset className="min-w-0">
      <legend className="font-sans text-sm font-semibold text-ink">Sheets on hand</legend>
      <p className="mb-2 text-fine text-graphite">
        {sheets.length === 0
          ? "Nobody has counted yet. What is counted here, the dry fit compares with what the sign needs."
          : "An empty count means not counted yet."}
      </p>
      <ol className="space-y-3">
        {lines.map(({ sheet, index, key }) => {
          const own = (field: keyof WrittenSheet) => faults.get(`sheets.${index}.${field}`);
          const options =
            sheet.thicknessMm === null || there.includes(sheet.thicknessMm) ? there : [...there, sheet.thicknessMm];
          return (
            <li
              key={key}
              className="grid grid-cols-2 items-start gap-x-3 gap-y-2 border-t border-rule pt-3 sm:grid-cols-[7rem_1fr_1fr_7rem_auto]"
            >
              <Select
                label="Thickness"
                error={own("thicknessMm")}
                value={String(sheet.thicknessMm)}
                onChange={(event) => change(index, { thicknessMm: Number(event.target.value) })}
              >
                {options.map((mm) => (
                  <option key={mm} value={String(mm)}>
                    {formatFine(mm, unit)}
                  </option>
                ))}
              </Select>
              <LengthField
                label="Long"
                unit={unit}
                value={sheet.widthMm}
                onChange={(widthMm) => change(index, { widthMm })}
                error={own("widthMm")}
              />
              <LengthField
                label="Wide"
                unit={unit}
                value={sheet.heightMm}
                onChange={(heightMm) => change(index, { heightMm })}
                error={own("heightMm")}
              />
              <NumberField
                label="How many"
                value={sheet.quantity}
                onChange={(quantity) => change(index, { quantity })}
                error={own("quantity")}
              />
              <Button
                size="small"
                className="col-span-2 justify-self-start sm:col-span-1 sm:mt-7"
                aria-label={`Take out sheet line ${index + 1}`}
                onClick={() => {
                  onChange(sheets.filter((_, place) => place !== index));
                  add.current?.focus();
                }}
              >
                Take out
              </Button>
            </li>
          );
        })}
      </ol>
      <Button
        ref={add}
        size="small"
        className="mt-3"
        disabled={first === undefined}
        onClick={() => {
          if (first === undefined) return;
          const last = sheets.at(-1);
          const size = last ? { widthMm: last.widthMm, heightMm: last.heightMm } : { widthMm: null, heightMm: null };
          onChange([...sheets, { thicknessMm: first, ...size, quantity: null }]);
        }}
      >
        Add a sheet size
      </Button>
      {first === undefined && <p className="mt-1 text-fine text-graphite">Add a thickness first.</p>}
    </fieldset>
  );
}

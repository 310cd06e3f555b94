import { type KeyboardEvent, useRef, useState } from "react";
import { formatFine } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Button } from "@/components/ui/button.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";

/** The thicknesses that a material comes in: a chip each, and a field for the next. */
export function ThicknessChips({
  unit,
  values,
  onChange,
  error,
}: {
  readonly unit: LengthUnit;
  readonly values: readonly (number | null)[];
  readonly onChange: (values: readonly number[]) => void;
  readonly error: string | undefined;
}) {
  const [next, setNext] = useState<number | null>(null);
  const fieldset = useRef<HTMLFieldSetElement>(null);
  const there = values.filter((mm) => mm !== null);
  const focusField = () => fieldset.current?.querySelector("input")?.focus();

  /** What was typed counts as soon as it is left, so that saving does not lose it. */
  function takeIn() {
    if (next === null || !Number.isFinite(next)) return;
    if (!there.includes(next)) onChange([...there, next].toSorted((a, b) => a - b));
    setNext(null);
  }
  function handleEnter(event: KeyboardEvent) {
    // Enter adds the thickness; the form is sent by its button.
    if (event.key !== "Enter" || !(event.target instanceof HTMLInputElement)) return;
    event.preventDefault();
    takeIn();
  }
  return (
    <fieldset ref={fieldset} onKeyDown={handleEnter} className="min-w-0">
      <legend className="mb-1 font-sans text-sm font-semibold text-ink">Thicknesses in stock</legend>
      <div className="flex items-start gap-2">
        <div className="w-52">
          <LengthField
            label={there.length === 0 ? "Thickness" : "Another thickness"}
            unit={unit}
            value={next}
            onChange={setNext}
            onBlur={takeIn}
            fine
            error={error}
          />
        </div>
        <Button onClick={focusField} className="mt-6">
          Add it
        </Button>
      </div>
      {/* Room for the first row is kept, so that nothing moves from under the pointer when a thickness is taken in. */}
      <div className="mt-2 min-h-11">
        <ul className="flex flex-wrap gap-2">
          {there.map((mm) => {
            const words = formatFine(mm, unit);
            return (
              <li key={mm} className="flex items-center border border-graphite bg-paper text-base tabular-nums">
                <span className="pl-3">{words}</span>
                <button
                  type="button"
                  aria-label={`Take out ${words}`}
                  onClick={() => {
                    onChange(there.filter((other) => other !== mm));
                    focusField();
                  }}
                  className="inline-flex size-9 cursor-pointer items-center justify-center hover:bg-linen pointer-coarse:size-11"
                >
                  <svg aria-hidden="true" viewBox="0 0 16 16" className="size-3">
                    <path d="M2 2l12 12M14 2L2 14" stroke="currentColor" strokeWidth="1.75" fill="none" />
                  </svg>
                </button>
              </li>
            );
          })}
        </ul>
      </div>
    </fieldset>
  );
}

import { useState } from "react";
import type { LengthUnit } from "#shared/units/length.ts";
import { Select } from "@/components/ui/select.tsx";
import { blankScrew } from "../model/blank-entry.ts";
import { type Faults, faultWithin } from "../model/faults.ts";
import { isSameScrew } from "../model/screw-entry.ts";
import type { WrittenScrew } from "../model/written.ts";
import { ScrewFields } from "./screw-fields.tsx";

const own = "own";

/** The wood screw of a standoff: one of the stock, or one of its own that is described here. */
export function ScrewChoice({
  unit,
  screws,
  screw,
  faults,
  onChange,
}: {
  readonly unit: LengthUnit;
  /** The screws in stock; null until they have come. */
  readonly screws: readonly WrittenScrew[] | null;
  readonly screw: WrittenScrew;
  readonly faults: Faults;
  readonly onChange: (screw: WrittenScrew) => void;
}) {
  const stocked = (screws ?? [screw]).findIndex((one) => isSameScrew(one, screw));
  const isBlank = isSameScrew(screw, blankScrew);
  const [describing, setDescribing] = useState(false);
  const isOwn = stocked === -1 && (describing || !isBlank);
  return (
    <fieldset className="min-w-0 space-y-4">
      <Select
        label="Wood screw"
        disabled={screws === null}
        error={isOwn ? undefined : isBlank ? blankFault(faults) : faultWithin(faults, "hardware.screw")}
        value={isOwn ? own : stocked === -1 ? "" : String(stocked)}
        onChange={(event) => {
          const chosen = screws?.[Number(event.target.value)];
          setDescribing(event.target.value === own);
          if (event.target.value === "") onChange(blankScrew);
          else if (event.target.value !== own && chosen) onChange(chosen);
          else if (stocked !== -1) onChange({ ...screw, name: `${screw.name}, own` });
        }}
      >
        <option value="">Choose a screw</option>
        {(screws ?? [screw]).map(({ name }, index) => (
          <option key={name} value={String(index)}>
            {name}
          </option>
        ))}
        <option value={own}>Another one, described here</option>
      </Select>
      {isOwn && (
        <div className="border-l-2 border-rule pl-4">
          <ScrewFields unit={unit} screw={screw} faults={faults} within="hardware.screw" onChange={onChange} />
        </div>
      )}
    </fieldset>
  );
}

const blankFault = (faults: Faults): string | undefined =>
  faultWithin(faults, "hardware.screw") ? "Choose the screw that holds it." : undefined;

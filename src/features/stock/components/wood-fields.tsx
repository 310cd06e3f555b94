import { boardOfSpecies, type Sawn, speciesOfBoard, woodSpecies } from "#shared/materials/wood-species.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Field } from "@/components/ui/field.tsx";
import { NumberField } from "@/components/ui/number-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { capitalised } from "@/lib/format.ts";
import { type Faults, faultWithin } from "../model/faults.ts";
import type { WrittenOf } from "../model/written.ts";
import { ColourField } from "./colour-field.tsx";
import { ThicknessChips } from "./thickness-chips.tsx";

type Entry = WrittenOf<"wood">;
type Wood = Entry["wood"];

export function WoodFields({
  unit,
  entry,
  faults,
  onChange,
}: {
  readonly unit: LengthUnit;
  readonly entry: Entry;
  readonly faults: Faults;
  readonly onChange: (entry: Entry) => void;
}) {
  const { wood, thicknessesMm } = entry;
  const change = (part: Partial<Wood>) => onChange({ ...entry, wood: { ...wood, ...part } });
  const listed = listedBoard(wood);
  function handleSpecies(species: string, sawn: Sawn) {
    const board = boardOfSpecies(species, sawn);
    if (board) change({ ...board, ...(wood.name.trim() === "" ? { name: capitalised(species) } : {}) });
  }
  return (
    <>
      <div className="grid gap-4 sm:grid-cols-[minmax(0,1fr)_12rem]">
        <Select
          label="Species"
          hint="Fills in gravity, movement and hardness from the Wood Handbook, and a usual colour."
          value={listed?.species ?? ""}
          onChange={(event) => handleSpecies(event.target.value, listed?.sawn ?? "flatsawn")}
        >
          <option value="">Not in the table: fill it in below</option>
          {(["softwood", "hardwood"] as const).map((hardness) => (
            <optgroup key={hardness} label={hardness === "softwood" ? "Softwoods" : "Hardwoods"}>
              {woodSpecies
                .filter((one) => one.hardness === hardness)
                .map(({ species }) => (
                  <option key={species} value={species}>
                    {capitalised(species)}
                  </option>
                ))}
            </optgroup>
          ))}
        </Select>
        <Select
          label="Sawn"
          hint={listed ? "Which way its width moves." : "Choose a species first."}
          disabled={!listed}
          value={listed?.sawn ?? "flatsawn"}
          onChange={(event) => listed && handleSpecies(listed.species, event.target.value as Sawn)}
        >
          <option value="flatsawn">Flatsawn</option>
          <option value="quartersawn">Quartersawn</option>
        </Select>
      </div>
      <div className="grid gap-4 sm:grid-cols-2">
        <Field
          label="Name"
          autoComplete="off"
          value={wood.name}
          onChange={(event) => change({ name: event.target.value })}
          error={faults.get("wood.name")}
        />
        <ColourField
          label="Colour, planed and raw"
          value={wood.colour}
          onChange={(colour) => change({ colour })}
          error={faults.get("wood.colour")}
        />
        <NumberField
          label="Specific gravity"
          hint="At 12 % moisture, on oven-dry mass."
          value={wood.gravity}
          onChange={(gravity) => change({ gravity })}
          error={faults.get("wood.gravity")}
        />
        <NumberField
          label="Movement across the grain"
          suffix="%"
          hint="For each point of moisture it gains or loses."
          value={percentOf(wood.movementPerPoint)}
          onChange={(percent) => change({ movementPerPoint: shareOf(percent) })}
          error={faults.get("wood.movementPerPoint")}
        />
        <NumberField
          label="Moisture as it lies here"
          suffix="%"
          hint="8 % is usual in heated rooms."
          value={wood.moisturePercent}
          onChange={(moisturePercent) => change({ moisturePercent })}
          error={faults.get("wood.moisturePercent")}
        />
        <Select
          label="Hardness"
          hint="For the pilot holes."
          value={wood.hardness}
          onChange={(event) => change({ hardness: event.target.value as Wood["hardness"] })}
        >
          <option value="softwood">Softwood</option>
          <option value="hardwood">Hardwood</option>
        </Select>
      </div>
      <ThicknessChips
        unit={unit}
        values={thicknessesMm}
        onChange={(values) => onChange({ ...entry, thicknessesMm: values })}
        error={faultWithin(faults, "thicknessesMm")}
      />
    </>
  );
}

function listedBoard({ gravity, movementPerPoint }: Wood) {
  return gravity === null || movementPerPoint === null ? null : speciesOfBoard({ gravity, movementPerPoint });
}

/** Free of the last digits that binary adds. */
const tidy = (value: number): number => Number(value.toPrecision(10));
const percentOf = (share: number | null): number | null => (share === null ? null : tidy(share * 100));
const shareOf = (percent: number | null): number | null => (percent === null ? null : tidy(percent / 100));

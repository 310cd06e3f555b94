import type { LengthUnit } from "#shared/units/length.ts";
import { Checkbox } from "@/components/ui/checkbox.tsx";
import { Field } from "@/components/ui/field.tsx";
import { NumberField } from "@/components/ui/number-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { type Faults, faultWithin } from "../model/faults.ts";
import type { WrittenOf } from "../model/written.ts";
import { ColourField } from "./colour-field.tsx";
import { SheetRows } from "./sheet-rows.tsx";
import { ThicknessChips } from "./thickness-chips.tsx";

type Entry = WrittenOf<"acrylic">;

export function AcrylicFields({
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
  const { acrylic, thicknessesMm, sheets } = entry;
  const change = (part: Partial<Entry["acrylic"]>) => onChange({ ...entry, acrylic: { ...acrylic, ...part } });
  return (
    <>
      <div className="grid gap-4 sm:grid-cols-2">
        <Field
          label="Name"
          hint="As the shop says it: a colour, a number on the rack."
          autoComplete="off"
          value={acrylic.name}
          onChange={(event) => change({ name: event.target.value })}
          error={faults.get("acrylic.name")}
        />
        <ColourField
          label="Colour"
          hint="Measure a piece in daylight; a screen is near it at best."
          value={acrylic.colour}
          onChange={(colour) => change({ colour })}
          error={faults.get("acrylic.colour")}
        />
        <Select
          label="Look"
          value={acrylic.look}
          onChange={(event) => change({ look: event.target.value as Entry["acrylic"]["look"] })}
        >
          <option value="opaque">Opaque</option>
          <option value="frosted">Frosted</option>
          <option value="clear">Clear</option>
          <option value="mirror">Mirror</option>
        </Select>
        <Select
          label="Made by"
          hint="Thickness of cast sheet varies more; the stack's heights show by how much."
          value={acrylic.process}
          onChange={(event) => change({ process: event.target.value as Entry["acrylic"]["process"] })}
        >
          <option value="cast">Casting</option>
          <option value="extruded">Extrusion</option>
        </Select>
        <NumberField
          label="Density"
          suffix="kg/m³"
          hint="1190 for acrylic of any colour."
          value={acrylic.densityKgM3}
          onChange={(densityKgM3) => change({ densityKgM3 })}
          error={faults.get("acrylic.densityKgM3")}
        />
      </div>
      <Checkbox
        label="Its two faces differ"
        hint="Matt on one side, or painted or mirrored at the back: pieces must then be cut from the right face."
        checked={acrylic.facesDiffer}
        onChange={(event) => change({ facesDiffer: event.target.checked })}
      />
      <ThicknessChips
        unit={unit}
        values={thicknessesMm}
        onChange={(values) => onChange({ ...entry, thicknessesMm: values })}
        error={faultWithin(faults, "thicknessesMm")}
      />
      <SheetRows
        unit={unit}
        thicknessesMm={thicknessesMm}
        sheets={sheets}
        faults={faults}
        onChange={(changed) => onChange({ ...entry, sheets: changed })}
      />
    </>
  );
}

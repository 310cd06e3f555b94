import type { LengthUnit } from "#shared/units/length.ts";
import { Field } from "@/components/ui/field.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import type { Faults } from "../model/faults.ts";
import { changeScrew, screwNumbers } from "../model/screw-entry.ts";
import type { WrittenScrew } from "../model/written.ts";

/** A wood screw. `within` is the path that its faults stand under. */
export function ScrewFields({
  unit,
  screw,
  faults,
  within,
  onChange,
}: {
  readonly unit: LengthUnit;
  readonly screw: WrittenScrew;
  readonly faults: Faults;
  readonly within: string;
  readonly onChange: (screw: WrittenScrew) => void;
}) {
  const fault = (field: keyof WrittenScrew) => faults.get(`${within}.${field}`);
  const change = (part: Parameters<typeof changeScrew>[1]) => onChange(changeScrew(screw, part, unit));
  const numbers = screw.gauge === null || screwNumbers.some((number) => number === screw.gauge) ? [] : [screw.gauge];
  const length = (field: "diameter" | "length" | "headDiameter" | "headHeight", label: string, hint?: string) => (
    <LengthField
      label={label}
      {...(hint ? { hint } : {})}
      unit={unit}
      fine={field !== "length"}
      value={screw[field]}
      onChange={(mm) => change({ [field]: mm })}
      error={fault(field)}
    />
  );
  return (
    <div className="grid gap-4 sm:grid-cols-2">
      <Select
        label="Number"
        hint="Fills in the shank, and a flat head as ASME B18.6.1 has it."
        value={screw.gauge === null ? "" : String(screw.gauge)}
        error={fault("gauge")}
        onChange={(event) => change({ gauge: event.target.value === "" ? null : Number(event.target.value) })}
      >
        <option value="">Not made by number</option>
        {[...screwNumbers, ...numbers].map((number) => (
          <option key={number} value={String(number)}>
            No. {number}
          </option>
        ))}
      </Select>
      <Select
        label="Head"
        value={screw.head}
        onChange={(event) => change({ head: event.target.value as WrittenScrew["head"] })}
      >
        <option value="flat">Flat</option>
        <option value="pan">Pan</option>
        <option value="round">Round</option>
      </Select>
      {length("length", "Length", screw.head === "flat" ? "Over all, head included." : "From under the head.")}
      {length("diameter", "Shank, across")}
      {length("headDiameter", "Head, across", screw.head === "flat" ? undefined : "Measure one from the box.")}
      {length("headHeight", "Head, high", screw.head === "flat" ? undefined : "Measure one from the box.")}
      <Field
        label="Name"
        className="sm:col-span-2"
        autoComplete="off"
        value={screw.name}
        onChange={(event) => change({ name: event.target.value })}
        error={fault("name")}
      />
    </div>
  );
}

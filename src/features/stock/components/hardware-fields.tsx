import { useState } from "react";
import type { Hardware } from "#shared/mockup/document.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Checkbox } from "@/components/ui/checkbox.tsx";
import { Field } from "@/components/ui/field.tsx";
import { NumberField } from "@/components/ui/number-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { asKind } from "../model/blank-entry.ts";
import type { Faults } from "../model/faults.ts";
import type { WrittenHardware, WrittenOf, WrittenScrew } from "../model/written.ts";
import { ColourField } from "./colour-field.tsx";
import { MeasureFields } from "./measure-fields.tsx";
import { ScrewChoice } from "./screw-choice.tsx";
import { StandoffDrawing } from "./standoff-drawing.tsx";

type Entry = WrittenOf<"hardware">;

const kinds: readonly { readonly kind: Hardware["kind"]; readonly label: string; readonly hint: string }[] = [
  {
    kind: "capStud",
    label: "Barrel with a cap",
    hint: "The barrel is screwed down; the cap's stud passes the panel into it.",
  },
  { kind: "throughScrew", label: "Loose spacer", hint: "One wood screw passes the panel and the spacer." },
  { kind: "blindStud", label: "Hidden stud", hint: "A stud in the panel's back goes into the wood; nothing is seen." },
  { kind: "edgeGrip", label: "Edge grip", hint: "A holder is screwed down and takes the panel's edge in its slot." },
];

export function HardwareFields({
  unit,
  entry,
  screws,
  faults,
  onChange,
}: {
  readonly unit: LengthUnit;
  readonly entry: Entry;
  /** The screws in stock, to choose from; null until they have come. */
  readonly screws: readonly WrittenScrew[] | null;
  readonly faults: Faults;
  readonly onChange: (entry: Entry) => void;
}) {
  const [active, setActive] = useState<string | null>(null);
  const { hardware } = entry;
  const set = (changed: WrittenHardware) => onChange({ ...entry, hardware: changed });
  return (
    <>
      <Select
        label="Kind of standoff"
        hint={kinds.find(({ kind }) => kind === hardware.kind)?.hint}
        value={hardware.kind}
        onChange={(event) => set(asKind(hardware, event.target.value as Hardware["kind"]))}
      >
        {kinds.map(({ kind, label }) => (
          <option key={kind} value={kind}>
            {label}
          </option>
        ))}
      </Select>
      <div className="grid gap-x-6 gap-y-4 md:grid-cols-[22rem_minmax(0,1fr)]">
        <div>
          <div className="md:sticky md:top-0">
            <StandoffDrawing hardware={hardware} unit={unit} active={active} />
          </div>
        </div>
        <div className="space-y-4">
          <KindParts hardware={hardware} faults={faults} onChange={set} />
          <MeasureFields unit={unit} hardware={hardware} faults={faults} onActive={setActive} onChange={set} />
          {hardware.kind !== "blindStud" && (
            <ScrewChoice
              unit={unit}
              screws={screws}
              screw={hardware.screw}
              faults={faults}
              onChange={(screw) => set({ ...hardware, screw })}
            />
          )}
        </div>
      </div>
      <div className="grid gap-4 sm:grid-cols-3">
        <Field
          label="Name"
          hint="As the shop says it."
          autoComplete="off"
          value={hardware.name}
          onChange={(event) => set({ ...hardware, name: event.target.value })}
          error={faults.get("hardware.name")}
        />
        <ColourField
          label="Finish"
          hint="The metal's colour, as caps are drawn."
          value={hardware.finish}
          onChange={(finish) => set({ ...hardware, finish })}
          error={faults.get("hardware.finish")}
        />
        <NumberField
          label="On hand"
          hint="Leave it empty while nobody has counted."
          value={entry.quantity}
          onChange={(quantity) => onChange({ ...entry, quantity })}
          error={faults.get("quantity")}
        />
      </div>
    </>
  );
}

/** What a kind has or has not, before its measures. */
function KindParts({
  hardware,
  faults,
  onChange,
}: {
  readonly hardware: WrittenHardware;
  readonly faults: Faults;
  readonly onChange: (hardware: WrittenHardware) => void;
}) {
  switch (hardware.kind) {
    case "capStud":
    case "edgeGrip":
      return (
        <Checkbox
          label="The floor is countersunk"
          hint={faults.get("hardware.countersunk") ?? "A flat head then lies flush in it."}
          aria-invalid={faults.has("hardware.countersunk") || undefined}
          checked={hardware.countersunk}
          onChange={(event) => onChange({ ...hardware, countersunk: event.target.checked })}
        />
      );
    case "throughScrew":
      return (
        <Checkbox
          label="A cap covers the screw's head"
          checked={hardware.cap !== null}
          onChange={(event) =>
            onChange({ ...hardware, cap: event.target.checked ? { diameter: null, thickness: null } : null })
          }
        />
      );
    case "blindStud":
      return (
        <Checkbox
          label="A spacer sits on the stud"
          hint="Without one the glue holds the panel off the wood."
          checked={hardware.barrelLength !== 0}
          onChange={(event) =>
            onChange({ ...hardware, barrelLength: event.target.checked ? null : 0, barrelDiameter: null })
          }
        />
      );
  }
}

import type { LengthUnit } from "#shared/units/length.ts";
import { LengthField } from "@/components/ui/length-field.tsx";
import type { Faults } from "../model/faults.ts";
import { measureIn, measuresOf, withMeasure } from "../model/measures.ts";
import type { WrittenHardware } from "../model/written.ts";

/** The measures of a standoff, numbered as on its drawing. The one being written is made known, so that it stands out there. */
export function MeasureFields({
  unit,
  hardware,
  faults,
  onActive,
  onChange,
}: {
  readonly unit: LengthUnit;
  readonly hardware: WrittenHardware;
  readonly faults: Faults;
  readonly onActive: (field: string | null) => void;
  readonly onChange: (hardware: WrittenHardware) => void;
}) {
  return (
    <fieldset className="min-w-0">
      <legend className="sr-only">Measures, by their numbers on the drawing</legend>
      <div className="grid grid-cols-2 gap-x-3 gap-y-4 sm:gap-x-4">
        {measuresOf(hardware).map(({ field, label, hint, number }) => (
          <LengthField
            key={field}
            label={`${number}  ${label}`}
            {...(hint ? { hint } : {})}
            unit={unit}
            fine
            value={measureIn(hardware, field)}
            onChange={(mm) => onChange(withMeasure(hardware, field, mm))}
            onFocus={() => onActive(field)}
            onBlur={() => onActive(null)}
            error={faults.get(`hardware.${field}`)}
          />
        ))}
      </div>
    </fieldset>
  );
}

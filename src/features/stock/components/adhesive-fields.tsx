import { familyFacts } from "#shared/bonds/adhesive-families.ts";
import { adhesiveSchema } from "#shared/mockup/stock-schemas.ts";
import { Field } from "@/components/ui/field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { capitalised } from "@/lib/format.ts";
import type { Faults } from "../model/faults.ts";
import type { WrittenOf } from "../model/written.ts";

type Entry = WrittenOf<"adhesive">;

export function AdhesiveFields({
  entry,
  faults,
  onChange,
}: {
  readonly entry: Entry;
  readonly faults: Faults;
  readonly onChange: (entry: Entry) => void;
}) {
  const { adhesive } = entry;
  const change = (part: Partial<Entry["adhesive"]>) => onChange({ ...entry, adhesive: { ...adhesive, ...part } });
  const { handlingHours, fullHours, gives, cautions } = familyFacts(adhesive.family);
  return (
    <>
      <div className="grid gap-4 sm:grid-cols-2">
        <Field
          label="Name"
          hint="As the shop says it."
          autoComplete="off"
          value={adhesive.name}
          onChange={(event) => change({ name: event.target.value })}
          error={faults.get("adhesive.name")}
        />
        <Select
          label="Family"
          hint="What the bottle holds; its maker's sheet says so."
          value={adhesive.family}
          onChange={(event) => change({ family: event.target.value as Entry["adhesive"]["family"] })}
        >
          {adhesiveSchema.shape.family.options.map((family) => (
            <option key={family} value={family}>
              {capitalised(family)}
            </option>
          ))}
        </Select>
      </div>
      <section aria-label={`About ${adhesive.family}`} className="border-l-4 border-ochre bg-paper px-4 py-3">
        <p className="text-base text-ink">
          <span className="font-semibold text-ochre">{capitalised(adhesive.family)}</span>, {gives}.{" "}
          {handlingHours === 0 ? "Can be handled at once" : `Can be handled after ${hours(handlingHours)}`}, has its
          strength after {hours(fullHours)}.
        </p>
        <ul className="mt-2 list-disc space-y-1 pl-5 text-sm text-ink">
          {cautions.map((caution) => (
            <li key={caution}>{caution}</li>
          ))}
        </ul>
        <p className="mt-2 text-fine text-graphite">Common practice. The maker's own sheet goes before it.</p>
      </section>
    </>
  );
}

function hours(count: number): string {
  if (count < 1) return `${Math.round(count * 60)} minutes`;
  if (count >= 48) return `${count / 24} days`;
  return count === 1 ? "1 hour" : `${count} hours`;
}

import type { SawSet } from "#shared/contracts/saws.ts";
import { sawFields } from "#shared/cut-plan/saw-fields.ts";
import { formatLimit } from "#shared/dry-fit/limit-units.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { SawsForm } from "./saws-form.tsx";

type SawsPartProps = { readonly shop: string; readonly unit: LengthUnit; readonly set: SawSet };

/** What every plan of the shop keeps to: a form for owners and makers, figures to read for a rep. */
export function SawsPart({ shop, unit, set }: SawsPartProps) {
  return (
    <section aria-labelledby="how-we-cut" className="mt-14 border-t border-ink pt-5 print:hidden">
      <h2 id="how-we-cut" tabIndex={-1} className="scroll-mt-4 font-serif text-xl font-bold text-ink">
        How we cut
      </h2>
      <p className="mt-1 mb-5 max-w-prose text-base text-graphite">
        The shop’s own figures; every plan keeps to them. The kerf of the machine that cuts sheets and the size of its
        bed stand among the limits of the dry fit.
      </p>
      {set.can.change ? (
        <SawsForm shop={shop} unit={unit} set={set} />
      ) : (
        <>
          <p className="text-base text-ink">You may look at the figures. Owners and makers set them.</p>
          <dl className="mt-3 grid gap-x-12 md:grid-cols-2">
            {sawFields.map(({ key, label, unit: figure }) => (
              <div key={key} className="flex flex-wrap justify-between gap-x-6 border-b border-rule py-2">
                <dt className="text-base text-graphite">{label}</dt>
                <dd className="font-serif text-base tabular-nums text-ink">
                  {formatLimit(set.saws[key], figure, unit)}
                </dd>
              </div>
            ))}
          </dl>
        </>
      )}
    </section>
  );
}

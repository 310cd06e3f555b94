import type { SheetView } from "#shared/contracts/revisions.ts";
import { formatLengthWithUnit } from "#shared/units/format-length.ts";
import { formatMass } from "#shared/units/mass.ts";

/** The words the sign reads, how far it stands off the wall and what it weighs; for the shop how it hangs, too. */
export function SheetFigures({ sheet }: { readonly sheet: Pick<SheetView, "figures" | "words" | "job" | "making"> }) {
  const { figures, words, job, making } = sheet;
  return (
    <div className="text-sm text-graphite lg:flex lg:flex-wrap lg:gap-x-4">
      {words !== "" && (
        <p>
          It reads <q className="font-serif font-bold whitespace-pre-line text-ink">{words}</q>
        </p>
      )}
      <p>
        Stands {formatLengthWithUnit(figures.offWallMm, job.unit)} off the wall, weighs about{" "}
        {formatMass(figures.massG, job.unit)} without hardware. Masses are estimates for planning.
      </p>
      {making !== null && <p>For the shop: {making}</p>}
    </div>
  );
}

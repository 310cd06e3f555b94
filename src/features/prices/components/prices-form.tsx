import { useState } from "react";
import { Button } from "@/components/ui/button.tsx";
import { NewerNotice } from "@/components/ui/newer-notice.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { UnsavedGuard } from "@/components/ui/unsaved-guard.tsx";
import { counted } from "@/lib/format.ts";
import { foundRows, type PriceSearch } from "../model/find-rows.ts";
import { priceGroups } from "../model/price-fields.ts";
import { AddFinish } from "./add-finish.tsx";
import { AddStrip } from "./add-strip.tsx";
import { PriceFinder } from "./price-finder.tsx";
import { PriceGroupSection } from "./price-group-section.tsx";
import { PriceIndex } from "./price-index.tsx";
import { PriceTerms } from "./price-terms.tsx";
import { type PricesFormInput, usePricesForm } from "./use-prices-form.ts";

/** The price book to be written, all saved at once. */
export function PricesForm(props: PricesFormInput) {
  const { unit, stock } = props;
  const prices = usePricesForm(props);
  const [search, setSearch] = useState<PriceSearch>({ text: "", unpricedOnly: false });
  const { draft, base, faults, changes, busy, newer } = prices;
  return (
    <form
      noValidate
      onSubmit={prices.handleSubmit}
      aria-label="Prices"
      className="max-w-5xl [&_:is(a,button,input,select)]:scroll-mb-32"
    >
      <UnsavedGuard when={changes > 0 && !busy} what="The price book" />
      <PriceTerms terms={draft} faults={faults} onWrite={prices.onWriteTerm} />
      <PriceFinder search={search} onSearch={setSearch} />
      <PriceIndex />
      {priceGroups.map((group) => (
        <PriceGroupSection
          key={group}
          group={group}
          rows={draft.rows[group]}
          shown={foundRows(group, draft.rows[group], { base: base.rows[group], faults, search, unit })}
          base={base.rows[group]}
          currency={draft.currency}
          unit={unit}
          faults={faults}
          onWrite={prices.onWrite}
          onRemove={prices.onRemove}
        >
          {group === "strips" && (
            <AddStrip stock={stock} unit={unit} onAdd={(thing) => prices.onAdd("strips", thing)} />
          )}
          {group === "finishes" && <AddFinish onAdd={(thing) => prices.onAdd("finishes", thing)} />}
        </PriceGroupSection>
      ))}
      <div className="sticky bottom-0 z-10 -mx-4 mt-10 space-y-3 border-t border-ink bg-paper px-4 py-3 sm:-mx-6 sm:px-6">
        {newer && <NewerNotice what="prices" newer={newer} onTake={prices.takeTheirs} onKeep={prices.keepMine} />}
        {prices.problem && <Notice tone="error">{prices.problem}</Notice>}
        <div className="flex flex-wrap items-center gap-x-5 gap-y-2">
          <Button type="submit" kind="primary" busy={busy} disabled={changes === 0 && !busy}>
            Save the prices
          </Button>
          <p role="status" className="text-sm text-graphite">
            {prices.saved
              ? "Saved. Mockups reckon with them from now on."
              : [
                  changes > 0 && `${counted(changes, "change")} not saved yet.`,
                  faults.size > 0 && `${counted(faults.size, "figure")} to mend first.`,
                ]
                  .filter(Boolean)
                  .join(" ")}
          </p>
        </div>
      </div>
    </form>
  );
}

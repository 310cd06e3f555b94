import { Checkbox } from "@/components/ui/checkbox.tsx";
import { Field } from "@/components/ui/field.tsx";
import type { PriceSearch } from "../model/find-rows.ts";

/** Narrows a long price book to what is being written. */
export function PriceFinder({
  search,
  onSearch,
}: {
  readonly search: PriceSearch;
  readonly onSearch: (search: PriceSearch) => void;
}) {
  return (
    <div className="mb-4 flex max-w-3xl flex-wrap items-end gap-x-6 gap-y-2">
      <Field
        label="Find by name"
        type="search"
        className="min-w-56 flex-1"
        value={search.text}
        onChange={(event) => onSearch({ ...search, text: event.target.value })}
        // Enter would save the prices.
        onKeyDown={(event) => event.key === "Enter" && event.preventDefault()}
      />
      <Checkbox
        label="Only what has no price"
        checked={search.unpricedOnly}
        onChange={(event) => onSearch({ ...search, unpricedOnly: event.target.checked })}
      />
    </div>
  );
}

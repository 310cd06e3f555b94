import { currencyCodes } from "#shared/cost/currency.ts";
import { Field } from "@/components/ui/field.tsx";
import { Select } from "@/components/ui/select.tsx";
import type { PriceDraft, PriceFaults } from "../model/price-draft.ts";

type Terms = Pick<PriceDraft, "currency" | "markup" | "taxName" | "taxShare">;

type PriceTermsProps = {
  readonly terms: Terms;
  readonly faults: PriceFaults;
  readonly onWrite: (key: keyof Terms, text: string) => void;
};

/** Currency, markup and tax: what counts for the whole book. */
export function PriceTerms({ terms, faults, onWrite }: PriceTermsProps) {
  const written = (key: keyof Terms) => ({
    value: terms[key],
    error: faults.get(key),
    onChange: (event: { target: { value: string } }) => onWrite(key, event.target.value),
  });
  return (
    <fieldset className="mb-8 grid max-w-3xl grid-cols-2 gap-4 md:grid-cols-4">
      <legend className="sr-only">Currency, markup and tax</legend>
      <Select label="Currency" {...written("currency")}>
        {currencyCodes.map((code) => (
          <option key={code}>{code}</option>
        ))}
      </Select>
      <Field label="Markup on the cost" suffix="%" inputMode="decimal" autoComplete="off" {...written("markup")} />
      <Field label="Tax is called" autoComplete="off" {...written("taxName")} />
      <Field
        label="Tax on cost and markup"
        suffix="%"
        inputMode="decimal"
        autoComplete="off"
        {...written("taxShare")}
      />
    </fieldset>
  );
}

import { formatMoney } from "#shared/cost/money.ts";
import type { PriceBook } from "#shared/cost/price-book.ts";
import type { ThingsToPrice } from "#shared/cost/things-to-price.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table.tsx";
import { groupWords } from "../model/group-words.ts";
import { draftOf, isPriced, type PriceRow } from "../model/price-draft.ts";
import { fieldsOf, isAsked, type PriceField, priceGroups, readField } from "../model/price-fields.ts";
import { groupAnchor, PriceIndex } from "./price-index.tsx";

type PricesToReadProps = { readonly book: PriceBook; readonly things: ThingsToPrice; readonly unit: LengthUnit };

/** The price book for those who work by it and do not set it: what has a price. */
export function PricesToRead({ book, things, unit }: PricesToReadProps) {
  const draft = draftOf(book, things, { unit });
  return (
    <>
      <p className="mb-6 text-base text-ink">
        Markup {draft.markup} %, {draft.taxName} {draft.taxShare} %.
      </p>
      <PriceIndex />
      {priceGroups.map((group) => {
        const rows = draft.rows[group].filter((row) => isPriced(group, row, unit));
        const fields = fieldsOf(group, unit);
        const { title } = groupWords[group];
        return (
          <section key={group} aria-labelledby={groupAnchor(group)} className="mt-10">
            <h2 id={groupAnchor(group)} tabIndex={-1} className="scroll-mt-4 font-serif text-lg font-bold text-ink">
              {title}
            </h2>
            {rows.length === 0 ? (
              <p className="mt-1 text-base text-graphite">Nothing here has a price yet.</p>
            ) : (
              <Table caption={title} className="mt-2">
                <thead>
                  <tr>
                    <HeadCell>What</HeadCell>
                    {fields.map(({ key, label }) => (
                      <HeadCell key={key} className="text-right">
                        {label}
                      </HeadCell>
                    ))}
                  </tr>
                </thead>
                <tbody>
                  {rows.map((row) => (
                    <tr key={row.id}>
                      <RowHead>{row.name}</RowHead>
                      {fields.map((field) => (
                        <Cell key={field.key} className="text-right whitespace-nowrap">
                          {isAsked(group, row.id, field) ? shown(field, row, { currency: book.currency, unit }) : "–"}
                        </Cell>
                      ))}
                    </tr>
                  ))}
                </tbody>
              </Table>
            )}
          </section>
        );
      })}
    </>
  );
}

function shown(field: PriceField, row: PriceRow, writing: { currency: string; unit: LengthUnit }): string {
  const text = row.fields[field.key] ?? "";
  if (field.kind !== "money") return field.suffix ? `${text} ${field.suffix}` : text;
  const read = readField(field, text, writing);
  return read.ok && typeof read.value === "number" ? formatMoney(read.value, writing.currency) : "–";
}

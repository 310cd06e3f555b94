import type { CostEstimate, CostTotals } from "#shared/cost/estimate-cost.ts";
import { formatMoney } from "#shared/cost/money.ts";
import type { PriceBook } from "#shared/cost/price-book.ts";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table.tsx";
import { percentOf, quantityWords, rateWords } from "../model/cost-words.ts";

/** The estimate line by line for all signs, then markup, tax and total, of all and of one. */
export function CostLines({
  estimate: { currency, signs, lines, whole, perSign },
  book,
}: {
  readonly estimate: CostEstimate;
  readonly book: PriceBook;
}) {
  const many = signs > 1;
  const money = (amount: number) => formatMoney(amount, currency);
  const sums: readonly (readonly [string, keyof CostTotals])[] = [
    ["Cost", "subtotal"],
    [`Markup, ${percentOf(book.markup)}`, "markup"],
    [`${book.tax.name}, ${percentOf(book.tax.share)}`, "tax"],
    ["To ask", "total"],
  ];
  return (
    <>
      <Table caption={many ? `What ${signs} signs cost` : "What the sign costs"} className="mt-1">
        <thead>
          <tr>
            <HeadCell>What</HeadCell>
            <HeadCell className="text-right">{many ? `For ${signs} signs` : "How much"}</HeadCell>
            <HeadCell className="text-right">Rate</HeadCell>
            <HeadCell className="text-right">Amount</HeadCell>
            {many && <HeadCell className="text-right">A sign</HeadCell>}
          </tr>
        </thead>
        <tbody>
          {lines.map((line) => (
            <tr key={`${line.group} ${line.id} ${line.unit}`}>
              <RowHead className="min-w-40 py-1.5 font-normal">{line.what}</RowHead>
              <Cell className="py-1.5 text-right">{quantityWords(line)}</Cell>
              <Cell className="py-1.5 text-right whitespace-nowrap text-graphite">{rateWords(line, currency)}</Cell>
              <Cell className="py-1.5 text-right whitespace-nowrap">{money(line.amount)}</Cell>
              {many && <Cell className="py-1.5" />}
            </tr>
          ))}
        </tbody>
        <tfoot>
          {sums.map(([label, key]) => (
            <tr key={key}>
              <RowHead className="py-1.5" colSpan={3}>
                {label}
              </RowHead>
              <Cell className="py-1.5 text-right font-semibold whitespace-nowrap">{money(whole[key])}</Cell>
              {many && <Cell className="py-1.5 text-right font-semibold whitespace-nowrap">{money(perSign[key])}</Cell>}
            </tr>
          ))}
        </tfoot>
      </Table>
      <p className="pt-2 text-fine text-graphite">
        An estimate from the shop’s own prices and paces. Clients, guests and sales reps see nothing of it.
      </p>
    </>
  );
}

import type { CostEstimate, CostTotals } from "#shared/cost/estimate-cost.ts";
import { formatMoney } from "#shared/cost/money.ts";
import type { PriceBook } from "#shared/cost/price-book.ts";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table.tsx";
import { cx } from "@/lib/cx.ts";
import { percentOf, quantityWords, rateWords } from "../model/cost-words.ts";

/** In the hand these columns stand in small print under the line itself. */
const whereWide = "hidden sm:table-cell";

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
            <HeadCell className={cx(whereWide, "text-right")}>{many ? `For ${signs} signs` : "How much"}</HeadCell>
            <HeadCell className={cx(whereWide, "text-right")}>Rate</HeadCell>
            <HeadCell className="text-right">Amount</HeadCell>
            {many && <HeadCell className="text-right">A sign</HeadCell>}
          </tr>
        </thead>
        <tbody>
          {lines.map((line) => (
            <tr key={`${line.group} ${line.id} ${line.unit}`}>
              <th scope="row" className="border-b border-rule px-3 py-2.5 align-top font-normal text-ink">
                {line.what}
                <span className="block text-fine text-graphite sm:hidden">
                  {quantityWords(line)} at {rateWords(line, currency)}
                </span>
              </th>
              <Cell className={cx(whereWide, "text-right")}>{quantityWords(line)}</Cell>
              <Cell className={cx(whereWide, "text-right whitespace-nowrap")}>{rateWords(line, currency)}</Cell>
              <Cell className="text-right whitespace-nowrap">{money(line.amount)}</Cell>
              {many && <Cell />}
            </tr>
          ))}
        </tbody>
        <tfoot>
          {sums.map(([label, key]) => (
            <tr key={key}>
              <RowHead>{label}</RowHead>
              <Cell className={whereWide} colSpan={2} />
              <Cell className="text-right font-semibold whitespace-nowrap">{money(whole[key])}</Cell>
              {many && <Cell className="text-right font-semibold whitespace-nowrap">{money(perSign[key])}</Cell>}
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

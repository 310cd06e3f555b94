import { useQuery } from "@tanstack/react-query";
import { useMemo } from "react";
import type { StockItem } from "#shared/contracts/stock.ts";
import { stockOfItems } from "#shared/contracts/stock-on-hand.ts";
import { costOfSign } from "#shared/cost/cost-of-sign.ts";
import type { SignMeasures } from "#shared/cost/measure-sign.ts";
import type { Unpriced } from "#shared/cost/priced-sign.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { TextLink } from "@/components/ui/text-link.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { pricesQuery } from "@/lib/prices-query.ts";
import { sawsQuery } from "@/lib/saws-query.ts";
import { costSummary } from "../model/cost-words.ts";
import { CostLines } from "./cost-lines.tsx";
import { CostUnpriced } from "./cost-unpriced.tsx";
import { Fold } from "./fold.tsx";

export type CostPanelProps = {
  readonly shop: string;
  readonly unit: LengthUnit;
  /** Of what is drawn; null until it was measured. */
  readonly measures: SignMeasures | null;
  readonly signs: number;
  readonly stock: readonly StockItem[];
  /** The page of the prices, with what is to be given one. */
  readonly pricesPath: (wanted: readonly Unpriced[]) => string;
};

/** What the sign costs the shop, folded under its schedule. Only for those who may see prices. */
export function CostPanel({ shop, unit, measures, signs, stock, pricesPath }: CostPanelProps) {
  const prices = useQuery(pricesQuery(shop));
  const saws = useQuery(sawsQuery(shop));
  const onHand = useMemo(() => stockOfItems(stock), [stock]);
  const book = prices.data?.book ?? null;
  const cost = useMemo(
    () =>
      book && saws.data && measures
        ? costOfSign({ measures, signs, book, stock: onHand, saws: saws.data.saws, unit })
        : null,
    [book, saws.data, measures, signs, onHand, unit],
  );
  const mayChange = prices.data?.can.change === true;
  const failed = [prices, saws].find((query) => query.isError && query.data === undefined);
  return (
    <section aria-label="Cost" className="min-w-0 border-t border-rule px-4 py-2 sm:px-6">
      {failed ? (
        <p className="py-1.5 text-sm text-graphite">What it costs could not be worked out. {messageOf(failed.error)}</p>
      ) : prices.data && book === null ? (
        <p className="py-1.5 text-sm text-graphite">
          What it costs is not known yet: the shop has no prices.{" "}
          {mayChange ? <TextLink to={pricesPath([])}>Write the prices</TextLink> : "An owner writes them."}
        </p>
      ) : cost === null ? (
        <p className="py-1.5 text-sm text-graphite">Working out what it costs …</p>
      ) : !cost.outcome.ok ? (
        <p className="py-1.5 text-sm text-oxblood">
          What it costs can’t be reckoned: {cost.outcome.problems.map(({ words }) => words).join(" ")}{" "}
          <TextLink to={pricesPath([])}>Look at the prices</TextLink>
        </p>
      ) : (
        <Fold name="cost" summary={costSummary(cost.outcome.value, cost.unpriced)}>
          <CostUnpriced
            unpriced={cost.unpriced}
            pricesPath={pricesPath(mayChange ? cost.unpriced : [])}
            mayChange={mayChange}
          />
          {book && cost.outcome.value.lines.length > 0 && <CostLines estimate={cost.outcome.value} book={book} />}
        </Fold>
      )}
    </section>
  );
}

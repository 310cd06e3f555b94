import type { Quantity } from "#shared/calculations/calculation.ts";
import { SkeletonBar, useSlow } from "@/components/ui/skeleton.tsx";
import { cx } from "@/lib/cx.ts";
import type { ExampleOutcome } from "../engine/worked-examples.ts";
import { formatFigure } from "../model/format-figure.ts";

/** An example, or what stands in its place: the worker is at it, or never came so far. */
export type ShownOutcome = ExampleOutcome | "computing" | "not computed";

/** What went in and, under a line as under a sum, what came out. */
export function ExampleTable({ of, outcome }: { readonly of: string; readonly outcome: ShownOutcome }) {
  const slow = useSlow(outcome === "computing");
  if (outcome === "computing") {
    return (
      <div className="space-y-2.5 border-t border-graphite pt-2.5">
        {slow && ["given", "given more", "gives"].map((row) => <SkeletonBar key={row} className="h-5" />)}
      </div>
    );
  }
  if (outcome === "not computed") {
    return <p className="border-t border-graphite pt-2 text-sm text-graphite">Not computed.</p>;
  }
  if (!outcome.ok) {
    return (
      <p className="border-t border-graphite pt-2 text-sm text-oxblood">
        The example could not be computed: {outcome.reason} Everything else on this sheet stands.
      </p>
    );
  }
  const { given, gives } = outcome.example;
  return (
    <table className="w-full border-collapse border-t border-graphite text-left text-sm tabular-nums">
      <caption className="sr-only">Worked example: {of}</caption>
      <thead className="sr-only">
        <tr>
          <th scope="col">Quantity</th>
          <th scope="col">Figure</th>
          <th scope="col">Unit</th>
        </tr>
      </thead>
      <tbody>
        {given.map((quantity) => (
          <Row key={quantity.name} quantity={quantity} />
        ))}
      </tbody>
      <tbody>
        {gives.map((quantity) => (
          <Row key={quantity.name} quantity={quantity} isResult />
        ))}
      </tbody>
    </table>
  );
}

function Row({
  quantity: { name, value, unit },
  isResult = false,
}: {
  readonly quantity: Quantity;
  readonly isResult?: boolean;
}) {
  const ink = isResult ? "font-semibold text-ink" : "text-graphite";
  return (
    <tr className={cx("border-b border-rule align-baseline", !isResult && "last:border-ink")}>
      <th scope="row" className={cx("py-1 pr-3 font-sans", isResult ? ink : "font-normal text-graphite")}>
        {name}
      </th>
      <td className={cx("py-1 text-right font-serif", ink)}>{formatFigure(value)}</td>
      <td className={cx("w-14 py-1 pl-1.5", ink)}>{unit}</td>
    </tr>
  );
}

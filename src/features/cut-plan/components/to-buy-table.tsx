import type { ToBuy } from "#shared/cut-plan/to-buy.ts";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table.tsx";

/** What the build takes against what is on hand. */
export function ToBuyTable({ lines }: { readonly lines: readonly ToBuy[] }) {
  if (lines.length === 0) return <p className="mt-4 text-base text-graphite">Nothing is known yet of what to buy.</p>;
  return (
    <Table caption="What to buy" className="mt-4">
      <thead>
        <tr>
          {["What", "Needed", "On hand", "To buy"].map((head) => (
            <HeadCell key={head}>{head}</HeadCell>
          ))}
        </tr>
      </thead>
      <tbody>
        {lines.map(({ what, need, onHand, buy }) => (
          <tr key={what}>
            <RowHead>{what}</RowHead>
            <Cell>{need}</Cell>
            <Cell>{onHand ?? "not counted"}</Cell>
            <Cell className={buy === 0 ? "text-graphite" : "font-semibold"}>
              {buy === null ? `${need}, less what is there` : buy === 0 ? "nothing" : buy}
            </Cell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

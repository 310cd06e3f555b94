import type { ScheduleRow } from "#shared/drawing/schedule.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table.tsx";

type ScheduleProps = { readonly rows: readonly ScheduleRow[]; readonly unit: LengthUnit };

/** A length as the schedule letters it, with its unit where the lettering has none of its own. */
const withUnit = (length: string, unit: ScheduleProps["unit"]): string =>
  unit === "mm" && /\d$/.test(length) ? `${length} mm` : length;

/** What the sign is made of, a row a layer from the wall outward. */
export function ScheduleTable({ rows }: Pick<ScheduleProps, "rows">) {
  return (
    <Table caption="Schedule" className="[&_td]:py-1 [&_th]:py-1">
      <thead>
        <tr>
          <HeadCell>Key</HeadCell>
          <HeadCell>What</HeadCell>
          <HeadCell>Stock</HeadCell>
          <HeadCell>Thick</HeadCell>
          <HeadCell>Held by</HeadCell>
          <HeadCell>Offset</HeadCell>
          <HeadCell className="whitespace-nowrap">Top at</HeadCell>
          <HeadCell>Pieces</HeadCell>
          <HeadCell>Mass</HeadCell>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={row.key}>
            <RowHead className="font-serif">{row.key}</RowHead>
            <Cell>{row.what}</Cell>
            <Cell>{row.stock}</Cell>
            <Cell className="whitespace-nowrap">{row.thickness}</Cell>
            <Cell>{row.heldBy}</Cell>
            <Cell className="whitespace-nowrap">{row.offset}</Cell>
            <Cell className="whitespace-nowrap">{row.topAt}</Cell>
            <Cell className="whitespace-nowrap">{row.pieces}</Cell>
            <Cell className="whitespace-nowrap">{row.mass}</Cell>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

/** The same, for a narrow page: a paragraph a layer. */
export function ScheduleList({ rows, unit }: ScheduleProps) {
  return (
    <ol className="divide-y divide-rule">
      {rows.map((row) => (
        <li key={row.key} className="flex gap-3 px-4 py-3">
          <span className="flex size-7 shrink-0 items-center justify-center rounded-full border border-ink font-serif text-sm font-bold">
            {row.key}
          </span>
          <div className="min-w-0">
            <p className="font-semibold">{row.what}</p>
            <p>
              {row.stock}, {withUnit(row.thickness, unit)} thick
            </p>
            <p className="text-sm text-graphite">
              {[
                row.heldBy,
                /\d/.test(row.offset) ? `offset ${withUnit(row.offset, unit)}` : "",
                `top at ${withUnit(row.topAt, unit)}`,
                row.pieces === "1" ? "1 piece" : `${row.pieces} pieces`,
                row.mass,
              ]
                .filter(Boolean)
                .join(", ")}
            </p>
          </div>
        </li>
      ))}
    </ol>
  );
}

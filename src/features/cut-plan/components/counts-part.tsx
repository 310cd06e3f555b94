import type { Counts, DrilledHole } from "#shared/cut-plan/counts.ts";
import { hoursWords } from "#shared/dry-fit/words.ts";
import { formatFine, formatLengthWithUnit } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table.tsx";

/** Pieces by layer, hardware with its drills, screws and joints, for all signs of the job. */
export function CountsPart({
  counts: { layers, hardware, screws, joints },
  quantity,
  unit,
}: {
  readonly counts: Counts;
  readonly quantity: number;
  readonly unit: LengthUnit;
}) {
  return (
    <div className="mt-5 space-y-7">
      <Table caption="Pieces by layer" captionHidden={false}>
        <Heads of={["Layer", "Stock", "Pieces", ...(quantity > 1 ? [`For ${quantity} signs`] : [])]} />
        <tbody>
          {layers.map(({ key, name, stock, thicknessMm, each, all }) => (
            <tr key={key}>
              <RowHead>
                {key}, {name}
              </RowHead>
              <Cell>
                {stock}, {formatLengthWithUnit(thicknessMm, unit)}
              </Cell>
              <Cell>{each}</Cell>
              {quantity > 1 && <Cell>{all}</Cell>}
            </tr>
          ))}
        </tbody>
      </Table>
      {hardware.length > 0 && (
        <Table caption="Hardware and its holes" captionHidden={false}>
          <Heads of={["Hardware", "Layers", "Count", "Drill"]} />
          <tbody>
            {hardware.map(({ hardware: { name }, layers: keys, count, holes }) => (
              <tr key={`${name} ${keys.join(" ")}`}>
                <RowHead>{name}</RowHead>
                <Cell>{keys.join(", ")}</Cell>
                <Cell>{count}</Cell>
                <Cell>{holes.map((hole) => holeWords(hole, unit)).join("; ") || "none in the panel"}</Cell>
              </tr>
            ))}
          </tbody>
        </Table>
      )}
      {screws.length > 0 && (
        <Table caption="Screws" captionHidden={false}>
          <Heads of={["Screw", "Count", "Pilot hole in the backer"]} />
          <tbody>
            {screws.map(({ screw: { name }, count, pilotMm }) => (
              <tr key={name}>
                <RowHead>{name}</RowHead>
                <Cell>{count}</Cell>
                <Cell>
                  {pilotMm === null ? "try on scrap: its root is not known" : `Ø ${formatFine(pilotMm, unit)}`}
                </Cell>
              </tr>
            ))}
          </tbody>
        </Table>
      )}
      {joints.length > 0 && (
        <Table caption="Glued joints" captionHidden={false}>
          <Heads of={["Layer", "Adhesive", "Pieces", "Move after", "Load after"]} />
          <tbody>
            {joints.map(({ layerKey, layerName, adhesives, pieces, handlingHours, fullHours }) => (
              <tr key={layerKey}>
                <RowHead>
                  {layerKey}, {layerName}
                </RowHead>
                <Cell>{adhesives.join(", then ")}</Cell>
                <Cell>{pieces}</Cell>
                <Cell>{handlingHours === 0 ? "at once" : hoursWords(handlingHours)}</Cell>
                <Cell>{hoursWords(fullHours)}</Cell>
              </tr>
            ))}
          </tbody>
        </Table>
      )}
    </div>
  );
}

function Heads({ of }: { readonly of: readonly string[] }) {
  return (
    <thead>
      <tr>
        {of.map((head) => (
          <HeadCell key={head}>{head}</HeadCell>
        ))}
      </tr>
    </thead>
  );
}

function holeWords({ into, diameterMm, depthMm, count }: DrilledHole, unit: LengthUnit): string {
  const deep = depthMm === null ? "" : `, ${formatFine(depthMm, unit)} deep`;
  return `${count} × Ø ${formatFine(diameterMm, unit)}${deep} in the ${into === "panel" ? "panel" : "backer"}`;
}

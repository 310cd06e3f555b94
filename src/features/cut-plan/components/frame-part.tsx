import type { Frame } from "#shared/frame/lay-out-frame.ts";
import { formatLength, formatLengthWithUnit } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table.tsx";
import { degreesWords } from "../model/plan-words.ts";

/** The pieces of the frame with their saw settings, and what to measure for it to be square. */
export function FramePart({ frame, unit }: { readonly frame: Frame; readonly unit: LengthUnit }) {
  const diagonals = [...new Set(frame.diagonals.map(({ lengthMm }) => formatLengthWithUnit(lengthMm, unit)))];
  return (
    <>
      <Table caption="Pieces of the frame" className="mt-4">
        <thead>
          <tr>
            {["Piece", `Long point, ${unit}`, `Short point, ${unit}`, "Saw, one end", "Saw, other end"].map((head) => (
              <HeadCell key={head}>{head}</HeadCell>
            ))}
          </tr>
        </thead>
        <tbody>
          {frame.members.map(({ longPoint, shortPoint, settings: [start, end], from }, index) => (
            <tr key={`${from.x} ${from.y}`}>
              <RowHead>F{index + 1}</RowHead>
              <Cell>{formatLength(longPoint, unit)}</Cell>
              <Cell>{formatLength(shortPoint, unit)}</Cell>
              <Cell>{degreesWords(start)}</Cell>
              <Cell>{degreesWords(end)}</Cell>
            </tr>
          ))}
        </tbody>
      </Table>
      {diagonals.length > 0 && (
        <p className="mt-3 text-base text-ink">
          Measure over the outer corners before the glue sets: {diagonals.join(", ")}
          {diagonals.length === 1 && frame.diagonals.length > 1 ? " both ways." : "."}
        </p>
      )}
    </>
  );
}

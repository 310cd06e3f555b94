import { counted } from "@/lib/format.ts";
import { formatArea } from "../model/trace-words.ts";

/** What tells a good trace from a poor one: few colours, pieces and nodes, and nothing too small to cut. */
export function TraceFigures({
  colours,
  pieces,
  nodes,
  smallestMm2,
}: {
  readonly colours: number;
  readonly pieces: number;
  readonly nodes: number;
  readonly smallestMm2: number | null;
}) {
  return (
    <p className="mt-2 text-sm tabular-nums" role="status">
      {counted(colours, "colour")}, {counted(pieces, "piece")}, {counted(nodes, "node")}
      {smallestMm2 !== null && `, smallest piece ${formatArea(smallestMm2)}`}
    </p>
  );
}

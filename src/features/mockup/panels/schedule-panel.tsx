import { scheduleRows, scheduleTotal } from "#shared/drawing/schedule.ts";
import { Cell, HeadCell, RowHead, Table } from "@/components/ui/table.tsx";
import { useDesk } from "../editor/desk-context.ts";
import { setBoard } from "../model/commands/set-board.ts";
import { CellText, Swatch, WordButton } from "./cell-controls.tsx";
import { ScheduleRow } from "./schedule-row.tsx";

const heads = ["Key", "What", "Stock", "Thick", "Held by", "Offset", "Locate by", "Top at", "Pieces", "Mass"];

/** The schedule: a row a layer from the wall outward, with its cells changed in place. */
export function SchedulePanel({
  onBoard,
  onBringIn,
}: {
  readonly onBoard: () => void;
  readonly onBringIn: () => void;
}) {
  const { document, figures, unit } = useDesk();
  const rows = figures === null ? null : scheduleRows(document, figures, unit);
  const backer = rows?.[0];
  const { stock, thickness } = document.backer;

  return (
    <section aria-label="Schedule" className="min-w-0 px-4 pt-2 pb-6 sm:px-6">
      <h2 className="pb-1 font-serif text-base font-bold text-ink">Schedule</h2>
      <Table caption="Layers from the wall outward">
        <thead>
          <tr>
            {heads.map((head) => (
              <HeadCell key={head} className="py-1.5">
                {head}
              </HeadCell>
            ))}
            <HeadCell className="py-1.5">
              <span className="sr-only">Order and removal</span>
            </HeadCell>
          </tr>
        </thead>
        <tbody>
          <tr>
            <RowHead className="py-1">A</RowHead>
            <Cell className="py-1">
              <BackerName />
            </Cell>
            <Cell className="py-1">
              <span className="flex items-center gap-2">
                <Swatch colour={stock.colour} />
                {stock.name}
              </span>
            </Cell>
            <Cell className="py-1">{backer?.thickness ?? thickness}</Cell>
            <Cell className="py-1">{backer?.heldBy}</Cell>
            <Cell className="py-1">–</Cell>
            <Cell className="py-1">–</Cell>
            <Cell className="py-1">{backer?.topAt}</Cell>
            <Cell className="py-1">{backer?.pieces}</Cell>
            <Cell className="py-1 whitespace-nowrap">{backer?.mass}</Cell>
            <Cell className="py-1">
              <WordButton onClick={onBoard}>Board</WordButton>
            </Cell>
          </tr>
          {document.layers.map((layer, index) => (
            <ScheduleRow
              key={layer.key}
              layer={layer}
              figures={rows?.find(({ key }) => key === layer.key) ?? null}
              isFirst={index === 0}
              isLast={index === document.layers.length - 1}
            />
          ))}
        </tbody>
      </Table>
      {document.layers.length === 0 && (
        <p className="py-4 text-base text-graphite">
          Nothing is on the board yet. <WordButton onClick={onBringIn}>Bring in artwork</WordButton> to make a layer of
          each of its colours, or add a plate.
        </p>
      )}
      {figures !== null && (
        <p className="pt-2 text-fine text-graphite">
          {scheduleTotal(document, figures, unit)} Figures are estimates for planning.
        </p>
      )}
    </section>
  );
}

/** The backer's finish is what tells it apart in the schedule, so it is written here. */
function BackerName() {
  const { document, edit } = useDesk();
  return (
    <span className="flex items-center gap-1">
      Backer,
      <CellText
        aria-label="Finish of the backer"
        placeholder="bare"
        maxLength={200}
        value={document.backer.finish}
        onCommit={(finish) => {
          edit({ label: "Finish the backer", change: (before) => setBoard(before, { finish }) });
          return true;
        }}
      />
    </span>
  );
}

import { faceColour } from "#shared/drawing/face-colour.ts";
import { backerStockWords, layingWords, scheduleRows, scheduleTotal } from "#shared/drawing/schedule.ts";
import { finishWords } from "#shared/mockup/finish-words.ts";
import { explodedOrder, orderWords } from "#shared/stack/exploded-order.ts";
import { Table } from "@/components/ui/table.tsx";
import { cx } from "@/lib/cx.ts";
import { useDesk } from "../editor/desk-context.ts";
import { Swatch, WordButton } from "./cell-controls.tsx";
import { DeskCell, DeskHead, DeskRowHead } from "./desk-table.tsx";
import { LayerTools } from "./layer-tools.tsx";
import { ScheduleRow } from "./schedule-row.tsx";

const heads = ["Key", "What", "Stock", "Thick", "Held by", "Offset", "Locate by", "Top at", "Pieces", "Mass"];

/** The schedule: a row a layer from the wall outward, with its cells changed in place. */
export function SchedulePanel({
  onBoard,
  onFinish,
  onBringIn,
}: {
  readonly onBoard: () => void;
  readonly onFinish: () => void;
  readonly onBringIn: () => void;
}) {
  const { document, figures, unit, heights, letterHeights } = useDesk();
  const rows = figures === null ? null : scheduleRows(document, figures, unit, heights);
  const backer = rows?.[0];
  const { thickness, slats } = document.backer;
  const isLaid = slats !== null || document.frame !== null;

  return (
    <section aria-label="Schedule" data-desk-part className="min-w-0 px-4 pt-2 pb-6 sm:px-6">
      <div className="flex min-h-8 flex-wrap items-baseline justify-between gap-x-6">
        <h2 className="font-serif text-base font-bold text-ink">Schedule</h2>
        <LayerTools onBoard={onBoard} />
      </div>
      <Table caption="Layers from the wall outward">
        <thead>
          <tr>
            {heads.map((head) => (
              <DeskHead key={head}>{head}</DeskHead>
            ))}
          </tr>
        </thead>
        <tbody>
          <tr>
            <DeskRowHead>A</DeskRowHead>
            <DeskCell className={isLaid ? "min-w-56" : "min-w-28"}>
              <BackerName onFinish={onFinish} />
            </DeskCell>
            <DeskCell className={cx(isLaid && "min-w-40")}>
              <span className="flex items-center gap-2 whitespace-normal">
                <Swatch colour={faceColour(document.backer)} />
                {backerStockWords(document.backer)}
              </span>
            </DeskCell>
            <DeskCell>{backer?.thickness ?? thickness}</DeskCell>
            <DeskCell>{backer?.heldBy}</DeskCell>
            <DeskCell>–</DeskCell>
            <DeskCell>–</DeskCell>
            <DeskCell>{backer?.topAt}</DeskCell>
            <DeskCell>{backer?.pieces}</DeskCell>
            <DeskCell>{backer?.mass}</DeskCell>
          </tr>
          {document.layers.map((layer) => (
            <ScheduleRow key={layer.key} layer={layer} figures={rows?.find(({ key }) => key === layer.key) ?? null} />
          ))}
        </tbody>
      </Table>
      {document.layers.length === 0 && (
        <p className="py-4 text-base text-graphite">
          Nothing is on the board yet.{" "}
          <WordButton inText className="text-base" onClick={onBringIn}>
            Bring in artwork
          </WordButton>{" "}
          to make a layer of each of its colours, or add a plate.
        </p>
      )}
      {figures !== null && (
        <p className="pt-2 text-fine text-graphite">
          {scheduleTotal(document, figures, unit)}{" "}
          {document.layers.length > 1 && <>Goes together in this order: {orderWords(explodedOrder(figures))}. </>}
          Figures are estimates for planning.{" "}
          <WordButton
            inText
            aria-pressed={heights === "with bands"}
            onClick={() => letterHeights(heights === "nominal" ? "with bands" : "nominal")}
          >
            {heights === "nominal" ? "Show heights with their tolerances" : "Show heights as they are meant"}
          </WordButton>
        </p>
      )}
    </section>
  );
}

/** The backer's finish is what tells it apart in the schedule; its coats are written in a dialog. */
function BackerName({ onFinish }: { readonly onFinish: () => void }) {
  const { document, unit } = useDesk();
  const words = finishWords(document.backer.finish);
  const laying = layingWords(document, unit);
  return (
    <>
      <WordButton
        title={words}
        aria-label={`Finish of the backer: ${words}`}
        className="-ml-0.5 line-clamp-2 whitespace-normal"
        onClick={onFinish}
      >
        Backer, {words}
      </WordButton>
      {laying.length > 0 && <span className="block px-0.5 pb-1 text-sm whitespace-normal">{laying.join(", ")}</span>}
    </>
  );
}

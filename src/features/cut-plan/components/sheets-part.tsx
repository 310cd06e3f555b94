import { useMemo } from "react";
import { drawNestingDiagrams } from "#shared/drawing/nesting-diagram.ts";
import { boxOfRegion } from "#shared/geometry/box.ts";
import type { SheetLayout, StockSheet } from "#shared/sheets/nesting.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Notice } from "@/components/ui/notice.tsx";
import { counted } from "@/lib/format.ts";
import type { SheetWork } from "../engine/planner.ts";
import { endedWords } from "../model/plan-words.ts";
import { DrawingBlock } from "./drawing-block.tsx";
import { usePaper } from "./use-paper.ts";

/** One sheet material: its sheets as drawings, how well they are used, and what lies on none. */
export function SheetsPart({ work: { task, state }, unit }: { readonly work: SheetWork; readonly unit: LengthUnit }) {
  const { ref, paperMm } = usePaper();
  const outcome = state.step === "over" ? state.outcome : null;
  const laid = outcome?.ok ? outcome.value : state.step === "running" ? state.best : null;
  const ended = outcome?.ok ? endedWords(outcome.ended) : null;
  const copies = task.request.pieces.reduce((sum, { quantity }) => sum + quantity, 0);
  return (
    <div ref={ref} className="mt-6 min-w-0 break-inside-avoid">
      <h3 className="font-serif text-lg font-bold text-ink break-after-avoid">{task.title}</h3>
      <p className="text-base text-graphite">
        {counted(copies, "piece")}
        {laid && `, ${Math.round(laid.layout.use * 100)} % of the sheet up to the last piece is used`}
        {task.sheetsAreCounted ? ", on sheets in stock." : ", on sheets as usually bought: the stock list counts none."}
      </p>
      {ended && <p className="text-base text-graphite">{ended}</p>}
      {outcome && !outcome.ok && (
        <Notice tone="error" title="This material can't be laid out." className="mt-3">
          {outcome.words}
        </Notice>
      )}
      {laid && paperMm !== null && (
        <Layout
          layout={laid.layout}
          work={task}
          stock={task.request.stock}
          isAll={laid.bought === null}
          unit={unit}
          paperMm={paperMm}
        />
      )}
      {laid?.bought && paperMm !== null && (
        <>
          <Notice tone="caution" className="mt-4">
            The sheets in stock are too few. What is left over lies on sheets to be bought:
          </Notice>
          <Layout layout={laid.bought} work={task} stock={[task.usualSheet]} isAll unit={unit} paperMm={paperMm} />
        </>
      )}
    </div>
  );
}

function Layout({
  layout,
  work: { title, request },
  stock,
  isAll,
  unit,
  paperMm,
}: {
  readonly layout: SheetLayout;
  readonly work: SheetWork["task"];
  readonly stock: readonly StockSheet[];
  /** Whether what lies on none of these lies nowhere. */
  readonly isAll: boolean;
  readonly unit: LengthUnit;
  readonly paperMm: number;
}) {
  const { pieces } = request;
  const aspect = aspectOf(layout);
  const widthMm = Math.min(paperMm, Math.max(leastWidthMm, tallestMm / aspect));
  const pages = useMemo(
    () =>
      drawNestingDiagrams({
        layout,
        pieces,
        stock,
        unit,
        widthMm,
        heightMm: 24 + widthMm * aspect,
        isTrimmed: true,
      }),
    [layout, pieces, stock, unit, widthMm, aspect],
  );
  const names = new Map(pieces.map(({ id, name }) => [id, name]));
  return (
    <>
      {layout.remarks.map((remark) => (
        <p key={remark} className="mt-1 text-base text-graphite">
          {remark}
        </p>
      ))}
      {isAll && layout.unplaced.length > 0 && (
        <Notice tone="caution" title="Not every piece has a place" className="mt-3">
          <ul>
            {layout.unplaced.map(({ pieceId, copies, words }) => (
              <li key={pieceId}>
                {copies > 1 && `${copies} × `}
                <strong>{names.get(pieceId)}</strong>: {words}
              </li>
            ))}
          </ul>
        </Notice>
      )}
      <div className="mt-4 flex flex-wrap items-start gap-5">
        {pages.map((list, index) => {
          const what = `${title}, sheet ${index + 1} of ${pages.length}`;
          return <DrawingBlock key={what} list={list} title={what} />;
        })}
      </div>
    </>
  );
}

/** A sheet is drawn no higher, so that it is seen whole; nor narrower, for its heading. Paper, mm. */
const tallestMm = 125;
const leastWidthMm = 90;

/** Height to width of the tallest sheet, at most a square's and a half. */
function aspectOf({ sheets }: SheetLayout): number {
  const aspects = sheets.flatMap(({ region, placements }) => {
    const box = placements.length > 0 ? boxOfRegion(region) : null;
    return box && box.width > 0 ? [box.height / box.width] : [];
  });
  return Math.min(1.5, Math.max(0.2, ...aspects));
}

import { useMemo, useRef, useState } from "react";
import type { Job } from "#shared/contracts/jobs.ts";
import type { Mockup } from "#shared/contracts/mockups.ts";
import type { StockItem } from "#shared/contracts/stock.ts";
import { makingWords } from "#shared/drawing/making-words.ts";
import { scheduleRows, scheduleTotal } from "#shared/drawing/schedule.ts";
import { drawSection } from "#shared/drawing/section.ts";
import type { Limits } from "#shared/dry-fit/limits.ts";
import { signBox } from "#shared/stack/sign-box.ts";
import { formatSize } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Notice } from "@/components/ui/notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import type { DrawingView } from "@/lib/drawing-view.ts";
import { DrawingViewer } from "@/lib/drawing-viewer.tsx";
import { ScheduleList, ScheduleTable } from "@/lib/schedule.tsx";
import { useMedia } from "@/lib/use-media.ts";
import { useRoom } from "@/lib/use-room.ts";
import { fitSign, paperScaleAt, usualMargins } from "../canvas/view-of-board.ts";
import { useStandings } from "../editor/use-standings.ts";
import { useEngine } from "../engine/use-engine.ts";
import { dryFitContextOf } from "../model/dry-fit-context.ts";
import { WordButton } from "./cell-controls.tsx";
import { CostPanel, type CostPanelProps } from "./cost-panel.tsx";
import { DraftsDialog } from "./drafts-dialog.tsx";
import { FindingsPanel } from "./findings-panel.tsx";
import { WallReadOnly } from "./wall-read-only.tsx";

type MockupReadOnlyProps = {
  readonly shop: string;
  readonly unit: LengthUnit;
  readonly job: Job;
  readonly jobPath: string;
  readonly mockup: Mockup;
  readonly limits: Limits;
  readonly stock: readonly StockItem[];
  /** The page of the prices; null for those who may not see what a sign costs. */
  readonly pricesPath: CostPanelProps["pricesPath"] | null;
  /** Why it can only be looked at. */
  readonly why: string;
};

/** The mockup to look at: the picture, the schedule and the dry fit, for a narrow window and for those who may not change it. */
export function MockupReadOnly(props: MockupReadOnlyProps) {
  const { shop, unit, job, jobPath, mockup, limits, stock, pricesPath, why } = props;
  const [draftsOpen, setDraftsOpen] = useState(false);
  const [view, setView] = useState<DrawingView | null>(null);
  const [sideView, setSideView] = useState<DrawingView | null>(null);
  const frame = useRef<HTMLDivElement>(null);
  const room = useRoom(frame);
  const { document } = mockup;
  const { board, frame: frameOfSign } = document;
  const whole = signBox(document);
  const isWide = useMedia("(min-width: 64rem)");
  // On a phone dimension lines would leave no room for the sign; its size stands under it in words.
  const dimensions = room !== null && room.width >= 600;
  const paperScale = room === null ? null : paperScaleAt(fitSign(whole, usualMargins, room).scale);
  const input = useMemo(
    () =>
      paperScale === null
        ? null
        : {
            document,
            context: dryFitContextOf({ unit, brief: job.brief, stock }),
            limits,
            paperScale,
            dimensions,
            what: "all" as const,
          },
    [document, unit, job.brief, stock, limits, paperScale, dimensions],
  );
  const { drawn, figures, failure } = useEngine(input);
  const section = useMemo(
    () =>
      figures === null || paperScale === null
        ? null
        : drawSection({ document, figures: figures.figures, unit, paperScale, depthScale: 1 }),
    [document, figures, unit, paperScale],
  );
  const standings = useStandings({ shop, jobId: job.id }, drawn?.dryFit.findings ?? null);

  return (
    <div className="space-y-4 px-4 py-4 sm:px-6">
      <h1 className="font-serif text-xl font-bold text-ink">
        {job.client.name}, {job.title}, mockup
      </h1>
      <p className="text-base text-graphite">
        {why} <TextLink to={jobPath}>To the job</TextLink>{" "}
        <WordButton inText className="ml-2" onClick={() => setDraftsOpen(true)}>
          Drafts
        </WordButton>
      </p>
      <DraftsDialog
        open={draftsOpen}
        onOpenChange={setDraftsOpen}
        shop={shop}
        jobId={job.id}
        unit={unit}
        document={document}
        onGoBack={null}
      />
      {failure && (
        <Notice tone="error" title="The drawing could not be made.">
          {failure}
        </Notice>
      )}
      <div className="grid border border-rule bg-sheet md:grid-cols-[minmax(0,1fr)_minmax(0,24rem)]">
        <div ref={frame} className="h-[56dvh]">
          {drawn === null && failure === null && <Skeleton label="Drawing the mockup" />}
          {drawn && (
            <DrawingViewer
              list={drawn.elevation}
              title="Elevation, from the front"
              view={view}
              onView={setView}
              className="h-full"
            />
          )}
        </div>
        {drawn && section && (
          <DrawingViewer
            list={section}
            title="Section, from the side"
            view={sideView}
            onView={setSideView}
            className="h-[56dvh] border-t border-rule md:border-t-0 md:border-l"
          />
        )}
      </div>
      {document.presentation.photo && <WallReadOnly shop={shop} unit={unit} document={document} />}
      {drawn && figures && (
        <>
          <p className="text-sm text-graphite">
            {frameOfSign
              ? `Overall ${formatSize(whole.width, whole.height, unit)}, body ${formatSize(board.width, board.height, unit)}`
              : `Board ${formatSize(board.width, board.height, unit)}`}
          </p>
          <h2 className="font-serif text-base font-bold text-ink">Schedule</h2>
          {isWide ? (
            <ScheduleTable rows={scheduleRows(document, figures.figures, unit)} />
          ) : (
            <div className="-mx-4 border-y border-rule sm:-mx-6">
              <ScheduleList rows={scheduleRows(document, figures.figures, unit)} unit={unit} />
            </div>
          )}
          <p className="text-fine text-graphite">
            {scheduleTotal(document, figures.figures, unit)} {makingWords(document, unit)}
          </p>
          {pricesPath && (
            <div className="-mx-4 sm:-mx-6">
              <CostPanel
                shop={shop}
                unit={unit}
                measures={drawn.measures}
                signs={document.quantity}
                stock={stock}
                pricesPath={pricesPath}
              />
            </div>
          )}
          <FindingsPanel
            dryFit={drawn.dryFit}
            standings={standings}
            isCurrent={drawn.input === input}
            className="-mx-4 max-w-3xl sm:-mx-6 sm:px-6"
          />
        </>
      )}
    </div>
  );
}

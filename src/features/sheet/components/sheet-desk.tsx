import type { ReactNode } from "react";

export type SheetParts = {
  readonly elevation: ReactNode;
  readonly section: ReactNode;
  readonly schedule: ReactNode;
  readonly figures: ReactNode;
  readonly notes: ReactNode;
  readonly decisions: ReactNode;
  readonly titleBlock: ReactNode;
};

type SheetDeskProps = {
  readonly parts: SheetParts;
  readonly elevationHeading: ReactNode;
  readonly sectionHeading: ReactNode;
  readonly scheduleHeading: ReactNode;
  /** Widths in mm of the two views, so that both come out at about one scale. */
  readonly viewsMm: { readonly elevation: number; readonly section: number };
};

/** The sheet on a desk: one frame with everything in its place, the title block at the lower right. */
export function SheetDesk({ parts, elevationHeading, sectionHeading, scheduleHeading, viewsMm }: SheetDeskProps) {
  return (
    <div className="relative mb-4 border border-ink bg-sheet p-5">
      <div className="grid min-h-[calc(100dvh-11.75rem)] grid-cols-[minmax(0,1fr)_23.5rem]">
        <div className="grid min-h-0 grid-cols-[minmax(0,1fr)] grid-rows-[minmax(24rem,1fr)_auto]">
          <div
            className="grid min-h-0"
            style={{
              gridTemplateColumns: `minmax(0, ${viewsMm.elevation}fr) minmax(12.5rem, ${viewsMm.section}fr)`,
            }}
          >
            <section className="flex min-h-0 flex-col" aria-label="Front elevation">
              <div className="flex h-10 shrink-0 items-end px-4">{elevationHeading}</div>
              <div className="min-h-0 flex-1">{parts.elevation}</div>
            </section>
            <section className="flex min-h-0 flex-col border-l border-rule" aria-label="Section">
              <div className="flex h-10 shrink-0 items-end px-4">{sectionHeading}</div>
              <div className="min-h-0 flex-1">{parts.section}</div>
            </section>
          </div>
          <div className="border-t border-rule px-4 pt-2 pb-3">
            <div className="flex flex-wrap items-baseline justify-between gap-x-6 pb-1.5">
              {scheduleHeading}
              {parts.figures}
            </div>
            {parts.schedule}
          </div>
        </div>
        {/* The margin takes the height that the drawing gives the sheet, and its notes scroll within. */}
        <div className="relative border-l border-ink">
          <div className="absolute inset-0 flex flex-col">
            <div className="min-h-0 flex-1 overflow-y-auto">{parts.notes}</div>
            <div className="border-t border-rule px-4 py-3 empty:hidden">{parts.decisions}</div>
            <div className="-ml-px">{parts.titleBlock}</div>
          </div>
        </div>
      </div>
      <div aria-hidden="true" className="pointer-events-none absolute inset-5 border border-ink" />
    </div>
  );
}

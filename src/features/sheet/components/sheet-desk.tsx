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
    <div className="relative border border-ink bg-sheet p-5">
      <div aria-hidden="true" className="pointer-events-none absolute inset-5 border border-ink" />
      <div className="grid h-[max(42rem,calc(100dvh-9.5rem))] grid-cols-[minmax(0,1fr)_23.5rem]">
        <div className="grid min-h-0 grid-rows-[minmax(0,1fr)_auto]">
          <div
            className="grid min-h-0"
            style={{
              gridTemplateColumns: `minmax(0, ${viewsMm.elevation}fr) minmax(11rem, ${viewsMm.section}fr)`,
            }}
          >
            <section className="relative min-h-0" aria-label="Front elevation">
              {parts.elevation}
              <div className="pointer-events-none absolute top-3 left-4">{elevationHeading}</div>
            </section>
            <section className="relative min-h-0 border-l border-rule" aria-label="Section">
              {parts.section}
              <div className="pointer-events-none absolute top-3 left-4">{sectionHeading}</div>
            </section>
          </div>
          <section className="max-h-64 overflow-y-auto border-t border-rule px-4 pt-2 pb-3" aria-label="Schedule">
            <div className="flex flex-wrap items-baseline justify-between gap-x-6 pb-1.5">
              {scheduleHeading}
              {parts.figures}
            </div>
            {parts.schedule}
          </section>
        </div>
        <div className="flex min-h-0 flex-col border-l border-ink">
          <div className="min-h-0 flex-1 overflow-y-auto">{parts.notes}</div>
          <div className="border-t border-rule px-4 py-3 empty:hidden">{parts.decisions}</div>
          <div className="-ml-px">{parts.titleBlock}</div>
        </div>
      </div>
    </div>
  );
}

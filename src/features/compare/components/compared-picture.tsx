import type { ReactNode } from "react";
import type { DisplayList } from "#shared/drawing/display-list.ts";
import { type DrawingView, spotInWindow } from "@/lib/drawing-view.ts";
import { DrawingViewer } from "@/lib/drawing-viewer.tsx";

type ComparedPictureProps = {
  readonly list: DisplayList;
  readonly title: string;
  readonly heading: ReactNode;
  readonly view: DrawingView | null;
  readonly onView: (view: DrawingView | null) => void;
  /** The spot of the chosen change, on the picture in mm. */
  readonly spot: { readonly x: number; readonly y: number } | null;
};

/** One of the two pictures. Both share one view, so that the same place is always beside itself. */
export function ComparedPicture({ list, title, heading, view, onView, spot }: ComparedPictureProps) {
  return (
    <section className="flex h-full min-h-0 min-w-0 flex-col bg-sheet" aria-label={title}>
      <div className="flex flex-wrap items-baseline justify-between gap-x-4 border-b border-rule px-4 py-2">
        {heading}
      </div>
      <DrawingViewer
        list={list}
        title={title}
        view={view}
        onView={onView}
        className="min-h-0 flex-1"
        overlay={(shown) => {
          if (spot === null) return null;
          const { x, y } = spotInWindow(shown, spot);
          return (
            <svg aria-hidden="true" className="pointer-events-none absolute inset-0 h-full w-full text-indigo">
              <circle cx={x} cy={y} r={26} fill="none" className="stroke-sheet" strokeWidth={7} />
              <circle cx={x} cy={y} r={26} fill="none" stroke="currentColor" strokeWidth={3} />
              <path
                d={`M${x - 40} ${y}h14M${x + 26} ${y}h14M${x} ${y - 40}v14M${x} ${y + 26}v14`}
                stroke="currentColor"
                strokeWidth={3}
              />
            </svg>
          );
        }}
      />
    </section>
  );
}

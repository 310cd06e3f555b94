import { type KeyboardEvent, type ReactNode, useRef } from "react";
import { flushSync } from "react-dom";
import { cx } from "@/lib/cx.ts";
import type { SheetParts } from "./sheet-desk.tsx";

const tabs = [
  { id: "front", label: "Front" },
  { id: "side", label: "From the side" },
  { id: "materials", label: "Materials" },
] as const;
export type SheetTab = (typeof tabs)[number]["id"];

type SheetInHandProps = {
  readonly parts: SheetParts;
  readonly tools: ReactNode;
  readonly tab: SheetTab;
  readonly onTab: (tab: SheetTab) => void;
  /** Height of the elevation over its width. */
  readonly shape: number;
};

/** The sheet in the hand: the drawing on top, its parts by plain words, notes below, the decisions at the bottom edge. */
export function SheetInHand({ parts, tools, tab, onTab, shape }: SheetInHandProps) {
  const list = useRef<HTMLDivElement>(null);
  const panel = useRef<HTMLDivElement>(null);

  /** The parts are of different heights: after a long one, a short one would lie above what is in sight. */
  function choose(next: SheetTab) {
    flushSync(() => onTab(next));
    const shown = panel.current;
    if (shown && shown.getBoundingClientRect().top < 0) shown.scrollIntoView({ block: "start" });
  }

  function handleKeyDown(event: KeyboardEvent) {
    const step = { ArrowRight: 1, ArrowLeft: -1 }[event.key];
    if (step === undefined) return;
    event.preventDefault();
    const at = tabs.findIndex(({ id }) => id === tab);
    const next = tabs[(at + step + tabs.length) % tabs.length];
    if (!next) return;
    choose(next.id);
    list.current?.querySelector<HTMLElement>(`#tab-${next.id}`)?.focus({ preventScroll: true });
  }

  return (
    <div className="flex min-h-[calc(100dvh-8rem)] flex-col">
      <div
        ref={panel}
        id="sheet-part"
        role="tabpanel"
        aria-labelledby={`tab-${tab}`}
        className={cx("border-y border-ink bg-sheet", tab === "materials" && "px-0 py-1")}
      >
        {tab === "materials" ? (
          <>
            {parts.schedule}
            <div className="px-4 py-3">{parts.figures}</div>
          </>
        ) : (
          <div
            className={tab === "front" ? "max-h-[58dvh]" : "h-[58dvh]"}
            // The row of words under the drawing takes 2.75rem.
            style={tab === "front" ? { height: `calc(${Math.min(1.2, shape)} * 100vw + 2.75rem)` } : undefined}
          >
            {tab === "front" ? parts.elevation : parts.section}
          </div>
        )}
      </div>
      <div
        ref={list}
        role="tablist"
        aria-label="Parts of the sheet"
        onKeyDown={handleKeyDown}
        className="flex gap-5 border-b border-rule px-4"
      >
        {tabs.map(({ id, label }) => (
          <button
            key={id}
            id={`tab-${id}`}
            type="button"
            role="tab"
            aria-selected={id === tab}
            aria-controls="sheet-part"
            tabIndex={id === tab ? 0 : -1}
            onClick={() => choose(id)}
            className={cx(
              "min-h-11 cursor-pointer border-b-2",
              id === tab ? "border-madder font-semibold text-ink" : "border-transparent text-graphite",
            )}
          >
            {label}
          </button>
        ))}
      </div>
      <div className="flex flex-wrap gap-x-5 gap-y-1 px-4 py-2 text-sm">{tools}</div>
      <div className="bg-sheet">{parts.notes}</div>
      <div className="mt-6 border-r border-b border-ink bg-sheet">{parts.titleBlock}</div>
      <div className="flex-1" />
      <div className="sticky bottom-0 mt-6 border-t border-ink bg-paper px-4 py-3">{parts.decisions}</div>
    </div>
  );
}

import { useEffect, useEffectEvent, useMemo } from "react";
import type { Note } from "#shared/contracts/notes.ts";
import { cx } from "@/lib/cx.ts";
import { type DrawingView, type Size, spotInWindow, viewShowing } from "@/lib/drawing-view.ts";
import { balloonOffsets } from "../model/balloon-offsets.ts";
import { balloonName, noteTone } from "../model/note-words.ts";
import { toneText } from "./note-mark.tsx";

type Spot = { readonly x: number; readonly y: number };

type BalloonsProps = {
  readonly notes: readonly Note[];
  /** Where the upper left corner of the board lies on the picture, in mm. */
  readonly origin: Spot;
  readonly view: DrawingView;
  /** The whole drawing in its window: balloons stand round their spots as they do there. */
  readonly fit: DrawingView;
  readonly room: Size;
  readonly selectedId: string | null;
  readonly onSelect: (noteId: string | null) => void;
  readonly onView: (view: DrawingView) => void;
  /** The spot of a note that is being written, on the board in mm. */
  readonly draft: Spot | null;
  /** A spot is being chosen: balloons let the touch through. */
  readonly isPlacing: boolean;
};

/** Numbered balloons with their leaders, laid over the drawing. Their size is the window's, not the drawing's. */
export function Balloons(props: BalloonsProps) {
  const { notes, origin, view, fit, room, selectedId, onSelect, onView, draft, isPlacing } = props;
  const pinned = useMemo(
    () => notes.flatMap((note) => (note.anchor.on === "spot" ? [{ note, at: onPicture(note.anchor, origin) }] : [])),
    [notes, origin],
  );
  const offsets = useMemo(
    () =>
      balloonOffsets(
        pinned.map(({ at }) => spotInWindow(fit, at)),
        room,
      ),
    [pinned, fit, room],
  );
  const bringIntoView = useEffectEvent(() => {
    const chosen = pinned.find(({ note }) => note.id === selectedId);
    // The whole drawing shows every spot already.
    const moved = chosen && view !== fit && viewShowing(view, chosen.at, room);
    if (moved && moved !== view) onView(moved);
  });
  // Only a change of the choice moves the drawing: afterwards the reader may look elsewhere.
  useEffect(() => {
    if (selectedId !== null) bringIntoView();
  }, [selectedId]);
  const shown = pinned.map(({ note, at }, index) => {
    const foot = spotInWindow(view, at);
    const { dx, dy } = offsets[index] ?? { dx: 46, dy: 0 };
    return { note, foot, head: { x: foot.x + dx, y: foot.y + dy }, tone: toneText[noteTone(note)] };
  });
  const draftAt = draft && spotInWindow(view, onPicture(draft, origin));

  return (
    <div className={cx("pointer-events-none absolute inset-0", isPlacing && "opacity-60")}>
      <svg aria-hidden="true" className="absolute inset-0 h-full w-full">
        {shown.map(({ note, foot, head, tone }) => (
          <g key={note.id} className={tone}>
            {/* A pale edge keeps the leader seen on a piece of its own colour. */}
            <line x1={foot.x} y1={foot.y} x2={head.x} y2={head.y} className="stroke-sheet/80" strokeWidth={4} />
            <circle cx={foot.x} cy={foot.y} r={4.5} className="fill-sheet/80" />
            <line
              x1={foot.x}
              y1={foot.y}
              x2={head.x}
              y2={head.y}
              stroke="currentColor"
              strokeWidth={note.id === selectedId ? 2.5 : 1.25}
            />
            <circle cx={foot.x} cy={foot.y} r={3} fill="currentColor" />
            {note.id === selectedId && (
              <circle cx={foot.x} cy={foot.y} r={11} fill="none" stroke="currentColor" strokeWidth={2.5} />
            )}
          </g>
        ))}
        {draftAt &&
          (["stroke-sheet", "stroke-indigo"] as const).map((colour, layer) => (
            <path
              key={colour}
              d={`M${draftAt.x - 16} ${draftAt.y}h32M${draftAt.x} ${draftAt.y - 16}v32`}
              className={colour}
              strokeWidth={layer === 0 ? 7 : 2.5}
            />
          ))}
      </svg>
      {shown.map(({ note, head, tone }) => (
        <button
          key={note.id}
          type="button"
          aria-label={balloonName(note)}
          aria-pressed={note.id === selectedId}
          disabled={isPlacing}
          onClick={() => onSelect(note.id === selectedId ? null : note.id)}
          style={{ left: head.x, top: head.y }}
          className={cx(
            "absolute flex size-[30px] -translate-x-1/2 -translate-y-1/2 cursor-pointer items-center justify-center rounded-full border-2 bg-sheet font-serif text-fine font-bold before:absolute before:-inset-1.5",
            !isPlacing && "pointer-events-auto",
            tone,
            note.kind === "must change" && note.state !== "settled" && "outline-1 outline-offset-2 outline-current",
            note.id === selectedId ? "border-[3px] ring-4 ring-current/25" : "border-current",
          )}
        >
          {note.number}
          {note.state === "settled" && <SettledTick />}
        </button>
      ))}
    </div>
  );
}

function SettledTick() {
  return (
    <svg aria-hidden="true" viewBox="0 0 10 10" className="absolute -right-2 -bottom-1 size-3.5 rounded-full bg-sheet">
      <path d="M2 5.4l2.2 2.2L8.2 3" fill="none" stroke="currentColor" strokeWidth="1.8" />
    </svg>
  );
}

const onPicture = (spot: Spot, origin: Spot): Spot => ({ x: spot.x + origin.x, y: spot.y + origin.y });

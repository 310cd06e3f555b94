import { type KeyboardEvent, type PointerEvent, useRef } from "react";
import type { Point } from "#shared/geometry/path.ts";
import { cx } from "@/lib/cx.ts";

export const cornerNames = ["Upper left", "Upper right", "Lower right", "Lower left"] as const;

type CornerMarkProps = {
  readonly corner: number;
  /** Px of the photo. */
  readonly at: Point;
  readonly shown: number;
  readonly isActive: boolean;
  readonly onActive: (isActive: boolean) => void;
  readonly onDrag: (to: Point) => void;
  readonly onPut: (to: Point, together: boolean) => void;
  /** The hand let go without having moved it. */
  readonly onLeave: () => void;
};

const arrows: Readonly<Record<string, Point>> = {
  ArrowLeft: { x: -1, y: 0 },
  ArrowRight: { x: 1, y: 0 },
  ArrowUp: { x: 0, y: -1 },
  ArrowDown: { x: 0, y: 1 },
};
/** A slow hand's share of the way. */
const slowly = 0.2;

/** The mark of one corner of the sheet: dragged, slowly with Shift, or moved by arrow keys. */
export function CornerMark({ corner, at, shown, isActive, onActive, onDrag, onPut, onLeave }: CornerMarkProps) {
  const hand = useRef<{ start: Point; last: Point; place: Point } | null>(null);

  function handleMove(event: PointerEvent) {
    const held = hand.current;
    if (!held) return;
    const share = (event.shiftKey ? slowly : 1) / shown;
    held.place = {
      x: held.place.x + (event.clientX - held.last.x) * share,
      y: held.place.y + (event.clientY - held.last.y) * share,
    };
    held.last = { x: event.clientX, y: event.clientY };
    onDrag(held.place);
  }

  function handleKey(event: KeyboardEvent) {
    const way = arrows[event.key];
    if (!way) return;
    event.preventDefault();
    const by = event.shiftKey ? 10 : 1;
    onPut({ x: at.x + way.x * by, y: at.y + way.y * by }, true);
  }

  return (
    <button
      type="button"
      aria-label={`${cornerNames[corner] ?? ""} corner of the sheet, ${Math.round(at.x)} px across, ${Math.round(at.y)} px down`}
      className={cx(
        "absolute z-10 size-11 -translate-x-1/2 -translate-y-1/2 cursor-crosshair touch-none rounded-full",
        isActive ? "text-madder" : "text-indigo",
      )}
      style={{ left: at.x * shown, top: at.y * shown }}
      onFocus={() => onActive(true)}
      onBlur={() => onActive(false)}
      onKeyDown={handleKey}
      onPointerDown={(event) => {
        event.currentTarget.setPointerCapture(event.pointerId);
        hand.current = { start: at, last: { x: event.clientX, y: event.clientY }, place: at };
      }}
      onPointerMove={handleMove}
      onPointerUp={() => {
        const held = hand.current;
        hand.current = null;
        if (held && (held.place.x !== held.start.x || held.place.y !== held.start.y)) onPut(held.place, false);
        else onLeave();
      }}
      onPointerCancel={() => {
        hand.current = null;
        onLeave();
      }}
    >
      <svg aria-hidden="true" viewBox="0 0 44 44" className="size-full" fill="none">
        <path d="M22 6v11M22 27v11M6 22h11M27 22h11" className="stroke-sheet" strokeWidth="4" />
        <path d="M22 6v11M22 27v11M6 22h11M27 22h11" stroke="currentColor" strokeWidth="2" />
        <circle cx="22" cy="22" r="1" fill="currentColor" />
      </svg>
    </button>
  );
}

import { type KeyboardEvent, type PointerEvent, useRef } from "react";
import type { OnWall } from "#shared/drawing/on-wall.ts";
import type { Point } from "#shared/geometry/path.ts";
import type { WallPhoto } from "#shared/mockup/document.ts";
import { signBox } from "#shared/stack/sign-box.ts";
import { mapPoint } from "#shared/wall/homography.ts";
import type { WallReading } from "#shared/wall/read-wall-photo.ts";
import { useDesk } from "../editor/desk-context.ts";
import { placeOnWallWords, wallStepsOf } from "../model/wall-words.ts";
import { seenAt, warpOf } from "../model/warp.ts";

type SignHandleProps = {
  readonly photo: WallPhoto;
  readonly reading: WallReading;
  readonly onWall: OnWall;
  readonly shown: number;
  readonly onDrag: (at: Point) => void;
  readonly onHang: (at: Point, together: boolean) => void;
  /** The hand let go without having moved it. */
  readonly onLeave: () => void;
};

const arrows: Readonly<Record<string, Point>> = {
  ArrowLeft: { x: -1, y: 0 },
  ArrowRight: { x: 1, y: 0 },
  ArrowUp: { x: 0, y: -1 },
  ArrowDown: { x: 0, y: 1 },
};

/** What the hand takes to move the sign along the wall: as wide and high as the sign is seen. Nothing where it isn't seen. */
export function SignHandle({ photo, reading, onWall, shown, onDrag, onHang, onLeave }: SignHandleProps) {
  const { document, unit } = useDesk();
  const hand = useRef<{ from: Point; at: Point; now: Point } | null>(null);
  const warp = warpOf({ reading, at: photo.at, board: document.board, box: onWall.box, shown }, { offWallMm: 0 });
  const { x, y, width, height } = signBox(document);
  const corners = [
    { x, y },
    { x: x + width, y },
    { x: x + width, y: y + height },
    { x, y: y + height },
  ].map((corner) => warp && seenAt(warp, onWall.box, corner));
  const seen = corners.filter((corner) => corner !== null);
  if (seen.length < 4) return null;
  const [left, right] = [Math.min(...seen.map((at) => at.x)), Math.max(...seen.map((at) => at.x))];
  const [top, bottom] = [Math.min(...seen.map((at) => at.y)), Math.max(...seen.map((at) => at.y))];

  /** The wall under the pointer; null where the photo shows none. */
  function wallUnder(event: PointerEvent<HTMLButtonElement>): Point | null {
    const frame = event.currentTarget.parentElement?.getBoundingClientRect();
    if (!frame) return null;
    return mapPoint(reading.toWall, {
      x: (event.clientX - frame.left) / shown,
      y: (event.clientY - frame.top) / shown,
    });
  }

  function handleMove(event: PointerEvent<HTMLButtonElement>) {
    const under = hand.current && wallUnder(event);
    if (!hand.current || !under) return;
    const { from, at } = hand.current;
    hand.current.now = { x: Math.round(at.x + under.x - from.x), y: Math.round(at.y + under.y - from.y) };
    onDrag(hand.current.now);
  }

  function handleKey(event: KeyboardEvent) {
    const way = arrows[event.key];
    if (!way) return;
    event.preventDefault();
    const steps = wallStepsOf(unit);
    const by = event.shiftKey ? steps.fine : steps.usual;
    onHang({ x: photo.at.x + way.x * by, y: photo.at.y + way.y * by }, true);
  }

  return (
    <button
      type="button"
      aria-label={`The sign on the wall. ${placeOnWallWords(document, photo, unit)}`}
      className="absolute cursor-grab touch-none active:cursor-grabbing"
      style={{ left, top, width: right - left, height: bottom - top }}
      onKeyDown={handleKey}
      onPointerDown={(event) => {
        const from = wallUnder(event);
        if (!from) return;
        event.currentTarget.setPointerCapture(event.pointerId);
        hand.current = { from, at: photo.at, now: photo.at };
      }}
      onPointerMove={handleMove}
      onPointerUp={() => {
        const held = hand.current;
        hand.current = null;
        if (held && held.now !== held.at) onHang(held.now, false);
        else onLeave();
      }}
      onPointerCancel={() => {
        hand.current = null;
        onLeave();
      }}
    />
  );
}

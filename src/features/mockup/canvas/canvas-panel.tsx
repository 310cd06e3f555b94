import { type RefObject, useId, useRef, useState } from "react";
import type { Point } from "#shared/geometry/path.ts";
import { Busy } from "@/components/ui/busy.tsx";
import { cx } from "@/lib/cx.ts";
import type { DrawingView, Size } from "@/lib/drawing-view.ts";
import { useDesk } from "../editor/desk-context.ts";
import type { Drawn } from "../engine/use-engine.ts";
import type { Drag } from "../model/drag.ts";
import { HolesByHand } from "./holes-by-hand.tsx";
import { Rulers } from "./rulers.tsx";
import { useCanvasKeys } from "./use-canvas-keys.ts";
import { usePointerMarks } from "./use-pointer-marks.ts";
import { useScene } from "./use-scene.ts";
import { useShownPicture } from "./use-shown-picture.ts";
import { useSpaceBar } from "./use-space-bar.ts";
import { viewOfBox } from "./view-of-board.ts";
import { ViewTools } from "./view-tools.tsx";

type CanvasPanelProps = {
  /** The newest picture that could be made; null before the first. */
  readonly drawn: Drawn | null;
  /** Why the newest one could not be made. */
  readonly failure: string | null;
  readonly drag: Drag | null;
  readonly onDrag: (drag: Drag | null) => void;
  readonly view: DrawingView;
  readonly fit: DrawingView;
  readonly room: Size | null;
  /** null asks for the whole board. */
  readonly onView: (view: DrawingView | null) => void;
  /** Where a finding points, on the board. */
  readonly spot: Point | null;
  readonly frame: RefObject<HTMLDivElement | null>;
};

/** The elevation: the picture of the proof on a fabric canvas, with pieces and holes to take hold of. */
export function CanvasPanel({ drawn, failure, drag, onDrag, view, fit, room, onView, spot, frame }: CanvasPanelProps) {
  const place = useRef<HTMLDivElement>(null);
  const spaceDown = useSpaceBar(frame);
  const { unit, aids } = useDesk();
  const [looksAround, setLooksAround] = useState(false);
  const pointer = usePointerMarks();
  const hand = { onDrag, view, fit, onView, spaceDown, looksAround, onPointer: pointer.follow };
  const { scene, sweep } = useScene(place, hand);
  const chosen = useShownPicture(scene, { drawn, drag, view, room, spot, sweep });
  const handleKeyDown = useCanvasKeys({ view, fit, room, onView, drag, onDrag });
  const hintId = useId();
  const takesKeys = { tabIndex: 0, onKeyDown: handleKeyDown };

  return (
    <div className="relative h-full min-h-0 overflow-hidden">
      <div
        ref={frame}
        role="application"
        aria-label="Elevation, from the front"
        aria-describedby={hintId}
        // Scale in px a mm, and where the board's corner lies in the window, px.
        data-view={[view.scale, view.x, view.y].join(" ")}
        {...takesKeys}
        className={cx(
          "absolute inset-0 touch-none overflow-hidden -outline-offset-4",
          looksAround && "[&_canvas]:cursor-grab!",
        )}
      >
        <div ref={place} />
      </div>
      <p id={hintId} className="sr-only">
        Choose a layer in the schedule or a piece in the list below. Arrows move what is chosen by the step that the bar
        names, with Shift ten times as far; Delete removes it. Keys lists them all. Plus and minus look closer and
        farther, 0 shows the whole board, 9 what is chosen.
      </p>
      {aids.rulers && room !== null && (
        <Rulers view={view} room={room} unit={unit} chosen={chosen} pointer={pointer.marks} />
      )}
      <HolesByHand />
      <ViewTools
        view={view}
        fit={fit}
        room={room}
        onView={onView}
        onChosen={chosen && room && (() => onView(viewOfBox(chosen, fit, room)))}
        looksAround={looksAround}
        onLookAround={setLooksAround}
        besideRulers={aids.rulers}
      />
      {drawn === null && failure === null && (
        <div className="pointer-events-none absolute inset-0 flex items-center justify-center">
          <Busy label="Drawing the sign" />
        </div>
      )}
      {failure !== null && (
        <p role="alert" className="absolute inset-x-4 bottom-4 border-l-4 border-oxblood bg-sheet p-3 text-sm">
          The drawing could not be made: {failure} Your work is kept. Undo the last step, or load the page again.
        </p>
      )}
    </div>
  );
}

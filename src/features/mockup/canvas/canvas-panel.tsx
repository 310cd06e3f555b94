import { type KeyboardEvent, type RefObject, useEffect, useEffectEvent, useId, useMemo, useRef, useState } from "react";
import type { Point } from "#shared/geometry/path.ts";
import { type DrawingView, type Size, viewMoved, viewScaled } from "@/lib/drawing-view.ts";
import { useDesk } from "../editor/desk-context.ts";
import type { Drawn } from "../engine/use-engine.ts";
import { castShadows } from "../model/cast-shadows.ts";
import { catchGuides } from "../model/catch-guides.ts";
import { boxesToLineUpWith, boxOfChosen, findHole } from "../model/chosen-box.ts";
import { removeHole, setHole } from "../model/commands/holes.ts";
import { movePieces, removePieces } from "../model/commands/pieces.ts";
import { type Drag, documentOfDrag, labelOfDrag } from "../model/drag.ts";
import { holeAt, pieceAt } from "../model/piece-at.ts";
import { chooseAlso, chooseHole, chooseLayer, choosePiece, layerOfPiece, nothingChosen } from "../model/selection.ts";
import { shiftsBetween } from "../model/shifts.ts";
import { listenToCanvas } from "./gestures.ts";
import { createScene, type Scene } from "./scene.ts";
import { useSpaceBar } from "./use-space-bar.ts";
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

const reachPx = 6;
const nudgeMm = 1;
const farNudgeMm = 10;
const stepFactor = 1.4;

const arrows = new Map<string, Point>([
  ["ArrowLeft", { x: -1, y: 0 }],
  ["ArrowRight", { x: 1, y: 0 }],
  ["ArrowUp", { x: 0, y: -1 }],
  ["ArrowDown", { x: 0, y: 1 }],
]);

/** The elevation: the picture of the proof on a fabric canvas, with pieces and holes to take hold of. */
export function CanvasPanel({ drawn, failure, drag, onDrag, view, fit, room, onView, spot, frame }: CanvasPanelProps) {
  const { document, figures, figuresOf, selection, edit, choose } = useDesk();
  const place = useRef<HTMLDivElement>(null);
  const [scene, setScene] = useState<Scene | null>(null);
  const spaceDown = useSpaceBar(frame);
  const hintId = useId();
  const elevation = drawn?.elevation ?? null;
  const shownDocument = drawn?.input.document ?? document;
  const wanted = useMemo(() => (drag === null ? document : documentOfDrag(document, drag)), [document, drag]);
  const shifts = useMemo(() => shiftsBetween(shownDocument, wanted), [shownDocument, wanted]);

  const chosenBox = useMemo(
    () => figures && boxOfChosen(figures, selection.pieceIds, shiftsBetween(figuresOf, wanted)),
    [figures, figuresOf, selection.pieceIds, wanted],
  );
  const isLifted = drag?.kind === "pieces";

  /** The gesture asks for what is true when the hand moves, not for what was when it began to listen. */
  const host = useEffectEvent(() => ({ document, figures, figuresOf, selection, view, fit }));
  const press = useEffectEvent((touched: { kind: "piece" | "hole"; id: string } | null, more: boolean) => {
    if (touched === null) choose(nothingChosen);
    else if (touched.kind === "hole") choose(chooseHole(document, touched.id));
    else {
      const layer = layerOfPiece(document, touched.id);
      if (!layer) return;
      if (more) choose(chooseAlso(document, selection, layer.key));
      else if (!selection.pieceIds.includes(touched.id)) choose(chooseLayer(document, layer.key));
    }
  });
  const pressTwice = useEffectEvent((id: string) => choose(choosePiece(document, id)));
  const showView = useEffectEvent((next: DrawingView) => onView(next));
  const pull = useEffectEvent((next: Drag | null) => onDrag(next));
  const drop = useEffectEvent(() => {
    if (drag === null) return;
    const dropped = drag;
    edit({ label: labelOfDrag(dropped), change: (before) => documentOfDrag(before, dropped) });
    onDrag(null);
  });

  useEffect(() => {
    if (place.current === null) return;
    const made = createScene(place.current);
    setScene(made);
    const stop = listenToCanvas(made.canvas, {
      view: () => host().view,
      fit: () => host().fit,
      showView,
      spaceDown: () => spaceDown.current,
      touched: (point) => {
        const now = host();
        const reachMm = reachPx / now.view.scale;
        // A hole lies under its cap: it is taken hold of once its layer is chosen, before that the cap belongs to the piece.
        const holeId = holeAt(now.document, now.selection.layerKey, point);
        if (holeId !== null) return { kind: "hole", id: holeId };
        const pieceId = now.figures && pieceAt({ document: now.document, figures: now.figures, reachMm }, point);
        return pieceId === null ? null : { kind: "piece", id: pieceId };
      },
      press: (touched, { more }) => press(touched, more),
      pressTwice: (touched) => {
        if (touched.kind === "piece") pressTwice(touched.id);
      },
      drag: (touched, _from, by, { free }) => {
        const now = host();
        if (touched.kind === "hole") {
          const hole = findHole(now.document, touched.id);
          if (hole) pull({ kind: "hole", holeId: hole.id, x: hole.x + by.dx, y: hole.y + by.dy });
          return;
        }
        const { pieceIds } = now.selection;
        const moved = shiftsBetween(now.figuresOf, now.document);
        const box = now.figures && boxOfChosen(now.figures, pieceIds, moved);
        if (!box || !now.figures) return;
        const { width, height } = now.document.board;
        const others = [{ x: 0, y: 0, width, height }, ...boxesToLineUpWith(now.figures, pieceIds)];
        const caught = free
          ? { ...by, guides: [] }
          : catchGuides({ box, ...by, reachMm: reachPx / now.view.scale }, others);
        pull({ kind: "pieces", pieceIds, ...caught });
      },
      drop,
      giveUp: () => pull(null),
    });
    return () => {
      stop();
      setScene(null);
      void made.close();
    };
  }, [spaceDown]);

  const latestShifts = useEffectEvent(() => shifts);
  useEffect(() => {
    if (scene !== null && elevation !== null) void scene.show(elevation, latestShifts());
  }, [scene, elevation]);
  useEffect(() => scene?.ground(document.presentation.wall), [scene, document.presentation.wall]);
  useEffect(() => scene?.shift(shifts), [scene, shifts]);
  const latestShadows = useEffectEvent(() => figures && castShadows(document, figures));
  // Until the picture has caught up with where they were put down, pieces keep the shadows they had in the hand.
  const isSettled = shifts.size === 0;
  useEffect(() => {
    if (isLifted) scene?.lift(latestShadows());
    else if (isSettled) scene?.lift(null);
  }, [scene, isLifted, isSettled]);
  useEffect(() => {
    if (room !== null) scene?.look(view, room);
  }, [scene, view, room]);
  useEffect(() => {
    const hole = selection.holeId === null ? null : findHole(wanted, selection.holeId);
    scene?.mark({
      chosen: chosenBox === null ? [] : [chosenBox],
      hole: hole === null ? null : { x: hole.x, y: hole.y, diameter: hole.capDiameter },
      guides: drag?.kind === "pieces" ? drag.guides : [],
      spot,
    });
  }, [scene, chosenBox, wanted, selection.holeId, drag, spot]);

  function handleKeyDown(event: KeyboardEvent) {
    if (event.altKey || event.ctrlKey || event.metaKey) return;
    const middle = room === null ? { x: 0, y: 0 } : { x: room.width / 2, y: room.height / 2 };
    const arrow = arrows.get(event.key);
    if (arrow) {
      event.preventDefault();
      nudge(arrow, event.shiftKey ? farNudgeMm : nudgeMm);
    } else if (event.key === "+" || event.key === "=") onView(viewScaled(view, stepFactor, middle, fit));
    else if (event.key === "-") onView(viewScaled(view, 1 / stepFactor, middle, fit));
    else if (event.key === "0") onView(null);
    else if (event.key === "Delete" || event.key === "Backspace") remove();
    else if (event.key === "Escape") {
      if (drag === null) choose(nothingChosen);
      else onDrag(null);
    }
  }

  const takesKeys = { tabIndex: 0, onKeyDown: handleKeyDown };

  function nudge({ x, y }: Point, by: number) {
    const { holeId, pieceIds } = selection;
    if (holeId !== null) {
      const hole = findHole(document, holeId);
      if (hole)
        edit({
          label: "Move a hole",
          together: `nudge ${holeId}`,
          change: (before) => setHole(before, { holeId, x: hole.x + x * by, y: hole.y + y * by }),
        });
    } else if (pieceIds.length > 0)
      edit({
        label: "Move pieces",
        together: `nudge ${pieceIds.join(" ")}`,
        change: (before) => movePieces(before, { pieceIds, dx: x * by, dy: y * by }),
      });
    else onView(viewMoved(view, { x: -x * 48, y: -y * 48 }));
  }

  function remove() {
    const { holeId, pieceIds } = selection;
    if (holeId !== null) edit({ label: "Remove a hole", change: (before) => removeHole(before, { holeId }) });
    else if (pieceIds.length > 0)
      edit({ label: "Remove pieces", change: (before) => removePieces(before, { pieceIds }) });
  }

  return (
    <div className="relative h-full min-h-0 overflow-hidden">
      <div
        ref={frame}
        role="application"
        aria-label="Elevation, from the front"
        aria-describedby={hintId}
        {...takesKeys}
        className="absolute inset-0 touch-none overflow-hidden -outline-offset-4"
      >
        <div ref={place} />
      </div>
      <p id={hintId} className="sr-only">
        Choose a layer in the schedule or a piece in the list below. Arrows move what is chosen by 1 mm, with Shift by
        10; Delete removes it. Plus and minus look closer and farther, 0 shows the whole board.
      </p>
      <ViewTools view={view} fit={fit} room={room} onView={onView} />
      {failure !== null && (
        <p role="alert" className="absolute inset-x-4 bottom-14 border-l-4 border-oxblood bg-sheet p-3 text-sm">
          The drawing could not be made: {failure} Your work is kept. Undo the last step, or load the page again.
        </p>
      )}
    </div>
  );
}

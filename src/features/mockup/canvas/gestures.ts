import type { Canvas, TPointerEvent } from "fabric/es";
import type { Point } from "#shared/geometry/path.ts";
import { type DrawingView, spotOnDrawing, viewFollowing } from "@/lib/drawing-view.ts";

/** What lies under a finger. */
export type Touched = { readonly kind: "piece" | "hole"; readonly id: string };

/** Keys held while pressing or dragging: `more` adds to what is chosen, `free` lets nothing catch. */
export type Held = { readonly more: boolean; readonly free: boolean };

/** How near a finger must come to an outline, and a moved edge to a line, px. */
export const reachPx = 6;

/** A place in the window, px. */
type Place = { readonly x: number; readonly y: number };

/** What the canvas does for a gesture. Points are mm of the board, view and places px of the window. */
export type GestureHost = {
  readonly view: () => DrawingView;
  readonly fit: () => DrawingView;
  readonly showView: (view: DrawingView) => void;
  /** Looks closer or farther about a place. False when there is nothing to change, so that the page may scroll. */
  readonly zoom: (factor: number, about: Place) => boolean;
  readonly touched: (point: Point) => Touched | null;
  /** Whether every drag looks around, as with the space bar down. */
  readonly looksAround: () => boolean;
  readonly press: (touched: Touched | null, held: Held) => void;
  /** Puts something down where a press is, when something is at hand for that; false when nothing is. */
  readonly put: (point: Point) => boolean;
  readonly pressTwice: (touched: Touched) => void;
  /** `by` is mm from where the hand took hold. */
  readonly drag: (touched: Touched, by: { dx: number; dy: number }, held: Held) => void;
  readonly drop: () => void;
  readonly giveUp: () => void;
  /** A box is drawn from bare ground, or from anywhere with Ctrl held, between two points. */
  readonly sweep: (from: Point, to: Point) => void;
  readonly endSweep: (held: Held) => void;
  readonly giveUpSweep: () => void;
  /** Where the pointer is in the window; null when it has left. */
  readonly pointer: (place: Place | null) => void;
};

/** A hand that trembles by so many px still presses; more than that drags. */
const dragFromPx = 4;
const twiceWithinMs = 400;

type Pan = { readonly view: DrawingView; readonly from: ReadonlyMap<number, Place> };
/** A press on bare ground, from which a box may be drawn. */
type Corner = { readonly place: Place; readonly point: Point; moved: boolean };
type Hold = { readonly touched: Touched; readonly place: Place; readonly point: Point; moved: boolean };

/** Listens to a canvas and turns presses, drags, wheel and two fingers into what the host of the moment does. Gives back how to stop. */
export function listenToCanvas(canvas: Canvas, host: () => GestureHost): () => void {
  const fingers = new Map<number, Place>();
  let pan: Pan | null = null;
  let hold: Hold | null = null;
  let corner: Corner | null = null;
  let lastPress: { id: string; at: number } | null = null;

  const pointOf = (place: Place): Point => spotOnDrawing(host().view(), place);
  const heldOf = (event: PointerEvent): Held => ({ more: event.shiftKey, free: event.altKey });

  function letGo() {
    if (hold?.moved) host().giveUp();
    if (corner?.moved) host().giveUpSweep();
    hold = null;
    corner = null;
  }

  function handleDown({ e, viewportPoint }: { e: TPointerEvent; viewportPoint: Place }) {
    if (!(e instanceof PointerEvent)) return;
    const place = { x: viewportPoint.x, y: viewportPoint.y };
    fingers.set(e.pointerId, place);
    canvas.upperCanvasEl.setPointerCapture(e.pointerId);
    const looksAround = e.button === 1 || host().looksAround();
    if (fingers.size > 1 || looksAround) {
      letGo();
      pan = { view: host().view(), from: new Map(fingers) };
      return;
    }
    if (e.button !== 0) return;
    const point = pointOf(place);
    const touched = e.ctrlKey || e.metaKey ? null : host().touched(point);
    if (touched?.kind !== "hole" && host().put(point)) {
      lastPress = null;
      return;
    }
    const twice = touched !== null && lastPress?.id === touched.id && e.timeStamp - lastPress.at < twiceWithinMs;
    lastPress = touched === null ? null : { id: touched.id, at: e.timeStamp };
    if (touched !== null && twice) host().pressTwice(touched);
    else host().press(touched, heldOf(e));
    if (touched === null) corner = { place, point, moved: false };
    else hold = { touched, place, point, moved: false };
  }

  const hasMoved = (from: Place, to: Place) => Math.hypot(to.x - from.x, to.y - from.y) >= dragFromPx;

  function handleMove({ e, viewportPoint }: { e: TPointerEvent; viewportPoint: Place }) {
    if (!(e instanceof PointerEvent)) return;
    const place = { x: viewportPoint.x, y: viewportPoint.y };
    host().pointer(place);
    if (!fingers.has(e.pointerId)) return;
    fingers.set(e.pointerId, place);
    if (pan !== null) {
      const ids = [...pan.from.keys()].filter((id) => fingers.has(id)).slice(0, 2);
      const placesIn = (map: ReadonlyMap<number, Place>) => ids.flatMap((id) => map.get(id) ?? []);
      host().showView(viewFollowing(pan.view, placesIn(pan.from), placesIn(fingers), host().fit()));
      return;
    }
    if (corner !== null) {
      corner.moved ||= hasMoved(corner.place, place);
      if (corner.moved) host().sweep(corner.point, pointOf(place));
      return;
    }
    if (hold === null || (!hold.moved && !hasMoved(hold.place, place))) return;
    hold.moved = true;
    const point = pointOf(place);
    host().drag(hold.touched, { dx: point.x - hold.point.x, dy: point.y - hold.point.y }, heldOf(e));
  }

  function handleUp({ e }: { e: TPointerEvent }) {
    if (!(e instanceof PointerEvent) || !fingers.delete(e.pointerId)) return;
    if (pan !== null) pan = fingers.size === 0 ? null : { view: host().view(), from: new Map(fingers) };
    if (hold?.moved) host().drop();
    if (corner?.moved) host().endSweep(heldOf(e));
    hold = null;
    corner = null;
  }

  function handleOut() {
    host().pointer(null);
  }

  function handleWheel({ e, viewportPoint }: { e: WheelEvent; viewportPoint: Place }) {
    const notch = e.deltaMode === WheelEvent.DOM_DELTA_PIXEL ? e.deltaY : e.deltaY * 33;
    const factor = Math.exp(-notch * (e.ctrlKey ? 0.01 : 0.0018));
    if (host().zoom(factor, { x: viewportPoint.x, y: viewportPoint.y })) e.preventDefault();
  }

  /** Lets go at once: a move still on its way must not take hold again. */
  function handleKey(event: KeyboardEvent) {
    if (event.key !== "Escape" || (hold === null && corner === null)) return;
    event.stopPropagation();
    letGo();
  }

  function handleCancel() {
    fingers.clear();
    pan = null;
    letGo();
  }

  const offs = [
    canvas.on("mouse:down:before", handleDown),
    canvas.on("mouse:move:before", handleMove),
    canvas.on("mouse:up:before", handleUp),
    canvas.on("mouse:wheel", handleWheel),
    canvas.on("mouse:out", handleOut),
  ];
  canvas.upperCanvasEl.addEventListener("pointercancel", handleCancel);
  // Before anyone else hears of it, wherever the focus is.
  window.addEventListener("keydown", handleKey, true);
  return () => {
    for (const off of offs) off();
    canvas.upperCanvasEl.removeEventListener("pointercancel", handleCancel);
    window.removeEventListener("keydown", handleKey, true);
  };
}

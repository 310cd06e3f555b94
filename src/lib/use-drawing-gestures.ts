import { type KeyboardEvent, type PointerEvent, type RefObject, useEffect, useEffectEvent, useRef } from "react";
import { type DrawingView, type Size, viewFollowing, viewHeld, viewMoved, viewScaled } from "./drawing-view.ts";

type Gestures = {
  element: RefObject<HTMLElement | null>;
  picture: Size;
  room: Size | null;
  fit: DrawingView;
  view: DrawingView;
  /** null asks for the whole drawing. */
  onView: (view: DrawingView | null) => void;
};

type Place = { x: number; y: number };
/** Where the view and the fingers were when their number last changed: the gesture is reckoned from there. */
type Began = { view: DrawingView; fingers: Map<number, Place> };

/** A hand that trembles by so many px still touches a spot; more than that drags. */
const dragFromPx = 6;
const stepPx = 64;
const stepFactor = 1.4;

const scaleKeys = new Map([
  ["+", stepFactor],
  ["=", stepFactor],
  ["-", 1 / stepFactor],
]);
const moveKeys = new Map<string, Place>([
  ["ArrowLeft", { x: stepPx, y: 0 }],
  ["ArrowRight", { x: -stepPx, y: 0 }],
  ["ArrowUp", { x: 0, y: stepPx }],
  ["ArrowDown", { x: 0, y: -stepPx }],
]);

/** Pan and zoom of a drawing by pointer, two fingers, wheel and keys. */
export function useDrawingGestures({ element, picture, room, fit, view, onView }: Gestures) {
  const fingers = useRef(new Map<number, Place>());
  const began = useRef<Began | null>(null);
  const dragged = useRef(false);
  const isWhole = view.scale <= fit.scale * 1.001;

  function show(next: DrawingView) {
    if (room) onView(next.scale <= fit.scale * 1.001 ? null : viewHeld(next, picture, room));
  }

  function placeOf(event: { clientX: number; clientY: number }): Place {
    const box = element.current?.getBoundingClientRect();
    return { x: event.clientX - (box?.left ?? 0), y: event.clientY - (box?.top ?? 0) };
  }

  function step(factor: number) {
    if (room) show(viewScaled(view, factor, { x: room.width / 2, y: room.height / 2 }, fit));
  }

  const handleWheel = useEffectEvent((event: WheelEvent) => {
    const notch = event.deltaMode === WheelEvent.DOM_DELTA_PIXEL ? event.deltaY : event.deltaY * 33;
    const factor = Math.exp(-notch * (event.ctrlKey ? 0.01 : 0.0018));
    // With the whole drawing in view, wheeling away is left to the page.
    if (factor < 1 && isWhole) return;
    event.preventDefault();
    show(viewScaled(view, factor, placeOf(event), fit));
  });

  useEffect(() => {
    const watched = element.current;
    const listen = (event: WheelEvent) => handleWheel(event);
    // React listens to the wheel passively, so the page would scroll along.
    watched?.addEventListener("wheel", listen, { passive: false });
    return () => watched?.removeEventListener("wheel", listen);
  }, [element]);

  function begin() {
    began.current = fingers.current.size === 0 ? null : { view, fingers: new Map(fingers.current) };
  }

  function handlePointerDown(event: PointerEvent) {
    if (event.pointerType === "mouse" && event.button !== 0) return;
    if (fingers.current.size === 0) dragged.current = false;
    fingers.current.set(event.pointerId, placeOf(event));
    begin();
  }

  function handlePointerMove(event: PointerEvent) {
    const from = began.current;
    const start = from?.fingers.get(event.pointerId);
    if (!from || !start) return;
    const place = placeOf(event);
    fingers.current.set(event.pointerId, place);
    if (!dragged.current && Math.hypot(place.x - start.x, place.y - start.y) < dragFromPx) return;
    dragged.current = true;
    element.current?.setPointerCapture(event.pointerId);
    const ids = [...from.fingers.keys()].slice(0, 2);
    const placesIn = (map: Map<number, Place>) => ids.flatMap((id) => map.get(id) ?? []);
    show(viewFollowing(from.view, placesIn(from.fingers), placesIn(fingers.current), fit));
  }

  function handlePointerEnd(event: PointerEvent) {
    if (fingers.current.delete(event.pointerId)) begin();
  }

  function handleKeyDown(event: KeyboardEvent) {
    if (event.altKey || event.ctrlKey || event.metaKey) return;
    const factor = scaleKeys.get(event.key);
    const by = moveKeys.get(event.key);
    // Arrows in a whole drawing have nothing to move: they scroll the page.
    if (factor === undefined && event.key !== "0" && (by === undefined || isWhole)) return;
    event.preventDefault();
    if (factor !== undefined) step(factor);
    else if (by !== undefined) show(viewMoved(view, by));
    else onView(null);
  }

  return {
    step,
    isWhole,
    /** Whether the last press of the pointer ended a drag, so that its click touches nothing. */
    endedDrag: () => dragged.current,
    /** For the drawing's window: it takes focus, since it takes keys of its own. */
    windowProps: {
      tabIndex: 0,
      onPointerDown: handlePointerDown,
      onPointerMove: handlePointerMove,
      onPointerUp: handlePointerEnd,
      onPointerCancel: handlePointerEnd,
      onKeyDown: handleKeyDown,
    },
  };
}

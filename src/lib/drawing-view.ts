/** How a drawing lies in its window: a point of the drawing in mm shows at x + mm · scale in window px. */
export type DrawingView = { readonly scale: number; readonly x: number; readonly y: number };

export type Size = { readonly width: number; readonly height: number };
type Spot = { readonly x: number; readonly y: number };

/** How many times closer than the whole drawing one may come. */
const closest = 24;

/** The whole drawing in the middle of its window, with `margin` px kept free on every side. */
export function viewFit(picture: Size, room: Size, margin = 12): DrawingView {
  const across = Math.max(1, room.width - 2 * margin) / picture.width;
  const down = Math.max(1, room.height - 2 * margin) / picture.height;
  const scale = Math.min(across, down);
  return {
    scale,
    x: (room.width - picture.width * scale) / 2,
    y: (room.height - picture.height * scale) / 2,
  };
}

/** Where a spot of the drawing (mm) shows in the window (px). */
export function spotInWindow(view: DrawingView, spot: Spot): Spot {
  return { x: view.x + spot.x * view.scale, y: view.y + spot.y * view.scale };
}

/** Which spot of the drawing (mm) shows at a place of the window (px). */
export function spotOnDrawing(view: DrawingView, place: Spot): Spot {
  return { x: (place.x - view.x) / view.scale, y: (place.y - view.y) / view.scale };
}

/**
 * The view with its scale times `factor`, the spot under `about` (window px) staying where it is. The scale stays between
 * that of `fit` and 24 times that.
 */
export function viewScaled(view: DrawingView, factor: number, about: Spot, fit: DrawingView): DrawingView {
  const scale = Math.min(fit.scale * closest, Math.max(fit.scale, view.scale * factor));
  const held = spotOnDrawing(view, about);
  return { scale, x: about.x - held.x * scale, y: about.y - held.y * scale };
}

export function viewMoved(view: DrawingView, by: Spot): DrawingView {
  return { ...view, x: view.x + by.x, y: view.y + by.y };
}

/**
 * The nearest view in which the drawing has not been lost: centred along an axis where it is smaller than the window, else
 * its edges come no further in than a quarter of the window.
 */
export function viewHeld(view: DrawingView, picture: Size, room: Size): DrawingView {
  const hold = (at: number, length: number, space: number) => {
    if (length <= space) return (space - length) / 2;
    const slack = space / 4;
    return Math.min(slack, Math.max(space - length - slack, at));
  };
  return {
    scale: view.scale,
    x: hold(view.x, picture.width * view.scale, room.width),
    y: hold(view.y, picture.height * view.scale, room.height),
  };
}

/** Moves the view so far that a spot (mm) lies at least `inset` px inside the window; the same view when it does already. */
export function viewShowing(view: DrawingView, spot: Spot, room: Size, inset = 48): DrawingView {
  const place = spotInWindow(view, spot);
  const missing = (at: number, space: number) => {
    const least = Math.min(inset, space / 2);
    if (at < least) return least - at;
    return at > space - least ? space - least - at : 0;
  };
  const by = { x: missing(place.x, room.width), y: missing(place.y, room.height) };
  return by.x === 0 && by.y === 0 ? view : viewMoved(view, by);
}

/**
 * The view after one or two fingers went from places to places of the window: one drags, two also come closer or go
 * farther by how their distance changed. `from` and `to` name the same fingers in the same order.
 */
export function viewFollowing(
  view: DrawingView,
  from: readonly Spot[],
  to: readonly Spot[],
  fit: DrawingView,
): DrawingView {
  const [a, b] = [middleOf(from), middleOf(to)];
  const apart = spread(from);
  const factor = apart === 0 ? 1 : spread(to) / apart;
  const scaled = from.length > 1 ? viewScaled(view, factor, a, fit) : view;
  return viewMoved(scaled, { x: b.x - a.x, y: b.y - a.y });
}

function middleOf(places: readonly Spot[]): Spot {
  const sum = places.reduce((total, place) => ({ x: total.x + place.x, y: total.y + place.y }), { x: 0, y: 0 });
  const count = Math.max(1, places.length);
  return { x: sum.x / count, y: sum.y / count };
}

function spread([one, other]: readonly Spot[]): number {
  return one && other ? Math.hypot(one.x - other.x, one.y - other.y) : 0;
}

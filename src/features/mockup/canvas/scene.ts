import { Canvas, cache, type FabricObject, Shadow } from "fabric/es";
import type { DisplayList } from "#shared/drawing/display-list.ts";
import { boardOriginOf } from "#shared/drawing/elevation.ts";
import type { DrawingView, Size } from "@/lib/drawing-view.ts";
import type { CastShadow } from "../model/cast-shadows.ts";
import type { Shift } from "../model/shifts.ts";
import { type Images, loadImages } from "./load-images.ts";
import { type Marks, noMarks } from "./marks.ts";
import { drawingFaces, type Painted, paintItems } from "./paint-items.ts";
import { paintMarks } from "./paint-marks.ts";

/** As dark as the shadows of the drawing are at their darkest. */
const castColour = "rgba(26, 18, 8, 0.46)";

export type Scene = {
  readonly canvas: Canvas;
  /** Shows a picture of `drawElevation` as soon as its images and letters are there; a later one overtakes it. */
  readonly show: (list: DisplayList, shifts: ReadonlyMap<string, Shift>) => Promise<void>;
  /** The wall around the picture. */
  readonly ground: (colour: string) => void;
  /** Moves what carries these ids from where the picture has it, until the next picture comes. */
  readonly shift: (shifts: ReadonlyMap<string, Shift>) => void;
  /** Pieces in the hand throw the canvas's own rough shadows in place of the picture's; null gives those back. */
  readonly lift: (shadows: ReadonlyMap<string, CastShadow> | null) => void;
  readonly mark: (marks: Marks) => void;
  /** The view is of the board: its upper left corner lies at x, y of the window. */
  readonly look: (view: DrawingView, room: Size) => void;
  readonly close: () => Promise<void>;
};

/** A shown object, with where the picture has it. */
type Shown = Painted & { readonly left: number; readonly top: number };

/** The only place that makes fabric objects. What they show comes in; nothing is ever read back from them. */
export function createScene(host: HTMLElement): Scene {
  // Its own element each time: fabric takes one back only some time after it was closed.
  const element = document.createElement("canvas");
  host.append(element);
  const canvas = new Canvas(element, {
    selection: false,
    skipTargetFind: true,
    enablePointerEvents: true,
    renderOnAddRemove: false,
    stopContextMenu: false,
    fireMiddleClick: true,
    defaultCursor: "default",
  });
  const letters = loadLetters();
  let shown: Shown[] = [];
  let marked: FabricObject[] = [];
  let lifted: ReadonlyMap<string, CastShadow> | null = null;
  let images: Images = new Map();
  let turns = 0;
  let marks = noMarks;
  let origin = { x: 0, y: 0 };
  let view: DrawingView = { scale: 1, x: 0, y: 0 };

  async function show(list: DisplayList, shifts: ReadonlyMap<string, Shift>) {
    const turn = ++turns;
    const [loaded] = await Promise.all([loadImages(list, images), letters]);
    if (turn !== turns) return;
    images = loaded;
    origin = boardOriginOf(list) ?? { x: 0, y: 0 };
    canvas.remove(...shown.map(({ object }) => object));
    shown = paintItems(list, images).map((painted) => ({
      ...painted,
      left: painted.object.left - origin.x,
      top: painted.object.top - origin.y,
    }));
    canvas.insertAt(0, ...shown.map(({ object }) => object));
    lift(lifted);
    shift(shifts);
  }

  function lift(shadows: ReadonlyMap<string, CastShadow> | null) {
    lifted = shadows;
    const first = new Set<string>();
    for (const { object, id, isShadow } of shown) {
      if (isShadow) object.visible = shadows === null;
      // Only a piece's body throws a shadow, which is the first of what carries its name.
      if (id === null || first.has(id)) continue;
      first.add(id);
      const cast = shadows?.get(id);
      object.shadow = cast
        ? new Shadow({ color: castColour, offsetX: cast.dx, offsetY: cast.dy, blur: cast.blur })
        : null;
    }
    canvas.requestRenderAll();
  }

  function shift(shifts: ReadonlyMap<string, Shift>) {
    for (const { object, id, left, top } of shown) {
      const by = id === null ? undefined : shifts.get(id.replace(/^hole:/, ""));
      object.set({ left: left + (by?.dx ?? 0), top: top + (by?.dy ?? 0) });
      object.setCoords();
    }
    canvas.requestRenderAll();
  }

  function mark(next: Marks) {
    marks = next;
    canvas.remove(...marked);
    marked = paintMarks(marks, 1 / view.scale);
    canvas.add(...marked);
    canvas.requestRenderAll();
  }

  function look(next: DrawingView, room: Size) {
    const rescaled = next.scale !== view.scale;
    view = next;
    if (canvas.width !== room.width || canvas.height !== room.height) canvas.setDimensions(room);
    canvas.setViewportTransform([view.scale, 0, 0, view.scale, view.x, view.y]);
    if (rescaled) mark(marks);
    else canvas.requestRenderAll();
  }

  function ground(colour: string) {
    canvas.backgroundColor = colour;
    canvas.requestRenderAll();
  }

  async function close() {
    turns += 1;
    const { wrapperEl } = canvas;
    await canvas.dispose();
    wrapperEl.remove();
    element.remove();
  }

  return { canvas, show, ground, shift, lift, mark, look, close };
}

/** The drawing's faces, before anything is lettered in them: fabric remembers the widths of what it measured too early. */
async function loadLetters(): Promise<void> {
  await Promise.all(drawingFaces.map((face) => document.fonts.load(face)));
  cache.clearFontCache();
}

import { Canvas, cache, type FabricObject } from "fabric/es";
import type { DisplayList } from "#shared/drawing/display-list.ts";
import { boardOriginOf } from "#shared/drawing/elevation.ts";
import type { DrawingView, Size } from "@/lib/drawing-view.ts";
import type { Shift } from "../model/shifts.ts";
import { type Images, loadImages } from "./load-images.ts";
import { type Marks, noMarks } from "./marks.ts";
import { drawingFaces, paintItems } from "./paint-items.ts";
import { paintMarks } from "./paint-marks.ts";

export type Scene = {
  readonly canvas: Canvas;
  /** Shows a picture of `drawElevation` as soon as its images and letters are there; a later one overtakes it. */
  readonly show: (list: DisplayList, shifts: ReadonlyMap<string, Shift>) => Promise<void>;
  /** The wall around the picture. */
  readonly ground: (colour: string) => void;
  /** Moves what carries these ids from where the picture has it, until the next picture comes. */
  readonly shift: (shifts: ReadonlyMap<string, Shift>) => void;
  readonly mark: (marks: Marks) => void;
  /** The view is of the board: its upper left corner lies at x, y of the window. */
  readonly look: (view: DrawingView, room: Size) => void;
  readonly close: () => Promise<void>;
};

/** A shown object, with where the picture has it. */
type Shown = { readonly object: FabricObject; readonly id: string | null; readonly left: number; readonly top: number };

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
    shown = paintItems(list, images).map(({ object, id }) => ({
      object,
      id,
      left: object.left - origin.x,
      top: object.top - origin.y,
    }));
    canvas.insertAt(0, ...shown.map(({ object }) => object));
    shift(shifts);
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

  return { canvas, show, ground, shift, mark, look, close };
}

/** The drawing's faces, before anything is lettered in them: fabric remembers the widths of what it measured too early. */
async function loadLetters(): Promise<void> {
  await Promise.all(drawingFaces.map((face) => document.fonts.load(face)));
  cache.clearFontCache();
}

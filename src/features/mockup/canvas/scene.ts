import { Canvas, cache, type FabricObject } from "fabric/es";
import type { DisplayList } from "#shared/drawing/display-list.ts";
import { boardOriginOf } from "#shared/drawing/elevation.ts";
import type { Box } from "#shared/geometry/path.ts";
import type { DrawingView, Size } from "@/lib/drawing-view.ts";
import type { CastShadow } from "../model/cast-shadows.ts";
import type { Shift } from "../model/shifts.ts";
import { type Grid, GridLines } from "./grid-lines.ts";
import { type Images, loadImages } from "./load-images.ts";
import { type Marks, noMarks } from "./marks.ts";
import { drawingFaces, type Painted, paintItems } from "./paint-items.ts";
import { paintMarks } from "./paint-marks.ts";
import { Picture } from "./picture.ts";

export type Scene = {
  readonly canvas: Canvas;
  /** Shows a picture of `drawElevation` as soon as its images and letters are there; a later one overtakes it. */
  readonly show: (list: DisplayList, shifts: ReadonlyMap<string, Shift>) => Promise<void>;
  /** The wall around the picture. */
  readonly ground: (colour: string) => void;
  /** Lines over the wood; null for none. */
  readonly rule: (grid: Grid | null) => void;
  /** Moves what carries these ids from where the picture has it, until the next picture comes. */
  readonly shift: (shifts: ReadonlyMap<string, Shift>) => void;
  /** Pieces in the hand throw the canvas's own rough shadows in place of the picture's; null gives those back. */
  readonly lift: (shadows: ReadonlyMap<string, CastShadow> | null) => void;
  readonly mark: (marks: Marks) => void;
  /** The view is of the board: its upper left corner lies at x, y of the window. */
  readonly look: (view: DrawingView, room: Size) => void;
  readonly close: () => Promise<void>;
};

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
  const picture = new Picture();
  canvas.add(picture);
  let painted: Painted[] = [];
  let grid: Grid | null = null;
  let marked: FabricObject[] = [];
  let images: Images = new Map();
  let turns = 0;
  let marks = noMarks;
  let view: DrawingView = { scale: 1, x: 0, y: 0 };
  let window: Box = { x: 0, y: 0, width: 0, height: 0 };

  async function show(list: DisplayList, shifts: ReadonlyMap<string, Shift>) {
    const turn = ++turns;
    const [loaded] = await Promise.all([loadImages(list, images), letters]);
    if (turn !== turns) return;
    images = loaded;
    const origin = boardOriginOf(list) ?? { x: 0, y: 0 };
    painted = paintItems(list, images);
    for (const { object } of painted) object.set({ left: object.left - origin.x, top: object.top - origin.y });
    picture.shift(shifts);
    showAll();
  }

  /** The grid lies over the wood and under all layers. */
  function showAll() {
    const lines = grid && { object: new GridLines(grid), id: null, layer: null, isShadow: false };
    const firstLayer = painted.findIndex(({ layer }) => layer !== null);
    const wood = painted.findLastIndex(({ id }) => id === "board") + 1;
    picture.show(lines ? painted.toSpliced(firstLayer < 0 ? wood : firstLayer, 0, lines) : painted);
    canvas.requestRenderAll();
  }

  function rule(next: Grid | null) {
    grid = next;
    showAll();
  }

  function lift(shadows: ReadonlyMap<string, CastShadow> | null) {
    picture.lift(shadows);
    canvas.requestRenderAll();
  }

  function shift(shifts: ReadonlyMap<string, Shift>) {
    picture.shift(shifts);
    canvas.requestRenderAll();
  }

  function mark(next: Marks) {
    marks = next;
    canvas.remove(...marked);
    marked = paintMarks(marks, 1 / view.scale, window);
    canvas.add(...marked);
    canvas.requestRenderAll();
  }

  function look(next: DrawingView, room: Size) {
    const rescaled = next.scale !== view.scale;
    view = next;
    const mm = (px: number) => px / view.scale;
    window = { x: mm(-view.x), y: mm(-view.y), width: mm(room.width), height: mm(room.height) };
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

  return { canvas, show, ground, rule, shift, lift, mark, look, close };
}

/** The drawing's faces, before anything is lettered in them: fabric remembers the widths of what it measured too early. */
async function loadLetters(): Promise<void> {
  await Promise.all(drawingFaces.map((face) => document.fonts.load(face)));
  cache.clearFontCache();
}

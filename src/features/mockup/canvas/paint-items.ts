import {
  FabricImage,
  type FabricObject,
  type FabricObjectProps,
  Path as FabricPath,
  FabricText,
  type TSimplePathData,
} from "fabric/es";
import type { DisplayList, Font, Item, Stroke } from "#shared/drawing/display-list.ts";
import { groupMatrixInside } from "#shared/drawing/group-matrix.ts";
import { pathData } from "#shared/drawing/path-data.ts";
import type { Path, Point } from "#shared/geometry/path.ts";
import { identityMatrix, type Matrix, pathTransform, pointTransform } from "#shared/geometry/transform.ts";
import { ClippedItems } from "./clipped-items.ts";
import type { Images } from "./load-images.ts";

/** A fabric object with the id of the item that it shows, or of the one it belongs to, as the edge of a piece. */
export type Painted = {
  readonly object: FabricObject;
  readonly id: string | null;
  /** The layer's group that it is drawn in, by its id; null outside any. */
  readonly layer: string | null;
  /** A thing's own picture carries its name; an image without one is a shadow on something. */
  readonly isShadow: boolean;
};

const families: Readonly<Record<Font, { readonly fontFamily: string; readonly fontWeight: string }>> = {
  serif: { fontFamily: "Merriweather", fontWeight: "400" },
  "serif-bold": { fontFamily: "Merriweather", fontWeight: "700" },
  "serif-black": { fontFamily: "Merriweather", fontWeight: "900" },
  sans: { fontFamily: "Merriweather Sans", fontWeight: "400" },
  "sans-semibold": { fontFamily: "Merriweather Sans", fontWeight: "600" },
};

/** Every face the drawings are lettered in, as `FontFaceSet.load` takes it. */
export const drawingFaces: readonly string[] = Object.values(families).map(
  ({ fontFamily, fontWeight }) => `${fontWeight} 16px "${fontFamily}"`,
);

/** A picture is looked at and never edited through its objects; caching each would cost more than drawing it (measured). */
const still = { objectCaching: false, selectable: false, evented: false } as const;

/** A display list as fabric objects in drawing order, in mm of the list. Groups are resolved, so every object is on its own. */
export function paintItems(list: DisplayList, images: Images): Painted[] {
  return paintAll(list.items, identityMatrix, images, null);
}

function paintAll(items: readonly Item[], matrix: Matrix, images: Images, layer: string | null): Painted[] {
  let named: string | null = null;
  let justNamed = false;
  return items.flatMap((item): Painted[] => {
    if (item.kind === "group") return paintAll(item.items, groupMatrixInside(matrix, item), images, item.id ?? layer);
    const own = "id" in item ? (item.id ?? null) : null;
    if (own !== null) named = own;
    // The unnamed lines after a piece, in its layer's group, are that piece's own; so is what is clipped right after any named thing.
    const inLayer = layer?.startsWith("layer:") ? layer : null;
    const belongs = inLayer !== null || (item.kind === "clip" && justNamed);
    const id = own ?? (belongs ? named : null);
    justNamed = own !== null;
    const isShadow = id === null && (item.kind === "image" || item.kind === "clip");
    const object = objectOf(item, matrix, images);
    return object === null ? [] : [{ object, id, layer: inLayer, isShadow }];
  });
}

function objectOf(item: Exclude<Item, { kind: "group" }>, matrix: Matrix, images: Images): FabricObject | null {
  switch (item.kind) {
    case "path":
      return new FabricPath(commandsOf(pathTransform(item.path, matrix)), {
        ...still,
        fill: item.fill ?? null,
        fillRule: "evenodd",
        opacity: item.opacity ?? 1,
        ...strokeOf(item.stroke, matrix.a),
      });
    case "line":
      return new FabricPath(lineCommands(item.points.map((point) => pointTransform(point, matrix))), {
        ...still,
        fill: null,
        ...strokeOf(item.stroke, matrix.a),
      });
    case "text":
      return textOf(item, matrix);
    case "image": {
      const image = images.get(item.pngBase64);
      if (!image) return null;
      const corner = pointTransform(item.box, matrix);
      return new FabricImage(image, {
        ...still,
        originX: "left",
        originY: "top",
        left: corner.x,
        top: corner.y,
        scaleX: (item.box.width * matrix.a) / image.width,
        scaleY: (item.box.height * matrix.a) / image.height,
        opacity: item.opacity ?? 1,
        strokeWidth: 0,
      });
    }
    case "clip": {
      const clip = pathTransform(item.clip, matrix);
      const inside = paintAll(item.items, matrix, images, null).map(({ object }) => object);
      return new ClippedItems(clip, pathData(clip), inside);
    }
  }
}

function textOf(item: Extract<Item, { kind: "text" }>, matrix: Matrix): FabricText {
  const at = pointTransform(item.at, matrix);
  const turn = item.turn ?? 0;
  const text = new FabricText(item.text, {
    ...still,
    ...families[item.font],
    fontSize: item.sizeMm * matrix.a,
    fill: item.colour,
    originX: item.align === "middle" ? "center" : item.align,
    originY: "top",
    angle: turn,
    lineHeight: 1,
    strokeWidth: 0,
  });
  // fabric hangs a line from its top; a drawing sets it on its baseline.
  const rise = text.fontSize * text._fontSizeMult * (1 - text._fontSizeFraction);
  const radians = (turn * Math.PI) / 180;
  text.set({ left: at.x + Math.sin(radians) * rise, top: at.y - Math.cos(radians) * rise });
  return text;
}

function strokeOf(stroke: Stroke | undefined, scale: number): Partial<FabricObjectProps> {
  if (stroke === undefined) return { stroke: null, strokeWidth: 0 };
  return {
    stroke: stroke.colour,
    strokeWidth: stroke.widthMm * scale,
    strokeDashArray: stroke.dashMm?.map((length) => length * scale) ?? null,
    strokeLineCap: stroke.cap ?? "butt",
    strokeLineJoin: "round",
  };
}

function commandsOf(path: Path): TSimplePathData {
  return path.flatMap(
    ({ start, segments }): TSimplePathData => [
      ["M", start.x, start.y],
      ...segments.map((segment): TSimplePathData[number] =>
        segment.kind === "line"
          ? ["L", segment.to.x, segment.to.y]
          : ["C", segment.c1.x, segment.c1.y, segment.c2.x, segment.c2.y, segment.to.x, segment.to.y],
      ),
      ["Z"],
    ],
  );
}

function lineCommands(points: readonly Point[]): TSimplePathData {
  return points.map(({ x, y }, index) => [index === 0 ? "M" : "L", x, y]);
}

import type { Point } from "../geometry/path.ts";
import { columnFields, rowFields, type ZoneField, zoneOf } from "../units/zones.ts";
import type { DrawingSheet, Item } from "./display-list.ts";
import { boardPlaneId } from "./elevation.ts";

/** How the board's plane lies on a sheet: paper mm = origin + board mm · scale. */
type Plane = { readonly x: number; readonly y: number; readonly scale: number };

/** The first board plane among the items, which is the front elevation's; null on a sheet without one. */
function boardPlane(items: readonly Item[], at: Plane = { x: 0, y: 0, scale: 1 }): Plane | null {
  for (const item of items) {
    if (item.kind === "clip") {
      const inside = boardPlane(item.items, at);
      if (inside) return inside;
    }
    if (item.kind !== "group") continue;
    const plane = { x: at.x + item.x * at.scale, y: at.y + item.y * at.scale, scale: at.scale * item.scale };
    if (item.id === boardPlaneId) return plane;
    const inside = boardPlane(item.items, plane);
    if (inside) return inside;
  }
  return null;
}

/** The zone (ISO 5457) of a point of the board on the sheet that shows it, as "B3"; null when the sheet does not show the board there. */
export function zoneOfBoardPoint(sheet: DrawingSheet, point: Point): string | null {
  const plane = boardPlane(sheet.items);
  return plane ? zoneOf({ x: plane.x + point.x * plane.scale, y: plane.y + point.y * plane.scale }, sheet) : null;
}

/** The sheet's zone fields in mm of the board, for a frame around the same picture elsewhere. */
export function zonesOnBoard(sheet: DrawingSheet): { columns: ZoneField[]; rows: ZoneField[] } {
  const plane = boardPlane(sheet.items);
  if (!plane) return { columns: [], rows: [] };
  const onBoard = (from: number) => (field: ZoneField) => ({
    label: field.label,
    fromMm: (field.fromMm - from) / plane.scale,
    toMm: (field.toMm - from) / plane.scale,
  });
  return { columns: columnFields(sheet).map(onBoard(plane.x)), rows: rowFields(sheet).map(onBoard(plane.y)) };
}

/** Millimetres of the sign that make one on this sheet: 5 at 1:5. 1 when the sheet shows no board. */
export function paperScaleOfSheet(sheet: DrawingSheet): number {
  const plane = boardPlane(sheet.items);
  return plane ? 1 / plane.scale : 1;
}

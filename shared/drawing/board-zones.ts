import type { Point } from "../geometry/path.ts";
import { columnFields, rowFields, type ZoneField, zoneOf } from "../units/zones.ts";
import type { DrawingSheet, Item } from "./display-list.ts";

type Plane = { readonly x: number; readonly y: number; readonly scale: number };

/** Where the named plane lies on the paper: the first group of that id, however deep. */
function planeOf(items: readonly Item[], id: string, outer: Plane): Plane | null {
  for (const item of items) {
    if (item.kind === "clip") {
      const found = planeOf(item.items, id, outer);
      if (found) return found;
    }
    if (item.kind !== "group") continue;
    const plane = {
      x: outer.x + item.x * outer.scale,
      y: outer.y + item.y * outer.scale,
      scale: outer.scale * item.scale,
    };
    const found = item.id === id ? plane : planeOf(item.items, id, plane);
    if (found) return found;
  }
  return null;
}

const onPaper = (sheet: DrawingSheet, planeId: string) => planeOf(sheet.items, planeId, { x: 0, y: 0, scale: 1 });

/** The sheet's zones in mm of the board that `planeId` names; null for a sheet that doesn't show it. */
export function boardZones(
  sheet: DrawingSheet,
  planeId: string,
): { readonly columns: ZoneField[]; readonly rows: ZoneField[] } | null {
  const plane = onPaper(sheet, planeId);
  if (plane === null) return null;
  const along = (fields: readonly ZoneField[], origin: number) =>
    fields.map(({ label, fromMm, toMm }) => ({
      label,
      fromMm: (fromMm - origin) / plane.scale,
      toMm: (toMm - origin) / plane.scale,
    }));
  return { columns: along(columnFields(sheet), plane.x), rows: along(rowFields(sheet), plane.y) };
}

/** The zone of a spot of the board (mm) on its sheet, as "B3"; null when the sheet doesn't show the board or the spot is off it. */
export function zoneOnBoard(sheet: DrawingSheet, planeId: string, spot: Point): string | null {
  const plane = onPaper(sheet, planeId);
  return plane && zoneOf({ x: plane.x + spot.x * plane.scale, y: plane.y + spot.y * plane.scale }, sheet);
}

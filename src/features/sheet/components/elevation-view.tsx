import { type ReactNode, useMemo } from "react";
import type { SheetView } from "#shared/contracts/revisions.ts";
import { boardOriginOf } from "#shared/drawing/elevation.ts";
import type { DrawingView, Size } from "@/lib/drawing-view.ts";
import { DrawingViewer } from "@/lib/drawing-viewer.tsx";
import { withoutDimensions } from "../model/dimensions.ts";
import { ZoneMarks } from "./zone-marks.tsx";

type Spot = { readonly x: number; readonly y: number };
export type TouchedSpot = Spot & { readonly pieceId: string | null; readonly layerKey: string | null };

type ElevationViewProps = {
  readonly sheet: Pick<SheetView, "elevation" | "zones" | "board" | "pieces" | "job">;
  readonly view: DrawingView | null;
  readonly onView: (view: DrawingView | null) => void;
  readonly showDimensions: boolean;
  readonly showZones: boolean;
  readonly isPlacing: boolean;
  readonly onTouch: (spot: TouchedSpot) => void;
  readonly onLeavePlacing: () => void;
  /** Balloons: where the board's corner lies on the picture (mm), how the picture lies in its window. */
  readonly balloons: (origin: Spot, shown: DrawingView, room: Size, fit: DrawingView) => ReactNode;
};

const zero: Spot = { x: 0, y: 0 };

/** The front elevation with its zone marks, its balloons and, while a spot is chosen, the cross-hair. */
export function ElevationView(props: ElevationViewProps) {
  const { sheet, view, onView, showDimensions, showZones, isPlacing, onTouch, onLeavePlacing, balloons } = props;
  const list = useMemo(
    () => (showDimensions ? sheet.elevation : withoutDimensions(sheet.elevation)),
    [sheet.elevation, showDimensions],
  );
  const origin = useMemo(() => boardOriginOf(sheet.elevation) ?? zero, [sheet.elevation]);
  const handlePick = useMemo(() => {
    if (!isPlacing) return undefined;
    return (id: string | null, at: Spot) => {
      const piece = sheet.pieces.find((each) => each.id === id);
      const round = (mm: number) => Math.round(mm * 10) / 10;
      onTouch({
        x: round(at.x - origin.x),
        y: round(at.y - origin.y),
        pieceId: piece?.id ?? null,
        layerKey: piece?.layerKey ?? (id === "board" || id === "frame" ? "A" : null),
      });
    };
  }, [isPlacing, onTouch, sheet.pieces, origin]);

  return (
    <div className="relative h-full">
      <DrawingViewer
        list={list}
        title="Front elevation"
        view={view}
        onView={onView}
        onPick={handlePick}
        overlay={(shown, room, fit) => balloons(origin, shown, room, fit)}
        frame={(shown, room) => showZones && <ZoneMarks zones={sheet.zones} origin={origin} view={shown} room={room} />}
        className="h-full"
      />
      {isPlacing && (
        <div className="absolute inset-x-1.5 bottom-1.5 flex items-center justify-center gap-3 border border-indigo bg-sheet px-3 text-sm sm:left-auto">
          <span className="font-semibold text-indigo">Touch the spot you mean.</span>
          <button
            type="button"
            onClick={onLeavePlacing}
            className="min-h-9 cursor-pointer text-indigo underline underline-offset-4 pointer-coarse:min-h-11"
          >
            Leave<span className="pointer-coarse:hidden"> (Escape)</span>
          </button>
        </div>
      )}
    </div>
  );
}

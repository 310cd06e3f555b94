import type { SheetView } from "#shared/contracts/revisions.ts";
import type { DrawingView, Size } from "@/lib/drawing-view.ts";

type Field = { readonly label: string; readonly fromMm: number; readonly toMm: number };

type ZoneMarksProps = {
  readonly zones: NonNullable<SheetView["zones"]>;
  /** Where the board's upper left corner lies on the picture, in mm. */
  readonly origin: { readonly x: number; readonly y: number };
  readonly view: DrawingView;
  readonly room: Size;
};

type Mark = { readonly label: string; readonly at: number; readonly end: number };

/** Fields that show in the window, in px: where the label stands and where the field ends. */
function marksIn(fields: readonly Field[], origin: number, scale: number, moved: number, space: number): Mark[] {
  return fields.flatMap(({ label, fromMm, toMm }) => {
    const from = Math.max(0, moved + (origin + fromMm) * scale);
    const to = Math.min(space, moved + (origin + toMm) * scale);
    return to - from < 14 ? [] : [{ label, at: (from + to) / 2, end: to }];
  });
}

/**
 * Zone letters and numbers in the frame's band at the left and over the row (2.5rem) that names the view. They go along with
 * the drawing, so that they are always the paper's.
 */
export function ZoneMarks({ zones, origin, view, room }: ZoneMarksProps) {
  const columns = marksIn(zones.columns, origin.x, view.scale, view.x, room.width);
  const rows = marksIn(zones.rows, origin.y, view.scale, view.y, room.height);
  return (
    <div aria-hidden="true" className="pointer-events-none font-serif text-fine leading-none text-graphite">
      <div className="absolute inset-x-0 -top-15 h-5 overflow-hidden">
        {columns.map(({ label, at, end }) => (
          <span key={label}>
            <span className="absolute top-1 -translate-x-1/2" style={{ left: at }}>
              {label}
            </span>
            {end < room.width - 1 && (
              <span className="absolute inset-y-0 border-l border-graphite" style={{ left: end }} />
            )}
          </span>
        ))}
      </div>
      <div className="absolute inset-y-0 -left-5 w-5 overflow-hidden">
        {rows.map(({ label, at, end }) => (
          <span key={label}>
            <span className="absolute inset-x-0 -translate-y-1/2 text-center" style={{ top: at }}>
              {label}
            </span>
            {end < room.height - 1 && (
              <span className="absolute inset-x-0 border-t border-graphite" style={{ top: end }} />
            )}
          </span>
        ))}
      </div>
    </div>
  );
}

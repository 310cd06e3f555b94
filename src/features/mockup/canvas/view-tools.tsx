import { cx } from "@/lib/cx.ts";
import { type DrawingView, type Size, viewScaled } from "@/lib/drawing-view.ts";

type ViewToolsProps = {
  readonly view: DrawingView;
  readonly fit: DrawingView;
  readonly room: Size | null;
  readonly onView: (view: DrawingView | null) => void;
};

/** Words to look closer, farther and at the whole board. */
export function ViewTools({ view, fit, room, onView }: ViewToolsProps) {
  const isWhole = view.scale <= fit.scale * 1.001;
  const middle = { x: (room?.width ?? 0) / 2, y: (room?.height ?? 0) / 2 };
  return (
    <p className="absolute top-2 left-2 flex gap-1">
      <ViewButton label="Closer" onPress={() => onView(viewScaled(view, 1.6, middle, fit))} />
      <ViewButton label="Farther" idle={isWhole} onPress={() => onView(viewScaled(view, 1 / 1.6, middle, fit))} />
      <ViewButton label="Whole board" onPress={() => onView(null)} />
    </p>
  );
}

function ViewButton({ label, idle = false, onPress }: { label: string; idle?: boolean; onPress: () => void }) {
  return (
    <button
      type="button"
      aria-disabled={idle}
      onClick={idle ? undefined : onPress}
      className={cx(
        "min-h-8 rounded border bg-sheet/90 px-2 text-fine",
        idle ? "border-rule text-graphite" : "cursor-pointer border-graphite text-ink hover:bg-linen",
      )}
    >
      {label}
    </button>
  );
}

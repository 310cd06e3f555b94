import { cx } from "@/lib/cx.ts";
import { type DrawingView, type Size, viewScaled } from "@/lib/drawing-view.ts";

type ViewToolsProps = {
  readonly view: DrawingView;
  readonly fit: DrawingView;
  readonly room: Size | null;
  readonly onView: (view: DrawingView | null) => void;
  /** Shows what is chosen; null when nothing is. */
  readonly onChosen: (() => void) | null;
  readonly looksAround: boolean;
  readonly onLookAround: (looksAround: boolean) => void;
  /** Whether rulers lie along the edges. */
  readonly besideRulers: boolean;
};

/** Words to look closer, farther, at the whole board, at what is chosen, and around. */
export function ViewTools(props: ViewToolsProps) {
  const { view, fit, room, onView, onChosen, looksAround, onLookAround, besideRulers } = props;
  const isWhole = view.scale <= fit.scale * 1.001;
  const middle = { x: (room?.width ?? 0) / 2, y: (room?.height ?? 0) / 2 };
  return (
    <p className={cx("absolute flex gap-1", besideRulers ? "top-7 left-7" : "top-2 left-2")}>
      <ViewButton label="Closer" onPress={() => onView(viewScaled(view, 1.6, middle, fit))} />
      <ViewButton label="Farther" idle={isWhole} onPress={() => onView(viewScaled(view, 1 / 1.6, middle, fit))} />
      <ViewButton label="Whole board" onPress={() => onView(null)} />
      <ViewButton label="What is chosen" idle={onChosen === null} onPress={() => onChosen?.()} />
      <ViewButton label="Look around" pressed={looksAround} onPress={() => onLookAround(!looksAround)} />
    </p>
  );
}

type ViewButtonProps = {
  readonly label: string;
  readonly idle?: boolean;
  /** For a word that stays pressed. */
  readonly pressed?: boolean;
  readonly onPress: () => void;
};

function ViewButton({ label, idle = false, pressed, onPress }: ViewButtonProps) {
  return (
    <button
      type="button"
      aria-disabled={idle}
      aria-pressed={pressed}
      onClick={idle ? undefined : onPress}
      className={cx(
        "min-h-8 rounded border px-2 text-fine",
        pressed ? "bg-indigo text-sheet" : "bg-sheet/90",
        idle ? "border-rule text-graphite" : "cursor-pointer border-graphite",
        !idle && !pressed && "text-ink hover:bg-linen",
      )}
    >
      {label}
    </button>
  );
}

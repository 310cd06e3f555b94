import { type MouseEvent, memo, type ReactNode, useId, useMemo, useRef } from "react";
import type { DisplayList } from "#shared/drawing/display-list.ts";
import { cx } from "./cx.ts";
import { DrawingSvg } from "./drawing-svg.tsx";
import { type DrawingView, type Size, viewFit } from "./drawing-view.ts";
import { isCrowded, isLegible, legibleAt, withOverallAlone } from "./legible-drawing.ts";
import { useDrawingGestures } from "./use-drawing-gestures.ts";
import { useRoom } from "./use-room.ts";

type DrawingViewerProps = {
  readonly list: DisplayList;
  /** What the picture shows, for those who don't see it. */
  readonly title: string;
  /** null shows the whole drawing. */
  readonly view: DrawingView | null;
  readonly onView: (view: DrawingView | null) => void;
  /** Size in mm that the whole view makes room for, when two pictures are to have one scale. */
  readonly fitTo?: Size;
  /** A cross-hair is shown and a touch names a spot in mm of the picture, with the item touched. */
  readonly onPick?: ((id: string | null, at: { x: number; y: number }) => void) | undefined;
  /** What lies over the drawing in window px, as balloons. */
  readonly overlay?: (shown: DrawingView, room: Size, fit: DrawingView) => ReactNode;
  /** What stands around the window, as zone marks; not clipped by it. */
  readonly frame?: (shown: DrawingView, room: Size) => ReactNode;
  readonly className?: string;
};

/** The picture itself: it is drawn once, and looking around only moves its frame. */
const Picture = memo(DrawingSvg);

/** A drawing in a window: drag, wheel, two fingers, keys or the three words below it to look around. */
export function DrawingViewer(props: DrawingViewerProps) {
  const { list, title, view, onView, fitTo, onPick, overlay, frame, className } = props;
  const element = useRef<HTMLDivElement>(null);
  const room = useRoom(element);
  const hintId = useId();
  const crowded = isCrowded(list, viewFit(fitTo ?? sizeOf(list), room ?? noRoom).scale);
  const spared = useMemo(
    () => (crowded ? withOverallAlone(list, { cropped: fitTo === undefined }) : list),
    [list, crowded, fitTo],
  );
  const fit = useMemo(() => viewFit(fitTo ?? sizeOf(spared), room ?? noRoom), [fitTo, spared, room]);
  const shown = view ?? fit;
  // Two pictures and no more: a new one at each step of a pinch would have to be drawn anew.
  const isClose = isLegible(list, shown.scale);
  const drawn = useMemo(() => (isClose ? list : legibleAt(spared, fit.scale)), [list, spared, isClose, fit.scale]);
  const picture = sizeOf(drawn);
  const gestures = useDrawingGestures({ element, picture: fitTo ?? picture, room, fit, view: shown, onView });

  function handleClickCapture(event: MouseEvent) {
    if (gestures.endedDrag()) event.stopPropagation();
  }

  return (
    <div className={cx("flex flex-col", className)}>
      <div className="relative min-h-0 flex-1">
        {room && frame?.(shown, room)}
        <div
          ref={element}
          role="application"
          aria-label={`${title}, to look around in`}
          aria-describedby={hintId}
          onClickCapture={handleClickCapture}
          {...gestures.windowProps}
          className={cx(
            "absolute inset-0 overflow-hidden -outline-offset-4",
            view === null ? "touch-pan-y" : "touch-none",
            onPick ? "cursor-crosshair" : view !== null && "cursor-grab",
          )}
        >
          {room && (
            <>
              <div
                className="absolute"
                style={{
                  left: shown.x,
                  top: shown.y,
                  width: picture.width * shown.scale,
                  height: picture.height * shown.scale,
                }}
              >
                <Picture
                  list={drawn}
                  title={title}
                  className="block h-full w-full overflow-visible select-none"
                  {...(onPick ? { onPick } : {})}
                />
              </div>
              {overlay?.(shown, room, fit)}
            </>
          )}
        </div>
      </div>
      <p className="flex flex-wrap gap-1 px-2 pt-0.5 pb-2">
        <ViewButton label="Closer" about={title} onPress={() => gestures.step(1.6)} />
        <ViewButton label="Farther" about={title} idle={gestures.isWhole} onPress={() => gestures.step(1 / 1.6)} />
        <ViewButton label="Whole" about={title} idle={gestures.isWhole} onPress={() => onView(null)} />
        {drawn !== list && spared !== list && (
          <span className="flex-1 basis-32 self-center pl-1.5 text-fine text-graphite">
            Closer shows every dimension.
          </span>
        )}
      </p>
      <p id={hintId} className="sr-only">
        Plus and minus look closer and farther, arrows move, 0 shows the whole drawing.
      </p>
    </div>
  );
}

/** Before the window was measured. */
const noRoom: Size = { width: 1, height: 1 };

const sizeOf = ({ widthMm, heightMm }: DisplayList): Size => ({ width: widthMm, height: heightMm });

type ViewButtonProps = {
  readonly label: string;
  readonly about: string;
  /** Pressing it would change nothing; it keeps its place in the tab order. */
  readonly idle?: boolean;
  readonly onPress: () => void;
};

function ViewButton({ label, about, idle = false, onPress }: ViewButtonProps) {
  return (
    <button
      type="button"
      aria-disabled={idle}
      onClick={idle ? undefined : onPress}
      aria-label={`${label}: ${about}`}
      className={cx(
        "min-h-8 rounded border bg-sheet px-2 text-fine pointer-coarse:min-h-11 pointer-coarse:px-3",
        idle ? "border-rule text-graphite" : "cursor-pointer border-graphite text-ink hover:bg-linen",
      )}
    >
      {label}
    </button>
  );
}

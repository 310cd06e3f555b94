import type { Point } from "#shared/geometry/path.ts";
import type { WallPhoto } from "#shared/mockup/document.ts";
import type { Size } from "@/lib/drawing-view.ts";

type MagnifierProps = {
  readonly address: string;
  readonly photo: Pick<WallPhoto, "widthPx" | "heightPx">;
  /** What it shows, px of the photo. */
  readonly at: Point;
  readonly shown: number;
  /** Of the picture, px of the screen. */
  readonly room: Size;
};

const sizePx = 176;
/** Px of the screen to one of the photo. */
const times = 4;
const besidePx = 40;

/** The photo around a mark, four times as large as it is, above the finger or below it where there is no room above. */
export function Magnifier({ address, photo, at, shown, room }: MagnifierProps) {
  const scale = Math.max(times, 2 * shown);
  const above = at.y * shown - besidePx - sizePx;
  const left = Math.min(room.width - sizePx, Math.max(0, at.x * shown - sizePx / 2));
  return (
    <div
      aria-hidden="true"
      className="pointer-events-none absolute z-20 overflow-hidden rounded-full border-2 border-ink bg-linen bg-no-repeat text-madder"
      style={{
        width: sizePx,
        height: sizePx,
        left,
        top: above < 0 ? at.y * shown + besidePx : above,
        backgroundImage: `url("${address}")`,
        backgroundSize: `${photo.widthPx * scale}px ${photo.heightPx * scale}px`,
        backgroundPosition: `${sizePx / 2 - 2 - at.x * scale}px ${sizePx / 2 - 2 - at.y * scale}px`,
      }}
    >
      <svg
        aria-hidden="true"
        viewBox="0 0 176 176"
        className="size-full"
        fill="none"
        stroke="currentColor"
        strokeWidth="1.5"
      >
        <path d="M86 20v58M86 94v58M20 86h58M94 86h58" />
        <circle cx="86" cy="86" r="1.2" fill="currentColor" stroke="none" />
      </svg>
    </div>
  );
}

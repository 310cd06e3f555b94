import { useMemo } from "react";
import type { ArtworkPiece } from "#shared/artwork/imported-artwork.ts";
import { pathToText } from "#shared/geometry/path-text.ts";
import { cx } from "@/lib/cx.ts";

type ArtworkPictureProps = {
  readonly label: string;
  readonly widthMm: number;
  readonly heightMm: number;
  readonly pieces: readonly ArtworkPiece[];
  /** What a piece will be cut from; null when it is left out. */
  readonly colourOf: (index: number) => string | null;
  readonly picked: ReadonlySet<number>;
  readonly onPick?: (index: number) => void;
};

/** An artwork as it will be cut: each piece in the colour of its sheet, what is left out as an outline. Pieces can be picked by pointer. */
export function ArtworkPicture({ label, widthMm, heightMm, pieces, colourOf, picked, onPick }: ArtworkPictureProps) {
  const outlines = useMemo(
    () => pieces.map((piece) => ({ index: piece.index, data: pathToText(piece.path, 2) })),
    [pieces],
  );
  const margin = Math.max(widthMm, heightMm) * 0.02;
  const box = [-margin, -margin, widthMm + 2 * margin, heightMm + 2 * margin].map((mm) => mm.toFixed(3)).join(" ");
  return (
    <svg
      role="img"
      aria-label={label}
      viewBox={box}
      className="block max-h-[45dvh] w-full border border-rule bg-linen text-ink"
    >
      {outlines.map(({ index, data }) => {
        const colour = colourOf(index);
        const isPicked = picked.has(index);
        return (
          <path
            key={index}
            d={data}
            fillRule="evenodd"
            fill={colour ?? "transparent"}
            vectorEffect="non-scaling-stroke"
            strokeWidth={isPicked ? 3 : 0.75}
            {...(colour === null && !isPicked ? { strokeDasharray: "3 3" } : {})}
            className={cx(isPicked ? "stroke-indigo" : "stroke-graphite", onPick && "cursor-pointer")}
            {...(onPick ? { onClick: () => onPick(index) } : {})}
          />
        );
      })}
    </svg>
  );
}

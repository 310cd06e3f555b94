import { artworkLimits } from "../artwork/limits.ts";
import { ArtworkRefused } from "../artwork/refusals.ts";
import { artworkWarnings, type WarningCode } from "../artwork/warnings.ts";
import { nodeCount } from "../geometry/node-count.ts";
import { chooseLabels } from "./choose-labels.ts";
import { findPalette } from "./find-palette.ts";
import { inkSpaceOf, inksOf, inksOfColours } from "./ink-space.ts";
import { labelPixels, relabelled } from "./label-pixels.ts";
import { outlineAreas } from "./outline-areas.ts";
import type { Picture } from "./picture.ts";
import { hexOf } from "./picture-colours.ts";
import { type Density, pictureSize } from "./picture-size.ts";
import { type PixelAreas, pixelAreas } from "./pixel-areas.ts";
import { removeSpeckles } from "./remove-speckles.ts";
import { scaleDown } from "./scale-down.ts";
import type { TraceChoices } from "./trace-choices.ts";
import type { TracedPicture } from "./traced-picture.ts";
import { tracedPieces } from "./traced-pieces.ts";

export type PictureFile = {
  readonly picture: Picture;
  /** Whether the file keeps its pixels only nearly, as JPEG does. */
  readonly lossy: boolean;
  readonly density: Density | null;
  /** What the reader of the file noted. */
  readonly warnings: ReadonlySet<WarningCode>;
};

/** How far outlines may run beside the pixels' edges, in pixels. */
const tolerancePx = { drawn: 0.4, lossy: 0.6 };
/** How much more or less they may for each smoothing, and how often the pixels' edges are evened out before. */
const smoothing = {
  close: { factor: 0.5, passes: { drawn: 0, lossy: 0 } },
  usual: { factor: 1, passes: { drawn: 0, lossy: 2 } },
  smooth: { factor: 1.5, passes: { drawn: 4, lossy: 8 } },
  smoothest: { factor: 2.5, passes: { drawn: 40, lossy: 50 } },
} as const;
/** More of a picture than this in shades that run into each other is a gradient, or a photograph. */
const blurredShare = { drawn: 0.03, lossy: 0.12 };

/**
 * A picture as pieces: its colours, each connected area of one of them with its outline in mm, neighbours sharing their borders. The same
 * picture and choices always give the same. Throws ArtworkRefused when nothing is left to cut, or too much.
 */
export function tracePicture({ picture, lossy, density, warnings }: PictureFile, choices: TraceChoices): TracedPicture {
  const scaled = scaleDown(picture);
  const space = inkSpaceOf({ lossy });
  const inks = inksOf(scaled, space);
  const palette = findPalette(scaled, inks, space, { most: choices.colours, lossy });
  const shades = labelPixels(scaled, inks, inksOfColours(palette.shades, space), { lossy });
  const chosen = chooseLabels(relabelled(shades, palette.colourOf), palette.colours, choices);
  const labels = removeSpeckles(chosen.labels, choices.speckle);
  const areas = pixelAreas(labels);
  refuseTooMany(areas, chosen.none);
  const kind = lossy ? "lossy" : "drawn";
  const outlines = outlineAreas(labels, areas, {
    tolerancePx: tolerancePx[kind] * smoothing[choices.smoothing].factor,
    passes: smoothing[choices.smoothing].passes[kind],
  });

  const size = pictureSize(picture, density);
  const widthMm = picture.width * size.mmPerPx;
  const coloured = [...outlines].flatMap(([area, outline]) => {
    const label = areas.areas[area]?.label ?? chosen.none;
    const colour = palette.colours[label];
    return label === chosen.none || !colour ? [] : [{ colour: hexOf(colour), outline }];
  });
  const { pieces, colours } = tracedPieces(coloured, widthMm / scaled.width);

  const codes = new Set<WarningCode>([...warnings, size.warning]);
  if (chosen.paperDropped) codes.add("picture.paper-dropped");
  if (palette.blurred > blurredShare[kind]) codes.add("picture.shades");
  if (palette.colours.some(({ alpha }) => alpha > 0 && alpha < 255)) codes.add("opacity.mixed");
  if (scaled !== picture) codes.add("picture.scaled-down");
  return {
    artwork: {
      widthMm,
      heightMm: picture.height * size.mmPerPx,
      colours,
      pieces,
      warnings: artworkWarnings(codes),
    },
    record: {
      choices,
      widthPx: picture.width,
      heightPx: picture.height,
      tracedWidthPx: scaled.width,
      tracedHeightPx: scaled.height,
      found: chosen.found,
      nodes: pieces.reduce((sum, { path }) => sum + nodeCount(path), 0),
      smallestMm2: Math.min(...pieces.map(({ areaMm2 }) => areaMm2)),
    },
  };
}

/** Before any border is walked, which for a picture of nothing but specks takes half a minute and more memory than there is. */
function refuseTooMany({ areas }: PixelAreas, none: number): void {
  const coloured = areas.filter(({ label }) => label !== none).length;
  if (coloured > artworkLimits.pieces || areas.length > artworkLimits.pictureOutlines)
    throw new ArtworkRefused("picture.too-many-pieces");
}

import type { Box } from "../geometry/path.ts";
import type { WallPhoto } from "../mockup/document.ts";
import type { Camera } from "./camera.ts";
import { fitCamera } from "./fit-camera.ts";
import { type Homography, homographyBetween, inverse, localScale } from "./homography.ts";
import { type LikelyError, likelyError } from "./likely-error.ts";
import { type CornerFault, cornerFault, type Quad } from "./quad.ts";
import { sheetCornersMm } from "./sheet-on-wall.ts";

type Sheet = Pick<WallPhoto, "paper" | "lies">;

/** What the four corners of the sheet say of the wall. Wall mm are right of and below the middle of the sheet. */
export type WallReading = {
  /** Mm on the wall to px of the photo. */
  readonly toPhoto: Homography;
  readonly toWall: Homography;
  /** Px of the photo to a mm of the wall, at the sheet. */
  readonly pxPerMm: number;
  /** What sees the wall so; null where the view is too frontal for depth to be told. */
  readonly camera: Camera | null;
  /** How far the corners are from where any camera would see a sheet's, root of the mean square. */
  readonly residualPx: number;
  readonly residualMm: number;
  /** Another sheet, or the same turned, that a camera would see there far better; null when there is none. */
  readonly betterSheet: Sheet | null;
};

export type WallOutcome =
  | { readonly ok: true; readonly value: WallReading }
  | { readonly ok: false; readonly reason: CornerFault };

/** Reads a photo's corners; says what is wrong with corners that can't be a sheet's. */
export function readWallPhoto(photo: Omit<WallPhoto, "photoId" | "at">): WallOutcome {
  const { corners } = photo;
  const fault = cornerFault(corners);
  if (fault) return { ok: false, reason: fault };
  const sheet = sheetCornersMm(photo);
  const toPhoto = homographyBetween(sheet, corners);
  const toWall = toPhoto && inverse(toPhoto);
  const fit = fitCamera(photo, sheet, corners);
  const pxPerMm = toPhoto && localScale(toPhoto, { x: 0, y: 0 });
  if (!toPhoto || !toWall || !fit || !pxPerMm) return { ok: false, reason: "in a line" };
  return {
    ok: true,
    value: {
      toPhoto,
      toWall,
      pxPerMm,
      camera: fit.isFocalTold ? fit.camera : null,
      residualPx: fit.residualPx,
      residualMm: fit.residualPx / pxPerMm,
      betterSheet: isDoubtful(fit.residualPx) ? betterSheet(photo, fit.residualPx) : null,
    },
  };
}

/** From here on the marks, and not a hand's tremor, are in question: a corner is marked to 1 or 2 px. */
const doubtfulPx = 2;
/** Whether corners that far from any camera's should be looked at again. */
export const isDoubtful = (residualPx: number): boolean => residualPx > doubtfulPx;

const sheets: readonly Sheet[] = (["A4", "Letter"] as const).flatMap((paper) =>
  (["upright", "lying"] as const).map((lies) => ({ paper, lies })),
);

function betterSheet(photo: Omit<WallPhoto, "photoId" | "at">, residualPx: number): Sheet | null {
  const tried = sheets
    .filter(({ paper, lies }) => paper !== photo.paper || lies !== photo.lies)
    .map((sheet) => ({
      sheet,
      residual: fitCamera(photo, sheetCornersMm(sheet), photo.corners)?.residualPx ?? Number.POSITIVE_INFINITY,
    }))
    .sort((a, b) => a.residual - b.residual);
  const best = tried[0];
  return best && best.residual < residualPx / 3 && !isDoubtful(best.residual) ? best.sheet : null;
}

/** One px of marking, or what the corners are really off by if that is more. */
const leastMarkPx = 1;

/**
 * How far the size and place of a box on the wall (mm from the sheet's middle) may be off. A fit of four corners leaves one figure of
 * eight over, so the marks themselves are off by about twice the residual of the corners.
 */
export function likelyErrorAt(
  photo: Omit<WallPhoto, "photoId" | "at">,
  { residualPx }: Pick<WallReading, "residualPx">,
  box: Box,
): LikelyError | null {
  const corners: Quad = photo.corners;
  return likelyError(sheetCornersMm(photo), corners, box, Math.max(leastMarkPx, markSpreadPx(residualPx)));
}

/** Standard deviation of one figure of the marks: the sum of squares over the one figure left over, which is 4 · residual². */
export const markSpreadPx = (residualPx: number): number => 2 * residualPx;

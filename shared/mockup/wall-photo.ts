import { z } from "zod";
import { coordinate } from "./schema-parts.ts";

/** Longest side of a kept photo, px: what is larger is made smaller when it comes in. */
export const longestPhotoSidePx = 4096;

const sidePx = z.int().min(1).max(longestPhotoSidePx);
const pixel = z.strictObject({
  x: z
    .number()
    .finite()
    .min(-longestPhotoSidePx)
    .max(2 * longestPhotoSidePx),
  y: z
    .number()
    .finite()
    .min(-longestPhotoSidePx)
    .max(2 * longestPhotoSidePx),
});

/** A photo of the wall with a sheet of paper taped on it, and where on the wall the sign is to hang. */
export const wallPhotoSchema = z.strictObject({
  photoId: z.uuid(),
  widthPx: sidePx,
  heightPx: sidePx,
  paper: z.enum(["A4", "Letter"]),
  /** How the sheet is taped, as one standing before the wall sees it. */
  lies: z.enum(["upright", "lying"]),
  /** The sheet's corners in the photo, px from its upper left: upper left, upper right, lower right, lower left. */
  corners: z.tuple([pixel, pixel, pixel, pixel]),
  /** The middle of the board on the wall, mm right of and below the middle of the sheet. */
  at: z.strictObject({ x: coordinate, y: coordinate }),
});

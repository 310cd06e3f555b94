import type { Point } from "#shared/geometry/path.ts";
import type { MockupDocument, WallPhoto } from "#shared/mockup/document.ts";
import { mapQuad, type Quad } from "#shared/wall/quad.ts";
import { coordinateOf } from "../limits.ts";
import { withFields } from "../same.ts";

export type ChosenPhoto = Pick<WallPhoto, "photoId" | "widthPx" | "heightPx">;

/** Shows the sign on a wall of that colour, #RRGGBB; another text changes nothing. */
export function setWallColour(document: MockupDocument, wall: string): MockupDocument {
  return /^#[0-9A-F]{6}$/.test(wall) ? withPresentation(document, { wall }) : document;
}

/**
 * Shows the sign on a photo, with its four marks in the middle to be put on the sheet's corners, the sign beside the sheet; null shows it on a plain
 * wall. The photo that it is on already changes nothing.
 */
export function chooseWallPhoto(
  document: MockupDocument,
  chosen: (ChosenPhoto & Pick<WallPhoto, "paper">) | null,
): MockupDocument {
  if (chosen === null) return withPresentation(document, { photo: null });
  if (document.presentation.photo?.photoId === chosen.photoId) return document;
  const { photoId, widthPx, heightPx, paper } = chosen;
  const at = { x: coordinateOf(document.board.width / 2 + besideMm) ?? 0, y: 0 };
  const corners = firstMarks(chosen);
  return withPresentation(document, {
    photo: { photoId, widthPx, heightPx, paper, lies: "upright", corners: [...corners], at },
  });
}

/** From the sheet's middle to the sign, where it is first shown. */
const besideMm = 300;

/** Marks as an upright A4 sheet would have them that takes a fifth of the photo's shorter side. */
function firstMarks({ widthPx, heightPx }: ChosenPhoto): Quad {
  const half = { x: Math.min(widthPx, heightPx) / 10, y: (Math.min(widthPx, heightPx) / 10) * Math.SQRT2 };
  const [x, y] = [widthPx / 2, heightPx / 2];
  return mapQuad(
    [
      { x: x - half.x, y: y - half.y },
      { x: x + half.x, y: y - half.y },
      { x: x + half.x, y: y + half.y },
      { x: x - half.x, y: y + half.y },
    ],
    roundPx,
  );
}

/** Whether the marks lie as they first came, on no sheet yet: what is read from them means nothing. */
export const isUnmarked = ({ corners, ...photo }: WallPhoto): boolean =>
  firstMarks(photo).every(({ x, y }, corner) => corners[corner]?.x === x && corners[corner]?.y === y);

/** Says which sheet is taped and how it lies. */
export function setSheet(document: MockupDocument, sheet: Partial<Pick<WallPhoto, "paper" | "lies">>): MockupDocument {
  return withPhoto(document, (photo) => withFields<WallPhoto>(photo, sheet));
}

/** Puts the mark of a corner (0 to 3, from the upper left clockwise) to a place in the photo, px, held within the photo. */
export function markCorner(
  document: MockupDocument,
  { corner, to }: { readonly corner: number; readonly to: Point },
): MockupDocument {
  if (!Number.isFinite(to.x) || !Number.isFinite(to.y)) return document;
  return withPhoto(document, (photo) => {
    const within = (value: number, most: number) => Math.min(most, Math.max(0, value));
    const place = roundPx({ x: within(to.x, photo.widthPx), y: within(to.y, photo.heightPx) });
    const [a, b, c, d] = photo.corners;
    const put = (index: number, mark: Point) => (index === corner ? place : mark);
    return withFields(photo, { corners: [put(0, a), put(1, b), put(2, c), put(3, d)] });
  });
}

/** Hangs the middle of the board to a place on the wall, mm right of and below the sheet's middle; out of reach it stays where it is. */
export function hangAt(document: MockupDocument, to: Partial<Point>): MockupDocument {
  return withPhoto(document, (photo) => {
    const [x, y] = [coordinateOf(to.x ?? photo.at.x), coordinateOf(to.y ?? photo.at.y)];
    return x === null || y === null ? photo : withFields(photo, { at: { x, y } });
  });
}

function withPhoto(document: MockupDocument, change: (photo: WallPhoto) => WallPhoto): MockupDocument {
  const { photo } = document.presentation;
  return photo ? withPresentation(document, { photo: change(photo) }) : document;
}

const withPresentation = (document: MockupDocument, fields: Partial<MockupDocument["presentation"]>): MockupDocument =>
  withFields(document, { presentation: withFields(document.presentation, fields) });

/** Marks are kept to a hundredth of a px. */
const roundPx = ({ x, y }: Point): Point => ({ x: Math.round(x * 100) / 100, y: Math.round(y * 100) / 100 });

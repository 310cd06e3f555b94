import type { Hardware, MockupDocument } from "#shared/mockup/document.ts";
import type { Guide } from "./catch-guides.ts";
import { setHole } from "./commands/holes.ts";
import { movePieces } from "./commands/pieces.ts";
import { raiseLayer, setPocket } from "./commands/set-hold.ts";
import { roundMm } from "./limits.ts";
import type { Measure } from "./move-measures.ts";

/** What a hand is moving, measured from where it took hold. */
export type Drag =
  | {
      readonly kind: "pieces";
      readonly pieceIds: readonly string[];
      readonly dx: number;
      readonly dy: number;
      readonly guides: readonly Guide[];
      /** Distances of the moved box to what is around it. */
      readonly measures: readonly Measure[];
    }
  | { readonly kind: "hole"; readonly holeId: string; readonly x: number; readonly y: number }
  /** In the section: `hardware` when the offset caught on a barrel. */
  | { readonly kind: "raise"; readonly key: string; readonly offset: number; readonly hardware: Hardware | undefined }
  /** In the section: how deep a layer's pocket is. */
  | { readonly kind: "let in"; readonly key: string; readonly depth: number };

/** The document as it would be if the hand let go now. A hand goes by thousandths of a millimetre. */
export function documentOfDrag(document: MockupDocument, drag: Drag | null): MockupDocument {
  if (drag === null) return document;
  switch (drag.kind) {
    case "pieces":
      return movePieces(document, { ...drag, dx: roundMm(drag.dx), dy: roundMm(drag.dy) });
    case "hole":
      return setHole(document, { ...drag, x: roundMm(drag.x), y: roundMm(drag.y) });
    case "raise":
      return raiseLayer(document, drag);
    case "let in":
      return setPocket(document, drag);
  }
}

/** What letting go is called in the list of steps. */
export function labelOfDrag(drag: Drag): string {
  switch (drag.kind) {
    case "pieces":
      return "Move pieces";
    case "hole":
      return "Move a hole";
    case "raise":
      return `Raise ${drag.key}`;
    case "let in":
      return `Let ${drag.key} in`;
  }
}

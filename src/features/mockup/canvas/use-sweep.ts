import { useRef, useState } from "react";
import type { Box } from "#shared/geometry/path.ts";
import { useDesk } from "../editor/desk-context.ts";
import { boxBetween, chooseWithin, piecesWithin } from "../model/choose-box.ts";
import { shiftsBetween } from "../model/shifts.ts";
import type { GestureHost } from "./gestures.ts";

/** A box that is being drawn, with the pieces that it would choose and their boxes. */
type Drawn = { readonly box: Box; readonly pieceIds: readonly string[]; readonly within: readonly Box[] };

/** A box that a hand draws round pieces: what it would choose is shown meanwhile, and chosen when the hand lets go. */
export function useSweep() {
  const { document, figures, figuresOf, selection, choose } = useDesk();
  const [drawn, setDrawn] = useState<Drawn | null>(null);
  /** The newest box: the hand may let go before it was shown. */
  const newest = useRef<Drawn | null>(null);

  function draw(next: Drawn | null) {
    newest.current = next;
    setDrawn(next);
  }

  const sweep: GestureHost["sweep"] = (from, to) => {
    if (figures === null) return;
    const box = boxBetween(from, to);
    const pieces = piecesWithin({ document, figures, shifts: shiftsBetween(figuresOf, document) }, box);
    draw({ box, pieceIds: pieces.map(({ pieceId }) => pieceId), within: pieces.map((piece) => piece.box) });
  };
  const endSweep: GestureHost["endSweep"] = ({ more }) => {
    const pieceIds = newest.current?.pieceIds;
    if (pieceIds) choose(chooseWithin(document, selection, { pieceIds, more }));
    draw(null);
  };
  const giveUpSweep = () => draw(null);
  return { drawn, sweep, endSweep, giveUpSweep };
}

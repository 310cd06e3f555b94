import { useMemo } from "react";
import { boxOfPath } from "#shared/geometry/box.ts";
import { placePath } from "#shared/geometry/placement.ts";
import type { Piece } from "#shared/mockup/document.ts";
import { cx } from "@/lib/cx.ts";
import { useDesk } from "../editor/desk-context.ts";
import { middleAnchor } from "../model/anchors.ts";
import { centrePieces, mirrorPieces, placePiece, removePieces } from "../model/commands/pieces.ts";
import { placeChosen } from "../model/commands/place-chosen.ts";
import { setReads } from "../model/commands/set-reads.ts";
import { coordinateBounds, scaleBounds, sizeBounds } from "../model/limits.ts";
import { readDegrees, readNumber } from "../model/read-number.ts";
import { choosePiece, choosePieceAlso } from "../model/selection.ts";
import { CellLength, CellText, WordButton } from "./cell-controls.tsx";
import { DeskCell, DeskRowHead } from "./desk-table.tsx";

type PieceRowProps = {
  readonly piece: Piece;
  /** What the list calls it. */
  readonly title: string;
  /** One of several chosen pieces, but not of all. */
  readonly isMarked: boolean;
  readonly isLocked: boolean;
};

/** One piece in figures: its place, turn and size, what it reads, and what can be done with it alone. */
export function PieceRow({ piece, title, isMarked, isLocked }: PieceRowProps) {
  const { document, selection, edit, choose, unit } = useDesk();
  const { id, path, placement } = piece;
  const { x, y, turn, scale, mirrored } = placement;
  const box = useMemo(() => boxOfPath(placePath(path, placement)), [path, placement]);
  const pieceIds = [id];
  const place = (to: { x?: number; y?: number; turn?: number; scale?: number }) =>
    edit({ label: `Place ${title}`, change: (before) => placePiece(before, { pieceId: id, ...to }) });
  const size = (to: { width?: number; height?: number }) =>
    edit({
      label: `Size ${title}`,
      change: (before) => placeChosen(before, { pieceIds, anchor: middleAnchor, ...to }),
    });
  const length = { unit, exact: true, disabled: isLocked };

  return (
    <tr className={cx(isMarked && "bg-indigo/8")}>
      <DeskRowHead>
        <WordButton
          aria-pressed={selection.pieceIds.includes(id)}
          onClick={({ shiftKey }) =>
            choose(shiftKey ? choosePieceAlso(document, selection, id) : choosePiece(document, id))
          }
        >
          {title}
        </WordButton>
      </DeskRowHead>
      <DeskCell className="w-24">
        <CellLength
          {...length}
          aria-label={`x of ${title}`}
          mm={x}
          bounds={coordinateBounds}
          onCommit={(mm) => place({ x: mm })}
        />
      </DeskCell>
      <DeskCell className="w-24">
        <CellLength
          {...length}
          aria-label={`y of ${title}`}
          mm={y}
          bounds={coordinateBounds}
          onCommit={(mm) => place({ y: mm })}
        />
      </DeskCell>
      <DeskCell className="w-20">
        <CellText
          aria-label={`Turn of ${title}`}
          inputMode="decimal"
          disabled={isLocked}
          value={String(Math.round(turn * 10_000) / 10_000)}
          onCommit={(text) => {
            const value = readDegrees(text);
            if (value === null) return "Write degrees, like 15 or −7.5.";
            place({ turn: value });
            return null;
          }}
        />
      </DeskCell>
      <DeskCell className="w-24">
        <CellLength
          {...length}
          aria-label={`Width of ${title}`}
          mm={box?.width ?? 0}
          bounds={sizeBounds}
          onCommit={(width) => size({ width })}
        />
      </DeskCell>
      <DeskCell className="w-24">
        <CellLength
          {...length}
          aria-label={`Height of ${title}`}
          mm={box?.height ?? 0}
          bounds={sizeBounds}
          onCommit={(height) => size({ height })}
        />
      </DeskCell>
      <DeskCell className="w-20">
        <CellText
          aria-label={`Size of ${title}`}
          inputMode="decimal"
          disabled={isLocked}
          value={String(Math.round(scale * 10_000) / 100)}
          onCommit={(text) => {
            const share = (readNumber(text) ?? 0) / 100;
            if (share < scaleBounds.least || share > scaleBounds.most)
              return "Write a percentage over 0, like 80 or 125.";
            place({ scale: share });
            return null;
          }}
        />
      </DeskCell>
      <DeskCell className="w-24">
        <CellText
          aria-label={`What ${title} reads`}
          placeholder="nothing"
          maxLength={120}
          disabled={isLocked}
          value={piece.reads}
          onCommit={(text) => {
            const reads = new Map([[id, text]]);
            edit({ label: `Read ${title}`, change: (before) => setReads(before, reads) });
            return null;
          }}
        />
      </DeskCell>
      <DeskCell>
        <WordButton
          aria-label={`Mirror ${title}`}
          aria-pressed={mirrored}
          disabled={isLocked}
          onClick={() =>
            edit({ label: `Mirror ${title}`, change: (before) => mirrorPieces(before, { pieceIds, way: "across" }) })
          }
        >
          {mirrored ? "Mirrored" : "Mirror"}
        </WordButton>
        <WordButton
          aria-label={`Centre ${title} on the board`}
          disabled={isLocked}
          onClick={() =>
            edit({ label: `Centre ${title}`, change: (before) => centrePieces(before, { pieceIds, way: "both" }) })
          }
        >
          Centre
        </WordButton>
        <WordButton
          aria-label={`Remove ${title}`}
          disabled={isLocked}
          onClick={() => edit({ label: `Remove ${title}`, change: (before) => removePieces(before, { pieceIds }) })}
        >
          Remove
        </WordButton>
      </DeskCell>
    </tr>
  );
}

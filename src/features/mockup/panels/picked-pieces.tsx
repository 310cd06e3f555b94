import { useState } from "react";
import type { ArtworkPiece } from "#shared/artwork/imported-artwork.ts";
import { formatLength, formatSize } from "#shared/units/format-length.ts";
import { Select } from "@/components/ui/select.tsx";
import { counted } from "@/lib/format.ts";
import { useDesk } from "../editor/desk-context.ts";
import type { ArtworkPart } from "../model/artwork-parts.ts";
import { drawnBox } from "../model/match-artworks.ts";
import { WordButton } from "./cell-controls.tsx";

type PickedPiecesProps = {
  readonly parts: readonly ArtworkPart[];
  readonly pieces: readonly ArtworkPiece[];
  readonly picked: ReadonlySet<number>;
  readonly onPick: (index: number) => void;
  readonly onClear: () => void;
  readonly onSplit: () => void;
};

/** Which pieces are picked and what can be done with them; below it the pieces as a list, for whoever picks without a pointer. */
export function PickedPieces({ parts, pieces, picked, onPick, onClear, onSplit }: PickedPiecesProps) {
  const { unit } = useDesk();
  const [listed, setListed] = useState(parts[0]?.id ?? "");
  const part = parts.find(({ id }) => id === listed) ?? parts[0];
  const box = drawnBox(pieces.filter(({ index }) => picked.has(index)));
  const splits = parts.some(
    ({ indices }) => indices.some((index) => picked.has(index)) && !indices.every((index) => picked.has(index)),
  );
  return (
    <div className="space-y-1">
      <p role="status" className="text-sm">
        {box ? (
          <>
            {counted(picked.size, "piece")} picked, {formatSize(box.width, box.height, unit)}.{" "}
            <WordButton inText disabled={!splits} onClick={onSplit}>
              Give them a layer of their own
            </WordButton>
            {" or "}
            <WordButton inText onClick={onClear}>
              pick none
            </WordButton>
          </>
        ) : (
          <span className="text-graphite">Press pieces to split them off, or to size the artwork by them.</span>
        )}
      </p>
      <details>
        <summary className="cursor-pointer text-sm text-indigo underline underline-offset-4">Pieces as a list</summary>
        <div className="mt-2 space-y-2">
          <Select label="Pieces of" value={part?.id ?? ""} onChange={(event) => setListed(event.target.value)}>
            {parts.map(({ id }) => (
              <option key={id} value={id}>
                {id}
              </option>
            ))}
          </Select>
          <ul className="max-h-48 overflow-y-auto border-y border-rule">
            {pieces
              .filter(({ index }) => part?.indices.includes(index))
              .map(({ index, box: { x, y, width, height } }) => (
                <li key={index}>
                  <label className="flex cursor-pointer items-center gap-2 py-1 text-sm tabular-nums">
                    <input
                      type="checkbox"
                      className="size-4 accent-indigo"
                      checked={picked.has(index)}
                      onChange={() => onPick(index)}
                    />
                    Piece {index + 1}, {formatSize(width, height, unit)}, {formatLength(x, unit)} from the left,{" "}
                    {formatLength(y, unit)} from the top
                  </label>
                </li>
              ))}
          </ul>
        </div>
      </details>
    </div>
  );
}

import { nextFreeKeys } from "#shared/mockup/layer-key.ts";
import { mostLayers, splitLayer } from "#shared/mockup/split-layer.ts";
import { Table } from "@/components/ui/table.tsx";
import { counted } from "@/lib/format.ts";
import { useDesk } from "../editor/desk-context.ts";
import { nameOfPiece } from "../model/piece-name.ts";
import { chooseLayer } from "../model/selection.ts";
import { WordButton } from "./cell-controls.tsx";
import { DeskHead } from "./desk-table.tsx";
import { HolesTable } from "./holes-table.tsx";
import { LetteringOfLayer } from "./lettering-of-layer.tsx";
import { PieceRow } from "./piece-row.tsx";
import { WordsOfLayer } from "./words-of-layer.tsx";

/** The pieces of the chosen layer as a list: what the canvas does by hand is done here in figures and by keyboard. */
export function PiecesPanel() {
  const { document, selection, edit, choose, unit } = useDesk();
  const layer = document.layers.find(({ key }) => key === selection.layerKey);
  if (!layer) return null;
  const { key, name, pieces } = layer;
  const chosen = pieces.filter(({ id }) => selection.pieceIds.includes(id)).map(({ id }) => id);
  const all = pieces.length > 0 && chosen.length === pieces.length;
  const split = () => {
    const [newKey = key] = nextFreeKeys(document, 1);
    edit({
      label: "Make a layer of pieces",
      change: (before) => splitLayer(before, { layerKey: key, pieceIds: chosen }),
      choose: (after) => chooseLayer(after, newKey),
    });
  };

  return (
    <section
      aria-label={`Pieces of ${key}`}
      data-desk-part
      className="space-y-4 border-t border-rule px-4 pt-3 pb-6 sm:px-6"
    >
      <div className="flex flex-wrap items-baseline gap-x-4">
        <h2 className="min-w-0 font-serif text-base font-bold wrap-anywhere text-ink">
          Pieces of {key}, {name}
        </h2>
        <p className="text-fine text-graphite">
          x and y are the middle of a piece, from the board’s upper left corner.
          {pieces.length > 1 && " Shift and press, or Shift Enter, chooses several."}
          {layer.locked && ` ${key} is locked: nothing of it can be moved.`}
        </p>
        {!all && pieces.length > 0 && (
          <WordButton onClick={() => choose(chooseLayer(document, key))}>Choose all of {key}</WordButton>
        )}
        {!all && !layer.locked && chosen.length > 0 && document.layers.length < mostLayers && (
          <WordButton onClick={split}>Make a layer of {counted(chosen.length, "piece")}</WordButton>
        )}
      </div>
      <LetteringOfLayer layer={layer} />
      {pieces.length > 1 && <WordsOfLayer layer={layer} />}
      {pieces.length === 0 ? (
        <p className="text-sm text-graphite">This layer has no pieces left. Remove it, or undo.</p>
      ) : (
        <Table caption={`Places of the pieces of ${key}`} className="max-h-80 overflow-y-auto">
          <thead>
            <tr>
              {[
                "Piece",
                `x, ${unit}`,
                `y, ${unit}`,
                "Turn, °",
                `Wide, ${unit}`,
                `High, ${unit}`,
                "Size, %",
                "Reads",
              ].map((head) => (
                <DeskHead key={head}>{head}</DeskHead>
              ))}
              <DeskHead>
                <span className="sr-only">Place and removal</span>
              </DeskHead>
            </tr>
          </thead>
          <tbody>
            {pieces.map((piece, index) => (
              <PieceRow
                key={piece.id}
                piece={piece}
                title={nameOfPiece(piece, index)}
                isMarked={!all && selection.pieceIds.includes(piece.id)}
                isLocked={layer.locked}
              />
            ))}
          </tbody>
        </Table>
      )}
      {layer.hold.kind === "standoff" && <HolesTable layer={layer} hold={layer.hold} />}
    </section>
  );
}

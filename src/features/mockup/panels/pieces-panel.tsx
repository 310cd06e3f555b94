import { nextFreeKeys } from "#shared/mockup/layer-key.ts";
import { mostLayers, splitLayer } from "#shared/mockup/split-layer.ts";
import { Table } from "@/components/ui/table.tsx";
import { cx } from "@/lib/cx.ts";
import { counted } from "@/lib/format.ts";
import { useDesk } from "../editor/desk-context.ts";
import { centrePieces, placePiece, removePieces } from "../model/commands/pieces.ts";
import { setReads } from "../model/commands/set-reads.ts";
import { coordinateBounds, scaleBounds } from "../model/limits.ts";
import { nameOfPiece } from "../model/piece-name.ts";
import { chooseLayer, choosePiece, choosePieceAlso } from "../model/selection.ts";
import { CellLength, CellText, WordButton } from "./cell-controls.tsx";
import { DeskCell, DeskHead, DeskRowHead } from "./desk-table.tsx";
import { HolesTable } from "./holes-table.tsx";
import { LetteringOfLayer } from "./lettering-of-layer.tsx";
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
    <section aria-label={`Pieces of ${key}`} className="space-y-4 border-t border-rule px-4 pt-3 pb-6 sm:px-6">
      <div className="flex flex-wrap items-baseline gap-x-4">
        <h2 className="min-w-0 font-serif text-base font-bold wrap-anywhere text-ink">
          Pieces of {key}, {name}
        </h2>
        <p className="text-fine text-graphite">
          x and y are the middle of a piece, from the board’s upper left corner.
          {pieces.length > 1 && " Shift and press chooses several."}
        </p>
        {!all && pieces.length > 0 && (
          <WordButton onClick={() => choose(chooseLayer(document, key))}>Choose all of {key}</WordButton>
        )}
        {!all && chosen.length > 0 && document.layers.length < mostLayers && (
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
              {["Piece", `x, ${unit}`, `y, ${unit}`, "Turn, °", "Size, %", "Reads"].map((head) => (
                <DeskHead key={head}>{head}</DeskHead>
              ))}
              <DeskHead>
                <span className="sr-only">Place and removal</span>
              </DeskHead>
            </tr>
          </thead>
          <tbody>
            {pieces.map((piece, index) => {
              const { x, y, turn, scale } = piece.placement;
              const title = nameOfPiece(piece, index);
              const place = (to: { x?: number; y?: number; turn?: number; scale?: number }) =>
                edit({ label: `Place ${title}`, change: (before) => placePiece(before, { pieceId: piece.id, ...to }) });
              const pieceIds = [piece.id];
              return (
                <tr key={piece.id} className={cx(!all && selection.pieceIds.includes(piece.id) && "bg-indigo/8")}>
                  <DeskRowHead>
                    <WordButton
                      aria-pressed={selection.pieceIds.includes(piece.id)}
                      onClick={({ shiftKey }) =>
                        choose(
                          shiftKey ? choosePieceAlso(document, selection, piece.id) : choosePiece(document, piece.id),
                        )
                      }
                    >
                      {title}
                    </WordButton>
                  </DeskRowHead>
                  <DeskCell className="w-28">
                    <CellLength
                      aria-label={`x of ${title}`}
                      mm={x}
                      unit={unit}
                      bounds={coordinateBounds}
                      onCommit={(mm) => place({ x: mm })}
                    />
                  </DeskCell>
                  <DeskCell className="w-28">
                    <CellLength
                      aria-label={`y of ${title}`}
                      mm={y}
                      unit={unit}
                      bounds={coordinateBounds}
                      onCommit={(mm) => place({ y: mm })}
                    />
                  </DeskCell>
                  <DeskCell className="w-24">
                    <CellText
                      aria-label={`Turn of ${title}`}
                      inputMode="decimal"
                      value={String(turn)}
                      onCommit={(text) => {
                        const value = readNumber(text);
                        if (value === null) return "Write degrees, like 15 or −7.5.";
                        place({ turn: value });
                        return null;
                      }}
                    />
                  </DeskCell>
                  <DeskCell className="w-24">
                    <CellText
                      aria-label={`Size of ${title}`}
                      inputMode="decimal"
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
                      value={piece.reads}
                      onCommit={(text) => {
                        const reads = new Map([[piece.id, text]]);
                        edit({ label: `Read ${title}`, change: (before) => setReads(before, reads) });
                        return null;
                      }}
                    />
                  </DeskCell>
                  <DeskCell>
                    <WordButton
                      aria-label={`Centre ${title} on the board`}
                      onClick={() =>
                        edit({
                          label: `Centre ${title}`,
                          change: (before) => centrePieces(before, { pieceIds, way: "both" }),
                        })
                      }
                    >
                      Centre on board
                    </WordButton>
                    <WordButton
                      aria-label={`Remove ${title}`}
                      onClick={() =>
                        edit({ label: `Remove ${title}`, change: (before) => removePieces(before, { pieceIds }) })
                      }
                    >
                      Remove
                    </WordButton>
                  </DeskCell>
                </tr>
              );
            })}
          </tbody>
        </Table>
      )}
      {layer.hold.kind === "standoff" && <HolesTable layer={layer} hold={layer.hold} />}
    </section>
  );
}

/** A number as people write it, with a point or a comma; null when it is none. */
function readNumber(text: string): number | null {
  const value = Number(text.trim().replace(",", ".").replace("−", "-").replace(/[°%]$/, ""));
  return text.trim() === "" || !Number.isFinite(value) ? null : value;
}

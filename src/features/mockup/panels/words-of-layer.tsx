import { linesOf } from "#shared/dry-fit/reading-lines.ts";
import type { Layer } from "#shared/mockup/document.ts";
import { useDesk } from "../editor/desk-context.ts";
import { setReads, spreadWords } from "../model/commands/set-reads.ts";
import { CellText } from "./cell-controls.tsx";

/** The words of a layer of letters, typed as they are read off the drawing and spread over its pieces. */
export function WordsOfLayer({ layer }: { readonly layer: Layer }) {
  const { document, figures, edit } = useDesk();
  if (figures === null) return null;
  const known = new Map(figures.pieces.map((one) => [one.pieceId, one]));
  const lines = linesOf(
    layer.pieces.flatMap((piece) => {
      const own = known.get(piece.id);
      return own ? [{ layer, piece, figures: own }] : [];
    }),
    document.lettering,
  );
  const inOrder = lines.flat();
  return (
    <div className="flex max-w-xl items-baseline gap-3 text-sm text-graphite">
      <span className="whitespace-nowrap">Its letters read</span>
      <CellText
        aria-label={`What the letters of ${layer.key} read`}
        disabled={layer.locked}
        placeholder="nothing, these are no letters"
        maxLength={2000}
        value={lines
          .map((line) => line.map(({ piece }) => piece.reads).join(""))
          .join(" ")
          .trim()}
        onCommit={(text) => {
          const ids = inOrder.map(({ piece }) => piece.id);
          const reads = text.trim() === "" ? new Map(ids.map((id) => [id, ""])) : spreadWords(ids, text);
          if (reads === null)
            return `There are ${ids.length} pieces here, one for each letter from the upper left. Write as many letters, or what each piece reads in the list.`;
          edit({ label: `Read ${layer.key}`, change: (before) => setReads(before, reads) });
          return null;
        }}
      />
    </div>
  );
}

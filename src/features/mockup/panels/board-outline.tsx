import { formatSize } from "#shared/units/format-length.ts";
import { Checkbox } from "@/components/ui/checkbox.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import type { BoardWriting } from "../editor/use-board-draft.ts";
import type { BoardDraft } from "../model/board-draft.ts";
import { roundMm } from "../model/limits.ts";
import { outlineChoices } from "../model/outline-of-piece.ts";
import { BoardMeasures } from "./board-measures.tsx";

const outlines: readonly { readonly kind: BoardDraft["outline"]; readonly text: string }[] = [
  { kind: "rectangle", text: "rectangle" },
  { kind: "rounded", text: "rounded corners" },
  { kind: "ellipse", text: "ellipse, or a circle" },
  { kind: "path", text: "its own, as drawn" },
  { kind: "piece", text: "the outline of a piece" },
];

/** What outline the board has and how large it is. */
export function BoardOutline({ writing }: { readonly writing: BoardWriting }) {
  const { document, unit } = useDesk();
  const { draft, set, problemOf } = writing;
  const pieces = outlineChoices(document);
  const offered = outlines.filter(
    ({ kind }) =>
      (kind !== "path" || document.board.outline.kind === "path") && (kind !== "piece" || pieces.length > 0),
  );
  const side = (name: "width" | "height" | "radius", label: string) => (
    <LengthField
      label={label}
      unit={unit}
      value={draft[name]}
      onChange={(mm) => set({ [name]: mm })}
      error={problemOf(name, draft[name])}
    />
  );
  return (
    <>
      <div className="grid gap-3 sm:grid-cols-3">
        <Select
          label="Outline"
          value={draft.outline}
          onChange={(event) => {
            const chosen = offered.find(({ kind }) => kind === event.target.value);
            if (chosen) set({ outline: chosen.kind });
          }}
        >
          {offered.map(({ kind, text }) => (
            <option key={kind} value={kind}>
              {text}
            </option>
          ))}
        </Select>
        {side("width", "Width")}
        {side("height", "Height")}
        {draft.outline === "rounded" && side("radius", "Radius of the corners")}
      </div>
      {draft.isFramed && draft.outline === "rectangle" && <BoardMeasures writing={writing} />}
      {draft.outline === "piece" && (
        <div className="grid items-start gap-3 sm:grid-cols-2">
          <Select
            label="Piece"
            hint="Its outer edge becomes the board’s, where it lies. Openings in it are closed."
            error={problemOf("pieceId", draft.pieceId)}
            value={draft.pieceId ?? ""}
            onChange={(event) => {
              const piece = pieces.find(({ pieceId }) => pieceId === event.target.value);
              if (piece) set({ pieceId: piece.pieceId, width: roundMm(piece.width), height: roundMm(piece.height) });
            }}
          >
            {draft.pieceId === null && <option value="">choose a piece</option>}
            {pieces.map(({ pieceId, name, width, height }) => (
              <option key={pieceId} value={pieceId}>
                {name}, {formatSize(width, height, unit)}
              </option>
            ))}
          </Select>
          <Checkbox
            label="Take the piece off the board"
            hint="For artwork that shows the board itself."
            checked={draft.removePiece}
            onChange={(event) => set({ removePiece: event.target.checked })}
          />
        </div>
      )}
    </>
  );
}

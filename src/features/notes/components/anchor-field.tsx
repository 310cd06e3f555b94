import type { Anchor } from "#shared/contracts/notes.ts";
import { Button } from "@/components/ui/button.tsx";
import { Select } from "@/components/ui/select.tsx";

export type AnchorPiece = {
  readonly id: string;
  readonly name: string;
  readonly layerKey: string;
  readonly x: number;
  readonly y: number;
};

type AnchorFieldProps = {
  readonly anchor: Anchor | null;
  readonly pieces: readonly AnchorPiece[];
  readonly error: string | undefined;
  readonly isPlacing: boolean;
  readonly onPlace: () => void;
  readonly onAnchor: (anchor: Anchor | null) => void;
};

const touched = "touched";
const whole = "whole";

function choiceOf(anchor: Anchor | null, pieces: readonly AnchorPiece[]): string {
  if (anchor === null) return "";
  if (anchor.on === "whole") return whole;
  const piece = pieces.find(({ id }) => id === anchor.pieceId);
  return piece && piece.x === anchor.x && piece.y === anchor.y ? piece.id : touched;
}

function touchedWords(anchor: Anchor | null, pieces: readonly AnchorPiece[]): string {
  const piece = anchor?.on === "spot" ? pieces.find(({ id }) => id === anchor.pieceId) : undefined;
  return piece ? `The spot touched, on ${piece.name || "a piece"}` : "The spot touched";
}

/** Where a note is: touched on the drawing, or chosen from the list of pieces. */
export function AnchorField({ anchor, pieces, error, isPlacing, onPlace, onAnchor }: AnchorFieldProps) {
  const choice = choiceOf(anchor, pieces);
  const keys = [...new Set(pieces.map(({ layerKey }) => layerKey))];

  function handleChoice(value: string) {
    if (value === touched) return;
    if (value === "" || value === whole) return onAnchor(value === whole ? { on: "whole" } : null);
    const piece = pieces.find(({ id }) => id === value);
    if (piece) onAnchor({ on: "spot", x: piece.x, y: piece.y, layerKey: piece.layerKey, pieceId: piece.id });
  }

  return (
    <div className="flex items-start gap-2">
      <Button className="mt-6 shrink-0 px-2! text-sm!" onClick={onPlace} aria-pressed={isPlacing}>
        {anchor?.on === "spot" ? "Touch another" : "Touch the spot"}
      </Button>
      <Select
        label="or choose from the list"
        value={choice}
        error={error}
        className="flex-1"
        onChange={(event) => handleChoice(event.target.value)}
      >
        <option value="">Nothing chosen yet</option>
        {choice === touched && <option value={touched}>{touchedWords(anchor, pieces)}</option>}
        <option value={whole}>The whole sign</option>
        {keys.map((key) => (
          <optgroup key={key} label={`Layer ${key}`}>
            {pieces
              .filter(({ layerKey }) => layerKey === key)
              .map((piece, index) => (
                <option key={piece.id} value={piece.id}>
                  {piece.name || `Piece ${index + 1}`}
                </option>
              ))}
          </optgroup>
        ))}
      </Select>
    </div>
  );
}

import { useMemo, useState } from "react";
import { pathOfRegion } from "#shared/geometry/path-of-region.ts";
import { placePath } from "#shared/geometry/placement.ts";
import { formatArea } from "#shared/units/format-area.ts";
import { formatSize } from "#shared/units/format-length.ts";
import { Dialog } from "@/components/ui/dialog.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { NumberField } from "@/components/ui/number-field.tsx";
import { counted } from "@/lib/format.ts";
import { useDesk } from "../editor/desk-context.ts";
import { useShaped } from "../engine/use-shaped.ts";
import { chosenWords } from "../model/chosen-words.ts";
import { dropLooseBits } from "../model/commands/shape-pieces.ts";
import { chosenByLayer, namedOutline } from "../model/cut-choices.ts";
import { boundsProblem, isWithinBounds } from "../model/length-bounds.ts";
import { nameOfPiece } from "../model/piece-name.ts";
import { ShapeForm } from "./shape-form.tsx";
import { ShapePicture } from "./shape-picture.tsx";

type LooseBitsDialogProps = { readonly open: boolean; readonly onOpenChange: (open: boolean) => void };

/** Drops bits too small to cut or to bond. */
export function LooseBitsDialog({ open, onOpenChange }: LooseBitsDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      size="wide"
      title="Drop loose bits"
      description="Bits that nothing holds to the rest of their piece, and that are too small to be worth cutting."
    >
      <LooseBitsForm onDone={() => onOpenChange(false)} />
    </Dialog>
  );
}

const widthBounds = { least: 0, most: 100 };
const mostAreaMm2 = 100_000;
/** As many as a person reads through. */
const mostListed = 60;

function LooseBitsForm({ onDone }: { readonly onDone: () => void }) {
  const { document, selection, unit, edit } = useDesk();
  const [areaMm2, setArea] = useState<number | null>(25);
  const [widthMm, setWidth] = useState<number | null>(1);
  const chosen = useMemo(() => chosenByLayer(document, selection), [document, selection]);
  const pieces = chosen.flatMap((one) => one.pieces);
  const isRight = areaMm2 !== null && areaMm2 >= 0 && areaMm2 <= mostAreaMm2 && isWithinBounds(widthMm, widthBounds);
  const { step, shown } = useShaped(
    isRight ? { kind: "loose bits", outlines: pieces.map(namedOutline), below: { areaMm2, widthMm } } : null,
  );
  const found = shown?.kind === "loose bits" ? shown.made : [];
  const bits = found.flatMap((one) => one.bits);
  const whole = found.filter(({ left }) => left === null).length;
  const names = new Map(
    chosen.flatMap(({ layer, pieces: own }) =>
      own.map((piece) => [piece.id, `${nameOfPiece(piece, layer.pieces.indexOf(piece))} of ${layer.key}`] as const),
    ),
  );

  function take() {
    edit({ label: "Drop loose bits", change: (before) => dropLooseBits(before, { found }) });
    onDone();
  }

  return (
    <ShapeForm
      step={step}
      isReady={bits.length > 0}
      action={bits.length === 0 ? "Drop them" : `Drop ${counted(bits.length, "bit")}`}
      onTake={take}
      onDone={onDone}
      picture={
        <ShapePicture
          title="The bits that would be dropped"
          isStale={step === "working"}
          shapes={[
            ...pieces.map((piece) => ({ path: placePath(piece.path, piece.placement), look: "was" as const })),
            ...bits.map(({ region }) => ({ path: pathOfRegion(region), look: "taken" as const })),
          ]}
        />
      }
      words={
        step === "made" &&
        (bits.length === 0 ? "Nothing of what is chosen is as small as that." : bitsWords(bits.length, whole))
      }
    >
      <p className="text-sm text-ink">
        Of <span className="font-semibold">{chosenWords(document, selection) ?? "nothing"}</span>
      </p>
      <div className="grid grid-cols-2 gap-3">
        <NumberField
          label="Smaller than"
          suffix="mm²"
          value={areaMm2}
          onChange={setArea}
          error={areaMm2 !== null && (areaMm2 < 0 || areaMm2 > mostAreaMm2) ? "From 0 to 100 000 mm²." : undefined}
        />
        <LengthField
          fine
          label="Or slimmer than"
          unit={unit}
          value={widthMm}
          onChange={setWidth}
          error={boundsProblem(widthMm, widthBounds, unit)}
        />
      </div>
      {bits.length > 0 && (
        <ul
          aria-label="Bits to drop"
          className="max-h-44 overflow-y-auto border border-rule px-3 py-1.5 text-sm text-ink"
        >
          {bits.slice(0, mostListed).map((bit, index) => (
            <li key={`${bit.id} ${bits.slice(0, index).filter(({ id }) => id === bit.id).length}`}>
              {names.get(bit.id)}: {formatSize(bit.lengthMm, bit.widthMm, unit)}, {formatArea(bit.areaMm2, unit)}
            </li>
          ))}
          {bits.length > mostListed && <li>and {bits.length - mostListed} more</li>}
        </ul>
      )}
    </ShapeForm>
  );
}

function bitsWords(count: number, whole: number): string {
  const bits = `${counted(count, "bit goes", "bits go")}.`;
  if (whole === 0) return bits;
  return `${bits} ${counted(whole, "piece is", "pieces are")} nothing else and ${whole === 1 ? "goes" : "go"} with ${whole === 1 ? "it" : "them"}.`;
}

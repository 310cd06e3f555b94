import { useMemo, useState } from "react";
import { boxOfPath } from "#shared/geometry/box.ts";
import { placePath } from "#shared/geometry/placement.ts";
import type { Piece } from "#shared/mockup/document.ts";
import { mostParts, type SeamWay, type Split } from "#shared/shaping/split-to-bed.ts";
import { formatSize } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Dialog } from "@/components/ui/dialog.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import { useShaped } from "../engine/use-shaped.ts";
import { splitPiece } from "../model/commands/shape-pieces.ts";
import { chosenByLayer } from "../model/cut-choices.ts";
import { boundsProblem, isWithinBounds } from "../model/length-bounds.ts";
import { nameOfPiece } from "../model/piece-name.ts";
import { ShapeForm } from "./shape-form.tsx";
import { ShapePicture } from "./shape-picture.tsx";

type SplitDialogProps = { readonly open: boolean; readonly onOpenChange: (open: boolean) => void };

/** Splits a piece that is larger than the bed of the machine that cuts it. */
export function SplitDialog({ open, onOpenChange }: SplitDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      size="wide"
      title="Split to the bed"
      description="A piece larger than the machine's bed is cut in parts along straight seams, which butt when it is put together."
    >
      <SplitForm onDone={() => onOpenChange(false)} />
    </Dialog>
  );
}

const shiftBounds = { least: -5000, most: 5000 };
const ways: readonly { readonly way: SeamWay; readonly text: string }[] = [
  { way: "across", text: "across its longer side" },
  { way: "upright", text: "upright" },
  { way: "level", text: "level" },
];

function SplitForm({ onDone }: { readonly onDone: () => void }) {
  const { document, selection, unit, site, edit } = useDesk();
  const { bedWidthMm: widthMm, bedHeightMm: heightMm } = site.limits;
  const pieces = useMemo(
    () =>
      chosenByLayer(document, selection)
        .flatMap(({ layer, pieces: own }) =>
          own.map((piece) => ({
            piece,
            layerKey: layer.key,
            title: `${nameOfPiece(piece, layer.pieces.indexOf(piece))} of ${layer.key}`,
            size: sizeOf(piece),
          })),
        )
        .toSorted((a, b) => b.size - a.size),
    [document, selection],
  );
  const [pieceId, setPiece] = useState<string | null>(null);
  const [seams, setSeams] = useState<SeamWay>("across");
  const [count, setCount] = useState<number | null>(null);
  const [shiftMm, setShift] = useState<number | null>(0);
  const chosen = pieces.find(({ piece }) => piece.id === pieceId) ?? pieces[0];
  const isRight = isWithinBounds(shiftMm, shiftBounds);
  const { step, shown } = useShaped(
    chosen && isRight
      ? {
          kind: "split",
          outline: { path: chosen.piece.path, placement: chosen.piece.placement },
          bed: { widthMm, heightMm },
          choice: { seams, count, shiftMm },
        }
      : null,
  );
  const split = shown?.kind === "split" ? shown.made : null;
  if (!chosen) return <p className="text-base text-graphite">Choose a piece first.</p>;
  const { piece, layerKey } = chosen;

  function take() {
    if (!split) return;
    const id = newId();
    const parts = split.parts.map(({ shaped }) => shaped);
    edit({
      label: `Split ${chosen?.title ?? "a piece"}`,
      change: (before) => splitPiece(before, { pieceId: piece.id, parts, id }),
      choose: () => ({ layerKey, pieceIds: parts.map((_, index) => `${id}-${index + 1}`), holeId: null }),
    });
    onDone();
  }

  return (
    <ShapeForm
      step={step}
      isReady={split !== null && split.parts.length > 1}
      action={split ? `Split it in ${split.parts.length}` : "Split it"}
      onTake={take}
      onDone={onDone}
      picture={
        <ShapePicture
          title="Where the seams fall"
          isStale={step === "working"}
          seams={split?.seams ?? []}
          shapes={
            split
              ? split.parts.map(({ shaped, fits }) => ({
                  path: placePath(shaped.path, shaped.placement),
                  look: fits ? ("made" as const) : ("taken" as const),
                }))
              : [{ path: placePath(piece.path, piece.placement), look: "was" as const }]
          }
        />
      }
      words={step === "made" && <PartList split={split} unit={unit} />}
    >
      <p className="text-sm text-graphite">
        The bed takes {formatSize(widthMm, heightMm, unit)}. The shop's limits say so.
      </p>
      <Select label="Piece" value={piece.id} onChange={(event) => setPiece(event.target.value)}>
        {pieces.map(({ piece: one, title }) => (
          <option key={one.id} value={one.id}>
            {title}
          </option>
        ))}
      </Select>
      <Select
        label="Seams run"
        value={seams}
        onChange={(event) => setSeams(ways.find(({ way }) => way === event.target.value)?.way ?? "across")}
      >
        {ways.map(({ way, text }) => (
          <option key={way} value={way}>
            {text}
          </option>
        ))}
      </Select>
      <Select
        label="Side by side"
        value={count ?? 0}
        onChange={(event) => setCount(Number(event.target.value) || null)}
      >
        <option value={0}>as few as go on the bed</option>
        {Array.from({ length: mostParts - 1 }, (_, index) => index + 2).map((parts) => (
          <option key={parts} value={parts}>
            {parts}
          </option>
        ))}
      </Select>
      <LengthField
        label="Seams moved by"
        hint="To the right or down; a minus moves them back."
        unit={unit}
        value={shiftMm}
        onChange={setShift}
        error={boundsProblem(shiftMm, shiftBounds, unit)}
      />
    </ShapeForm>
  );
}

/** From corner to corner of its box, mm: the largest piece is offered first. */
function sizeOf({ path, placement }: Piece): number {
  const box = boxOfPath(placePath(path, placement));
  return box ? Math.hypot(box.width, box.height) : 0;
}

/** A list longer than this is told by its largest part. */
const mostListed = 6;

function PartList({ split, unit }: { readonly split: Split | null; readonly unit: LengthUnit }) {
  if (!split) return <>No seam meets the piece there, or no 24 parts of it go on the bed.</>;
  const asIs = split.fitsWhole && <p className="text-graphite">It goes on the bed as it is, too.</p>;
  const large = split.parts.filter(({ fits }) => !fits).length;
  if (split.parts.length > mostListed)
    return (
      <>
        {asIs}
        {split.parts.length} parts. {large === 0 ? "All go on the bed." : `${large} are still larger than the bed.`}
      </>
    );
  return (
    <>
      {asIs}
      <ul>
        {split.parts.map(({ shaped, widthMm, heightMm, fits }, index) => (
          <li key={`${shaped.placement.x} ${shaped.placement.y}`} className={fits ? "" : "font-semibold text-oxblood"}>
            Part {index + 1}: {formatSize(widthMm, heightMm, unit)}, {fits ? "goes on the bed" : "larger than the bed"}
          </li>
        ))}
      </ul>
    </>
  );
}

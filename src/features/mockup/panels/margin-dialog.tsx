import { useMemo, useState } from "react";
import { placePath } from "#shared/geometry/placement.ts";
import type { MarginChoice } from "#shared/shaping/margin-plate.ts";
import { formatArea } from "#shared/units/format-area.ts";
import { formatSize } from "#shared/units/format-length.ts";
import { Dialog } from "@/components/ui/dialog.tsx";
import { Field } from "@/components/ui/field.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { Select } from "@/components/ui/select.tsx";
import { counted } from "@/lib/format.ts";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import { useShaped } from "../engine/use-shaped.ts";
import { chosenWords } from "../model/chosen-words.ts";
import { addMargin } from "../model/commands/add-margin.ts";
import { chosenPieces, namedOutline } from "../model/cut-choices.ts";
import { boundsProblem, isWithinBounds } from "../model/length-bounds.ts";
import { chooseLayer } from "../model/selection.ts";
import { optionsOfHold } from "../model/stock-choices.ts";
import { suggestHold } from "../model/suggest-layers.ts";
import { type LayerChoice, LayerFields } from "./layer-fields.tsx";
import { ShapeForm } from "./shape-form.tsx";
import { ShapePicture } from "./shape-picture.tsx";

type MarginDialogProps = { readonly open: boolean; readonly onOpenChange: (open: boolean) => void };

/** A plate that follows what is chosen at a distance, as a layer of its own. */
export function MarginDialog({ open, onOpenChange }: MarginDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      size="wide"
      title="Margin plate"
      description="A plate that follows the outline of what is chosen, as far outside it as you say."
    >
      <MarginForm onDone={() => onOpenChange(false)} />
    </Dialog>
  );
}

const marginBounds = { least: 0.1, most: 500 };

function MarginForm({ onDone }: { readonly onDone: () => void }) {
  const { document, selection, stock, unit, site, edit } = useDesk();
  const [marginMm, setMargin] = useState<number | null>(10);
  const [corners, setCorners] = useState<MarginChoice["corners"]>("round");
  const [openings, setOpenings] = useState<MarginChoice["openings"]>("filled");
  const [place, setPlace] = useState<"wall" | "under">("under");
  const [name, setName] = useState("Margin plate");
  const [layer, setLayer] = useState<LayerChoice>(() => ({
    sheet: 0,
    thickness: stock.acrylics[0]?.thicknessesMm[0] ?? 3,
    hold: suggestHold(stock, "wood"),
  }));
  const pieces = useMemo(() => chosenPieces(document, selection), [document, selection]);
  const isRight = isWithinBounds(marginMm, marginBounds);
  const { step, shown } = useShaped(
    isRight ? { kind: "margin", outlines: pieces.map(namedOutline), choice: { marginMm, corners, openings } } : null,
  );
  const made = shown?.kind === "margin" ? shown.made : null;
  const lowest = document.layers.find((one) => one.pieces.some(({ id }) => selection.pieceIds.includes(id)));
  const sheet = stock.acrylics[layer.sheet];
  const hold = optionsOfHold(stock)[layer.hold];
  if (!sheet || !hold)
    return (
      <Notice tone="caution">
        The stock list needs a sheet of acrylic and something to hold it, before a plate can be added.
      </Notice>
    );

  function take() {
    if (!made || !sheet || !hold || !isRight) return;
    const id = newId();
    const pieceIds = pieces.map((piece) => piece.id);
    const plate = { name, stock: sheet.acrylic, thickness: layer.thickness, hold, plates: made.plates, pieceIds };
    const under = place === "under" && lowest ? { under: lowest.key } : ("wall" as const);
    edit({
      label: "Add a margin plate",
      change: (before) => addMargin(before, { ...plate, choice: { marginMm, corners }, id, site, place: under }),
      choose: (after) => {
        const added = after.layers.find((one) => one.pieces.some((piece) => piece.id === `${id}-1`));
        return added ? chooseLayer(after, added.key) : selection;
      },
    });
    onDone();
  }

  return (
    <ShapeForm
      step={step}
      isReady={made !== null}
      action="Add the margin plate"
      onTake={take}
      onDone={onDone}
      picture={
        <ShapePicture
          title="The plate round what is chosen"
          isStale={step === "working"}
          shapes={[
            ...(made?.plates ?? []).map((plate) => ({
              path: placePath(plate.path, plate.placement),
              look: "made" as const,
            })),
            ...pieces.map((piece) => ({ path: placePath(piece.path, piece.placement), look: "was" as const })),
          ]}
        />
      }
      words={
        made && (
          <>
            {formatSize(made.widthMm, made.heightMm, unit)} over all, {formatArea(made.areaMm2, unit)}
            {made.plates.length > 1 && (
              <>. It is in {counted(made.plates.length, "piece")}: the shapes lie further apart than two margins</>
            )}
            .
          </>
        )
      }
    >
      <p className="text-sm text-ink">
        Round <span className="font-semibold">{chosenWords(document, selection) ?? "nothing"}</span>
      </p>
      <div className="grid grid-cols-2 gap-3">
        <LengthField
          label="Margin"
          unit={unit}
          value={marginMm}
          onChange={setMargin}
          error={boundsProblem(marginMm, marginBounds, unit)}
        />
        <Select
          label="Corners"
          value={corners}
          onChange={(event) => setCorners(event.target.value === "sharp" ? "sharp" : "round")}
        >
          <option value="round">round</option>
          <option value="sharp">sharp</option>
        </Select>
        <Select
          label="Openings"
          value={openings}
          onChange={(event) => setOpenings(event.target.value === "kept" ? "kept" : "filled")}
        >
          <option value="filled">filled</option>
          <option value="kept">kept, less the margin</option>
        </Select>
        <Select
          label="Where it lies"
          value={place}
          onChange={(event) => setPlace(event.target.value === "wall" ? "wall" : "under")}
        >
          <option value="under">right under {lowest?.key ?? "it"}</option>
          <option value="wall">under all layers</option>
        </Select>
      </div>
      {corners === "sharp" && (
        <p className="text-fine text-graphite">
          A corner sharper than 29° is cut off square, four margins out at most.
        </p>
      )}
      <Field label="Name" maxLength={120} value={name} onChange={(event) => setName(event.target.value)} />
      <LayerFields choice={layer} onChange={setLayer} narrow />
    </ShapeForm>
  );
}

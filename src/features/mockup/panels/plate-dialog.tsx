import { useState } from "react";
import { Button } from "@/components/ui/button.tsx";
import { Dialog } from "@/components/ui/dialog.tsx";
import { Field } from "@/components/ui/field.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import { addPlate, type PlateOrder } from "../model/commands/add-plate.ts";
import { boundsProblem, isWithinBounds } from "../model/length-bounds.ts";
import { choosePiece } from "../model/selection.ts";
import { optionsOfHold } from "../model/stock-choices.ts";
import { suggestHold } from "../model/suggest-layers.ts";
import { type LayerChoice, LayerFields } from "./layer-fields.tsx";

type PlateDialogProps = { readonly open: boolean; readonly onOpenChange: (open: boolean) => void };

/** A plate of acrylic, round or square-cornered, as a layer of its own. */
export function PlateDialog({ open, onOpenChange }: PlateDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title="Add a plate"
      description="It comes to the middle of the board."
    >
      <PlateForm onDone={() => onOpenChange(false)} />
    </Dialog>
  );
}

const plateBounds = { least: 1, most: 5000 };

function PlateForm({ onDone }: { readonly onDone: () => void }) {
  const { document, stock, unit, site, edit } = useDesk();
  const half = Math.round(Math.min(document.board.width, document.board.height) / 2);
  const [kind, setKind] = useState<"circle" | "rectangle">("circle");
  const [name, setName] = useState("Plate");
  const [width, setWidth] = useState<number | null>(half);
  const [height, setHeight] = useState<number | null>(half);
  const [choice, setChoice] = useState<LayerChoice>(() => ({
    sheet: 0,
    thickness: stock.acrylics[0]?.thicknessesMm[0] ?? 3,
    hold: suggestHold(stock, "wood"),
  }));
  const isFirst = document.layers.length === 0;
  const [nearest, setNearest] = useState<PlateOrder>("wall");
  const sheet = stock.acrylics[choice.sheet];
  const hold = optionsOfHold(stock)[choice.hold];
  if (!sheet || !hold)
    return (
      <Notice tone="caution">
        The stock list needs a sheet of acrylic and something to hold it, before a plate can be added.
      </Notice>
    );

  const fits = isWithinBounds(width, plateBounds) && (kind === "circle" || isWithinBounds(height, plateBounds));

  function add() {
    if (!sheet || !hold || !fits) return;
    const shape = kind === "circle" ? { kind, diameter: width } : { kind, width, height: height ?? width };
    const id = newId();
    edit({
      label: "Add a plate",
      change: (before) =>
        addPlate(before, { shape, id, site, name, stock: sheet.acrylic, thickness: choice.thickness, hold, nearest }),
      choose: (after) => choosePiece(after, id),
    });
    onDone();
  }

  return (
    <form
      className="space-y-4"
      onSubmit={(event) => {
        event.preventDefault();
        add();
      }}
    >
      <div className="grid gap-3 sm:grid-cols-2">
        <Select
          label="Shape"
          value={kind}
          onChange={(event) => setKind(event.target.value === "circle" ? "circle" : "rectangle")}
        >
          <option value="circle">circle</option>
          <option value="rectangle">rectangle</option>
        </Select>
        <Field label="Name" maxLength={120} value={name} onChange={(event) => setName(event.target.value)} />
        <LengthField
          label={kind === "circle" ? "Diameter" : "Width"}
          unit={unit}
          value={width}
          onChange={setWidth}
          error={boundsProblem(width, plateBounds, unit)}
        />
        {kind === "rectangle" && (
          <LengthField
            label="Height"
            unit={unit}
            value={height}
            onChange={setHeight}
            error={boundsProblem(height, plateBounds, unit)}
          />
        )}
        {!isFirst && (
          <Select
            label="Where it lies"
            value={nearest}
            onChange={(event) => setNearest(event.target.value === "viewer" ? "viewer" : "wall")}
          >
            <option value="wall">under the other layers</option>
            <option value="viewer">over the other layers</option>
          </Select>
        )}
      </div>
      <LayerFields choice={choice} onChange={setChoice} />
      <div className="flex flex-wrap justify-end gap-3">
        <Button onClick={onDone}>Cancel</Button>
        <Button type="submit" disabled={!fits}>
          Add the plate
        </Button>
      </div>
    </form>
  );
}

import { useState } from "react";
import { formatLengthWithUnit } from "#shared/units/format-length.ts";
import { Button } from "@/components/ui/button.tsx";
import { Dialog } from "@/components/ui/dialog.tsx";
import { Field } from "@/components/ui/field.tsx";
import { LengthField } from "@/components/ui/length-field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import { addPlate, addPlateToLayer, type PlateOrder, type PlateShape } from "../model/commands/add-plate.ts";
import { boundsProblem, isWithinBounds } from "../model/length-bounds.ts";
import { choosePiece } from "../model/selection.ts";
import { optionsOfHold } from "../model/stock-choices.ts";
import { suggestHold } from "../model/suggest-layers.ts";
import { type LayerChoice, LayerFields } from "./layer-fields.tsx";

type PlateDialogProps = { readonly open: boolean; readonly onOpenChange: (open: boolean) => void };

/** A plate of acrylic, of a plain shape by its measures: as a layer of its own or one more piece of a layer. */
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
const kinds = ["circle", "rectangle", "rounded", "ellipse"] as const;
type Kind = (typeof kinds)[number];
const kindWords: Record<Kind, string> = {
  circle: "circle",
  rectangle: "rectangle",
  rounded: "rectangle, rounded",
  ellipse: "ellipse",
};

function PlateForm({ onDone }: { readonly onDone: () => void }) {
  const { document, selection, stock, unit, site, edit } = useDesk();
  const half = Math.round(Math.min(document.board.width, document.board.height) / 2);
  const [kind, setKind] = useState<Kind>("circle");
  const [name, setName] = useState("Plate");
  const [width, setWidth] = useState<number | null>(half);
  const [height, setHeight] = useState<number | null>(half);
  const [radius, setRadius] = useState<number | null>(10);
  const [choice, setChoice] = useState<LayerChoice>(() => ({
    sheet: 0,
    thickness: stock.acrylics[0]?.thicknessesMm[0] ?? 3,
    hold: suggestHold(stock, "wood"),
  }));
  const free = document.layers.filter(({ locked }) => !locked);
  const isChosenEmpty = free.some(({ key, pieces }) => key === selection.layerKey && pieces.length === 0);
  /** "wall", "viewer", or the key of a layer. */
  const [where, setWhere] = useState<string>((isChosenEmpty && selection.layerKey) || "wall");
  const into = free.find(({ key }) => key === where);
  const sheet = stock.acrylics[choice.sheet];
  const hold = optionsOfHold(stock)[choice.hold];
  if ((!sheet || !hold) && free.length === 0)
    return (
      <Notice tone="caution">
        The stock list needs a sheet of acrylic and something to hold it, before a plate can be added.
      </Notice>
    );

  const radiusBounds = { least: 0.1, most: Math.max(0.1, Math.min(width ?? 0, height ?? 0) / 2) };
  const fits =
    isWithinBounds(width, plateBounds) &&
    (kind === "circle" || isWithinBounds(height, plateBounds)) &&
    (kind !== "rounded" || isWithinBounds(radius, radiusBounds)) &&
    (into !== undefined || (sheet !== undefined && hold !== undefined));

  function add() {
    if (!fits || width === null) return;
    const shape = shapeOf(kind, { width, height: height ?? width, radius: radius ?? 0 });
    const id = newId();
    const nearest: PlateOrder = where === "viewer" ? "viewer" : "wall";
    edit({
      label: "Add a plate",
      change: (before) => {
        if (into) return addPlateToLayer(before, { key: into.key, shape, id, name });
        if (!sheet || !hold) return before;
        const layer = { stock: sheet.acrylic, thickness: choice.thickness, hold };
        return addPlate(before, { shape, id, site, name, ...layer, nearest });
      },
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
          onChange={(event) => setKind(kinds.find((one) => one === event.target.value) ?? "circle")}
        >
          {kinds.map((one) => (
            <option key={one} value={one}>
              {kindWords[one]}
            </option>
          ))}
        </Select>
        <Field label="Name" maxLength={120} value={name} onChange={(event) => setName(event.target.value)} />
        <LengthField
          label={kind === "circle" ? "Diameter" : "Width"}
          unit={unit}
          value={width}
          onChange={setWidth}
          error={boundsProblem(width, plateBounds, unit)}
        />
        {kind !== "circle" && (
          <LengthField
            label="Height"
            unit={unit}
            value={height}
            onChange={setHeight}
            error={boundsProblem(height, plateBounds, unit)}
          />
        )}
        {kind === "rounded" && (
          <LengthField
            label="Radius of the corners"
            unit={unit}
            value={radius}
            onChange={setRadius}
            error={boundsProblem(radius, radiusBounds, unit)}
          />
        )}
        {document.layers.length > 0 && (
          <Select
            label="Where it lies"
            value={into ? into.key : where}
            onChange={(event) => setWhere(event.target.value)}
          >
            <optgroup label="As a layer of its own">
              <option value="wall">under the other layers</option>
              <option value="viewer">over the other layers</option>
            </optgroup>
            {free.length > 0 && (
              <optgroup label="As a piece of">
                {free.map(({ key, name: layerName }) => (
                  <option key={key} value={key}>
                    {key}, {layerName}
                  </option>
                ))}
              </optgroup>
            )}
          </Select>
        )}
      </div>
      {into ? (
        <p className="text-sm text-graphite">
          It is cut from {into.stock.name}, {formatLengthWithUnit(into.thickness, unit)}, and held as all of {into.key}{" "}
          is.
          {into.hold.kind === "standoff" && " Its standoffs get no holes by themselves: add them in the list of holes."}
        </p>
      ) : (
        <LayerFields choice={choice} onChange={setChoice} />
      )}
      <div className="flex flex-wrap justify-end gap-3">
        <Button onClick={onDone}>Cancel</Button>
        <Button type="submit" disabled={!fits}>
          Add the plate
        </Button>
      </div>
    </form>
  );
}

function shapeOf(kind: Kind, { width, height, radius }: { width: number; height: number; radius: number }): PlateShape {
  switch (kind) {
    case "circle":
      return { kind, diameter: width };
    case "rounded":
      return { kind, width, height, radius };
    case "rectangle":
    case "ellipse":
      return { kind, width, height };
  }
}

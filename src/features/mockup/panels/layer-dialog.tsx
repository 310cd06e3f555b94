import { useState } from "react";
import { Button } from "@/components/ui/button.tsx";
import { Dialog } from "@/components/ui/dialog.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import { addLayer, type LayerPlace } from "../model/commands/add-layer.ts";
import { chooseLayer } from "../model/selection.ts";
import { optionsOfHold } from "../model/stock-choices.ts";
import { suggestHold } from "../model/suggest-layers.ts";
import { type LayerChoice, LayerFields } from "./layer-fields.tsx";

type LayerDialogProps = {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  /** Key of the chosen layer, under which the new one can lie; null when none is chosen. */
  readonly over: string | null;
};

/** A layer without pieces yet: to paste into, to send pieces to, to put plates in. */
export function LayerDialog({ open, onOpenChange, over }: LayerDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title="Add a layer"
      description="It is empty at first. Plates, lettering and copied pieces can be put into it."
    >
      <LayerForm over={over} onDone={() => onOpenChange(false)} />
    </Dialog>
  );
}

function LayerForm({ over, onDone }: { readonly over: string | null; readonly onDone: () => void }) {
  const { document, stock, site, edit } = useDesk();
  const [name, setName] = useState("New layer");
  const [place, setPlace] = useState<"viewer" | "under" | "wall">("viewer");
  const [choice, setChoice] = useState<LayerChoice>(() => ({
    sheet: 0,
    thickness: stock.acrylics[0]?.thicknessesMm[0] ?? 3,
    hold: suggestHold(stock, document.layers.length === 0 ? "wood" : "acrylic"),
  }));
  const sheet = stock.acrylics[choice.sheet];
  const hold = optionsOfHold(stock)[choice.hold];
  if (!sheet || !hold)
    return (
      <Notice tone="caution">
        The stock list needs a sheet of acrylic and something to hold it, before a layer can be added.
      </Notice>
    );

  function add() {
    if (!sheet || !hold) return;
    const at: LayerPlace = place === "under" && over !== null ? { under: over } : place === "wall" ? "wall" : "viewer";
    const layer = { name, stock: sheet.acrylic, thickness: choice.thickness, hold, id: newId(), site, place: at };
    edit({
      label: "Add a layer",
      change: (before) => addLayer(before, layer),
      choose: (after) => {
        const known = new Set(document.layers.map(({ key }) => key));
        const added = after.layers.find(({ key }) => !known.has(key));
        return added ? chooseLayer(after, added.key) : chooseLayer(after, over ?? "");
      },
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
        <Field label="Name" maxLength={120} value={name} onChange={(event) => setName(event.target.value)} />
        {document.layers.length > 0 && (
          <Select
            label="Where it lies"
            value={place}
            onChange={(event) => {
              const { value } = event.target;
              setPlace(value === "wall" || value === "under" ? value : "viewer");
            }}
          >
            <option value="viewer">over all layers</option>
            {over !== null && <option value="under">right under {over}</option>}
            <option value="wall">under all layers</option>
          </Select>
        )}
      </div>
      <LayerFields choice={choice} onChange={setChoice} />
      <div className="flex flex-wrap justify-end gap-3">
        <Button onClick={onDone}>Cancel</Button>
        <Button type="submit" kind="primary">
          Add the layer
        </Button>
      </div>
    </form>
  );
}

import { useState } from "react";
import type { Layer } from "#shared/mockup/document.ts";
import { Dialog } from "@/components/ui/dialog.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import { useLetteringDraft } from "../editor/use-lettering-draft.ts";
import { addLettering, type LetteringLayer } from "../model/commands/add-lettering.ts";
import { newLetteringDraft } from "../model/lettering-draft.ts";
import { shortWords } from "../model/lettering-words.ts";
import { chooseLettering } from "../model/selection.ts";
import { optionsOfHold } from "../model/stock-choices.ts";
import { suggestHold } from "../model/suggest-layers.ts";
import { type LayerChoice, LayerFields } from "./layer-fields.tsx";
import { LetteringForm } from "./lettering-form.tsx";

type LetteringDialogProps = { readonly open: boolean; readonly onOpenChange: (open: boolean) => void };

/** Words set in a shipped face, as pieces of a layer: a new one or one that is there. */
export function LetteringDialog({ open, onOpenChange }: LetteringDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title="Set lettering"
      description="Each letter becomes a piece that knows what it reads. The words come to the middle of the board."
      size="wide"
    >
      <NewLettering onDone={() => onOpenChange(false)} />
    </Dialog>
  );
}

function NewLettering({ onDone }: { readonly onDone: () => void }) {
  const { document, stock, site, briefWords, edit } = useDesk();
  const writing = useLetteringDraft(() => newLetteringDraft(document, briefWords));
  const free = document.layers.filter(({ locked }) => !locked);
  const [layerKey, setLayerKey] = useState<string | null>(null);
  const [name, setName] = useState<string | null>(null);
  const [choice, setChoice] = useState<LayerChoice>(() => ({
    sheet: 0,
    thickness: stock.acrylics[0]?.thicknessesMm[0] ?? 3,
    hold: suggestHold(stock, "wood"),
  }));
  const { ready, draft } = writing;
  const usualName = shortWords(draft.words) || "Lettering";
  const into = intoLayer();

  function intoLayer(): LetteringLayer | null {
    if (layerKey !== null) return { kind: "existing", key: layerKey };
    const sheet = stock.acrylics[choice.sheet];
    const hold = optionsOfHold(stock)[choice.hold];
    if (!sheet || !hold) return null;
    const { thickness } = choice;
    return { kind: "new", site, layer: { name: name ?? usualName, stock: sheet.acrylic, thickness, hold } };
  }

  function send() {
    if (!ready || !into) return;
    const id = newId();
    const lettering = { ...ready.setting, id };
    edit({
      label: `Set “${shortWords(draft.words)}”`,
      change: (before) =>
        addLettering(before, { set: { lettering, letters: ready.letters, box: ready.box }, id: newIdOf(id), into }),
      choose: (after) => chooseLettering(after, id),
    });
    onDone();
  }

  return (
    <LetteringForm
      writing={writing}
      action="Set the words"
      canSend={ready !== null && into !== null}
      onSend={send}
      onCancel={onDone}
    >
      <fieldset className="space-y-3 border-t border-rule pt-3">
        <legend className="sr-only">The layer of the letters</legend>
        <div className="grid gap-3 sm:grid-cols-2">
          <Select
            label="Layer"
            value={layerKey ?? ""}
            onChange={(event) => setLayerKey(event.target.value === "" ? null : event.target.value)}
          >
            <option value="">a new one, over the others</option>
            {free.map((layer) => (
              <option key={layer.key} value={layer.key}>
                {nameOfLayer(layer)}
              </option>
            ))}
          </Select>
          {layerKey === null && (
            <Field
              label="Name of the layer"
              maxLength={120}
              value={name ?? usualName}
              onChange={(event) => setName(event.target.value)}
            />
          )}
        </div>
        {layerKey === null && into !== null && <LayerFields choice={choice} onChange={setChoice} />}
        {into === null && (
          <Notice tone="caution">
            The stock list needs a sheet of acrylic and something to hold it, before letters can have a layer of their
            own.
          </Notice>
        )}
      </fieldset>
    </LetteringForm>
  );
}

const nameOfLayer = ({ key, name }: Layer): string => `${key}, ${name}`;
/** Pieces have ids of their own. */
const newIdOf = (letteringId: string): string => `${letteringId}-l`;

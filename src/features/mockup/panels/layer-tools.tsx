import { useState } from "react";
import { nextFreeKeys } from "#shared/mockup/layer-key.ts";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import { doubleLayer } from "../model/commands/add-layer.ts";
import { moveLayer, removeLayer } from "../model/commands/order-layers.ts";
import { hideLayer, lockLayer } from "../model/commands/show-layer.ts";
import { mostLayers } from "../model/limits.ts";
import { chooseLayer } from "../model/selection.ts";
import { WordButton } from "./cell-controls.tsx";
import { LayerDialog } from "./layer-dialog.tsx";
import { ToolWord } from "./tool-word.tsx";

/** What can be done with the chosen layer as a whole. Nothing asks back: Undo brings it all again. */
export function LayerTools({ onBoard }: { readonly onBoard: () => void }) {
  const { document, selection, edit } = useDesk();
  const [isAdding, setAdding] = useState(false);
  const index = document.layers.findIndex(({ key }) => key === selection.layerKey);
  const layer = document.layers[index];
  const whyFull = document.layers.length >= mostLayers ? `A sign takes ${mostLayers} layers.` : null;
  const add = (
    <>
      <ToolWord why={whyFull} onClick={() => setAdding(true)}>
        add a layer
      </ToolWord>
      <LayerDialog open={isAdding} onOpenChange={setAdding} over={layer?.key ?? null} />
    </>
  );
  if (!layer)
    return (
      <p className="text-fine text-graphite">
        Press a key to choose a layer. {add} <WordButton onClick={onBoard}>Change the board</WordButton>
      </p>
    );
  const { key, hidden, locked } = layer;
  const move = (towards: "viewer" | "wall") =>
    edit({ label: `Move ${key} towards the ${towards}`, change: (before) => moveLayer(before, { key, towards }) });

  function double() {
    const id = newId();
    const [newKey = key] = nextFreeKeys(document, 1);
    edit({
      label: `Double layer ${key}`,
      change: (before) => doubleLayer(before, { key, id }),
      choose: (after) => chooseLayer(after, newKey),
    });
  }

  return (
    <fieldset className="flex flex-wrap items-center gap-x-2">
      <legend className="float-left text-sm font-semibold text-ink">
        Layer {key}
        {locked && <span className="font-normal text-graphite">, locked</span>}
      </legend>
      <WordButton disabled={index === document.layers.length - 1} onClick={() => move("viewer")}>
        towards the viewer
      </WordButton>
      <WordButton disabled={index === 0} onClick={() => move("wall")}>
        towards the wall
      </WordButton>
      <WordButton
        onClick={() =>
          edit({
            label: hidden ? `Show ${key}` : `Hide ${key}`,
            change: (before) => hideLayer(before, { key, hidden: !hidden }),
          })
        }
      >
        {hidden ? "show again" : "hide"}
      </WordButton>
      <WordButton
        title={locked ? "So that it can be changed again" : "So that nothing of it can be moved or changed"}
        onClick={() =>
          edit({
            label: locked ? `Unlock ${key}` : `Lock ${key}`,
            change: (before) => lockLayer(before, { key, locked: !locked }),
          })
        }
      >
        {locked ? "unlock" : "lock"}
      </WordButton>
      <ToolWord why={whyFull} onClick={double}>
        double layer
      </ToolWord>
      {add}
      <ToolWord
        why={locked ? `${key} is locked. Unlock it first.` : null}
        onClick={() => edit({ label: `Remove ${key}`, change: (before) => removeLayer(before, { key }) })}
      >
        remove
      </ToolWord>
    </fieldset>
  );
}

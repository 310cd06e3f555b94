import { useDesk } from "../editor/desk-context.ts";
import { moveLayer, removeLayer } from "../model/commands/order-layers.ts";
import { hideLayer } from "../model/commands/show-layer.ts";
import { WordButton } from "./cell-controls.tsx";

/** What can be done with the chosen layer as a whole. Nothing asks back: Undo brings it all again. */
export function LayerTools({ onBoard }: { readonly onBoard: () => void }) {
  const { document, selection, edit } = useDesk();
  const index = document.layers.findIndex(({ key }) => key === selection.layerKey);
  const layer = document.layers[index];
  if (!layer)
    return (
      <p className="text-fine text-graphite">
        Press a key to choose a layer. <WordButton onClick={onBoard}>Change the board</WordButton>
      </p>
    );
  const { key, hidden } = layer;
  const move = (towards: "viewer" | "wall") =>
    edit({ label: `Move ${key} towards the ${towards}`, change: (before) => moveLayer(before, { key, towards }) });

  return (
    <fieldset className="flex flex-wrap items-center gap-x-2">
      <legend className="float-left text-sm font-semibold text-ink">Layer {key}</legend>
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
        {hidden ? "show again" : "hide in the picture"}
      </WordButton>
      <WordButton onClick={() => edit({ label: `Remove ${key}`, change: (before) => removeLayer(before, { key }) })}>
        remove
      </WordButton>
    </fieldset>
  );
}

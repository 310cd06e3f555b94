import { Menu, MenuItem, MenuLabel } from "@/components/ui/menu.tsx";
import { useDesk } from "../editor/desk-context.ts";
import { useCopyKeys } from "../editor/use-copy-keys.ts";
import { useCopying } from "../editor/use-copying.ts";
import { whyIdle } from "../model/chosen-words.ts";
import { ToolWord } from "./tool-word.tsx";

/** Copy, double and paste: in this mockup, and from one job of the client to another. */
export function CopyTools() {
  const { document, selection, client } = useDesk();
  const { read, copy, takeOut, double, pasteInto, pasteAsItCame } = useCopying();
  const hasPieces = selection.pieceIds.length > 0;
  const why = whyIdle(document, selection);
  useCopyKeys({
    hasChosen: hasPieces,
    onCopy: copy,
    onTakeOut: takeOut,
    onDouble: double,
    onPaste: pasteAsItCame,
    onPasteAsLayers: () => pasteInto(null),
  });
  const target = document.layers.find(({ key }) => key === selection.layerKey);
  const whyNoPaste = read === null ? `Nothing was copied yet in a job of ${client}.` : read.ok ? null : read.why;

  return (
    <>
      {/* What is locked can be copied: it stays as it is. */}
      <ToolWord why={hasPieces ? null : "Choose a layer or pieces first."} title="Ctrl C" onClick={copy}>
        copy
      </ToolWord>
      <ToolWord why={why} title="Ctrl D" onClick={double}>
        double pieces
      </ToolWord>
      {whyNoPaste !== null ? (
        <ToolWord why={whyNoPaste}>paste</ToolWord>
      ) : (
        <Menu
          align="start"
          trigger={
            <ToolWord why={null} title="Ctrl V">
              paste
            </ToolWord>
          }
        >
          <MenuItem onSelect={() => pasteInto(null)}>as layers of their own</MenuItem>
          {target &&
            (target.locked ? (
              <MenuLabel>
                {target.key}, {target.name} is locked
              </MenuLabel>
            ) : (
              <MenuItem onSelect={() => pasteInto(target.key)}>
                into {target.key}, {target.name}
              </MenuItem>
            ))}
        </Menu>
      )}
    </>
  );
}

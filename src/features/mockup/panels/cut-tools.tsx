import { useDesk } from "../editor/desk-context.ts";
import { cutReasons } from "../model/cut-choices.ts";
import type { DeskDialog } from "./desk-dialogs.tsx";
import { ToolGroup } from "./tool-group.tsx";
import { ToolWord } from "./tool-word.tsx";

/** How pieces are shaped for the cutter. Each opens a dialog that shows what would be, before it is done. */
export function CutTools({ onOpen }: { readonly onOpen: (dialog: DeskDialog) => void }) {
  const { document, selection } = useDesk();
  const why = cutReasons(document, selection);
  return (
    <ToolGroup title="Cut">
      <ToolWord why={why.margin} onClick={() => onOpen("margin")}>
        margin plate
      </ToolWord>
      <ToolWord why={why.join} onClick={() => onOpen("join")}>
        join
      </ToolWord>
      <ToolWord why={why.cutAway} onClick={() => onOpen("cut away")}>
        cut away
      </ToolWord>
      <ToolWord why={why.looseBits} onClick={() => onOpen("loose bits")}>
        loose bits
      </ToolWord>
      <ToolWord why={why.split} onClick={() => onOpen("split")}>
        split to bed
      </ToolWord>
    </ToolGroup>
  );
}

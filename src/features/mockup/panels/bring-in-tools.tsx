import { WordButton } from "./cell-controls.tsx";
import type { DeskDialog } from "./desk-dialogs.tsx";
import { ToolGroup } from "./tool-group.tsx";

/** What can be brought onto the board. */
export function BringInTools({ onOpen }: { readonly onOpen: (dialog: DeskDialog) => void }) {
  return (
    <ToolGroup title="Bring in">
      <WordButton onClick={() => onOpen("artwork")}>artwork</WordButton>
      <WordButton onClick={() => onOpen("lettering")}>lettering</WordButton>
      <WordButton onClick={() => onOpen("plate")}>a plate</WordButton>
    </ToolGroup>
  );
}

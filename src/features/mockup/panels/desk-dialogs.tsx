import { BoardDialog } from "./board-dialog.tsx";
import { BringInDialog } from "./bring-in-dialog.tsx";
import { KeysDialog } from "./keys-dialog.tsx";
import { LetteringDialog } from "./lettering-dialog.tsx";
import { PlateDialog } from "./plate-dialog.tsx";

export type DeskDialog = "artwork" | "lettering" | "plate" | "board" | "finish" | "keys";

type DeskDialogsProps = {
  readonly open: DeskDialog | null;
  readonly onClose: () => void;
  readonly shop: string;
  readonly jobId: string;
  readonly jobPath: string;
};

/** The dialogs that the bar over the drawing opens, one at a time. */
export function DeskDialogs({ open, onClose, ...job }: DeskDialogsProps) {
  const at = (dialog: DeskDialog) => ({
    open: open === dialog,
    onOpenChange: (isOpen: boolean) => {
      if (!isOpen) onClose();
    },
  });
  return (
    <>
      <BringInDialog {...at("artwork")} {...job} />
      <LetteringDialog {...at("lettering")} />
      <PlateDialog {...at("plate")} />
      <BoardDialog {...at("board")} />
      <BoardDialog {...at("finish")} at="finish" />
      <KeysDialog {...at("keys")} />
    </>
  );
}

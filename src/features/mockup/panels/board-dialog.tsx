import { Dialog } from "@/components/ui/dialog.tsx";
import { BoardForm } from "./board-form.tsx";

type BoardDialogProps = { readonly open: boolean; readonly onOpenChange: (open: boolean) => void };

/** The board in a dialog. */
export function BoardDialog({ open, onOpenChange }: BoardDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title="Board"
      description="What lies on it keeps its place from the middle."
    >
      <BoardForm onDone={() => onOpenChange(false)} />
    </Dialog>
  );
}

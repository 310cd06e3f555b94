import { useRef, useState } from "react";
import { ConfirmDialog } from "@/components/ui/confirm-dialog.tsx";
import { Dialog } from "@/components/ui/dialog.tsx";
import { BoardForm, type BoardPart } from "./board-form.tsx";

type BoardDialogProps = {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  /** Where the reader begins; at the top when not said. */
  readonly at?: BoardPart;
};

/** The board in a dialog. What was written in it is not thrown away without asking. */
export function BoardDialog({ open, onOpenChange, at }: BoardDialogProps) {
  const isChanged = useRef(false);
  const [isLeaving, setLeaving] = useState(false);
  const close = () => {
    isChanged.current = false;
    setLeaving(false);
    onOpenChange(false);
  };
  const leave = () => (isChanged.current ? setLeaving(true) : close());
  return (
    <>
      <Dialog
        open={open}
        onOpenChange={(next) => (next ? onOpenChange(true) : leave())}
        size="wide"
        title="Board"
        description="What lies on it keeps its place from the middle. All of it is one step, and Undo takes it back."
      >
        <BoardForm
          {...(at ? { at } : {})}
          onChanged={(changed) => {
            isChanged.current = changed;
          }}
          onLeave={leave}
          onTaken={close}
        />
      </Dialog>
      <ConfirmDialog
        open={open && isLeaving}
        onOpenChange={setLeaving}
        title="Leave the board as it was?"
        action="Leave it as it was"
        refuse="Go on writing"
        onConfirm={close}
      >
        <p>What you wrote here is not in the drawing yet, and is lost when you leave.</p>
      </ConfirmDialog>
    </>
  );
}

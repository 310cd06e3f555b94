import { BoardDialog } from "./board-dialog.tsx";
import { BringInDialog } from "./bring-in-dialog.tsx";
import { CutAwayDialog } from "./cut-away-dialog.tsx";
import { DeskDrafts } from "./desk-drafts.tsx";
import { JoinDialog } from "./join-dialog.tsx";
import { KeysDialog } from "./keys-dialog.tsx";
import { LetteringDialog } from "./lettering-dialog.tsx";
import { LooseBitsDialog } from "./loose-bits-dialog.tsx";
import { MarginDialog } from "./margin-dialog.tsx";
import { PlateDialog } from "./plate-dialog.tsx";
import { SplitDialog } from "./split-dialog.tsx";
import { StepOffDialog } from "./step-off-dialog.tsx";
import { WallDialog } from "./wall-dialog.tsx";

/** How pieces are shaped. */
type CutDialog = "margin" | "join" | "cut away" | "loose bits" | "split";

export type DeskDialog =
  | "drafts"
  | "artwork"
  | "lettering"
  | "plate"
  | "board"
  | "finish"
  | "keys"
  | "step off"
  | "wall"
  | CutDialog;

type DeskDialogsProps = {
  readonly open: DeskDialog | null;
  readonly onClose: () => void;
  readonly shop: string;
  readonly jobId: string;
  /** Files dropped on the drawing, for the artwork dialog that they open. */
  readonly files: readonly File[];
};

/** The dialogs that the bar over the drawing opens, one at a time. */
export function DeskDialogs({ open, onClose, files, ...job }: DeskDialogsProps) {
  const at = (dialog: DeskDialog) => ({
    open: open === dialog,
    onOpenChange: (isOpen: boolean) => {
      if (!isOpen) onClose();
    },
  });
  return (
    <>
      <BringInDialog {...at("artwork")} {...job} files={files} />
      <LetteringDialog {...at("lettering")} />
      <PlateDialog {...at("plate")} />
      <BoardDialog {...at("board")} />
      <BoardDialog {...at("finish")} at="finish" />
      <StepOffDialog {...at("step off")} />
      <DeskDrafts {...at("drafts")} shop={job.shop} jobId={job.jobId} />
      <MarginDialog {...at("margin")} />
      <JoinDialog {...at("join")} />
      <CutAwayDialog {...at("cut away")} />
      <LooseBitsDialog {...at("loose bits")} />
      <SplitDialog {...at("split")} />
      <WallDialog {...at("wall")} shop={job.shop} jobId={job.jobId} />
      <KeysDialog {...at("keys")} />
    </>
  );
}

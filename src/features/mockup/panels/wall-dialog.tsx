import { Dialog } from "@/components/ui/dialog.tsx";
import { WallForm } from "./wall-form.tsx";

type WallDialogProps = {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly shop: string;
  readonly jobId: string;
};

/** The sign on the wall that it is to hang on: a colour, or a photo of the place. */
export function WallDialog({ open, onOpenChange, shop, jobId }: WallDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      size="desk"
      undoes
      title="On the wall"
      description="For judging size and place, not for setting out: what is drilled is measured on the wall itself."
    >
      <WallForm shop={shop} jobId={jobId} />
    </Dialog>
  );
}

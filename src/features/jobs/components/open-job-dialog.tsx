import { Dialog } from "@/components/ui/dialog.tsx";
import { OpenJobForm } from "./open-job-form.tsx";

export function OpenJobDialog({
  shop,
  open,
  onOpenChange,
  onOpened,
}: {
  readonly shop: string;
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly onOpened: (jobId: string) => void;
}) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title="Open a job"
      description="A client and what the sign is. The rest is filled in on the job's own page."
    >
      <OpenJobForm shop={shop} onOpened={onOpened} />
    </Dialog>
  );
}

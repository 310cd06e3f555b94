import { useEffect, useEffectEvent, useState } from "react";
import { Dialog } from "@/components/ui/dialog.tsx";
import { cx } from "@/lib/cx.ts";
import { useArtworkUpload } from "@/lib/use-artwork-upload.ts";
import { useFileDrop } from "@/lib/use-file-drop.ts";
import { ArtworkChoice } from "./artwork-choice.tsx";
import { ArtworkFiles } from "./artwork-files.tsx";

type BringInDialogProps = {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly shop: string;
  readonly jobId: string;
  /** Files that were dropped on the drawing and opened this. */
  readonly files: readonly File[];
};

/** The job's artwork, sent from here or brought before: each colour to a layer, or the whole in place of another. */
export function BringInDialog({ open, onOpenChange, ...rest }: BringInDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      size="desk"
      title="Bring in artwork"
      description="Each colour becomes a layer, of the stock that comes nearest, unless you say otherwise."
    >
      <BringIn {...rest} onDone={() => onOpenChange(false)} />
    </Dialog>
  );
}

function BringIn({
  shop,
  jobId,
  files,
  onDone,
}: Omit<BringInDialogProps, "open" | "onOpenChange"> & { onDone: () => void }) {
  const [chosen, setChosen] = useState<string | null>(null);
  const { state, refusals, send, cancel } = useArtworkUpload(shop, jobId, ({ id }) => setChosen(id));
  const take = (given: readonly File[]) => {
    if (given.length > 0 && state.step !== "sending") void send(given);
  };
  const drop = useFileDrop(take);
  const takeDropped = useEffectEvent(take);
  useEffect(() => takeDropped(files), [files]);
  return (
    <section
      aria-label="Artwork of this job"
      {...drop.handlers}
      className={cx("space-y-4 outline-offset-8", drop.over && "bg-linen outline-2 outline-indigo outline-dashed")}
    >
      <ArtworkFiles state={state} refusals={refusals} onFiles={take} onCancel={cancel} />
      <ArtworkChoice shop={shop} jobId={jobId} chosen={chosen} onChoose={setChosen} onDone={onDone} />
    </section>
  );
}

import { type DragEvent, useId, useRef, useState } from "react";
import { Busy } from "@/components/ui/busy.tsx";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { cx } from "@/lib/cx.ts";
import { useArtworkUpload } from "@/lib/use-artwork-upload.ts";
import { useDropsKeptOut } from "@/lib/use-drops-kept-out.ts";

/** Brings in artwork files: chosen, or dropped on the frame. Shows how far they are, and why one was refused. */
export function ArtworkUpload({ shop, jobId }: { readonly shop: string; readonly jobId: string }) {
  const input = useRef<HTMLInputElement>(null);
  const id = useId();
  const [over, setOver] = useState(false);
  const { state, refusals, send, cancel } = useArtworkUpload(shop, jobId);
  useDropsKeptOut();
  const sending = state.step === "sending";
  const take = (files: FileList | null) => {
    if (files && files.length > 0 && !sending) void send([...files]);
  };
  const handleDrop = (event: DragEvent) => {
    event.preventDefault();
    setOver(false);
    take(event.dataTransfer.files);
  };
  return (
    <fieldset
      className={cx("min-w-0 border border-dashed px-4 py-4", over ? "border-indigo bg-linen" : "border-graphite")}
      onDragOver={(event) => {
        event.preventDefault();
        setOver(true);
      }}
      onDragLeave={() => setOver(false)}
      onDrop={handleDrop}
    >
      <legend className="sr-only">Bring in artwork</legend>
      <input
        ref={input}
        id={id}
        type="file"
        multiple
        aria-label="Artwork file"
        accept=".svg,.pdf,.png,.jpg,.jpeg,image/svg+xml,application/pdf,image/png,image/jpeg"
        className="sr-only"
        tabIndex={-1}
        onChange={(event) => {
          take(event.target.files);
          // The same file can be chosen again after it was mended.
          event.target.value = "";
        }}
      />
      {refusals.map(({ id: refusal, name, reason }) => (
        <Notice key={refusal} tone="error" title={`“${name}” was not taken`} className="mb-3">
          {reason}
        </Notice>
      ))}
      {state.step === "cancelled" && (
        <Notice tone="info" className="mb-3">
          “{state.name}” was given up. Nothing of it was kept.
        </Notice>
      )}
      {sending ? (
        <div className="space-y-3">
          <Busy
            label={state.share < 1 ? `Sending “${state.name}”` : `Checking “${state.name}”`}
            {...(state.share < 1 ? { share: state.share } : {})}
          />
          <Button size="small" onClick={cancel}>
            Cancel
          </Button>
        </div>
      ) : (
        <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
          <Button onClick={() => input.current?.click()}>Bring in a file</Button>
          <p className="text-sm text-graphite">or drop it here. SVG, PDF, PNG or JPEG; the file is kept as it came.</p>
        </div>
      )}
    </fieldset>
  );
}

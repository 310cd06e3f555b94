import { useRef } from "react";
import { Busy } from "@/components/ui/busy.tsx";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import type { Refusal, UploadState } from "@/lib/use-artwork-upload.ts";

type ArtworkFilesProps = {
  readonly state: UploadState;
  readonly refusals: readonly Refusal[];
  readonly onFiles: (files: readonly File[]) => void;
  readonly onCancel: () => void;
};

/** Files to choose, how far they are sent, and why one was not taken. */
export function ArtworkFiles({ state, refusals, onFiles, onCancel }: ArtworkFilesProps) {
  const input = useRef<HTMLInputElement>(null);
  return (
    <div className="space-y-2">
      <input
        ref={input}
        type="file"
        multiple
        aria-label="Artwork file"
        accept=".svg,.pdf,.png,.jpg,.jpeg,image/svg+xml,application/pdf,image/png,image/jpeg"
        className="sr-only"
        tabIndex={-1}
        onChange={(event) => {
          if (event.target.files && event.target.files.length > 0) onFiles([...event.target.files]);
          // The same file can be chosen again after it was mended.
          event.target.value = "";
        }}
      />
      {refusals.map(({ id, name, reason }) => (
        <Notice key={id} tone="error" title={`“${name}” was not taken`}>
          {reason}
        </Notice>
      ))}
      {state.step === "cancelled" && <Notice tone="info">“{state.name}” was given up. Nothing of it was kept.</Notice>}
      {state.step === "sending" ? (
        <div className="flex flex-wrap items-end gap-4">
          <div className="w-full max-w-sm">
            <Busy
              label={state.share < 1 ? `Sending “${state.name}”` : `Checking “${state.name}”`}
              {...(state.share < 1 ? { share: state.share } : {})}
            />
          </div>
          <Button size="small" onClick={onCancel}>
            Cancel sending
          </Button>
        </div>
      ) : (
        <div className="flex flex-wrap items-center gap-x-4 gap-y-1">
          <Button size="small" onClick={() => input.current?.click()}>
            Choose a file
          </Button>
          <p className="text-sm text-graphite">or drop it here or on the drawing.</p>
        </div>
      )}
    </div>
  );
}

import { useQuery } from "@tanstack/react-query";
import { useRef } from "react";
import type { WallPhotoItem } from "#shared/contracts/wall-photos.ts";
import { Busy } from "@/components/ui/busy.tsx";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { cx } from "@/lib/cx.ts";
import { useFileDrop } from "@/lib/use-file-drop.ts";
import { useRemoveWallPhoto, wallPhotosQuery } from "../api/wall-photos.ts";
import { useDesk } from "../editor/desk-context.ts";
import { usePhotoUpload } from "../editor/use-photo-upload.ts";
import type { ChosenPhoto } from "../model/commands/set-wall.ts";
import { WordButton } from "./cell-controls.tsx";

type WallPhotoChoiceProps = {
  readonly shop: string;
  readonly jobId: string;
  readonly onChoose: (photo: ChosenPhoto | null) => void;
};

const chosenOf = ({ id, widthPx, heightPx }: WallPhotoItem): ChosenPhoto => ({ photoId: id, widthPx, heightPx });

/** A plain wall, or one of the job's photos; a new one is chosen or dropped here. */
export function WallPhotoChoice({ shop, jobId, onChoose }: WallPhotoChoiceProps) {
  const { document } = useDesk();
  const { photo } = document.presentation;
  const input = useRef<HTMLInputElement>(null);
  const photos = useQuery(wallPhotosQuery(shop, jobId));
  const remove = useRemoveWallPhoto(shop, jobId);
  const { state, send, cancel } = usePhotoUpload(shop, jobId, (added) => onChoose(chosenOf(added)));
  const sending = state.step === "sending";
  const take = (file: File | undefined) => {
    if (file && !sending) void send(file);
  };
  const { over, handlers } = useFileDrop((files) => take(files[0]));

  return (
    <fieldset
      className={cx("min-w-0 space-y-3 border border-dashed p-3", over ? "border-indigo bg-linen" : "border-graphite")}
      {...handlers}
    >
      <legend className="sr-only">What it hangs on</legend>
      <div className="space-y-1">
        <Choice name="a plain wall" isChosen={photo === null} onChoose={() => onChoose(null)} />
        {photos.data?.map((item) => (
          <div key={item.id} className="flex items-center justify-between gap-2">
            <Choice name={item.name} isChosen={photo?.photoId === item.id} onChoose={() => onChoose(chosenOf(item))} />
            {item.can.remove && photo?.photoId !== item.id && (
              <WordButton aria-label={`Take ${item.name} off the job`} onClick={() => remove.mutate(item.id)}>
                take off
              </WordButton>
            )}
          </div>
        ))}
        {photo && photos.data && !photos.data.some(({ id }) => id === photo.photoId) && (
          <Choice name="a photo that is no longer on the job’s list" isChosen onChoose={() => undefined} />
        )}
      </div>
      {photos.isError && (
        <ProblemNotice
          what="The job’s photos could not be listed."
          error={photos.error}
          onRetry={() => void photos.refetch()}
        />
      )}
      {remove.isError && <ProblemNotice what="The photo could not be taken off." error={remove.error} />}
      {state.step === "refused" && (
        <Notice tone="error" title={`“${state.name}” was not taken`}>
          {state.reason}
        </Notice>
      )}
      {state.step === "cancelled" && <Notice>“{state.name}” was given up. Nothing of it was kept.</Notice>}
      <input
        ref={input}
        type="file"
        aria-label="Photo of the wall"
        accept=".jpg,.jpeg,.png,image/jpeg,image/png"
        className="sr-only"
        tabIndex={-1}
        onChange={(event) => {
          take(event.target.files?.[0]);
          event.target.value = "";
        }}
      />
      {sending ? (
        <div className="space-y-2">
          <Busy
            label={state.share < 1 ? `Sending “${state.name}”` : `Making “${state.name}” ready`}
            {...(state.share < 1 ? { share: state.share } : {})}
          />
          <Button size="small" onClick={cancel}>
            Cancel
          </Button>
        </div>
      ) : (
        <div className="space-y-2">
          <Button size="small" onClick={() => input.current?.click()}>
            Bring in a photo
          </Button>
          <p className="text-sm text-graphite">
            {photo
              ? "or drop it here: JPEG or PNG."
              : "or drop it here: JPEG or PNG. Tape an A4 or Letter sheet flat and level on the wall before you take it, and keep the whole photo, uncropped."}
          </p>
        </div>
      )}
    </fieldset>
  );
}

function Choice({
  name,
  isChosen,
  onChoose,
}: {
  readonly name: string;
  readonly isChosen: boolean;
  readonly onChoose: () => void;
}) {
  return (
    <label className="flex min-h-9 min-w-0 cursor-pointer items-center gap-2 text-base text-ink">
      <input
        type="radio"
        name="wall"
        className="size-4 shrink-0 accent-indigo"
        checked={isChosen}
        onChange={onChoose}
      />
      <span className="truncate">{name}</span>
    </label>
  );
}

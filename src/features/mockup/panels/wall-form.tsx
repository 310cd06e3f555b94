import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import type { WallPhoto } from "#shared/mockup/document.ts";
import { Notice } from "@/components/ui/notice.tsx";
import { mockupQueries } from "../api/queries.ts";
import { wallPhotoAddress } from "../api/wall-photos.ts";
import { useDesk } from "../editor/desk-context.ts";
import { useOnWall } from "../engine/use-on-wall.ts";
import { chooseWallPhoto, hangAt, markCorner } from "../model/commands/set-wall.ts";
import { PhotoWall } from "./photo-wall.tsx";
import { PlainWall } from "./plain-wall.tsx";
import { WallColour } from "./wall-colour.tsx";
import { WallFigures } from "./wall-figures.tsx";
import { WallPhotoChoice } from "./wall-photo-choice.tsx";
import { WallSteps } from "./wall-steps.tsx";

export type WallStep = "mark" | "hang";

/** The picture at the left, what it is made of at the right. */
export function WallForm({ shop, jobId }: { readonly shop: string; readonly jobId: string }) {
  const { document, unit, edit } = useDesk();
  const { photo } = document.presentation;
  const [step, setStep] = useState<WallStep>("hang");
  /** Under the hand; null at rest. */
  const [preview, setPreview] = useState<WallPhoto | null>(null);
  const { onWall, isFailed } = useOnWall(document, unit);
  const job = useQuery(mockupQueries.job(shop, jobId));
  const shown = preview ?? photo;

  return (
    <div className="grid gap-5 lg:grid-cols-[minmax(0,1fr)_21rem]">
      <div className="min-w-0 space-y-3">
        {isFailed && (
          <Notice tone="error" title="The sign could not be drawn.">
            Close this view and open it again. The mockup itself is safe.
          </Notice>
        )}
        {shown ? (
          <>
            <WallSteps step={step} onStep={setStep} />
            <PhotoWall
              key={shown.photoId}
              address={wallPhotoAddress(shop, shown.photoId)}
              photo={shown}
              onWall={onWall}
              step={step}
              onPreview={setPreview}
              onMark={(corner, to, together) => {
                setPreview(null);
                edit({
                  label: "Mark the sheet",
                  change: (before) => markCorner(before, { corner, to }),
                  ...(together ? { together: `wall mark ${corner}` } : {}),
                });
              }}
              onHang={(to, together) => {
                setPreview(null);
                edit({
                  label: "Hang the sign",
                  change: (before) => hangAt(before, to),
                  ...(together ? { together: "wall place" } : {}),
                });
              }}
            />
          </>
        ) : (
          <PlainWall onWall={onWall} />
        )}
      </div>
      <div className="min-w-0 space-y-5">
        {job.data?.brief.wall && (
          <p className="text-sm text-graphite">The brief says of the wall: “{job.data.brief.wall}”.</p>
        )}
        <WallPhotoChoice
          shop={shop}
          jobId={jobId}
          onChoose={(chosen) => {
            edit({
              label: chosen ? "Choose a photo of the wall" : "Show on a plain wall",
              change: (before) =>
                chooseWallPhoto(before, chosen && { ...chosen, paper: unit === "mm" ? "A4" : "Letter" }),
            });
            setStep("mark");
          }}
        />
        {shown ? <WallFigures photo={shown} step={step} /> : <WallColour />}
      </div>
    </div>
  );
}

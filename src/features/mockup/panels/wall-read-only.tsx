import { useMemo, useRef, useState } from "react";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { readWallPhoto } from "#shared/wall/read-wall-photo.ts";
import { useRoom } from "@/lib/use-room.ts";
import { wallPhotoAddress } from "../api/wall-photos.ts";
import { useOnWall } from "../engine/use-on-wall.ts";
import { errorWords, placeOnWallWords } from "../model/wall-words.ts";
import { SignOnPhoto } from "./sign-on-photo.tsx";
import { WallImage } from "./wall-image.tsx";

type WallReadOnlyProps = {
  readonly shop: string;
  readonly unit: LengthUnit;
  readonly document: MockupDocument;
};

/** The sign on the photo of its wall, to look at; nothing while the mockup has no photo whose sheet is marked. */
export function WallReadOnly({ shop, unit, document }: WallReadOnlyProps) {
  const { photo } = document.presentation;
  const frame = useRef<HTMLDivElement>(null);
  const room = useRoom(frame);
  const [isLoaded, setLoaded] = useState(false);
  const reading = useMemo(() => (photo ? readWallPhoto(photo) : null), [photo]);
  const { onWall } = useOnWall(document, unit);
  if (!photo || !reading?.ok) return null;
  return (
    <section className="space-y-2">
      <h2 className="font-serif text-base font-bold text-ink">On the wall</h2>
      <WallImage
        address={wallPhotoAddress(shop, photo.photoId)}
        photo={photo}
        frame={frame}
        onLoad={() => setLoaded(true)}
      >
        {isLoaded && room && onWall && (
          <SignOnPhoto
            onWall={onWall}
            reading={reading.value}
            at={photo.at}
            board={document.board}
            shown={room.width / photo.widthPx}
          />
        )}
      </WallImage>
      <p className="text-sm text-graphite">
        {placeOnWallWords(document, photo, unit)} {errorWords(document, photo, reading.value, unit)} The picture is for
        judging size and place, not for setting out.
      </p>
    </section>
  );
}

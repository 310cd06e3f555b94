import { useMemo, useRef, useState } from "react";
import type { OnWall } from "#shared/drawing/on-wall.ts";
import type { Point } from "#shared/geometry/path.ts";
import type { WallPhoto } from "#shared/mockup/document.ts";
import { cornerFaultWords } from "#shared/wall/quad.ts";
import { readWallPhoto } from "#shared/wall/read-wall-photo.ts";
import { Notice } from "@/components/ui/notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { useRoom } from "@/lib/use-room.ts";
import { useDesk } from "../editor/desk-context.ts";
import { CornerMark } from "./corner-mark.tsx";
import { Magnifier } from "./magnifier.tsx";
import { SheetOutline } from "./sheet-outline.tsx";
import { SignHandle } from "./sign-handle.tsx";
import { SignOnPhoto } from "./sign-on-photo.tsx";
import type { WallStep } from "./wall-form.tsx";
import { WallImage } from "./wall-image.tsx";

type PhotoWallProps = {
  readonly address: string;
  readonly photo: WallPhoto;
  readonly onWall: OnWall | null;
  readonly step: WallStep;
  readonly onPreview: (photo: WallPhoto | null) => void;
  readonly onMark: (corner: number, to: Point, together: boolean) => void;
  readonly onHang: (to: Point, together: boolean) => void;
};

/** The photo with the marks on the sheet's corners and the sign on its wall. */
export function PhotoWall({ address, photo, onWall, step, onPreview, onMark, onHang }: PhotoWallProps) {
  const { document } = useDesk();
  const frame = useRef<HTMLDivElement>(null);
  const room = useRoom(frame);
  const [active, setActive] = useState<number | null>(null);
  const [isLoaded, setLoaded] = useState(false);
  const reading = useMemo(() => readWallPhoto(photo), [photo]);
  const shown = room === null ? null : room.width / photo.widthPx;
  const mark = active === null ? undefined : photo.corners[active];

  const withCorner = (corner: number, to: Point): WallPhoto => {
    const [a, b, c, d] = photo.corners;
    const put = (index: number, before: Point) => (index === corner ? to : before);
    return { ...photo, corners: [put(0, a), put(1, b), put(2, c), put(3, d)] };
  };

  return (
    <div className="space-y-3">
      {!reading.ok && <Notice tone="caution">{cornerFaultWords[reading.reason]}</Notice>}
      <WallImage address={address} photo={photo} frame={frame} onLoad={() => setLoaded(true)}>
        {isLoaded && shown !== null && (
          <>
            {reading.ok && onWall && (
              <SignOnPhoto onWall={onWall} reading={reading.value} at={photo.at} board={document.board} shown={shown} />
            )}
            {!onWall && <Skeleton label="Drawing the sign" rows={0} />}
            {step === "mark" && <SheetOutline corners={photo.corners} shown={shown} />}
            {step === "mark" &&
              photo.corners.map((at, corner) => (
                <CornerMark
                  key={cornerKey(corner)}
                  corner={corner}
                  at={at}
                  shown={shown}
                  isActive={active === corner}
                  onActive={(isActive) =>
                    setActive((before) => (isActive ? corner : before === corner ? null : before))
                  }
                  onDrag={(to) => onPreview(withCorner(corner, to))}
                  onPut={(to, together) => onMark(corner, to, together)}
                  onLeave={() => onPreview(null)}
                />
              ))}
            {step === "mark" && mark && room && (
              <Magnifier address={address} photo={photo} at={mark} shown={shown} room={room} />
            )}
            {step === "hang" && reading.ok && onWall && (
              <SignHandle
                photo={photo}
                reading={reading.value}
                onWall={onWall}
                shown={shown}
                onDrag={(at) => onPreview({ ...photo, at })}
                onHang={onHang}
                onLeave={() => onPreview(null)}
              />
            )}
          </>
        )}
      </WallImage>
    </div>
  );
}

const cornerKey = (corner: number): string => `corner ${corner}`;

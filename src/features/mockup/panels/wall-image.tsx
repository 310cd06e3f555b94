import { type ReactNode, type Ref, useState } from "react";
import type { WallPhoto } from "#shared/mockup/document.ts";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";

type WallImageProps = {
  readonly address: string;
  readonly photo: Pick<WallPhoto, "widthPx" | "heightPx">;
  readonly frame: Ref<HTMLDivElement>;
  readonly onLoad: () => void;
  readonly children?: ReactNode;
};

/** The photo as large as its place allows, with what is laid over it. Says when it can't be loaded. */
export function WallImage({ address, photo, frame, onLoad, children }: WallImageProps) {
  const [tries, setTries] = useState(0);
  const [isFailed, setFailed] = useState(false);
  const { widthPx, heightPx } = photo;
  return (
    <>
      {isFailed && (
        <Notice tone="error" title="The photo could not be loaded.">
          <p>The connection may be lost, or the photo was taken out of the shop.</p>
          <Button
            size="small"
            className="mt-2"
            onClick={() => {
              setFailed(false);
              setTries(tries + 1);
            }}
          >
            Try again
          </Button>
        </Notice>
      )}
      <div
        ref={frame}
        className="relative mx-auto overflow-hidden bg-linen"
        style={{
          aspectRatio: `${widthPx} / ${heightPx}`,
          width: `min(100%, calc((100dvh - 15rem) * ${widthPx / heightPx}))`,
        }}
      >
        <img
          key={tries}
          src={address}
          alt="The wall that the sign is to hang on"
          draggable={false}
          onLoad={onLoad}
          onError={() => setFailed(true)}
          className="absolute inset-0 size-full select-none"
        />
        {children}
      </div>
    </>
  );
}

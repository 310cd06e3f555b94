import { type CSSProperties, memo } from "react";
import type { OnWall } from "#shared/drawing/on-wall.ts";
import type { Board, WallPhoto } from "#shared/mockup/document.ts";
import type { WallReading } from "#shared/wall/read-wall-photo.ts";
import { DrawingSvg } from "@/lib/drawing-svg.tsx";
import { matrix3dOf, warpOf } from "../model/warp.ts";

type SignOnPhotoProps = {
  readonly onWall: OnWall;
  readonly reading: WallReading;
  readonly at: WallPhoto["at"];
  readonly board: Pick<Board, "width" | "height">;
  /** Px of the screen to a px of the photo. */
  readonly shown: number;
};

/** The sign's planes laid over a photo in true size and slant, from its upper left corner. Nothing where the photo can't show them. */
export function SignOnPhoto({ onWall, reading, at, board, shown }: SignOnPhotoProps) {
  const { box, planes } = onWall;
  const warps = planes.map((plane) => warpOf({ reading, at, board, box, shown }, plane));
  return (
    <div aria-hidden="true" data-sign className="pointer-events-none absolute inset-0 overflow-hidden">
      {planes.map(({ list }, index) => {
        const warp = warps[index];
        if (!warp) return null;
        const style: CSSProperties = {
          width: box.width * warp.pxPerMm,
          height: box.height * warp.pxPerMm,
          transform: matrix3dOf(warp.map),
        };
        return (
          <div key={planeKey(index)} className="absolute top-0 left-0 origin-top-left" style={style}>
            <Plane list={list} title="" className="block size-full" />
          </div>
        );
      })}
    </div>
  );
}

/** Under a hand the planes move and nothing in them changes. */
const Plane = memo(DrawingSvg);

/** Planes keep their order, the wall's first. */
const planeKey = (index: number): string => `plane ${index}`;

import type { OnWall } from "#shared/drawing/on-wall.ts";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { DrawingSvg } from "@/lib/drawing-svg.tsx";
import { useDesk } from "../editor/desk-context.ts";

/** The sign from the front on a wall of one colour. */
export function PlainWall({ onWall }: { readonly onWall: OnWall | null }) {
  const { document } = useDesk();
  if (!onWall) return <Skeleton label="Drawing the sign" rows={1} rowClassName="h-[50dvh]" />;
  const { box, planes } = onWall;
  return (
    <div
      role="img"
      aria-label="The sign on a plain wall, from the front"
      className="flex h-[max(20rem,calc(100dvh-14rem))] items-center justify-center border border-rule p-6"
      style={{ backgroundColor: document.presentation.wall }}
    >
      <div
        aria-hidden="true"
        className="relative max-h-full w-full"
        style={{ aspectRatio: `${box.width} / ${box.height}` }}
      >
        {planes.map(({ list }, index) => (
          // Planes keep their order, lowest first.
          <DrawingSvg key={planeKey(index)} list={list} title="" className="absolute inset-0 size-full" />
        ))}
      </div>
    </div>
  );
}

const planeKey = (index: number): string => `plane ${index}`;

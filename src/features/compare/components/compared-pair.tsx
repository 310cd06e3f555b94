import { useMemo, useRef, useState } from "react";
import type { z } from "zod";
import type { compareSchema } from "#shared/contracts/revisions.ts";
import type { DisplayList } from "#shared/drawing/display-list.ts";
import { boardOriginOf } from "#shared/drawing/elevation.ts";
import { Button } from "@/components/ui/button.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { cx } from "@/lib/cx.ts";
import type { DrawingView } from "@/lib/drawing-view.ts";
import { revisionStateWord, type Side } from "@/lib/revision-state.ts";
import { alignPictures } from "../model/align-pictures.ts";
import { ChangeList } from "./change-list.tsx";
import { ComparedPicture } from "./compared-picture.tsx";

type ComparedPairProps = {
  readonly pair: z.infer<typeof compareSchema>;
  /** Who reads. */
  readonly side: Side;
  readonly pathOfSheet: (revisionId: string) => string;
};

const sides = [
  { id: "elevation", label: "Front" },
  { id: "section", label: "From the side" },
] as const;

/** Two letters side by side at one scale, and what changed in words. */
export function ComparedPair({ pair, side: reader, pathOfSheet }: ComparedPairProps) {
  const [side, setSide] = useState<(typeof sides)[number]["id"]>("elevation");
  const [view, setView] = useState<DrawingView | null>(null);
  const [chosen, setChosen] = useState<number | null>(null);
  const pictures = useRef<HTMLDivElement>(null);
  const { before, after, changes } = pair;
  const aligned = useMemo(() => {
    const placed = (list: DisplayList) => ({ list, origin: boardOriginOf(list) ?? { x: 0, y: 0 } });
    return alignPictures(placed(before[side]), placed(after[side]));
  }, [before, after, side]);
  const where = side === "elevation" && chosen !== null ? changes[chosen]?.where : null;
  const spot = where ? { x: where.x + aligned.origin.x, y: where.y + aligned.origin.y } : null;

  function handleSide(next: typeof side) {
    setSide(next);
    setView(null);
  }

  function handleChoose(place: number | null) {
    setChosen(place);
    if (place === null) return;
    handleSide("elevation");
    pictures.current?.scrollIntoView({ block: "nearest" });
  }

  return (
    <div className="border-y border-ink bg-sheet lg:grid lg:h-[max(36rem,calc(100dvh-13rem))] lg:grid-cols-[minmax(0,1fr)_22rem] lg:border-x">
      <div ref={pictures} className="flex min-h-0 flex-col">
        <p className="flex gap-2 border-b border-rule px-4 py-2">
          {sides.map(({ id, label }) => (
            <Button
              key={id}
              size="small"
              aria-pressed={id === side}
              className="aria-pressed:bg-linen"
              onClick={() => handleSide(id)}
            >
              {label}
            </Button>
          ))}
        </p>
        <div
          className={cx(
            "grid min-h-0 flex-1 lg:auto-rows-auto lg:grid-cols-2",
            // Sections are tall and narrow: under each other a phone would letter them too small to read.
            side === "section" ? "auto-rows-[32rem] grid-cols-2" : "auto-rows-[19rem]",
          )}
        >
          {[
            { ...before, list: aligned.before },
            { ...after, list: aligned.after },
          ].map((one, index) => (
            <div
              key={one.revision.id}
              className={cx(
                "min-h-0 min-w-0",
                index === 0 && (side === "section" ? "border-r border-rule" : "lg:border-r lg:border-rule"),
                index === 1 && side === "elevation" && "border-t border-ink lg:border-t-0",
              )}
            >
              <ComparedPicture
                list={one.list}
                title={`Revision ${one.revision.letter}, ${side === "elevation" ? "front" : "from the side"}`}
                heading={
                  <>
                    <h2 className="font-serif text-base font-bold">
                      Revision {one.revision.letter}{" "}
                      <span className="font-sans text-fine font-normal text-graphite">
                        {revisionStateWord(one.revision.state, reader)}
                      </span>
                    </h2>
                    <TextLink
                      className="inline-flex min-h-8 items-center text-sm pointer-coarse:min-h-11"
                      to={pathOfSheet(one.revision.id)}
                    >
                      Sheet {one.revision.letter}
                    </TextLink>
                  </>
                }
                view={view}
                onView={setView}
                spot={spot}
              />
            </div>
          ))}
        </div>
      </div>
      <div className="border-t border-ink lg:min-h-0 lg:overflow-y-auto lg:border-t-0 lg:border-l">
        <ChangeList
          changes={changes}
          before={before.revision.letter}
          after={after.revision.letter}
          chosen={chosen}
          onChoose={handleChoose}
        />
      </div>
    </div>
  );
}

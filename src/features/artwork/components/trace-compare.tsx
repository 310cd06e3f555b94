import { useState } from "react";
import { pathToText } from "#shared/geometry/path-text.ts";
import type { TracedPicture } from "#shared/tracing/traced-picture.ts";
import { cx } from "@/lib/cx.ts";

/** The picture before and the pieces after, side by side or the outlines laid over the picture. */
export function TraceCompare({
  address,
  name,
  traced,
  working,
}: {
  readonly address: string;
  readonly name: string;
  readonly traced: TracedPicture | null;
  readonly working: boolean;
}) {
  const [way, setWay] = useState<"beside" | "over">("beside");
  const box = traced ? `0 0 ${traced.artwork.widthMm} ${traced.artwork.heightMm}` : "0 0 1 1";
  const paths =
    traced?.artwork.pieces.map(({ index, colour, path }) => ({ index, colour, text: pathToText(path) })) ?? [];
  const frame = "relative min-w-0 border border-rule bg-sheet";
  return (
    <div className="space-y-3">
      <fieldset className="flex flex-wrap gap-x-5 gap-y-1">
        <legend className="sr-only">Before and after</legend>
        {(["beside", "over"] as const).map((choice) => (
          <label key={choice} className="flex min-h-11 cursor-pointer items-center gap-2 text-sm sm:min-h-0">
            <input
              type="radio"
              name="before-and-after"
              className="size-4 accent-indigo"
              checked={way === choice}
              onChange={() => setWay(choice)}
            />
            {choice === "beside" ? "Before and after side by side" : "Outlines over the picture"}
          </label>
        ))}
      </fieldset>
      <div className={cx("grid gap-4", way === "beside" && "sm:grid-cols-2")}>
        <figure className="min-w-0">
          <div className={frame}>
            <img src={address} alt={`${name} as it came`} className="block w-full" />
            {way === "over" && (
              <svg role="img" viewBox={box} className="absolute inset-0 size-full" aria-label={`Outlines of ${name}`}>
                {paths.map(({ index, text }) => (
                  <path
                    key={index}
                    d={text}
                    fill="none"
                    vectorEffect="non-scaling-stroke"
                    className="stroke-madder stroke-[1.5]"
                  />
                ))}
              </svg>
            )}
          </div>
          <figcaption className="mt-1 text-fine text-graphite">
            {way === "over" ? "The outlines that would be cut, over the picture" : "Before: the picture"}
          </figcaption>
        </figure>
        {way === "beside" && (
          <figure className="min-w-0">
            <div className={cx(frame, working && "opacity-60")}>
              <svg role="img" viewBox={box} className="block w-full" aria-label={`${name} as pieces`}>
                {paths.map(({ index, colour, text }) => (
                  <path key={index} d={text} fill={colour} fillRule="evenodd" />
                ))}
              </svg>
            </div>
            <figcaption className="mt-1 text-fine text-graphite">After: the pieces</figcaption>
          </figure>
        )}
      </div>
    </div>
  );
}

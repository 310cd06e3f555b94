import { useState } from "react";
import { type Artwork, getArtworkFile } from "#shared/contracts/artworks.ts";
import { formatSize } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Busy } from "@/components/ui/busy.tsx";
import { Button } from "@/components/ui/button.tsx";
import { FileButton } from "@/components/ui/link-button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { addressOf } from "@/lib/api-client.ts";
import { counted, formatBytes, formatInstant } from "@/lib/format.ts";
import { TraceFigures } from "./trace-figures.tsx";
import { TraceForm } from "./trace-form.tsx";
import { TraceUnderWay } from "./trace-under-way.tsx";
import { TrueSizeForm } from "./true-size-form.tsx";

/** One artwork: what it became, at which size, and what to look at. */
export function ArtworkItem({
  shop,
  jobId,
  unit,
  artwork,
  tracingAtFirst,
  onRemove,
}: {
  readonly shop: string;
  readonly jobId: string;
  readonly unit: LengthUnit;
  readonly artwork: Artwork;
  readonly tracingAtFirst: boolean;
  readonly onRemove: () => void;
}) {
  const [open, setOpen] = useState<"size" | "trace" | null>(tracingAtFirst ? "trace" : null);
  const { name, state, widthMm, heightMm, colours, warnings, refusal } = artwork;
  const pieces = colours.reduce((sum, { pieces: count }) => sum + count, 0);
  return (
    <li className="border-b border-rule py-4">
      <h3 className="text-base font-semibold break-all">{name}</h3>
      <p className="text-sm text-graphite">
        {formatBytes(artwork.byteSize)}, brought in {formatInstant(artwork.addedAt)} by {artwork.addedBy}
      </p>
      {state === "importing" && (
        <div className="mt-2 max-w-sm">
          <Busy label="Turning it into pieces" />
        </div>
      )}
      {refusal && (
        <Notice tone="error" title="No pieces could be made of it" className="mt-2">
          {refusal.text}
        </Notice>
      )}
      {state === "ready" && widthMm !== null && heightMm !== null && (
        <>
          <p className="mt-1 text-base tabular-nums">
            Page {formatSize(widthMm, heightMm, unit)}, {counted(pieces, "piece")} in{" "}
            {counted(colours.length, "colour")}
          </p>
          <ul className="mt-2 flex flex-wrap gap-x-4 gap-y-1.5">
            {colours.map(({ colour, pieces: count }) => (
              <li key={colour} className="flex items-center gap-1.5 text-sm">
                <svg aria-hidden="true" viewBox="0 0 16 16" className="size-4 border border-graphite">
                  <rect width="16" height="16" fill={colour} />
                </svg>
                <span>
                  {colour}, {counted(count, "piece")}
                </span>
              </li>
            ))}
          </ul>
        </>
      )}
      {warnings.length > 0 && (
        <Notice
          tone="caution"
          title={counted(warnings.length, "thing to look at", "things to look at")}
          className="mt-3"
        >
          <ul className="list-disc space-y-0.5 pl-5 text-sm">
            {warnings.map(({ code, text }) => (
              <li key={code + text}>{text}</li>
            ))}
          </ul>
        </Notice>
      )}
      {artwork.trace?.record && open !== "trace" && (
        <TraceFigures
          colours={colours.length}
          pieces={pieces}
          nodes={artwork.trace.record.nodes}
          smallestMm2={artwork.trace.record.smallestMm2}
        />
      )}
      <TraceUnderWay shop={shop} jobId={jobId} artwork={artwork} />
      {open === "size" ? (
        <TrueSizeForm shop={shop} jobId={jobId} unit={unit} artwork={artwork} onDone={() => setOpen(null)} />
      ) : open === "trace" && artwork.can.trace ? (
        <TraceForm shop={shop} jobId={jobId} artwork={artwork} onDone={() => setOpen(null)} />
      ) : (
        <div className="mt-3 flex flex-wrap gap-2">
          {state === "ready" && artwork.can.change && (
            <Button size="small" aria-label={`Set the true size of ${name}`} onClick={() => setOpen("size")}>
              Set the true size
            </Button>
          )}
          {artwork.can.trace && (
            <Button size="small" aria-label={`Trace ${name} again`} onClick={() => setOpen("trace")}>
              Trace again
            </Button>
          )}
          <FileButton
            size="small"
            download
            aria-label={`File of ${name} as it came`}
            href={addressOf(getArtworkFile, { params: { shop, artworkId: artwork.id } })}
          >
            File as it came
          </FileButton>
          {artwork.can.remove && (
            <Button size="small" kind="danger" aria-label={`Take ${name} off the job`} onClick={onRemove}>
              Take it off
            </Button>
          )}
        </div>
      )}
    </li>
  );
}

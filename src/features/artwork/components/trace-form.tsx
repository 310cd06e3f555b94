import { useState } from "react";
import { type Artwork, getArtworkFile } from "#shared/contracts/artworks.ts";
import { mostColours } from "#shared/tracing/find-palette.ts";
import { backgrounds, firstChoices, smoothings, type TraceChoices } from "#shared/tracing/trace-choices.ts";
import { Busy } from "@/components/ui/busy.tsx";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { NumberField } from "@/components/ui/number-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { addressOf } from "@/lib/api-client.ts";
import { messageOf } from "@/lib/form-problem.ts";
import { useTraceArtwork } from "../api/mutations.ts";
import { useTracePreview } from "../engine/use-trace-preview.ts";
import { backgroundWords, formatArea, smoothingWords } from "../model/trace-words.ts";
import { TraceColours } from "./trace-colours.tsx";
import { TraceCompare } from "./trace-compare.tsx";
import { TraceFigures } from "./trace-figures.tsx";

/** Tracing a picture again: every choice shows at once what would be cut, before the pieces are made anew. */
export function TraceForm({
  shop,
  jobId,
  artwork,
  onDone,
}: {
  readonly shop: string;
  readonly jobId: string;
  readonly artwork: Artwork;
  readonly onDone: () => void;
}) {
  const [choices, setChoices] = useState<TraceChoices>(
    artwork.trace?.asked ?? artwork.trace?.record?.choices ?? firstChoices,
  );
  const send = useTraceArtwork(shop, jobId, artwork.id);
  const address = addressOf(getArtworkFile, { params: { shop, artworkId: artwork.id } });
  const { step, traced, reason } = useTracePreview(address, choices);
  const change = (changed: Partial<TraceChoices>) => setChoices((before) => ({ ...before, ...changed }));
  const mmOfPreview = traced && artwork.widthMm !== null ? artwork.widthMm / traced.artwork.widthMm : null;
  const pxMm =
    traced && mmOfPreview !== null ? (mmOfPreview * traced.artwork.widthMm) / traced.record.tracedWidthPx : null;
  const speckle = Number.isNaN(choices.speckle) ? null : choices.speckle;
  return (
    <form
      noValidate
      className="mt-3 space-y-4 border-l-2 border-rule pl-4"
      aria-label={`Trace ${artwork.name}`}
      onSubmit={(event) => {
        event.preventDefault();
        send.mutate(choices, { onSuccess: onDone });
      }}
    >
      {send.isError && <Notice tone="error">{messageOf(send.error)}</Notice>}
      <div className="flex flex-wrap items-start gap-3">
        <Select
          label="Number of colours"
          className="w-56"
          value={choices.colours ?? ""}
          onChange={({ target }) => change({ colours: target.value === "" ? null : Number(target.value) })}
        >
          <option value="">Those clearly apart</option>
          {counts.map((count) => (
            <option key={count} value={count}>
              {count}
            </option>
          ))}
        </Select>
        <NumberField
          label="Smallest area kept, in pixels"
          className="w-56"
          hint={
            pxMm === null || speckle === null
              ? "Smaller specks become what lies around them."
              : `${formatArea(speckle * pxMm * pxMm)} at this size. Smaller specks become what lies around them.`
          }
          value={choices.speckle}
          error={isSpeckle(choices.speckle) ? undefined : "Write a whole number from 0 to 20,000."}
          onChange={(value) => change({ speckle: value ?? 0 })}
        />
        <Select
          label="Outlines"
          className="w-60"
          value={choices.smoothing}
          onChange={({ target }) => change({ smoothing: smoothings.find((one) => one === target.value) ?? "usual" })}
        >
          {smoothings.map((smoothing) => (
            <option key={smoothing} value={smoothing}>
              {smoothingWords[smoothing]}
            </option>
          ))}
        </Select>
        <Select
          label="Background"
          className="w-64"
          value={choices.background}
          onChange={({ target }) =>
            change({ background: backgrounds.find((one) => one === target.value) ?? "automatic" })
          }
        >
          {backgrounds.map((background) => (
            <option key={background} value={background}>
              {backgroundWords[background]}
            </option>
          ))}
        </Select>
      </div>
      {step === "unreadable" ? (
        <Notice tone="caution" title="No preview">
          This browser could not read the picture. It can be traced all the same: look at the pieces afterwards.
        </Notice>
      ) : step === "refused" ? (
        <Notice tone="error">{reason}</Notice>
      ) : traced === null ? (
        <Skeleton label="Tracing the picture" rows={1} rowClassName="h-64" />
      ) : (
        <>
          <TraceCompare address={address} name={artwork.name} traced={traced} working={step === "working"} />
          <TraceFigures
            colours={traced.artwork.colours.length}
            pieces={traced.artwork.pieces.length}
            nodes={traced.record.nodes}
            smallestMm2={mmOfPreview === null ? null : traced.record.smallestMm2 * mmOfPreview ** 2}
          />
        </>
      )}
      {step === "working" && traced !== null && <Busy label="Tracing with the new choices" />}
      <TraceColours
        found={traced?.record.found ?? artwork.trace?.record?.found ?? []}
        choices={choices}
        onChange={setChoices}
      />
      <div className="flex flex-wrap gap-2">
        <Button
          type="submit"
          size="small"
          busy={send.isPending}
          disabled={step === "refused" || !isSpeckle(choices.speckle)}
        >
          Make the pieces
        </Button>
        <Button size="small" kind="bare" onClick={onDone}>
          Leave it
        </Button>
      </div>
      <p className="text-fine text-graphite">
        The pieces of this artwork are made anew. Pieces that are in a mockup already keep their outlines.
      </p>
    </form>
  );
}

const counts = Array.from({ length: mostColours }, (_, index) => index + 1);

const isSpeckle = (value: number): boolean => Number.isInteger(value) && value >= 0 && value <= 20_000;

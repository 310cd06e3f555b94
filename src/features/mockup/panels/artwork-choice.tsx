import { useQuery } from "@tanstack/react-query";
import { type ReactNode, useState } from "react";
import type { Artwork } from "#shared/contracts/artworks.ts";
import { artworkUsed } from "#shared/mockup/artwork-used.ts";
import { formatSize } from "#shared/units/format-length.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Busy } from "@/components/ui/busy.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Select } from "@/components/ui/select.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { mockupQueries } from "../api/queries.ts";
import { useDesk } from "../editor/desk-context.ts";
import type { ArtworkToBringIn } from "../model/commands/bring-in-artwork.ts";
import { optionsOfHold } from "../model/stock-choices.ts";
import { ColourChoices } from "./colour-choices.tsx";
import { ReplaceReview } from "./replace-review.tsx";

type ArtworkChoiceProps = {
  readonly shop: string;
  readonly jobId: string;
  readonly chosen: string | null;
  readonly onChoose: (artworkId: string) => void;
  readonly onDone: () => void;
};

/** One artwork out of the job's, and whether it makes layers or takes the place of another. Looks again while one is worked out. */
export function ArtworkChoice({ shop, jobId, chosen, onChoose, onDone }: ArtworkChoiceProps) {
  const { document, stock, unit } = useDesk();
  const [replaced, setReplaced] = useState<string | null>(null);
  const artworks = useQuery({
    ...mockupQueries.artworks(shop, jobId),
    refetchInterval: ({ state }) => (state.data?.some((one) => one.state === "importing") ? 1000 : false),
  });
  if (artworks.isPending) return <Skeleton label="Loading the artwork" />;
  if (artworks.isError)
    return (
      <ProblemNotice
        what="The artwork could not be loaded."
        error={artworks.error}
        onRetry={() => void artworks.refetch()}
      />
    );
  if (stock.acrylics.length === 0 || optionsOfHold(stock).length === 0)
    return (
      <Notice tone="caution">
        {stock.acrylics.length === 0
          ? "The stock list has no acrylic. A layer needs a sheet to be cut from: ask for one to be added."
          : "The stock list has no adhesive and no hardware. A layer needs something to hold it: ask for one to be added."}
      </Notice>
    );
  const artwork =
    artworks.data.find(({ id }) => id === chosen) ??
    artworks.data.find(({ state }) => state === "ready") ??
    artworks.data[0];
  if (!artwork)
    return (
      <p className="text-base">
        This job has no artwork yet. Choose the client’s logo: its closed shapes become pieces.
      </p>
    );
  const used = new Set(artworkUsed(document));
  const others = artworks.data.filter(({ id, state }) => used.has(id) && id !== artwork.id && state === "ready");
  const before = others.find(({ id }) => id === replaced) ?? null;
  return (
    <div className="space-y-4">
      <div className="flex flex-wrap gap-4">
        <Select
          label="Artwork"
          className="w-full max-w-md"
          value={artwork.id}
          onChange={(event) => onChoose(event.target.value)}
        >
          {artworks.data.map((one) => (
            <option key={one.id} value={one.id}>
              {nameOf(one, unit)}
            </option>
          ))}
        </Select>
        {others.length > 0 && (
          <Select
            label="What becomes of it"
            className="w-full max-w-md"
            value={before?.id ?? ""}
            onChange={(event) => setReplaced(event.target.value || null)}
          >
            <option value="">layers by its colours</option>
            {others.map(({ id, name }) => (
              <option key={id} value={id}>
                it takes the place of {name}
              </option>
            ))}
          </Select>
        )}
      </div>
      <Readiness artwork={artwork} />
      {artwork.state === "ready" && (
        <Drawings key={`${artwork.id} ${before?.id}`} shop={shop} artwork={artwork} before={before}>
          {(drawing, old) =>
            old && before ? (
              <ReplaceReview artwork={artwork} before={{ ...old, name: before.name }} after={drawing} onDone={onDone} />
            ) : (
              <ColourChoices shop={shop} jobId={jobId} artwork={artwork} drawing={drawing} onDone={onDone} />
            )
          }
        </Drawings>
      )}
    </div>
  );
}

function Readiness({ artwork: { state, name, refusal, warnings } }: { readonly artwork: Artwork }) {
  if (state === "importing")
    return (
      <div className="max-w-sm">
        <Busy label={`“${name}” is being turned into pieces`} />
      </div>
    );
  if (refusal)
    return (
      <Notice tone="error" title={`No pieces could be made of “${name}”`}>
        {refusal.text}
      </Notice>
    );
  if (warnings.length === 0) return null;
  return (
    <Notice
      tone="caution"
      title={warnings.length === 1 ? "One thing to look at" : `${warnings.length} things to look at`}
    >
      <ul className="list-disc space-y-0.5 pl-5 text-sm">
        {warnings.map(({ code, text }) => (
          <li key={code + text}>{text}</li>
        ))}
      </ul>
    </Notice>
  );
}

/** Reads the pieces of the artwork, and of the one whose place it takes. */
function Drawings({
  shop,
  artwork,
  before,
  children,
}: {
  readonly shop: string;
  readonly artwork: Artwork;
  readonly before: Artwork | null;
  readonly children: (drawing: ArtworkToBringIn, old: ArtworkToBringIn | null) => ReactNode;
}) {
  const drawing = useQuery(mockupQueries.pieces(shop, artwork.id));
  const old = useQuery({ ...mockupQueries.pieces(shop, before?.id ?? ""), enabled: before !== null });
  const failed = drawing.isError ? drawing : before && old.isError ? old : null;
  if (failed)
    return (
      <ProblemNotice
        what="The pieces could not be loaded."
        error={failed.error}
        onRetry={() => void failed.refetch()}
      />
    );
  if (!drawing.data || (before && !old.data)) return <Skeleton label="Loading the pieces" />;
  return children(toBringIn(drawing.data), before && old.data ? toBringIn(old.data) : null);
}

const toBringIn = ({
  id,
  ...rest
}: Omit<ArtworkToBringIn, "artworkId"> & { readonly id: string }): ArtworkToBringIn => ({
  ...rest,
  artworkId: id,
});

function nameOf({ name, state, widthMm, heightMm }: Artwork, unit: LengthUnit): string {
  if (state === "refused") return `${name}, not taken`;
  return widthMm === null || heightMm === null ? name : `${name}, page ${formatSize(widthMm, heightMm, unit)}`;
}

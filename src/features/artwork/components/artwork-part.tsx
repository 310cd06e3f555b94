import { useInfiniteQuery } from "@tanstack/react-query";
import { useState } from "react";
import type { Artwork } from "#shared/contracts/artworks.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { ConfirmDialog } from "@/components/ui/confirm-dialog.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { ShowMore } from "@/components/ui/show-more.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { itemsOf } from "@/lib/pages-query.ts";
import { useRemoveArtwork } from "../api/mutations.ts";
import { artworksQuery } from "../api/queries.ts";
import { ArtworkItem } from "./artwork-item.tsx";
import { ArtworkUpload } from "./artwork-upload.tsx";

/** The artwork of a job: what is there, and a place to bring in more. Looks again while a file is being turned into pieces. */
export function ArtworkPart({
  shop,
  jobId,
  unit,
  mayAdd,
  tracing = null,
}: {
  readonly shop: string;
  readonly jobId: string;
  readonly unit: LengthUnit;
  readonly mayAdd: boolean;
  /** The picture whose tracing is to be open from the start. */
  readonly tracing?: string | null;
}) {
  const [removing, setRemoving] = useState<Artwork | null>(null);
  const remove = useRemoveArtwork(shop, jobId);
  const artworks = useInfiniteQuery({
    ...artworksQuery(shop, jobId),
    refetchInterval: ({ state }) =>
      itemsOf(state.data).some((item) => item.state === "importing" || item.trace?.asked) ? 1500 : false,
  });
  const rows = itemsOf(artworks.data);
  return (
    <section id="artwork" tabIndex={-1} aria-labelledby="artwork-heading">
      <h2 id="artwork-heading" className="mb-3 font-serif text-lg font-bold">
        Artwork
      </h2>
      {artworks.isPending ? (
        <Skeleton label="Loading the artwork" rows={1} rowClassName="h-20" />
      ) : artworks.isError ? (
        <ProblemNotice
          what="The artwork could not be loaded."
          error={artworks.error}
          onRetry={() => void artworks.refetch()}
        />
      ) : rows.length === 0 ? (
        <p className="mb-3 text-base text-graphite">
          No artwork yet. {mayAdd ? "Bring in the logo: its closed shapes become the pieces of the mockup." : ""}
        </p>
      ) : (
        <ul className="mb-4 border-t border-rule">
          {rows.map((artwork) => (
            <ArtworkItem
              key={artwork.id}
              shop={shop}
              jobId={jobId}
              unit={unit}
              artwork={artwork}
              tracingAtFirst={artwork.id === tracing}
              onRemove={() => setRemoving(artwork)}
            />
          ))}
        </ul>
      )}
      <ShowMore query={artworks} what="artwork" />
      {mayAdd && <ArtworkUpload shop={shop} jobId={jobId} />}
      {removing && (
        <ConfirmDialog
          open
          onOpenChange={() => {
            setRemoving(null);
            remove.reset();
          }}
          title={`Take “${removing.name}” off the job?`}
          action="Take it off"
          busy={remove.isPending}
          error={remove.isError ? messageOf(remove.error) : null}
          onConfirm={() => remove.mutate(removing.id, { onSuccess: () => setRemoving(null) })}
        >
          <p>Its pieces can't be chosen for the mockup any more. What was issued keeps them.</p>
        </ConfirmDialog>
      )}
    </section>
  );
}

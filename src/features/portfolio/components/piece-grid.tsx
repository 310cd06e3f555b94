import { useInfiniteQuery } from "@tanstack/react-query";
import type { LengthUnit } from "#shared/units/length.ts";
import { EmptyState } from "@/components/ui/empty-state.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { ShowMore } from "@/components/ui/show-more.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { itemsOf } from "@/lib/pages-query.ts";
import { piecesQuery } from "../api/queries.ts";
import { PieceCard } from "./piece-card.tsx";

/** Approved pieces. Those whose client agreed can be chosen for a link. */
export function PieceGrid({
  shop,
  unit,
  chosen,
  onChoose,
}: {
  readonly shop: string;
  readonly unit: LengthUnit;
  /** Null while no link is being made. */
  readonly chosen: readonly string[] | null;
  readonly onChoose: (jobIds: string[]) => void;
}) {
  const pieces = useInfiniteQuery(piecesQuery(shop));
  if (pieces.isPending) return <Skeleton label="Loading the pieces" rows={2} rowClassName="h-56" />;
  if (pieces.isError) {
    return (
      <ProblemNotice
        what="The pieces could not be loaded."
        error={pieces.error}
        onRetry={() => void pieces.refetch()}
      />
    );
  }
  const rows = itemsOf(pieces.data);
  if (rows.length === 0) {
    return (
      <EmptyState title="No approved piece yet">
        A piece can be shown once its client approved it and agreed to its being shown.
      </EmptyState>
    );
  }
  return (
    <>
      <ul className="grid gap-6 sm:grid-cols-2 xl:grid-cols-3">
        {rows.map((piece) => (
          <PieceCard
            key={piece.jobId}
            shop={shop}
            unit={unit}
            piece={piece}
            chosen={chosen === null ? null : chosen.includes(piece.jobId)}
            onChoose={(wanted) =>
              onChoose(
                wanted ? [...(chosen ?? []), piece.jobId] : (chosen ?? []).filter((jobId) => jobId !== piece.jobId),
              )
            }
          />
        ))}
      </ul>
      <ShowMore query={pieces} what="pieces" />
    </>
  );
}

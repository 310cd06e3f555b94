import { useInfiniteQuery } from "@tanstack/react-query";
import { useState } from "react";
import type { Revision } from "#shared/contracts/revisions.ts";
import { EmptyState } from "@/components/ui/empty-state.tsx";
import { LinkButton } from "@/components/ui/link-button.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { ShowMore } from "@/components/ui/show-more.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { itemsOf } from "@/lib/pages-query.ts";
import { revisionsQuery } from "../api/queries.ts";
import { RevisionItem } from "./revision-item.tsx";
import { WithdrawDialog } from "./withdraw-dialog.tsx";

const isDrawn = ({ state }: Revision) => state !== "draft" && state !== "preparing" && state !== "withdrawn";

/** Revisions of a job, newest first. Looks again every few seconds while one is being prepared. */
export function RevisionList({
  shop,
  jobId,
  side,
  ways,
}: {
  readonly shop: string;
  readonly jobId: string;
  readonly side: "shop" | "client";
  /** Where else a reader gets from here: the mockup, where the next step does not lead there, and the cut plan. */
  readonly ways: readonly { readonly label: string; readonly to: string }[];
}) {
  const [withdrawing, setWithdrawing] = useState<Revision | null>(null);
  const revisions = useInfiniteQuery({
    ...revisionsQuery(shop, jobId),
    refetchInterval: ({ state }) => (itemsOf(state.data).some((item) => item.state === "preparing") ? 2000 : false),
  });
  const rows = itemsOf(revisions.data);
  return (
    <section aria-labelledby="revisions">
      <div className="mb-3 flex flex-wrap items-center justify-between gap-x-4 gap-y-2">
        <h2 id="revisions" className="font-serif text-lg font-bold">
          {side === "client" ? "Drawings" : "Revisions"}
        </h2>
        {ways.length > 0 && (
          <div className="flex flex-wrap gap-3">
            {ways.map(({ label, to }) => (
              <LinkButton key={to} size="small" to={to}>
                {label}
              </LinkButton>
            ))}
          </div>
        )}
      </div>
      {revisions.isPending ? (
        <Skeleton label="Loading the revisions" rows={2} rowClassName="h-24" />
      ) : revisions.isError ? (
        <ProblemNotice
          what="The revisions could not be loaded."
          error={revisions.error}
          onRetry={() => void revisions.refetch()}
        />
      ) : rows.length === 0 ? (
        <EmptyState title={side === "client" ? "No drawing yet" : "No revision yet"}>
          {side === "client"
            ? "You get a mail as soon as there is one to look at."
            : "Revision A is issued from the mockup once the dry fit has no stops."}
        </EmptyState>
      ) : (
        <ul className="border-t border-rule">
          {rows.map((revision, index) => (
            <RevisionItem
              key={revision.id}
              shop={shop}
              side={side}
              revision={revision}
              before={rows.slice(index + 1).find(isDrawn) ?? null}
              onWithdraw={() => setWithdrawing(revision)}
            />
          ))}
        </ul>
      )}
      <ShowMore query={revisions} what="revisions" />
      {withdrawing && <WithdrawDialog shop={shop} revision={withdrawing} onClose={() => setWithdrawing(null)} />}
    </section>
  );
}

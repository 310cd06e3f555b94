import { useInfiniteQuery } from "@tanstack/react-query";
import { useState } from "react";
import type { z } from "zod";
import type { shareLinkSchema } from "#shared/contracts/portfolio.ts";
import { Button } from "@/components/ui/button.tsx";
import { ConfirmDialog } from "@/components/ui/confirm-dialog.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { ShowMore } from "@/components/ui/show-more.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { cx } from "@/lib/cx.ts";
import { messageOf } from "@/lib/form-problem.ts";
import { counted, formatDay, formatInstant } from "@/lib/format.ts";
import { itemsOf } from "@/lib/pages-query.ts";
import { useRevokeShareLink } from "../api/mutations.ts";
import { shareLinksQuery } from "../api/queries.ts";

type ShareLink = z.infer<typeof shareLinkSchema>;

const stateWords = ({ state, expiresAt }: ShareLink): string =>
  state === "live" ? `open until ${formatDay(expiresAt)}` : state === "expired" ? "run out" : "closed";

/** Links made so far: for whom, what they show, how often they were opened. */
export function LinkList({ shop, mayClose }: { readonly shop: string; readonly mayClose: boolean }) {
  const [closing, setClosing] = useState<ShareLink | null>(null);
  const links = useInfiniteQuery(shareLinksQuery(shop));
  const revoke = useRevokeShareLink(shop);
  if (links.isPending) return <Skeleton label="Loading the links" rows={2} />;
  if (links.isError) {
    return (
      <ProblemNotice what="The links could not be loaded." error={links.error} onRetry={() => void links.refetch()} />
    );
  }
  const rows = itemsOf(links.data);
  if (rows.length === 0) return <p className="text-base text-graphite">No link yet.</p>;
  return (
    <>
      <ul className="border-t border-rule">
        {rows.map((link) => (
          <li
            key={link.id}
            className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 border-b border-rule py-3"
          >
            <div className="min-w-0">
              <p className="font-semibold">
                {link.label}
                <span className={cx("font-normal", link.state === "live" ? "text-verdigris" : "text-graphite")}>
                  , {stateWords(link)}
                </span>
              </p>
              <p className="text-sm text-graphite">{link.pieces.map((piece) => piece.title).join("; ")}</p>
              <p className="text-fine text-graphite">
                made by {link.createdBy} {formatInstant(link.createdAt)},{" "}
                {link.lastOpenedAt
                  ? `${counted(link.openings, "opening")}, last ${formatInstant(link.lastOpenedAt)}`
                  : "not opened yet"}
              </p>
            </div>
            {mayClose && link.state === "live" && (
              <Button
                size="small"
                kind="danger"
                aria-label={`Close the link for ${link.label}`}
                onClick={() => setClosing(link)}
              >
                Close it
              </Button>
            )}
          </li>
        ))}
      </ul>
      <ShowMore query={links} what="links" />
      {closing && (
        <ConfirmDialog
          open
          onOpenChange={() => {
            setClosing(null);
            revoke.reset();
          }}
          title={`Close the link for ${closing.label}?`}
          action="Close the link"
          busy={revoke.isPending}
          error={revoke.isError ? messageOf(revoke.error) : null}
          onConfirm={() => revoke.mutate(closing.id, { onSuccess: () => setClosing(null) })}
        >
          <p>Whoever has it sees nothing from now on. It can't be opened again; a new link can be made.</p>
        </ConfirmDialog>
      )}
    </>
  );
}

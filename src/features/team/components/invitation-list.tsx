import { useInfiniteQuery } from "@tanstack/react-query";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { ShowMore } from "@/components/ui/show-more.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { formatInstant } from "@/lib/format.ts";
import { itemsOf } from "@/lib/pages-query.ts";
import { useRevokeInvitation } from "../api/mutations.ts";
import { invitationsQuery } from "../api/queries.ts";

/** Invitations that nobody has taken up yet. */
export function InvitationList({ shop }: { readonly shop: string }) {
  const invitations = useInfiniteQuery(invitationsQuery(shop));
  const revoke = useRevokeInvitation(shop);
  if (invitations.isPending) return <Skeleton label="Loading the invitations" rows={1} />;
  if (invitations.isError) {
    return (
      <ProblemNotice
        what="The invitations could not be loaded."
        error={invitations.error}
        onRetry={() => void invitations.refetch()}
      />
    );
  }
  const rows = itemsOf(invitations.data);
  if (rows.length === 0) return <p className="text-base text-graphite">No invitation is open.</p>;
  return (
    <>
      {revoke.isError && <Notice tone="error">{messageOf(revoke.error)}</Notice>}
      <ul className="border-t border-rule">
        {rows.map((invitation) => (
          <li
            key={invitation.id}
            className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 border-b border-rule py-3"
          >
            <span className="min-w-0">
              <span className="block font-semibold break-all">{invitation.email}</span>
              <span className="block text-sm text-graphite">
                as {invitation.role}, by {invitation.by} {formatInstant(invitation.sentAt)}
              </span>
            </span>
            <Button
              size="small"
              aria-label={`Take back the invitation of ${invitation.email}`}
              busy={revoke.isPending && revoke.variables === invitation.id}
              onClick={() => revoke.mutate(invitation.id)}
            >
              Take it back
            </Button>
          </li>
        ))}
      </ul>
      <ShowMore query={invitations} what="invitations" />
    </>
  );
}

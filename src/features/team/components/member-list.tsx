import { useInfiniteQuery } from "@tanstack/react-query";
import { useState } from "react";
import type { z } from "zod";
import { role } from "#shared/contracts/account.ts";
import type { memberSchema } from "#shared/contracts/shop.ts";
import { Button } from "@/components/ui/button.tsx";
import { ConfirmDialog } from "@/components/ui/confirm-dialog.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Select } from "@/components/ui/select.tsx";
import { ShowMore } from "@/components/ui/show-more.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { capitalised, formatDay } from "@/lib/format.ts";
import { itemsOf } from "@/lib/pages-query.ts";
import { useChangeRole, useRemoveMember } from "../api/mutations.ts";
import { membersQuery } from "../api/queries.ts";

type Member = z.infer<typeof memberSchema>;

/** Who works in the shop, and as what. */
export function MemberList({ shop }: { readonly shop: string }) {
  const [removing, setRemoving] = useState<Member | null>(null);
  const members = useInfiniteQuery(membersQuery(shop));
  const change = useChangeRole(shop);
  const remove = useRemoveMember(shop);
  if (members.isPending) return <Skeleton label="Loading the team" rows={3} rowClassName="h-16" />;
  if (members.isError) {
    return (
      <ProblemNotice
        what="The team could not be loaded."
        error={members.error}
        onRetry={() => void members.refetch()}
      />
    );
  }
  return (
    <>
      {change.isError && (
        <Notice tone="error" className="mb-3">
          {messageOf(change.error)}
        </Notice>
      )}
      <ul className="border-t border-rule">
        {itemsOf(members.data).map((member) => (
          <li
            key={member.id}
            className="flex flex-wrap items-center justify-between gap-x-6 gap-y-2 border-b border-rule py-3"
          >
            <div className="min-w-0">
              <p className="font-semibold">
                {member.name}
                {member.isYou && <span className="font-normal text-graphite">, you</span>}
              </p>
              <p className="text-sm break-all text-graphite">{member.email}</p>
              <p className="text-fine text-graphite">since {formatDay(member.since)}</p>
            </div>
            <div className="flex flex-wrap items-center gap-2">
              {member.can.changeRole ? (
                <Select
                  label={`Role of ${member.name}`}
                  labelHidden
                  className="w-32"
                  value={member.role}
                  disabled={change.isPending && change.variables.memberId === member.id}
                  onChange={(event) => change.mutate({ memberId: member.id, role: role.parse(event.target.value) })}
                >
                  {role.options.map((name) => (
                    <option key={name} value={name}>
                      {capitalised(name)}
                    </option>
                  ))}
                </Select>
              ) : (
                <span className="text-base">{capitalised(member.role)}</span>
              )}
              {member.can.remove && (
                <Button kind="danger" aria-label={`Remove ${member.name}`} onClick={() => setRemoving(member)}>
                  Remove
                </Button>
              )}
            </div>
          </li>
        ))}
      </ul>
      <ShowMore query={members} what="members" />
      {removing && (
        <ConfirmDialog
          open
          onOpenChange={() => {
            setRemoving(null);
            remove.reset();
          }}
          title={`Remove ${removing.name}?`}
          action={`Remove ${removing.name}`}
          refuse={`Keep ${removing.name}`}
          busy={remove.isPending}
          error={remove.isError ? messageOf(remove.error) : null}
          onConfirm={() => remove.mutate(removing.id, { onSuccess: () => setRemoving(null) })}
        >
          <p>Every session ends at once. What {removing.name} made and wrote stays under that name.</p>
        </ConfirmDialog>
      )}
    </>
  );
}

import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import type { Role } from "#shared/contracts/account.ts";
import * as contract from "#shared/contracts/shop.ts";
import { call } from "@/lib/api-client.ts";
import { meQuery } from "@/lib/me.ts";
import { keys } from "@/lib/query-keys.ts";

function useRefreshTeam(shop: string) {
  const client = useQueryClient();
  return () => client.invalidateQueries({ queryKey: keys.team(shop) });
}

export function useInvite(shop: string) {
  return useMutation({
    mutationFn: (body: z.input<typeof contract.inviteMember.body>) =>
      call(contract.inviteMember, { params: { shop }, body }),
    onSuccess: useRefreshTeam(shop),
  });
}

export function useRevokeInvitation(shop: string) {
  return useMutation({
    mutationFn: (invitationId: string) => call(contract.revokeInvitation, { params: { shop, invitationId } }),
    onSuccess: useRefreshTeam(shop),
  });
}

/** Changing one's own role changes what one may do, so who one is gets asked again. */
export function useChangeRole(shop: string) {
  const client = useQueryClient();
  const refresh = useRefreshTeam(shop);
  return useMutation({
    mutationFn: ({ memberId, role }: { memberId: string; role: Role }) =>
      call(contract.changeMember, { params: { shop, memberId }, body: { role } }),
    onSuccess: () =>
      Promise.all([
        refresh(),
        client.invalidateQueries({ queryKey: meQuery.queryKey }),
        client.invalidateQueries({ queryKey: ["shop", shop] }),
      ]),
  });
}

export function useRemoveMember(shop: string) {
  return useMutation({
    mutationFn: (memberId: string) => call(contract.removeMember, { params: { shop, memberId } }),
    onSuccess: useRefreshTeam(shop),
  });
}

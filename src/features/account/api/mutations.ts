import { useMutation, useQueryClient } from "@tanstack/react-query";
import * as contract from "#shared/contracts/account.ts";
import { call } from "@/lib/api-client.ts";
import { meQuery } from "@/lib/me.ts";
import { sessionsQuery } from "./queries.ts";

export function useChangeName() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { name: string }) => call(contract.changeAccount, { body }),
    onSuccess: (me) => client.setQueryData(meQuery.queryKey, me),
  });
}

export function useChangePassword() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: { current: string; password: string }) => call(contract.changePassword, { body }),
    onSuccess: () => client.invalidateQueries({ queryKey: sessionsQuery.queryKey }),
  });
}

export function useEndSession() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (sessionId: string) => call(contract.endSession, { params: { sessionId } }),
    onSuccess: () => client.invalidateQueries({ queryKey: sessionsQuery.queryKey }),
  });
}

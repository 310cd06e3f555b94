import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import * as contract from "#shared/contracts/clients.ts";
import { call } from "@/lib/api-client.ts";
import { keys } from "@/lib/query-keys.ts";

export function useAddClient(shop: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (body: z.input<typeof contract.addClient.body>) => call(contract.addClient, { params: { shop }, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: keys.clients(shop) }),
  });
}

/** Refreshes one client and the list it stands in. */
function useRefresh(shop: string, clientId: string) {
  const client = useQueryClient();
  return () =>
    Promise.all([
      client.invalidateQueries({ queryKey: keys.client(shop, clientId) }),
      client.invalidateQueries({ queryKey: keys.clients(shop) }),
    ]);
}

export function useChangeClient(shop: string, clientId: string) {
  return useMutation({
    mutationFn: (body: z.input<typeof contract.changeClient.body>) =>
      call(contract.changeClient, { params: { shop, clientId }, body }),
    onSuccess: useRefresh(shop, clientId),
  });
}

export function useAddContact(shop: string, clientId: string) {
  return useMutation({
    mutationFn: (body: z.input<typeof contract.addContact.body>) =>
      call(contract.addContact, { params: { shop, clientId }, body }),
    onSuccess: useRefresh(shop, clientId),
  });
}

export function useChangeContact(shop: string, clientId: string, contactId: string) {
  return useMutation({
    mutationFn: (body: z.input<typeof contract.changeContact.body>) =>
      call(contract.changeContact, { params: { shop, contactId }, body }),
    onSuccess: useRefresh(shop, clientId),
  });
}

export function useRemoveContact(shop: string, clientId: string) {
  return useMutation({
    mutationFn: (contactId: string) => call(contract.removeContact, { params: { shop, contactId } }),
    onSuccess: useRefresh(shop, clientId),
  });
}

export const useInviteContact = (shop: string) =>
  useMutation({ mutationFn: (contactId: string) => call(contract.inviteContact, { params: { shop, contactId } }) });

import { useMutation, useQueryClient } from "@tanstack/react-query";
import type { z } from "zod";
import * as contract from "#shared/contracts/account.ts";
import { call } from "@/lib/api-client.ts";
import { signInWithLink, signInWithPassword, signOut } from "@/lib/auth-client.ts";

/** Whatever was loaded for the person before belongs to that person: it goes when another signs in. */
function useForget() {
  const client = useQueryClient();
  return () => client.clear();
}

export function useSignIn() {
  const forget = useForget();
  return useMutation({
    mutationFn: ({ email, password }: { email: string; password: string }) => signInWithPassword(email, password),
    onSuccess: forget,
  });
}

export function useSpendLink() {
  const forget = useForget();
  return useMutation({ mutationFn: (token: string) => signInWithLink(token), onSuccess: forget });
}

/** Signs out and stays on the page, which asks anew who is there. */
export function useSignOutHere() {
  const client = useQueryClient();
  return useMutation({ mutationFn: signOut, onSuccess: () => client.resetQueries() });
}

export const useRequestLink = () =>
  useMutation({ mutationFn: (email: string) => call(contract.requestLink, { body: { email } }) });

export const useSendFreshLink = () =>
  useMutation({ mutationFn: (token: string) => call(contract.sendFreshLink, { body: { token } }) });

export const useForgotPassword = () =>
  useMutation({ mutationFn: (email: string) => call(contract.forgotPassword, { body: { email } }) });

/** Opens the shop and signs its owner in. */
export function useRegisterShop() {
  const forget = useForget();
  return useMutation({
    mutationFn: async (body: z.output<typeof contract.registerShop.body>) => {
      const opened = await call(contract.registerShop, { body });
      await signInWithPassword(body.email, body.password);
      return opened;
    },
    onSuccess: forget,
  });
}

/** Joins a shop as someone new: sets name and password, then signs in. */
export function useJoinShop() {
  const forget = useForget();
  return useMutation({
    mutationFn: async (body: { token: string; name: string; password: string }) => {
      const joined = await call(contract.acceptInvitation, { body });
      await signInWithPassword(joined.email, body.password);
      return joined;
    },
    onSuccess: forget,
  });
}

/** Joins a shop as someone who is signed in already. */
export function useAcceptInvitation() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (token: string) => call(contract.acceptInvitation, { body: { token } }),
    onSuccess: () => client.invalidateQueries({ queryKey: ["me"] }),
  });
}

/** Sets a new password and signs in with it. */
export function useResetPassword() {
  const forget = useForget();
  return useMutation({
    mutationFn: async (body: { token: string; password: string }) => {
      const { email } = await call(contract.resetPassword, { body });
      await signInWithPassword(email, body.password);
    },
    onSuccess: forget,
  });
}

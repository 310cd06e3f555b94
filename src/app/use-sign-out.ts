import { useMutation, useQueryClient } from "@tanstack/react-query";
import { useNavigate } from "react-router-dom";
import { signOut } from "@/lib/auth-client.ts";
import { paths } from "./paths.ts";

/** Ends the session, forgets all that was loaded for it, and leads to sign-in. */
export function useSignOut() {
  const client = useQueryClient();
  const navigate = useNavigate();
  return useMutation({
    mutationFn: signOut,
    onSuccess: () => {
      client.clear();
      return navigate(paths.signIn());
    },
  });
}

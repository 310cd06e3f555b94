import { QueryClient } from "@tanstack/react-query";
import { ApiProblem } from "@/lib/api-client.ts";

/** Only what may pass by itself is tried again: no answer, or a server that is not ready. */
const mayPass = (error: unknown): boolean =>
  error instanceof ApiProblem && (error.code === "unreachable" || error.code === "not_ready");

export const queryClient = new QueryClient({
  defaultOptions: {
    // Without a network a request fails and says so; by default it would wait in silence.
    queries: {
      networkMode: "always",
      // As long as a screen takes to come together, so that its parts ask once; a screen opened anew asks again.
      staleTime: 2_000,
      retry: (failures, error) => failures < 2 && mayPass(error),
    },
    mutations: { networkMode: "always", retry: false },
  },
});

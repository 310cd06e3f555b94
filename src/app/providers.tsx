import { QueryClientProvider } from "@tanstack/react-query";
import { RouterProvider } from "react-router-dom";
import { onNotSignedIn } from "@/lib/api-client.ts";
import { paths, signInTo } from "./paths.ts";
import { queryClient } from "./query-client.ts";
import { router } from "./router.tsx";

onNotSignedIn(() => {
  const { pathname, search } = router.state.location;
  queryClient.clear();
  // Of several requests that find nobody the first has led there already, with the way back.
  if (pathname === paths.signIn()) return;
  void router.navigate(signInTo(pathname + search));
});

export function Providers() {
  return (
    <QueryClientProvider client={queryClient}>
      <RouterProvider router={router} />
    </QueryClientProvider>
  );
}

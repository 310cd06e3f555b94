import { queryOptions } from "@tanstack/react-query";
import { listSessions } from "#shared/contracts/account.ts";
import { call } from "@/lib/api-client.ts";

export const sessionsQuery = queryOptions({
  queryKey: ["sessions"],
  queryFn: ({ signal }) => call(listSessions, { signal }),
});

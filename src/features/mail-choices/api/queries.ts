import { queryOptions } from "@tanstack/react-query";
import { inspectUnsubscribe, listMailChoices } from "#shared/contracts/mail-choices.ts";
import { call } from "@/lib/api-client.ts";

export const mailChoicesQuery = queryOptions({
  queryKey: ["mail choices"],
  queryFn: ({ signal }) => call(listMailChoices, { signal }),
});

/** Whose mails a link stops. Looking stops nothing. */
export const unsubscribeQuery = (token: string) =>
  queryOptions({
    queryKey: ["unsubscribe", token],
    queryFn: ({ signal }) => call(inspectUnsubscribe, { body: { token }, signal }),
    staleTime: 0,
  });

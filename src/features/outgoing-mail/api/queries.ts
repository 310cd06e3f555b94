import { queryOptions } from "@tanstack/react-query";
import { getOutgoingMail, listOutgoingMail } from "#shared/contracts/outgoing-mail.ts";
import { call } from "@/lib/api-client.ts";
import { pagesQuery } from "@/lib/pages-query.ts";
import { keys } from "@/lib/query-keys.ts";

export const mailsQuery = (shop: string) =>
  pagesQuery(keys.outgoingMail(shop), (cursor, signal) =>
    call(listOutgoingMail, { params: { shop }, query: cursor ? { cursor } : {}, signal }),
  );

export const mailQuery = (shop: string, mailId: string) =>
  queryOptions({
    queryKey: [...keys.outgoingMail(shop), mailId],
    queryFn: ({ signal }) => call(getOutgoingMail, { params: { shop, mailId }, signal }),
  });

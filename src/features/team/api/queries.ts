import { listInvitations, listMembers } from "#shared/contracts/shop.ts";
import { call } from "@/lib/api-client.ts";
import { pagesQuery } from "@/lib/pages-query.ts";
import { keys } from "@/lib/query-keys.ts";

export const membersQuery = (shop: string) =>
  pagesQuery([...keys.team(shop), "members"] as const, (cursor, signal) =>
    call(listMembers, { params: { shop }, query: cursor ? { cursor } : {}, signal }),
  );

export const invitationsQuery = (shop: string) =>
  pagesQuery([...keys.team(shop), "invitations"] as const, (cursor, signal) =>
    call(listInvitations, { params: { shop }, query: cursor ? { cursor } : {}, signal }),
  );

import { queryOptions } from "@tanstack/react-query";
import { getRevision, getSheet, type Revision } from "#shared/contracts/revisions.ts";
import { call } from "@/lib/api-client.ts";
import { revisionKeys } from "@/lib/revision-keys.ts";

const pollMs = 2000;

/** A revision whose PDF is not stored yet, so that there is no sheet to show. */
export const isUnready = ({ state }: Pick<Revision, "state">): boolean => state === "preparing" || state === "draft";

export const sheetQueries = {
  /** Asked again while it is being prepared. */
  revision: (shop: string, revisionId: string) =>
    queryOptions({
      queryKey: revisionKeys.revision(shop, revisionId),
      queryFn: ({ signal }) => call(getRevision, { params: { shop, revisionId }, signal }),
      refetchInterval: ({ state }) => (state.data?.state === "preparing" ? pollMs : false),
    }),
  sheet: (shop: string, revisionId: string) =>
    queryOptions({
      queryKey: revisionKeys.sheet(shop, revisionId),
      queryFn: ({ signal }) => call(getSheet, { params: { shop, revisionId }, signal }),
    }),
};

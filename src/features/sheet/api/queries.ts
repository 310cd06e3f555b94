import { queryOptions } from "@tanstack/react-query";
import { type AddressOf, addresses } from "#shared/contracts/addresses.ts";
import type { getRevision, getSheet, Revision } from "#shared/contracts/revisions.ts";
import { call } from "@/lib/api-client.ts";
import { revisionKeys } from "@/lib/revision-keys.ts";

const revisionAt: AddressOf<typeof getRevision> = addresses.getRevision;
const sheetAt: AddressOf<typeof getSheet> = addresses.getSheet;

const preparingPollMs = 2000;
const certificatePollMs = 5000;

/** A revision whose PDF is not stored yet, so that there is no sheet to show. */
export const isUnready = ({ state }: Pick<Revision, "state">): boolean => state === "preparing" || state === "draft";

export const sheetQueries = {
  /** Asked again while its PDF or, once it is approved, its certificate is being made. */
  revision: (shop: string, revisionId: string) =>
    queryOptions({
      queryKey: revisionKeys.revision(shop, revisionId),
      queryFn: ({ signal }) => call(revisionAt, { params: { shop, revisionId }, signal }),
      refetchInterval: ({ state: { data } }) => {
        if (data?.state === "preparing") return preparingPollMs;
        return data?.state === "approved" && data.decision?.hasCertificate === false ? certificatePollMs : false;
      },
    }),
  sheet: (shop: string, revisionId: string) =>
    queryOptions({
      queryKey: revisionKeys.sheet(shop, revisionId),
      queryFn: ({ signal }) => call(sheetAt, { params: { shop, revisionId }, signal }),
    }),
};

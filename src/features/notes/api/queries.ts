import { infiniteQueryOptions, useInfiniteQuery } from "@tanstack/react-query";
import { useEffect, useMemo } from "react";
import { type AddressOf, addresses } from "#shared/contracts/addresses.ts";
import type { listNotes } from "#shared/contracts/notes.ts";
import { call } from "@/lib/api-client.ts";
import { revisionKeys } from "@/lib/revision-keys.ts";

const notesAt: AddressOf<typeof listNotes> = addresses.listNotes;

export const noteQueries = {
  ofRevision: (shop: string, revisionId: string) =>
    infiniteQueryOptions({
      queryKey: revisionKeys.notes(shop, revisionId),
      queryFn: ({ pageParam, signal }) =>
        call(notesAt, {
          params: { shop, revisionId },
          query: { limit: 100, ...(pageParam === null ? {} : { cursor: pageParam }) },
          signal,
        }),
      initialPageParam: null as string | null,
      getNextPageParam: ({ next }) => next,
    }),
};

/**
 * All notes of a revision by number. Page after page is fetched by itself: the drawing must carry every balloon, and the
 * counts must be true. `isWhole` says whether the last page is there.
 */
export function useNotes(shop: string, revisionId: string) {
  const query = useInfiniteQuery(noteQueries.ofRevision(shop, revisionId));
  const { hasNextPage, isFetching, isError, fetchNextPage } = query;
  useEffect(() => {
    if (hasNextPage && !isFetching && !isError) void fetchNextPage();
  }, [hasNextPage, isFetching, isError, fetchNextPage]);
  const notes = useMemo(
    () => (query.data?.pages ?? []).flatMap(({ items }) => items).sort((a, b) => a.number - b.number),
    [query.data],
  );
  return {
    notes,
    isWhole: query.isSuccess && !hasNextPage,
    isLoading: query.isPending,
    error: query.error,
    refetch: query.refetch,
  };
}

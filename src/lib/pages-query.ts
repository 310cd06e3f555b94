import { type InfiniteData, infiniteQueryOptions, type QueryKey } from "@tanstack/react-query";

type Paged<T> = { readonly items: readonly T[]; readonly next: string | null };

/** A list fetched page by page, the next one by the cursor that the last one gave. */
export function pagesQuery<T, P extends Paged<T>, K extends QueryKey>(
  queryKey: K,
  fetchPage: (cursor: string | undefined, signal: AbortSignal) => Promise<P & Paged<T>>,
) {
  return infiniteQueryOptions<P & Paged<T>, Error, InfiniteData<P & Paged<T>>, K, string | null>({
    queryKey,
    queryFn: ({ pageParam, signal }) => fetchPage(pageParam ?? undefined, signal),
    initialPageParam: null,
    getNextPageParam: (last) => last.next,
  });
}

/** Every item fetched so far. */
export const itemsOf = <T>(data: InfiniteData<Paged<T>, unknown> | undefined): readonly T[] =>
  data?.pages.flatMap((page) => page.items) ?? [];

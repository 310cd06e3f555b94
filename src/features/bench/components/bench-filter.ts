import { useSearchParams } from "react-router-dom";
import { jobState, move } from "#shared/contracts/jobs.ts";
import type { JobFilter } from "../api/queries.ts";

const sorts = ["due", "number", "newest"] as const;
export type BenchSort = (typeof sorts)[number];

/** The Bench's filter as its address carries it. What the address has that is no filter is left out. */
export function filterOfSearch(search: URLSearchParams): JobFilter {
  const state = jobState.safeParse(search.get("state"));
  const whoseMove = move.safeParse(search.get("move"));
  const sort = sorts.find((name) => name === search.get("sort"));
  const q = search.get("q")?.trim().slice(0, 200) ?? "";
  return {
    ...(q === "" ? {} : { q }),
    ...(state.success ? { state: state.data } : {}),
    ...(whoseMove.success ? { whoseMove: whoseMove.data } : {}),
    ...(sort && sort !== "due" ? { sort } : {}),
  };
}

/** The filter and a way to change one part of it; typing replaces the history entry, choosing adds one. */
export function useBenchFilter() {
  const [search, setSearch] = useSearchParams();
  const change = (name: "q" | "state" | "move" | "sort", value: string) =>
    setSearch(
      (before) => {
        const after = new URLSearchParams(before);
        if (value === "") after.delete(name);
        else after.set(name, value);
        return after;
      },
      { replace: name === "q", preventScrollReset: true },
    );
  return { filter: filterOfSearch(search), change, clear: () => setSearch({}) };
}

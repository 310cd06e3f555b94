import { describe, expect, it } from "vitest";
import { filterOfSearch } from "@/features/bench/components/bench-filter.ts";
import { benchSentence, clientSentence } from "@/features/bench/components/bench-sentence.ts";

const filter = (search: string) => filterOfSearch(new URLSearchParams(search));

describe("filterOfSearch", () => {
  it("reads every part", () => {
    expect(filter("q=+ring+&move=client&state=out+for+proof&sort=newest")).toEqual({
      q: "ring",
      whoseMove: "client",
      state: "out for proof",
      sort: "newest",
    });
  });
  it("leaves out what is empty, unknown or usual", () => {
    expect(filter("q=++&move=theirs&state=lost&sort=due")).toEqual({});
  });
  it("cuts a search that the server would refuse", () => {
    expect(filter(`q=${"x".repeat(500)}`).q).toHaveLength(200);
  });
});

it("says in one sentence whose moves there are", () => {
  expect([0, 1, 2, 13].map(benchSentence)).toEqual([
    "No move is ours",
    "One move is ours",
    "Two moves are ours",
    "13 moves are ours",
  ]);
  expect([0, 1, 3].map(clientSentence)).toEqual([
    "Nothing waits for you",
    "One sign waits for you",
    "Three signs wait for you",
  ]);
});

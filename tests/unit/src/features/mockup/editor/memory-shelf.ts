import {
  type DraftPlace,
  type DraftShelf,
  draftOf,
  type KeepOutcome,
  newestFirst,
  recordOf,
} from "@/features/mockup/editor/draft-shelf.ts";

/** A shelf as the browser's, in memory. `outcome` is what the next puts come to; only what is kept is kept. */
export function memoryShelf() {
  const records = new Map<string, unknown>();
  const keyOf = ({ personId, shop, jobId }: DraftPlace, deskId = "") => [personId, shop, jobId, deskId].join(" ");
  const shelf: DraftShelf & { outcome: KeepOutcome; readonly records: Map<string, unknown> } = {
    outcome: "kept",
    records,
    put: async (place, draft) => {
      if (shelf.outcome === "kept") records.set(keyOf(place, draft.deskId), recordOf(draft));
      return shelf.outcome;
    },
    list: async (place) =>
      newestFirst(
        [...records]
          .filter(([key]) => key.startsWith(keyOf(place)))
          .map(([, record]) => draftOf(record))
          .filter((draft) => draft !== null),
      ),
    remove: async (place, deskId) => {
      records.delete(keyOf(place, deskId));
    },
  };
  return shelf;
}

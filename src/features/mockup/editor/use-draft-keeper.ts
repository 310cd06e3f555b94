import { useState } from "react";
import { draftKeeper } from "./draft-keeper.ts";
import type { DraftPlace, DraftShelf, KeepOutcome } from "./draft-shelf.ts";
import { newId } from "./new-id.ts";

/** Why this browser keeps no copy of the work; null while it does. */
export type KeepFailure = Exclude<KeepOutcome, "kept"> | null;

/** The keeper of the desk that is opened here, and whether it could keep what it was last given. */
export function useDraftKeeper(shelf: DraftShelf, place: DraftPlace) {
  const [failure, setFailure] = useState<KeepFailure>(null);
  const [keeper] = useState(() =>
    draftKeeper({
      shelf,
      place,
      deskId: newId(),
      onOutcome: (outcome) => setFailure(outcome === "kept" ? null : outcome),
    }),
  );
  return { keeper, failure };
}

import { useState } from "react";
import type { Mockup } from "#shared/contracts/mockups.ts";
import { isSame } from "../model/same.ts";
import { type DraftPlace, dropDraft, findDraft } from "./kept-draft.ts";

/** Work kept in this browser that the server does not have, as it was found when the mockup was opened. */
export function useKeptDraft(place: DraftPlace, mockup: Mockup) {
  const [draft, setDraft] = useState(() => {
    const found = findDraft(window.localStorage, place);
    return found !== null && isSame(found.document, mockup.document) ? null : found;
  });

  return {
    draft,
    forget: () => {
      dropDraft(window.localStorage, place);
      setDraft(null);
    },
  };
}

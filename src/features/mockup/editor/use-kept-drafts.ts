import { useEffect, useState } from "react";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { isSame } from "../model/same.ts";
import { openDesks } from "./desk-locks.ts";
import type { DraftPlace, DraftShelf, KeptDraft } from "./draft-shelf.ts";

/**
 * Work kept in this browser that the server does not have, as it was found when the mockup was opened, newest first. What
 * another open tab is keeping is that tab's; what the server turns out to have is let go.
 */
export function useKeptDrafts({
  shelf,
  place,
  onServer,
}: {
  readonly shelf: DraftShelf;
  readonly place: DraftPlace;
  /** The document on the server when the mockup was opened. */
  readonly onServer: MockupDocument;
}) {
  const [drafts, setDrafts] = useState<readonly KeptDraft[]>([]);
  const [opened] = useState(onServer);

  useEffect(() => {
    let isLeft = false;
    async function find() {
      const found = await shelf.list(place);
      const open = await openDesks(found.map(({ deskId }) => deskId));
      const lost = found.filter(({ deskId }) => !open.has(deskId));
      const saved = lost.filter(({ document }) => isSame(document, opened));
      for (const { deskId } of saved) await shelf.remove(place, deskId);
      if (!isLeft) setDrafts(lost.filter((draft) => !saved.includes(draft)));
    }
    void find();
    return () => {
      isLeft = true;
    };
  }, [shelf, place, opened]);

  return {
    drafts,
    forget: async ({ deskId }: KeptDraft) => {
      setDrafts((before) => before.filter((draft) => draft.deskId !== deskId));
      await shelf.remove(place, deskId);
    },
  };
}

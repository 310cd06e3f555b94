import type { Revision, SheetView } from "#shared/contracts/revisions.ts";

export type StandingTone = "waiting" | "ours" | "settled" | "quiet";

/** What the title block's "Approved by" says, and how it is set. */
export type Standing = { readonly words: string; readonly tone: StandingTone };

type Decided = Pick<Revision, "state" | "decision" | "letter">;

/** Where a revision stands, as the reader is to be told. */
export function standingOf(revision: Decided, reader: SheetView["reader"]): Standing {
  switch (revision.state) {
    case "approved":
      return { words: revision.decision?.typedName ?? revision.decision?.by ?? "approved", tone: "settled" };
    case "revision asked":
      return { words: "a revision is asked for", tone: "ours" };
    case "superseded":
      return { words: "nobody: superseded", tone: "quiet" };
    case "withdrawn":
      return { words: "nobody: withdrawn", tone: "quiet" };
    case "issued":
      if (reader.side === "shop") return { words: "waiting for the client", tone: "waiting" };
      return reader.approver
        ? { words: "waiting for you", tone: "waiting" }
        : { words: "waiting for your approver", tone: "waiting" };
    case "draft":
    case "preparing":
      return { words: "not out yet", tone: "quiet" };
  }
}

/** A sheet that is approved while a later letter is out must not be cut from. */
export function isHeld(revision: Pick<Revision, "id" | "state" | "current">): boolean {
  return revision.state === "approved" && revision.current !== null && revision.current.revisionId !== revision.id;
}

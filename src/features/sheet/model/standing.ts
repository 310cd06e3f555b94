import type { Revision, SheetView } from "#shared/contracts/revisions.ts";

export type StandingTone = "waiting" | "ours" | "settled" | "quiet";

/** What the title block's "Approved by" says, how it is set, and the same as a sentence of its own. */
export type Standing = { readonly words: string; readonly alone: string; readonly tone: StandingTone };

type Decided = Pick<Revision, "state" | "decision" | "letter">;

/** Where a revision stands, as the reader is to be told. `toAnswer` counts the notes that wait on the shop. */
export function standingOf(revision: Decided, reader: SheetView["reader"], toAnswer = 0): Standing {
  const same = (words: string, tone: StandingTone): Standing => ({ words, alone: words, tone });
  // Beside "Approved by" a bare "the shop is answering" would read as a name.
  const notYet = (alone: string, tone: StandingTone): Standing => ({ words: `not yet: ${alone}`, alone, tone });
  switch (revision.state) {
    case "approved": {
      const name = revision.decision?.typedName ?? revision.decision?.by ?? "the client";
      return { words: name, alone: `approved by ${name}`, tone: "settled" };
    }
    case "revision asked":
      return notYet("a revision is asked for", "ours");
    case "superseded":
    case "withdrawn":
      return { words: `nobody: ${revision.state}`, alone: revision.state, tone: "quiet" };
    case "issued":
      if (toAnswer > 0 && reader.side === "shop") return notYet("notes to answer", "ours");
      if (toAnswer > 0) return notYet("the shop is answering", "waiting");
      if (reader.side === "shop") return notYet("waiting for the client", "waiting");
      return notYet(reader.approver ? "waiting for you" : "waiting for your approver", "waiting");
    case "draft":
    case "preparing":
      return same("not out yet", "quiet");
  }
}

/** A sheet that is approved while a later letter is out must not be cut from. */
export function isHeld(revision: Pick<Revision, "id" | "state" | "current">): boolean {
  return revision.state === "approved" && revision.current !== null && revision.current.revisionId !== revision.id;
}

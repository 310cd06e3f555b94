import type { Note as NoteView } from "#shared/contracts/notes.ts";
import type { Note } from "../models/note.ts";
import type { Actor } from "../policies/actor.ts";
import { notePolicy } from "../policies/note.ts";
import type { RevisionFacts } from "../policies/revision.ts";

/** A note as this actor sees it on a revision. */
export function presentNote(actor: Actor, on: RevisionFacts, note: Note): NoteView {
  return {
    id: note.id,
    number: note.number,
    kind: note.kind,
    state: note.state,
    text: note.text,
    anchor: note.anchor,
    zone: note.zone,
    author: note.authorName,
    side: note.side,
    shopOnly: note.shopOnly,
    fromLetter: note.revision?.letter ?? "",
    at: note.createdAt.toISOString(),
    replies: (note.replies ?? []).map(({ id, text, authorName, side, createdAt }) => ({
      id,
      text,
      author: authorName,
      side,
      at: createdAt.toISOString(),
    })),
    can: {
      reply: notePolicy.reply(actor, on, note),
      settle: notePolicy.move(actor, on, note, "settled"),
      reopen: notePolicy.move(actor, on, note, "open"),
    },
  };
}

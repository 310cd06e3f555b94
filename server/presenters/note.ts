import type { Note as NoteView } from "#shared/contracts/notes.ts";
import { editableUntil } from "#shared/lifecycle/note-edits.ts";
import type { ReadContext } from "../http/context.ts";
import type { Note } from "../models/note.ts";
import { notePolicy } from "../policies/note.ts";
import type { RevisionFacts } from "../policies/revision.ts";

type Reading = Pick<ReadContext, "actor" | "now">;

/** A note as this actor sees it on a revision at this moment. */
export function presentNote({ actor, now }: Reading, on: RevisionFacts, note: Note): NoteView {
  const until = ({ authorId, createdAt }: { authorId: string; createdAt: Date }) =>
    notePolicy.edit(actor, on, note, { authorId, createdAt, now }) ? editableUntil(createdAt).toISOString() : null;
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
    editedAt: note.editedAt?.toISOString() ?? null,
    editableUntil: until(note),
    replies: (note.replies ?? []).map((reply) => ({
      id: reply.id,
      text: reply.text,
      author: reply.authorName,
      side: reply.side,
      at: reply.createdAt.toISOString(),
      editedAt: reply.editedAt?.toISOString() ?? null,
      editableUntil: until(reply),
    })),
    can: {
      reply: notePolicy.reply(actor, on, note),
      settle: notePolicy.move(actor, on, note, "settled"),
      reopen: notePolicy.move(actor, on, note, "open"),
    },
  };
}

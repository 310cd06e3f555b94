import * as contract from "#shared/contracts/notes.ts";
import { addNote } from "../commands/add-note.ts";
import { editNote, editReply } from "../commands/edit-note.ts";
import { replyToNote } from "../commands/reply-to-note.ts";
import { setNoteState } from "../commands/set-note-state.ts";
import type { ReadContext } from "../http/context.ts";
import { type Routes, read, write } from "../http/route.ts";
import { presentNote } from "../presenters/note.ts";
import { findNote } from "../queries/find-note.ts";
import { findRevision } from "../queries/find-revision.ts";
import { listNotes } from "../queries/list-notes.ts";
import { pageOf } from "../queries/page.ts";

export function registerNoteRoutes(routes: Routes): void {
  read(routes, contract.listNotes, async (context, { params, query }) => {
    const { revision, facts } = await findRevision(context, params.revisionId);
    const notes = await listNotes(context, revision, query);
    return pageOf(
      notes,
      query.limit,
      (note) => presentNote(context, facts, note),
      ({ number }) => [number],
    );
  });

  write(routes, contract.addNote, async (context, { params, body }) => {
    const { id } = await addNote(context, { revisionId: params.revisionId, ...body });
    return noteView(context, id);
  });

  write(routes, contract.replyToNote, async (context, { params, body }) => {
    await replyToNote(context, { noteId: params.noteId, ...body });
    return noteView(context, params.noteId);
  });

  write(routes, contract.editNote, async (context, { params, body }) => {
    await editNote(context, { noteId: params.noteId, ...body });
    return noteView(context, params.noteId);
  });

  write(routes, contract.editReply, async (context, { params, body }) => {
    await editReply(context, { ...params, ...body });
    return noteView(context, params.noteId);
  });

  write(routes, contract.setNoteState, async (context, { params, body }) => {
    await setNoteState(context, { noteId: params.noteId, ...body });
    return noteView(context, params.noteId);
  });
}

async function noteView(context: ReadContext, noteId: string) {
  const { note, on } = await findNote(context, noteId);
  return presentNote(context, on.facts, note);
}

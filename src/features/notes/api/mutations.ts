import { type InfiniteData, useMutation, useQueryClient } from "@tanstack/react-query";
import { type AddressOf, addresses } from "#shared/contracts/addresses.ts";
import type * as contract from "#shared/contracts/notes.ts";
import { call } from "@/lib/api-client.ts";
import { keys } from "@/lib/query-keys.ts";
import { revisionKeys } from "@/lib/revision-keys.ts";
import type { NoteDraft } from "../model/note-draft.ts";
import { noteQueries } from "./queries.ts";

type Note = contract.Note;

const addAt: AddressOf<typeof contract.addNote> = addresses.addNote;
const replyAt: AddressOf<typeof contract.replyToNote> = addresses.replyToNote;
const stateAt: AddressOf<typeof contract.setNoteState> = addresses.setNoteState;
const editAt: AddressOf<typeof contract.editNote> = addresses.editNote;
const editReplyAt: AddressOf<typeof contract.editReply> = addresses.editReply;

type Pages<Cursor> = InfiniteData<{ items: Note[]; next: string | null }, Cursor>;

/** Puts an answered note where it lies in the list, or at its end when it is new. */
export function withNote<Cursor>(pages: Pages<Cursor> | undefined, note: Note): Pages<Cursor> | undefined {
  if (!pages) return pages;
  const known = pages.pages.some(({ items }) => items.some(({ id }) => id === note.id));
  const last = pages.pages.length - 1;
  return {
    ...pages,
    pages: pages.pages.map((page, index) => ({
      ...page,
      items: known
        ? page.items.map((item) => (item.id === note.id ? note : item))
        : index === last
          ? [...page.items, note]
          : page.items,
    })),
  };
}

function useNoteLanding(shop: string, revisionId: string) {
  const client = useQueryClient();
  return (note: Note) => {
    client.setQueryData(noteQueries.ofRevision(shop, revisionId).queryKey, (pages) => withNote(pages, note));
    // What may be done with the revision can hang on its notes. The drawing can't, and it is large: it stays.
    return Promise.all([
      client.invalidateQueries({ queryKey: revisionKeys.notes(shop, revisionId) }),
      client.invalidateQueries({ queryKey: revisionKeys.revision(shop, revisionId) }),
      client.invalidateQueries({ queryKey: keys.jobs(shop) }),
    ]);
  };
}

export function useAddNote(shop: string, revisionId: string) {
  const onSuccess = useNoteLanding(shop, revisionId);
  return useMutation({
    mutationFn: ({ text, kind, anchor, shopOnly }: NoteDraft & Required<Pick<Note, "kind" | "anchor">>) =>
      call(addAt, { params: { shop, revisionId }, body: { text, kind, anchor, shopOnly } }),
    onSuccess,
  });
}

export function useReplyToNote(shop: string, revisionId: string, noteId: string) {
  const onSuccess = useNoteLanding(shop, revisionId);
  return useMutation({
    mutationFn: (text: string) => call(replyAt, { params: { shop, noteId }, body: { text } }),
    onSuccess,
  });
}

export function useSetNoteState(shop: string, revisionId: string, noteId: string) {
  const onSuccess = useNoteLanding(shop, revisionId);
  return useMutation({
    mutationFn: (state: "settled" | "open") => call(stateAt, { params: { shop, noteId }, body: { state } }),
    onSuccess,
  });
}

export function useEditNote(shop: string, revisionId: string, noteId: string) {
  const onSuccess = useNoteLanding(shop, revisionId);
  return useMutation({
    mutationFn: (body: Pick<Note, "text" | "kind">) => call(editAt, { params: { shop, noteId }, body }),
    onSuccess,
  });
}

export function useEditReply(shop: string, revisionId: string, noteId: string) {
  const onSuccess = useNoteLanding(shop, revisionId);
  return useMutation({
    mutationFn: ({ replyId, text }: { replyId: string; text: string }) =>
      call(editReplyAt, { params: { shop, noteId, replyId }, body: { text } }),
    onSuccess,
  });
}

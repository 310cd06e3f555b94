import { useState } from "react";
import type { Note } from "#shared/contracts/notes.ts";
import { Button } from "@/components/ui/button.tsx";
import { useUntil } from "@/lib/use-until.ts";
import { useEditNote, useEditReply } from "../api/mutations.ts";
import { PutRightForm } from "./put-right-form.tsx";

type Of = { readonly shop: string; readonly revisionId: string; readonly note: Note };

/** What a note says; its author can put it right for a few minutes. */
export function NoteWords({ shop, revisionId, note }: Of) {
  const edit = useEditNote(shop, revisionId, note.id);
  return (
    <Written
      id={note.id}
      what={`note ${note.number}`}
      text={note.text}
      kind={note.kind}
      editableUntil={note.editableUntil}
      isPending={edit.isPending}
      error={edit.error}
      onSend={({ text, kind }, onKept) => edit.mutate({ text, kind: kind ?? note.kind }, { onSuccess: onKept })}
    />
  );
}

/** What a reply says; its author can put it right for a few minutes. */
export function ReplyWords({ shop, revisionId, note, reply }: Of & { readonly reply: Note["replies"][number] }) {
  const edit = useEditReply(shop, revisionId, note.id);
  return (
    <Written
      id={reply.id}
      what={`your reply to note ${note.number}`}
      text={reply.text}
      kind={null}
      editableUntil={reply.editableUntil}
      isPending={edit.isPending}
      error={edit.error}
      onSend={({ text }, onKept) => edit.mutate({ replyId: reply.id, text }, { onSuccess: onKept })}
    />
  );
}

type WrittenProps = {
  readonly id: string;
  readonly what: string;
  readonly text: string;
  readonly kind: Note["kind"] | null;
  readonly editableUntil: string | null;
  readonly isPending: boolean;
  readonly error: unknown;
  readonly onSend: (changed: { text: string; kind: Note["kind"] | null }, onKept: () => void) => void;
};

function Written({ id, what, text, kind, editableUntil, isPending, error, onSend }: WrittenProps) {
  const [isOpen, setOpen] = useState(false);
  const isEditable = useUntil(editableUntil);
  if (isOpen)
    return (
      <PutRightForm
        id={id}
        label={`Put right ${what}`}
        text={text}
        kind={kind}
        isPending={isPending}
        error={error}
        onSend={onSend}
        onDone={() => setOpen(false)}
      />
    );
  return (
    <>
      <p className="whitespace-pre-wrap">{text}</p>
      {isEditable && (
        <Button kind="bare" size="small" onClick={() => setOpen(true)}>
          Put right
          <span className="sr-only"> {what}</span>
        </Button>
      )}
    </>
  );
}

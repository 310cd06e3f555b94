import { type FormEvent, useRef, useState } from "react";
import type { Note } from "#shared/contracts/notes.ts";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { TextArea } from "@/components/ui/text-area.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { hasSessionText, useSessionText } from "@/lib/session-draft.ts";
import { useReplyToNote } from "../api/mutations.ts";

type ReplyFormProps = {
  readonly shop: string;
  readonly revisionId: string;
  readonly note: Note;
  /** Not when it stands open from before: the reader may be looking elsewhere. */
  readonly takesFocus: boolean;
  readonly onDone: () => void;
};

const keyOf = (noteId: string): string => `standproud:reply:${noteId}`;

/** Whether an answer to a note was begun and neither sent nor emptied. */
export const hasBegunReply = (noteId: string): boolean => hasSessionText(keyOf(noteId));

/** An answer under a note. What is typed survives a reload. */
export function ReplyForm({ shop, revisionId, note, takesFocus, onDone }: ReplyFormProps) {
  const [text, setText] = useSessionText(keyOf(note.id));
  const [isEmpty, setEmpty] = useState(false);
  const isSent = useRef(false);
  const reply = useReplyToNote(shop, revisionId, note.id);

  function handleSubmit(event: FormEvent) {
    event.preventDefault();
    // A second press can come before the button is drawn as busy.
    if (isSent.current) return;
    setEmpty(text.trim() === "");
    if (text.trim() === "") return;
    isSent.current = true;
    reply.mutate(text, {
      onSuccess: () => {
        setText("");
        onDone();
      },
      onError: () => {
        isSent.current = false;
      },
    });
  }

  return (
    <form onSubmit={handleSubmit} className="mt-2 space-y-2" noValidate>
      <TextArea
        autoFocus={takesFocus}
        label={`Reply to note ${note.number}`}
        value={text}
        rows={2}
        error={isEmpty ? "Write something first." : undefined}
        onChange={(event) => setText(event.target.value)}
      />
      {reply.isError && (
        <Notice tone="error" title="The reply was not sent.">
          {messageOf(reply.error)} What you wrote is still here.
        </Notice>
      )}
      <div className="flex flex-wrap gap-3">
        <Button type="submit" size="small" busy={reply.isPending}>
          Send the reply
        </Button>
        <Button kind="bare" size="small" onClick={onDone}>
          Leave it
        </Button>
      </div>
    </form>
  );
}

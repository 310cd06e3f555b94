import { useEffect, useRef, useState } from "react";
import type { Note } from "#shared/contracts/notes.ts";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { cx } from "@/lib/cx.ts";
import { messageOf } from "@/lib/form-problem.ts";
import { formatExact, formatInstant } from "@/lib/format.ts";
import { useSetNoteState } from "../api/mutations.ts";
import { kindWords, noteTone, placeWords } from "../model/note-words.ts";
import { NoteMark, toneText } from "./note-mark.tsx";
import { NoteWords, ReplyWords } from "./note-words.tsx";
import { hasBegunReply, ReplyForm } from "./reply-form.tsx";

type NoteItemProps = {
  readonly shop: string;
  readonly revisionId: string;
  readonly letter: string;
  readonly note: Note;
  readonly pieceNames: ReadonlyMap<string, string>;
  readonly isSelected: boolean;
  readonly onSelect: (noteId: string | null) => void;
};

/** The number of a note's line, where the focus goes once the note is there. */
export const noteButtonId = (noteId: string): string => `note-${noteId}`;

/** One note as a line of the margin: number, words, what and where, replies, and what can be done with it. */
export function NoteItem({ shop, revisionId, letter, note, pieceNames, isSelected, onSelect }: NoteItemProps) {
  const [isReplying, setReplying] = useState(() => note.can.reply && hasBegunReply(note.id));
  const [wasAsked, setAsked] = useState(false);
  const change = useSetNoteState(shop, revisionId, note.id);
  const line = useRef<HTMLLIElement>(null);
  const tone = noteTone(note);

  useEffect(() => {
    if (isSelected) line.current?.scrollIntoView({ block: "nearest" });
  }, [isSelected]);

  function handleReply() {
    setAsked(true);
    setReplying(true);
  }

  const state = note.state === "settled" ? "Settled" : kindWords[note.kind].word;
  const rest = [
    placeWords(note, pieceNames),
    note.fromLetter === letter ? null : `from revision ${note.fromLetter}`,
    note.state === "settled" ? `was ${note.kind}` : note.state === "answered" ? "answered" : null,
  ].filter((part) => part !== null);

  return (
    <li ref={line} className={cx("border-b border-rule px-4 py-3", isSelected && "bg-linen")}>
      <div className="flex gap-3">
        <button
          type="button"
          id={noteButtonId(note.id)}
          aria-pressed={isSelected}
          aria-label={`Note ${note.number}: show on the drawing`}
          onClick={() => onSelect(isSelected ? null : note.id)}
          className={cx(
            "relative mt-0.5 flex size-7 shrink-0 cursor-pointer items-center justify-center rounded-full border-2 border-current bg-sheet font-serif text-fine font-bold before:absolute before:-inset-2",
            toneText[tone],
          )}
        >
          {note.number}
        </button>
        <div className="min-w-0 flex-1">
          <NoteWords shop={shop} revisionId={revisionId} note={note} />
          <p className="mt-0.5 text-fine text-graphite">
            <span className={cx("font-semibold", toneText[tone])}>
              <NoteMark tone={tone} /> {state}
            </span>
            , {rest.join(", ")}
          </p>
          <p className="text-fine text-graphite">
            {note.author},{" "}
            <time dateTime={note.at} title={formatExact(note.at)}>
              {formatInstant(note.at)}
            </time>
            {note.editedAt !== null && ", put right since"}
            {note.shopOnly && <strong className="ml-1.5 border border-graphite px-1 font-semibold">shop only</strong>}
          </p>
          {note.replies.length > 0 && (
            <ul aria-label={`Replies to note ${note.number}`} className="mt-2 space-y-2 border-l-2 border-rule pl-3">
              {note.replies.map((reply) => (
                <li key={reply.id}>
                  <ReplyWords shop={shop} revisionId={revisionId} note={note} reply={reply} />
                  <p className="text-fine text-graphite">
                    {reply.author},{" "}
                    <time dateTime={reply.at} title={formatExact(reply.at)}>
                      {formatInstant(reply.at)}
                    </time>
                    {reply.editedAt !== null && ", put right since"}
                  </p>
                </li>
              ))}
            </ul>
          )}
          {change.isError && (
            <Notice tone="error" className="mt-2">
              {messageOf(change.error)}
            </Notice>
          )}
          {isReplying ? (
            <ReplyForm
              shop={shop}
              revisionId={revisionId}
              note={note}
              takesFocus={wasAsked}
              onDone={() => setReplying(false)}
            />
          ) : (
            <p className="mt-1 flex flex-wrap gap-x-4 empty:hidden">
              {note.can.reply && (
                <Button kind="bare" size="small" onClick={handleReply}>
                  Reply
                  <span className="sr-only"> to note {note.number}</span>
                </Button>
              )}
              {note.can.settle && (
                <Button kind="bare" size="small" busy={change.isPending} onClick={() => change.mutate("settled")}>
                  Settle
                  <span className="sr-only"> note {note.number}</span>
                </Button>
              )}
              {note.can.reopen && (
                <Button kind="bare" size="small" busy={change.isPending} onClick={() => change.mutate("open")}>
                  Open again
                  <span className="sr-only">, note {note.number}</span>
                </Button>
              )}
            </p>
          )}
        </div>
      </div>
    </li>
  );
}

import type { ReactNode } from "react";
import type { Note } from "#shared/contracts/notes.ts";
import { Button } from "@/components/ui/button.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { countWords } from "../model/note-words.ts";
import { NoteItem } from "./note-item.tsx";

type NotesPanelProps = {
  readonly shop: string;
  readonly revisionId: string;
  readonly letter: string;
  readonly notes: readonly Note[];
  readonly isLoading: boolean;
  readonly isWhole: boolean;
  readonly error: unknown;
  readonly onRetry: () => void;
  readonly canNote: boolean;
  readonly onAdd: () => void;
  readonly pieceNames: ReadonlyMap<string, string>;
  readonly selectedId: string | null;
  readonly onSelect: (noteId: string | null) => void;
  /** Brings back the note that was left just now; null when there is none. */
  readonly onTakeUpAgain: (() => void) | null;
  /** The note being written, at the head of the list. */
  readonly composer: ReactNode;
};

/** The margin of the sheet: every note by its number, open ones and settled ones. */
export function NotesPanel(props: NotesPanelProps) {
  const { shop, revisionId, letter, notes, isLoading, isWhole, error, onRetry, canNote, onAdd } = props;
  const { pieceNames, selectedId, onSelect, onTakeUpAgain, composer } = props;
  return (
    <section aria-labelledby="notes-heading">
      <div className="flex items-center justify-between gap-3 px-4 pt-3 pb-2">
        <h2 id="notes-heading" className="font-serif text-base font-bold">
          Notes <span className="font-sans text-fine font-normal text-graphite">{isWhole && countWords(notes)}</span>
        </h2>
        {canNote && !composer && (
          <Button size="small" onClick={onAdd} className="shrink-0">
            Add a note
          </Button>
        )}
      </div>
      {composer}
      {onTakeUpAgain !== null && !composer && (
        <p role="status" className="flex flex-wrap items-center gap-x-3 bg-linen px-4 py-1 text-sm">
          The note was left.
          <Button kind="bare" size="small" onClick={onTakeUpAgain}>
            Take it up again
          </Button>
        </p>
      )}
      {isLoading && (
        <div className="px-4 py-3">
          <Skeleton label="Loading the notes" rows={3} rowClassName="h-16" />
        </div>
      )}
      {error !== null && (
        <div className="px-4 py-3">
          <ProblemNotice what="The notes could not be loaded." error={error} onRetry={onRetry} />
        </div>
      )}
      {isWhole && notes.length === 0 && !composer && (
        <p className="px-4 pb-4 text-sm text-graphite">
          {canNote
            ? "No notes yet. Press “Add a note” and touch the spot you mean: what must change, what you want to know, what is fine as it is."
            : "No notes on this sheet."}
        </p>
      )}
      {notes.length > 0 && (
        <ol className="border-t border-rule">
          {notes.map((note) => (
            <NoteItem
              key={note.id}
              shop={shop}
              revisionId={revisionId}
              letter={letter}
              note={note}
              pieceNames={pieceNames}
              isSelected={note.id === selectedId}
              onSelect={onSelect}
            />
          ))}
        </ol>
      )}
      {!isLoading && !isWhole && error === null && (
        <p role="status" className="px-4 py-3 text-sm text-graphite">
          Reading the rest of the notes.
        </p>
      )}
    </section>
  );
}

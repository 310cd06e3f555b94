import { useId } from "react";
import { cx } from "@/lib/cx.ts";
import { kindWords, type NoteKind, noteTone } from "../model/note-words.ts";
import { NoteMark } from "./note-mark.tsx";

const kinds = Object.keys(kindWords) as NoteKind[];

type KindFieldProps = {
  readonly kind: NoteKind | null;
  readonly error: string | undefined;
  readonly onKind: (kind: NoteKind) => void;
};

/** What kind of note it is: a word, a drawn mark and what it asks. */
export function KindField({ kind, error, onKind }: KindFieldProps) {
  const id = useId();
  return (
    <fieldset aria-describedby={error ? `${id}-error` : undefined}>
      <legend className="text-sm font-semibold">What kind of note</legend>
      <div className="mt-1 space-y-1.5">
        {kinds.map((each) => (
          <label
            key={each}
            className={cx(
              "flex min-h-11 cursor-pointer items-center gap-3 rounded border bg-sheet px-3 py-1.5",
              each === kind ? "border-ink" : "border-graphite",
            )}
          >
            <input
              type="radio"
              name={id}
              value={each}
              checked={each === kind}
              aria-invalid={error ? true : undefined}
              onChange={() => onKind(each)}
              className="size-5 shrink-0 cursor-pointer accent-indigo"
            />
            <NoteMark tone={noteTone({ kind: each, state: "open" })} />
            <span>
              <span className="block text-sm font-semibold">{kindWords[each].word}</span>
              <span className="block text-fine text-graphite">{kindWords[each].means}</span>
            </span>
          </label>
        ))}
      </div>
      {error && (
        <p id={`${id}-error`} className="mt-1 text-sm text-oxblood">
          {error}
        </p>
      )}
    </fieldset>
  );
}

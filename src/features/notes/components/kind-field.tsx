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
      <div className="mt-1 grid grid-cols-3 border border-graphite bg-sheet">
        {kinds.map((each) => (
          <label
            key={each}
            className={cx(
              "flex min-h-11 cursor-pointer items-center justify-center gap-1.5 border-graphite px-1 text-center text-sm leading-tight not-first:border-l",
              "has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-indigo",
              each === kind ? "bg-ink font-semibold text-sheet" : "hover:bg-linen",
            )}
          >
            <input
              type="radio"
              name={id}
              value={each}
              checked={each === kind}
              aria-invalid={error ? true : undefined}
              onChange={() => onKind(each)}
              className="sr-only"
            />
            <NoteMark tone={noteTone({ kind: each, state: "open" })} className={each === kind && "text-sheet"} />
            {kindWords[each].word}
          </label>
        ))}
      </div>
      {kind !== null && <p className="mt-1 text-fine text-graphite">{kindWords[kind].means}</p>}
      {error && (
        <p id={`${id}-error`} className="mt-1 text-sm text-oxblood">
          {error}
        </p>
      )}
    </fieldset>
  );
}

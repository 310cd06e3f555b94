import { useId } from "react";

export type OpenNote = {
  readonly id: string;
  readonly number: number;
  readonly text: string;
  readonly zone: string | null;
};

type OpenNoteQuestionProps = {
  readonly note: OpenNote;
  readonly answer: "settled" | "stop" | undefined;
  readonly isMissing: boolean;
  readonly onAnswer: (answer: "settled" | "stop") => void;
};

const answers = [
  { value: "settled", label: "Settled: this drawing does it" },
  { value: "stop", label: "Not settled: stop here" },
] as const;

/** One open must-change note, which an approval has to settle or to stop at. */
export function OpenNoteQuestion({ note, answer, isMissing, onAnswer }: OpenNoteQuestionProps) {
  const id = useId();
  return (
    <fieldset className="border-l-4 border-madder bg-sheet px-3 py-2">
      <legend className="float-left w-full">
        <span className="font-semibold">
          Note {note.number}
          {note.zone === null ? "" : `, zone ${note.zone}`}:
        </span>{" "}
        <span className="whitespace-pre-wrap">{note.text}</span>
      </legend>
      <div className="clear-both flex flex-wrap gap-x-5">
        {answers.map(({ value, label }) => (
          <label key={value} className="flex min-h-11 cursor-pointer items-center gap-2">
            <input
              type="radio"
              name={id}
              value={value}
              checked={answer === value}
              aria-invalid={isMissing ? true : undefined}
              onChange={() => onAnswer(value)}
              className="size-5 cursor-pointer accent-indigo"
            />
            {label}
          </label>
        ))}
      </div>
      {isMissing && <p className="text-sm text-oxblood">Say whether it is settled.</p>}
    </fieldset>
  );
}

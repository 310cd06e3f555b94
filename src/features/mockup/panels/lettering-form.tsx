import type { ReactNode } from "react";
import { faceOf, nameOfFace } from "#shared/lettering/faces.ts";
import { longestWords } from "#shared/mockup/lettering-schema.ts";
import { Button } from "@/components/ui/button.tsx";
import { TextArea } from "@/components/ui/text-area.tsx";
import { useDesk } from "../editor/desk-context.ts";
import type { LetteringWriting } from "../editor/use-lettering-draft.ts";
import { linesOfText } from "../model/lettering-draft.ts";
import { shortWords } from "../model/lettering-words.ts";
import { WordButton } from "./cell-controls.tsx";
import { FaceChoice } from "./face-choice.tsx";
import { LetteringFields } from "./lettering-fields.tsx";
import { LetteringPreview } from "./lettering-preview.tsx";

type LetteringFormProps = {
  readonly writing: LetteringWriting;
  /** What the form is sent by. */
  readonly action: string;
  readonly canSend: boolean;
  readonly onSend: () => void;
  readonly onCancel: () => void;
  /** What else there is to choose. */
  readonly children?: ReactNode;
};

/** Words and how they are set, with the words as they will be cut. */
export function LetteringForm({ writing, action, canSend, onSend, onCancel, children }: LetteringFormProps) {
  const { unit, briefWords } = useDesk();
  const { draft, set, state, shown } = writing;
  const face = faceOf(draft.face);
  const isTooLong = draft.words.length > longestWords;
  return (
    <form
      className="space-y-4"
      onSubmit={(event) => {
        event.preventDefault();
        if (canSend) onSend();
      }}
    >
      <div className="grid gap-4 md:grid-cols-[2fr_3fr]">
        <div className="space-y-1">
          <TextArea
            label="Words"
            rows={3}
            value={draft.words}
            onChange={(event) => set({ words: event.target.value })}
            error={isTooLong ? `At most ${longestWords} characters.` : undefined}
          />
          <BriefLines words={briefWords} onChoose={(words) => set({ words })} />
        </div>
        <LetteringPreview state={state} shown={shown} face={face ? nameOfFace(face) : ""} unit={unit} />
      </div>
      <FaceChoice
        value={draft.face}
        onChange={(key) => set({ face: key })}
        sample={shortWords(linesOfText(draft.words)[0] ?? "")}
      />
      <LetteringFields draft={draft} set={set} unit={unit} />
      {children}
      {/* Within reach however long the form is. */}
      <div className="sticky -bottom-5 z-10 sm:-bottom-6 -mx-5 -mb-5 flex flex-wrap justify-end gap-3 border-t border-rule bg-sheet px-5 py-3 sm:-mx-6 sm:-mb-6 sm:px-6">
        <Button onClick={onCancel}>Cancel</Button>
        <Button type="submit" disabled={!canSend}>
          {action}
        </Button>
      </div>
    </form>
  );
}

/** The brief's words to take a line of, or all. */
function BriefLines({ words, onChoose }: { readonly words: string; readonly onChoose: (words: string) => void }) {
  const lines = linesOfText(words);
  if (lines.length === 0) return <p className="text-fine text-graphite">The brief has no words yet.</p>;
  const all = lines.join("\n");
  return (
    <p className="text-fine text-graphite">
      From the brief:{" "}
      {[...new Set(lines)].map((line) => (
        <WordButton key={line} onClick={() => onChoose(line)}>
          {shortWords(line)}
        </WordButton>
      ))}
      {lines.length > 1 && <WordButton onClick={() => onChoose(all)}>all {lines.length} lines</WordButton>}
    </p>
  );
}

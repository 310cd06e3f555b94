import type { Revision } from "#shared/contracts/revisions.ts";
import { Select } from "@/components/ui/select.tsx";
import { revisionStateWord, type Side } from "@/lib/revision-state.ts";

type LetterChoiceProps = {
  readonly label: string;
  readonly side: Side;
  readonly revisions: readonly Revision[];
  readonly chosen: string;
  readonly onChoose: (revisionId: string) => void;
};

/** One of the letters of a job. */
export function LetterChoice({ label, side, revisions, chosen, onChoose }: LetterChoiceProps) {
  return (
    <Select label={label} value={chosen} onChange={(event) => onChoose(event.target.value)} className="min-w-0 flex-1">
      {!revisions.some(({ id }) => id === chosen) && <option value={chosen}>Choose a revision</option>}
      {revisions.map(({ id, letter, state }) => (
        <option key={id} value={id}>
          {letter}, {revisionStateWord(state, side)}
        </option>
      ))}
    </Select>
  );
}

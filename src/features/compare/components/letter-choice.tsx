import type { Revision } from "#shared/contracts/revisions.ts";
import { Select } from "@/components/ui/select.tsx";

type LetterChoiceProps = {
  readonly label: string;
  readonly revisions: readonly Revision[];
  readonly chosen: string;
  readonly onChoose: (revisionId: string) => void;
};

/** One of the letters of a job. */
export function LetterChoice({ label, revisions, chosen, onChoose }: LetterChoiceProps) {
  return (
    <Select label={label} value={chosen} onChange={(event) => onChoose(event.target.value)} className="min-w-0 flex-1">
      {!revisions.some(({ id }) => id === chosen) && <option value={chosen}>Choose a letter</option>}
      {revisions.map(({ id, letter, state }) => (
        <option key={id} value={id}>
          {letter}, {state}
        </option>
      ))}
    </Select>
  );
}

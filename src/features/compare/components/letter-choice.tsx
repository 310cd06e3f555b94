import type { Revision } from "#shared/contracts/revisions.ts";
import { Select } from "@/components/ui/select.tsx";
import { formatDay } from "@/lib/format.ts";

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
      {revisions.map(({ id, letter, state, issuedAt }) => (
        <option key={id} value={id}>
          Revision {letter}, {state}
          {issuedAt === null ? "" : `, ${formatDay(issuedAt)}`}
        </option>
      ))}
    </Select>
  );
}

import type { Revision, SheetView } from "#shared/contracts/revisions.ts";
import { TextLink } from "@/components/ui/text-link.tsx";
import { comparedWith, compareLetters } from "../model/compared-with.ts";

type SheetToolsProps = {
  readonly revision: Revision;
  readonly others: SheetView["others"];
  readonly proofAddress: string;
  readonly pathOfCompare: (before: string, after: string) => string;
  /** null when the drawing does not name its dimensions. */
  readonly dimensions: { readonly shown: boolean; readonly onToggle: () => void } | null;
};

const linkClass =
  "inline-flex min-h-8 cursor-pointer items-center text-indigo underline underline-offset-4 hover:text-ink";

/** What can be done with the sheet beside deciding: dimensions, comparing, the PDF. */
export function SheetTools({ revision, others, proofAddress, pathOfCompare, dimensions }: SheetToolsProps) {
  const other = comparedWith(revision.letter, others);
  const earlierFirst = other && compareLetters(other, revision) < 0;
  return (
    <>
      {dimensions && (
        <button type="button" className={linkClass} onClick={dimensions.onToggle}>
          {dimensions.shown ? "Dimensions off" : "Dimensions on"}
        </button>
      )}
      {other && (
        <TextLink
          className={linkClass}
          to={
            earlierFirst ? pathOfCompare(other.revisionId, revision.id) : pathOfCompare(revision.id, other.revisionId)
          }
        >
          Compare with {other.letter}
        </TextLink>
      )}
      {revision.can.download && (
        <a href={proofAddress} className={linkClass} download>
          Download PDF
        </a>
      )}
    </>
  );
}

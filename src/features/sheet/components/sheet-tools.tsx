import type { Revision, SheetView } from "#shared/contracts/revisions.ts";
import { TextLink } from "@/components/ui/text-link.tsx";
import { comparedWith, compareLetters } from "../model/compared-with.ts";

type SheetToolsProps = {
  readonly revision: Revision;
  readonly others: SheetView["others"];
  readonly proofAddress: string;
  readonly pathOfCompare: (before: string, after: string) => string;
  readonly jobPath: string;
  /** null for a reader who does not see mockups. */
  readonly mockupPath: string | null;
  /** null when the drawing does not name its dimensions. */
  readonly dimensions: { readonly shown: boolean; readonly onToggle: () => void } | null;
};

const linkClass =
  "inline-flex min-h-8 pointer-coarse:min-h-11 cursor-pointer items-center text-indigo underline underline-offset-4 hover:text-ink";

/** What can be done with the sheet beside deciding: dimensions, comparing, the PDF, and the ways on from here. */
export function SheetTools(props: SheetToolsProps) {
  const { revision, others, proofAddress, pathOfCompare, jobPath, mockupPath, dimensions } = props;
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
      {mockupPath !== null && (
        <TextLink className={linkClass} to={mockupPath}>
          To the mockup
        </TextLink>
      )}
      <TextLink className={linkClass} to={jobPath}>
        To the job
      </TextLink>
    </>
  );
}

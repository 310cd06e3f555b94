import { getCertificate, getProof, type Revision } from "#shared/contracts/revisions.ts";
import { paths } from "@/app/paths.ts";
import { Button } from "@/components/ui/button.tsx";
import { LetterMark } from "@/components/ui/letter-mark.tsx";
import { FileButton, LinkButton } from "@/components/ui/link-button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { addressOf } from "@/lib/api-client.ts";
import { formatBytes, formatInstant } from "@/lib/format.ts";
import { revisionTone, revisionWords } from "./revision-words.ts";

/** One revision with its state and what may be done with it. */
export function RevisionItem({
  shop,
  side,
  revision,
  before,
  onWithdraw,
}: {
  readonly shop: string;
  readonly side: "shop" | "client";
  readonly revision: Revision;
  /** The one before it that the reader may see, to compare with. */
  readonly before: Revision | null;
  readonly onWithdraw: () => void;
}) {
  const { letter, state, decision } = revision;
  const params = { shop, revisionId: revision.id };
  const drawn = state !== "draft" && state !== "preparing";
  return (
    <li className="border-b border-rule py-4">
      <div className="flex items-start gap-3">
        <LetterMark tone={revisionTone[state]}>{letter}</LetterMark>
        <div className="min-w-0 flex-1">
          <h3 className="text-base font-semibold">
            Revision {letter}: <span className="font-normal">{revisionWords(state, side)}</span>
          </h3>
          <p className="text-sm text-graphite">
            {revision.issuedAt
              ? `Issued ${formatInstant(revision.issuedAt)} by ${revision.issuedBy}`
              : `By ${revision.issuedBy}`}
          </p>
          {decision && (
            <p className="mt-1 text-sm">
              {decision.kind === "approved" ? "Approved" : "Revision asked"} by {decision.by}{" "}
              {formatInstant(decision.at)}
              {decision.summary && `: “${decision.summary}”`}
            </p>
          )}
          {revision.message && <p className="mt-1 text-sm whitespace-pre-line text-graphite">{revision.message}</p>}
          {revision.failure && (
            <Notice tone="error" title={`The PDF of ${letter} could not be made`} className="mt-2">
              {revision.failure} Nothing was mailed. Issue it again from the mockup.
            </Notice>
          )}
          {state === "approved" && revision.current && (
            <Notice tone="caution" className="mt-2">
              Do not cut: {revision.current.letter} is out.
            </Notice>
          )}
          {drawn && (
            <div className="mt-3 flex flex-wrap gap-2">
              <LinkButton size="small" to={paths.sheet(shop, revision.id)} aria-label={`Sheet of revision ${letter}`}>
                {side === "client" ? "Sheet (the drawing)" : "Sheet"}
              </LinkButton>
              {before && (
                <LinkButton size="small" to={paths.compare(shop, revision.jobId, before.id, revision.id)}>
                  Compare with {before.letter}
                </LinkButton>
              )}
              {revision.can.download && revision.pdfSha256 && (
                <FileButton
                  size="small"
                  href={addressOf(getProof, { params })}
                  aria-label={`PDF of revision ${letter}`}
                  download
                >
                  PDF{revision.pdfByteSize !== null && `, ${formatBytes(revision.pdfByteSize)}`}
                </FileButton>
              )}
              {decision?.hasCertificate && (
                <FileButton size="small" href={addressOf(getCertificate, { params })} download>
                  Certificate
                </FileButton>
              )}
              {revision.can.withdraw && (
                <Button size="small" kind="danger" onClick={onWithdraw} aria-label={`Withdraw revision ${letter}`}>
                  Withdraw
                </Button>
              )}
            </div>
          )}
        </div>
      </div>
    </li>
  );
}

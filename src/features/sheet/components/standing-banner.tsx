import type { ReactNode, Ref } from "react";
import type { Revision } from "#shared/contracts/revisions.ts";
import { Notice } from "@/components/ui/notice.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { formatExact } from "@/lib/format.ts";
import { isHeld } from "../model/standing.ts";

type StandingBannerProps = {
  readonly revision: Revision;
  readonly shopName: string;
  readonly pathOfSheet: (revisionId: string) => string;
  readonly certificateAddress: string;
  /** Where the focus goes once a decision is made. */
  readonly bannerRef: Ref<HTMLDivElement>;
};

/** What the reader has to know of a revision that is not waiting for a decision; nothing for one that is. */
export function StandingBanner({
  revision,
  shopName,
  pathOfSheet,
  certificateAddress,
  bannerRef,
}: StandingBannerProps) {
  const { state, letter, decision, current } = revision;
  const wayOn = current && current.revisionId !== revision.id && (
    <TextLink to={pathOfSheet(current.revisionId)}>Go to revision {current.letter}</TextLink>
  );
  const banner = ((): ReactNode => {
    switch (state) {
      case "superseded":
        return (
          <Notice tone="caution" title={`Revision ${letter} is superseded.`}>
            It stays here as it was, to look at. {wayOn}
          </Notice>
        );
      case "withdrawn":
        return (
          <Notice tone="caution" title={`Revision ${letter} is withdrawn.`}>
            {shopName} took it back; there is nothing for you to decide. {wayOn}
          </Notice>
        );
      case "revision asked":
        return (
          <Notice tone="info" title={`A revision of ${letter} is asked for.`}>
            {decision && (
              <p>
                By {decision.by}, {formatExact(decision.at)}.
              </p>
            )}
            {decision?.summary && <p className="whitespace-pre-wrap">“{decision.summary}”</p>}
            <p>
              {shopName} answers the notes and issues the next revision. {wayOn}
            </p>
          </Notice>
        );
      case "approved":
        return (
          <>
            {isHeld(revision) && current && (
              <Notice tone="caution" title={`Do not cut: ${current.letter} is out.`} className="mb-2">
                Revision {letter} stays the approved one, but wait until {current.letter} is approved or withdrawn.{" "}
                {wayOn}
              </Notice>
            )}
            <Notice tone="done" title={`Revision ${letter} is approved.`}>
              {decision && (
                <p>
                  Approved by {decision.typedName ?? decision.by}, on {formatExact(decision.at)}.{" "}
                  {decision.hasCertificate ? (
                    <a href={certificateAddress} className="text-indigo underline underline-offset-4" download>
                      Download the certificate
                    </a>
                  ) : (
                    "The certificate is being made."
                  )}
                </p>
              )}
            </Notice>
          </>
        );
      default:
        return null;
    }
  })();
  return (
    <div ref={bannerRef} tabIndex={-1} className="empty:hidden focus-visible:outline-none">
      {banner}
    </div>
  );
}

import { type FormEvent, useId, useRef, useState } from "react";
import type { Revision, SheetView } from "#shared/contracts/revisions.ts";
import { Button } from "@/components/ui/button.tsx";
import { Checkbox } from "@/components/ui/checkbox.tsx";
import { Dialog } from "@/components/ui/dialog.tsx";
import { Field } from "@/components/ui/field.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { useApprove } from "../api/mutations.ts";
import {
  type Approval,
  approvalGaps,
  emptyApproval,
  isAnotherName,
  isComplete,
  isStopped,
  shortHash,
} from "../model/approval.ts";
import { DecisionProblem } from "./decision-problem.tsx";
import { type OpenNote, OpenNoteQuestion } from "./open-note-question.tsx";

type ApproveDialogProps = {
  readonly shop: string;
  readonly revision: Revision;
  readonly sheet: Pick<SheetView, "job" | "reader" | "acknowledgements">;
  readonly openNotes: readonly OpenNote[];
  readonly proofAddress: string;
  readonly pathOfSheet: (revisionId: string) => string;
  readonly onClose: () => void;
  readonly onApproved: () => void;
  readonly onAskInstead: () => void;
};

/** The approval, read back line by line and signed with a typed name. */
export function ApproveDialog(props: ApproveDialogProps) {
  const { shop, revision, sheet, openNotes, proofAddress, pathOfSheet, onClose, onApproved, onAskInstead } = props;
  const [approval, setApproval] = useState<Approval>(emptyApproval);
  const [tried, setTried] = useState(false);
  /** The unexpected name about which the reader was asked. */
  const [askedName, setAskedName] = useState<string | null>(null);
  const approve = useApprove(shop, revision);
  const form = useRef<HTMLFormElement>(null);
  const isSent = useRef(false);
  const errorId = useId();
  const { pdfSha256 } = revision;
  const asked = { acknowledgements: sheet.acknowledgements, notes: openNotes };
  const gaps = approvalGaps(approval, asked);
  const shown = tried ? gaps : { acknowledgements: [], notes: [], typedName: false };
  const stopped = isStopped(approval, openNotes);
  const typedName = approval.typedName.trim();
  const isAskedName = askedName !== null && askedName === typedName;

  function change(part: Partial<Approval>) {
    setApproval((before) => ({ ...before, ...part }));
  }

  function handleSubmit(event: FormEvent) {
    event.preventDefault();
    // A second press or the Enter key can come before the button is drawn as busy.
    if (isSent.current) return;
    setTried(true);
    if (stopped || pdfSha256 === null) return;
    if (!isComplete(gaps)) {
      requestAnimationFrame(() => form.current?.querySelector<HTMLElement>("[aria-invalid]")?.focus());
      return;
    }
    if (isAnotherName(typedName, sheet.reader.name) && !isAskedName) {
      setAskedName(typedName);
      // The question stands under the name, which may lie above what a phone shows.
      form.current?.querySelector<HTMLElement>("[autocomplete=name]")?.focus();
      return;
    }
    isSent.current = true;
    approve.mutate(
      { ...approval, typedName, pdfSha256 },
      {
        onSuccess: onApproved,
        onError: () => {
          isSent.current = false;
        },
      },
    );
  }

  return (
    <Dialog
      open
      onOpenChange={(open) => !open && !approve.isPending && onClose()}
      title={`Approve revision ${revision.letter}`}
      description={`${sheet.job.title}, ${sheet.job.number}. Once it is approved the shop may cut it. Read each line back and tick it.`}
    >
      <form ref={form} onSubmit={handleSubmit} className="space-y-5" noValidate>
        <fieldset aria-describedby={shown.acknowledgements.length > 0 ? errorId : undefined}>
          <legend className="font-serif text-base font-bold">What you approve</legend>
          {sheet.acknowledgements.map(({ id, text }) => (
            <Checkbox
              key={id}
              label={<span className="whitespace-pre-line">{text}</span>}
              checked={approval.acknowledgedIds.includes(id)}
              aria-invalid={shown.acknowledgements.includes(id) ? true : undefined}
              onChange={(event) =>
                change({
                  acknowledgedIds: event.target.checked
                    ? [...approval.acknowledgedIds, id]
                    : approval.acknowledgedIds.filter((other) => other !== id),
                })
              }
            />
          ))}
          {shown.acknowledgements.length > 0 && (
            <p id={errorId} className="text-sm text-oxblood">
              {shown.acknowledgements.length === 1
                ? "One line is not ticked yet."
                : `${shown.acknowledgements.length} lines are not ticked yet.`}{" "}
              If one of them is wrong, ask for a revision instead.
            </p>
          )}
        </fieldset>

        {openNotes.length > 0 && (
          <section className="space-y-2">
            <h3 className="font-serif text-base font-bold">Notes that must change, still open</h3>
            {openNotes.map((note) => (
              <OpenNoteQuestion
                key={note.id}
                note={note}
                answer={approval.answers[note.id]}
                isMissing={shown.notes.includes(note.id)}
                onAnswer={(answer) => change({ answers: { ...approval.answers, [note.id]: answer } })}
              />
            ))}
          </section>
        )}

        <Field
          label="Your name, typed as your signature"
          hint={`You are ${sheet.reader.name} here.`}
          autoComplete="name"
          maxLength={120}
          value={approval.typedName}
          error={shown.typedName ? "Type your name." : undefined}
          onChange={(event) => change({ typedName: event.target.value })}
        />
        {isAskedName && !stopped && (
          <Notice tone="caution" title={`This page knows you as ${sheet.reader.name}.`}>
            You typed “{typedName}”. If you are {sheet.reader.name}, sign with that name. If you are someone else, leave
            it to {sheet.reader.name}, or ask {sheet.job.shopName} for a link of your own.
          </Notice>
        )}
        <Checkbox
          label={`${sheet.job.shopName} may show this sign in its portfolio`}
          hint="If you like. It changes nothing about the sign, and you can take it back."
          checked={approval.consentToPortfolio}
          onChange={(event) => change({ consentToPortfolio: event.target.checked })}
        />
        {pdfSha256 !== null && (
          <p className="text-sm text-graphite">
            You approve this very{" "}
            <a
              href={proofAddress}
              target="_blank"
              rel="noreferrer"
              className="text-indigo underline underline-offset-4"
            >
              PDF
            </a>
            . Its fingerprint is <span className="whitespace-nowrap text-ink tabular-nums">{shortHash(pdfSha256)}</span>
            : change one line of the drawing and the fingerprint is another, so nobody can exchange it afterwards.
          </p>
        )}
        {pdfSha256 === null && (
          <Notice tone="caution">The PDF of this revision is not stored yet. Load the page again in a moment.</Notice>
        )}
        {stopped && (
          <Notice tone="caution" title="Then this is not the one to approve.">
            Ask for a revision: your open notes go along.
          </Notice>
        )}
        {approve.isError && (
          <DecisionProblem error={approve.error} what="It was not approved." pathOfSheet={pathOfSheet} />
        )}
        <div className="flex flex-wrap gap-3">
          {stopped ? (
            <Button kind="primary" onClick={onAskInstead}>
              Ask for a revision
            </Button>
          ) : (
            <Button type="submit" kind="approve" busy={approve.isPending} disabled={pdfSha256 === null}>
              Approve revision {revision.letter}
              {isAskedName && ` as ${typedName}`}
            </Button>
          )}
          <Button onClick={onClose} disabled={approve.isPending}>
            Not yet
          </Button>
        </div>
      </form>
    </Dialog>
  );
}

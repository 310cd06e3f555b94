import { type FormEvent, useRef, useState } from "react";
import type { Revision } from "#shared/contracts/revisions.ts";
import { Button } from "@/components/ui/button.tsx";
import { Dialog } from "@/components/ui/dialog.tsx";
import { TextArea } from "@/components/ui/text-area.tsx";
import { useSessionText } from "@/lib/session-draft.ts";
import { useAskForRevision } from "../api/mutations.ts";
import { DecisionProblem } from "./decision-problem.tsx";
import type { OpenNote } from "./open-note-question.tsx";

type AskDialogProps = {
  readonly shop: string;
  readonly shopName: string;
  readonly revision: Revision;
  /** The reader's side's open notes that ask for something. */
  readonly openNotes: readonly OpenNote[];
  readonly pathOfSheet: (revisionId: string) => string;
  readonly onClose: () => void;
  readonly onAsked: () => void;
};

/** Asking for a revision: the open notes go along, and a summary where there is none. */
export function AskDialog({ shop, shopName, revision, openNotes, pathOfSheet, onClose, onAsked }: AskDialogProps) {
  const [summary, setSummary] = useSessionText(`standproud:ask:${revision.id}`);
  const [tried, setTried] = useState(false);
  const isSent = useRef(false);
  const ask = useAskForRevision(shop, revision);
  const isMissing = openNotes.length === 0 && summary.trim() === "";

  function handleSubmit(event: FormEvent) {
    event.preventDefault();
    // A second press can come before the button is drawn as busy.
    if (isSent.current) return;
    setTried(true);
    if (isMissing) return;
    isSent.current = true;
    ask.mutate(summary, {
      onSuccess: () => {
        setSummary("");
        onAsked();
      },
      onError: () => {
        isSent.current = false;
      },
    });
  }

  return (
    <Dialog
      open
      onOpenChange={(open) => !open && !ask.isPending && onClose()}
      title={`Ask for a revision of ${revision.letter}`}
      description={`${shopName} changes the drawing and sends you the next revision. Nothing is cut meanwhile.`}
    >
      <form onSubmit={handleSubmit} className="space-y-4" noValidate>
        {openNotes.length > 0 && (
          <section>
            <h3 className="font-serif text-base font-bold">
              {openNotes.length === 1 ? "This open note goes along" : "These open notes go along"}
            </h3>
            <ul className="mt-1 space-y-1">
              {openNotes.map((note) => (
                <li key={note.id} className="border-l-2 border-rule pl-3">
                  <span className="font-semibold">
                    Note {note.number}
                    {note.zone === null ? "" : `, zone ${note.zone}`}:
                  </span>{" "}
                  {note.text}
                </li>
              ))}
            </ul>
          </section>
        )}
        <TextArea
          label={openNotes.length > 0 ? "Anything to add" : "What should change"}
          hint={openNotes.length > 0 ? "You may leave this empty." : undefined}
          rows={4}
          maxLength={2000}
          value={summary}
          error={tried && isMissing ? "Say what should change, or leave a note at the spot first." : undefined}
          onChange={(event) => setSummary(event.target.value)}
        />
        {ask.isError && (
          <DecisionProblem error={ask.error} what="The revision was not asked for." pathOfSheet={pathOfSheet} />
        )}
        <div className="flex flex-wrap gap-3">
          <Button type="submit" kind="primary" busy={ask.isPending}>
            Ask for a revision
          </Button>
          <Button onClick={onClose} disabled={ask.isPending}>
            Not yet
          </Button>
        </div>
      </form>
    </Dialog>
  );
}

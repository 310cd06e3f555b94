import { useState } from "react";
import { openStops } from "#shared/dry-fit/set-aside.ts";
import { Button } from "@/components/ui/button.tsx";
import { Dialog } from "@/components/ui/dialog.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { TextArea } from "@/components/ui/text-area.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { useIssueRevision } from "../api/mutations.ts";
import type { DeskStanding } from "../editor/use-standings.ts";
import { IssueHindrances } from "./issue-hindrances.tsx";

type IssueDialogProps = {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly shop: string;
  readonly jobId: string;
  readonly letter: string;
  /** Who is to approve, and gets the mail. */
  readonly approvers: readonly string[];
  /** Where the mockup is not what the brief asks for, a sentence each. */
  readonly differences: readonly string[];
  /** What the dry fit found and what stands against it. */
  readonly standings: readonly DeskStanding[];
  /** Saves what is on the desk and gives its version; null when it could not be saved. */
  readonly save: () => Promise<number | null>;
  readonly onIssued: (revisionId: string) => void;
};

/** Freezes the saved mockup as the next revision, with a few words to the client. */
export function IssueDialog({ open, onOpenChange, letter, approvers, ...rest }: IssueDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title={`Issue revision ${letter}`}
      description={`The mockup is frozen as it stands and drawn as a proof. ${whoIsMailed(approvers)}`}
    >
      <IssueForm {...rest} letter={letter} onCancel={() => onOpenChange(false)} />
    </Dialog>
  );
}

/** Only those whom the brief names are mailed. */
function whoIsMailed(approvers: readonly string[]): string {
  const last = approvers.at(-1);
  if (last === undefined)
    return "The brief names nobody who approves, so nobody gets a mail. Name someone there first.";
  const others = approvers.slice(0, -1).join(", ");
  const names = others === "" ? last : `${others} and ${last}`;
  return `${names} ${others === "" ? "gets" : "get"} a mail with a link once the proof is ready.`;
}

type IssueFormProps = Omit<IssueDialogProps, "open" | "onOpenChange" | "approvers"> & { readonly onCancel: () => void };

function IssueForm({ shop, jobId, letter, differences, standings, save, onIssued, onCancel }: IssueFormProps) {
  const [message, setMessage] = useState("");
  const [problem, setProblem] = useState<string | null>(null);
  const [saving, setSaving] = useState(false);
  const issue = useIssueRevision(shop, jobId);

  async function send() {
    setProblem(null);
    setSaving(true);
    const mockupVersion = await save();
    setSaving(false);
    if (mockupVersion === null) {
      setProblem("The mockup could not be saved, so nothing was issued. See beside Undo what stands in the way.");
      return;
    }
    issue.mutate(
      { mockupVersion, message },
      { onSuccess: ({ id }) => onIssued(id), onError: (error) => setProblem(messageOf(error)) },
    );
  }

  return (
    <form
      className="space-y-4"
      onSubmit={(event) => {
        event.preventDefault();
        void send();
      }}
    >
      <IssueHindrances standings={standings} />
      {differences.length > 0 && (
        <Notice tone="caution" title="Not what the brief asks for">
          <ul className="space-y-0.5 text-sm">
            {differences.map((sentence) => (
              <li key={sentence}>{sentence}</li>
            ))}
          </ul>
        </Notice>
      )}
      <TextArea
        label="Message to the client"
        hint="Optional. It stands in the mail and on the sheet."
        maxLength={2000}
        rows={4}
        value={message}
        onChange={(event) => setMessage(event.target.value)}
      />
      {problem && (
        <Notice tone="error" title="Not issued.">
          {problem}
        </Notice>
      )}
      <div className="flex flex-wrap justify-end gap-3">
        <Button onClick={onCancel}>Cancel</Button>
        <Button
          kind="primary"
          type="submit"
          disabled={openStops(standings).length > 0}
          busy={saving || issue.isPending}
        >
          Issue {letter}
        </Button>
      </div>
    </form>
  );
}

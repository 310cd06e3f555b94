import { useState } from "react";
import { Button } from "@/components/ui/button.tsx";
import { Dialog } from "@/components/ui/dialog.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { TextArea } from "@/components/ui/text-area.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { useIssueRevision } from "../api/mutations.ts";

type IssueDialogProps = {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
  readonly shop: string;
  readonly jobId: string;
  readonly letter: string;
  readonly client: string;
  /** Saves what is on the desk and gives its version; null when it could not be saved. */
  readonly save: () => Promise<number | null>;
  readonly onIssued: (revisionId: string) => void;
};

/** Freezes the saved mockup as the next revision, with a few words to the client. */
export function IssueDialog({ open, onOpenChange, letter, client, ...rest }: IssueDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title={`Issue revision ${letter}`}
      description={`The mockup is frozen as it stands and drawn as a proof. ${client} gets a mail with a link once the proof is ready.`}
    >
      <IssueForm {...rest} letter={letter} onCancel={() => onOpenChange(false)} />
    </Dialog>
  );
}

type IssueFormProps = Omit<IssueDialogProps, "open" | "onOpenChange" | "client"> & { readonly onCancel: () => void };

function IssueForm({ shop, jobId, letter, save, onIssued, onCancel }: IssueFormProps) {
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
        <Button kind="primary" type="submit" busy={saving || issue.isPending}>
          Issue {letter}
        </Button>
      </div>
    </form>
  );
}

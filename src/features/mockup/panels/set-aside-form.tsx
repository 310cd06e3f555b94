import { type FormEvent, useEffect, useRef, useState } from "react";
import { longestReason } from "#shared/contracts/set-asides.ts";
import type { Finding } from "#shared/dry-fit/finding.ts";
import { Button } from "@/components/ui/button.tsx";
import { TextArea } from "@/components/ui/text-area.tsx";

type SetAsideFormProps = {
  readonly finding: Finding;
  /** Gives what stood in the way, or null when it is done. */
  readonly onSend: (reason: string) => Promise<string | null>;
  readonly onCancel: () => void;
};

/** Asks why a finding is set aside. The focus goes into it; Escape leaves it. */
export function SetAsideForm({ finding, onSend, onCancel }: SetAsideFormProps) {
  const [reason, setReason] = useState("");
  const [problem, setProblem] = useState<string | undefined>(undefined);
  const [busy, setBusy] = useState(false);
  const area = useRef<HTMLTextAreaElement>(null);
  useEffect(() => area.current?.focus(), []);

  async function handleSubmit(event: FormEvent) {
    event.preventDefault();
    if (reason.trim().length < 3) {
      setProblem("Say why, in a few words.");
      area.current?.focus();
      return;
    }
    setProblem(undefined);
    setBusy(true);
    const stood = await onSend(reason);
    setBusy(false);
    setProblem(stood ?? undefined);
  }

  return (
    <form
      aria-label={`Set aside: ${finding.title}`}
      className="mt-2 space-y-2"
      onSubmit={(event) => void handleSubmit(event)}
      onKeyDown={(event) => {
        if (event.key !== "Escape") return;
        event.stopPropagation();
        onCancel();
      }}
    >
      <TextArea
        ref={area}
        label="Why it is set aside"
        hint="For the shop only: it stands in the log and with the revision. When the value changes, this stands again."
        error={problem}
        required
        maxLength={longestReason}
        rows={2}
        value={reason}
        onChange={(event) => setReason(event.target.value)}
      />
      <div className="flex flex-wrap gap-2">
        <Button kind="primary" size="small" type="submit" busy={busy}>
          Set aside
        </Button>
        <Button size="small" onClick={onCancel}>
          Cancel
        </Button>
      </div>
    </form>
  );
}

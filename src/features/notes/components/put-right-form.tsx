import { type FormEvent, useState } from "react";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { TextArea } from "@/components/ui/text-area.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { useSessionDraft } from "@/lib/session-draft.ts";
import type { NoteKind } from "../model/note-words.ts";
import { KindField } from "./kind-field.tsx";

type PutRightFormProps = {
  /** Names what is typed, so that it survives a reload. */
  readonly id: string;
  readonly label: string;
  readonly text: string;
  /** null for a reply, which is of no kind. */
  readonly kind: NoteKind | null;
  readonly isPending: boolean;
  readonly error: unknown;
  readonly onSend: (changed: { text: string; kind: NoteKind | null }, onKept: () => void) => void;
  readonly onDone: () => void;
};

/** What its author wrote a moment ago, to be put right. */
export function PutRightForm({ id, label, text, kind, isPending, error, onSend, onDone }: PutRightFormProps) {
  const [typed, setTyped] = useSessionDraft(`standproud:put right:${id}`, (stored) =>
    typeof stored === "string" ? stored : null,
  );
  const [chosen, setChosen] = useState(kind);
  const [isEmpty, setEmpty] = useState(false);
  const written = typed ?? text;

  function handleSubmit(event: FormEvent) {
    event.preventDefault();
    setEmpty(written.trim() === "");
    if (written.trim() !== "" && !isPending) onSend({ text: written, kind: chosen }, leave);
  }

  function leave() {
    setTyped(null);
    onDone();
  }

  return (
    <form onSubmit={handleSubmit} className="mt-2 space-y-2" noValidate>
      <TextArea
        autoFocus
        label={label}
        value={written}
        rows={3}
        maxLength={4000}
        error={isEmpty ? "Write something first." : undefined}
        onChange={(event) => setTyped(event.target.value)}
      />
      {chosen !== null && <KindField kind={chosen} error={undefined} onKind={setChosen} />}
      {error !== null && (
        <Notice tone="error" title="It was not changed.">
          {messageOf(error)} What you wrote is still here.
        </Notice>
      )}
      <div className="flex flex-wrap gap-3">
        <Button type="submit" size="small" busy={isPending}>
          Keep the change
        </Button>
        <Button kind="bare" size="small" onClick={leave}>
          Leave it
        </Button>
      </div>
    </form>
  );
}

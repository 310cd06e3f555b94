import { type FormEvent, useEffect, useId, useRef, useState } from "react";
import type { Anchor } from "#shared/contracts/notes.ts";
import { Button } from "@/components/ui/button.tsx";
import { Checkbox } from "@/components/ui/checkbox.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { TextArea } from "@/components/ui/text-area.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { useAddNote } from "../api/mutations.ts";
import { type DraftGaps, draftGaps, type NoteDraft } from "../model/note-draft.ts";
import { AnchorField, type AnchorPiece } from "./anchor-field.tsx";
import { KindField } from "./kind-field.tsx";

type NoteComposerProps = {
  readonly shop: string;
  readonly revisionId: string;
  readonly draft: NoteDraft;
  readonly onDraft: (draft: NoteDraft) => void;
  readonly pieces: readonly AnchorPiece[];
  /** Staff may keep a note among themselves. */
  readonly maySayShopOnly: boolean;
  readonly onPlace: () => void;
  readonly isPlacing: boolean;
  readonly onAdded: (noteId: string, words: string) => void;
  readonly onLeave: () => void;
};

/** A note being written: where, what kind, in which words. */
export function NoteComposer(props: NoteComposerProps) {
  const { shop, revisionId, draft, onDraft, pieces, maySayShopOnly, onPlace, isPlacing, onAdded, onLeave } = props;
  const [tried, setTried] = useState(false);
  const add = useAddNote(shop, revisionId);
  const form = useRef<HTMLFormElement>(null);
  const isSent = useRef(false);
  const headingId = useId();
  const gaps: DraftGaps = tried ? draftGaps(draft) : {};
  const hasSpot = draft.anchor?.on === "spot";

  useEffect(() => {
    // The spot has just been touched: now the words.
    if (hasSpot) form.current?.querySelector("textarea")?.focus();
  }, [hasSpot]);

  function handleSubmit(event: FormEvent) {
    event.preventDefault();
    // A second press can come before the button is drawn as busy.
    if (isSent.current) return;
    setTried(true);
    const { kind, anchor } = draft;
    if (kind === null || anchor === null || Object.keys(draftGaps(draft)).length > 0) {
      // The marked controls exist only after this render.
      requestAnimationFrame(() => form.current?.querySelector<HTMLElement>("[aria-invalid]")?.focus());
      return;
    }
    isSent.current = true;
    add.mutate(
      { ...draft, kind, anchor },
      {
        onSuccess: (note) =>
          onAdded(note.id, `Note ${note.number} is on the drawing${note.zone === null ? "" : `, zone ${note.zone}`}.`),
        onError: () => {
          isSent.current = false;
        },
      },
    );
  }

  return (
    <form
      ref={form}
      onSubmit={handleSubmit}
      aria-labelledby={headingId}
      className="space-y-3 bg-linen px-4 py-3"
      noValidate
    >
      <h3 id={headingId} className="font-serif text-base font-bold">
        A new note
      </h3>
      <AnchorField
        anchor={draft.anchor}
        pieces={pieces}
        error={gaps.anchor}
        isPlacing={isPlacing}
        onPlace={onPlace}
        onAnchor={(anchor: Anchor | null) => onDraft({ ...draft, anchor })}
      />
      <KindField kind={draft.kind} error={gaps.kind} onKind={(kind) => onDraft({ ...draft, kind })} />
      <TextArea
        label="Your note"
        rows={2}
        value={draft.text}
        error={gaps.text}
        onChange={(event) => onDraft({ ...draft, text: event.target.value })}
      />
      {maySayShopOnly && (
        <Checkbox
          label="Shop only"
          hint="The client never sees it."
          checked={draft.shopOnly}
          onChange={(event) => onDraft({ ...draft, shopOnly: event.target.checked })}
        />
      )}
      {add.isError && (
        <Notice tone="error" title="The note was not added.">
          {messageOf(add.error)} What you wrote is still here.
        </Notice>
      )}
      <div className="flex flex-wrap gap-3">
        <Button type="submit" kind="primary" size="small" busy={add.isPending}>
          Add the note
        </Button>
        <Button size="small" onClick={onLeave}>
          Leave it
        </Button>
      </div>
    </form>
  );
}

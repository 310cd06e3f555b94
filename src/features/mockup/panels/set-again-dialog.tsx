import { useState } from "react";
import { Checkbox } from "@/components/ui/checkbox.tsx";
import { Dialog } from "@/components/ui/dialog.tsx";
import { counted } from "@/lib/format.ts";
import { useDesk } from "../editor/desk-context.ts";
import { newId } from "../editor/new-id.ts";
import { useLetteringDraft } from "../editor/use-lettering-draft.ts";
import { setLetteringAgain } from "../model/commands/set-lettering-again.ts";
import type { LetteringByHand } from "../model/lettering-by-hand.ts";
import { draftOfLettering } from "../model/lettering-draft.ts";
import { shortWords } from "../model/lettering-words.ts";
import { chooseLettering } from "../model/selection.ts";
import { LetteringForm } from "./lettering-form.tsx";

type SetAgainDialogProps = {
  readonly byHand: LetteringByHand;
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
};

/** Lettering that lies on the board, to be written or set otherwise where it lies. */
export function SetAgainDialog({ byHand, open, onOpenChange }: SetAgainDialogProps) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      title={`Set “${shortWords(byHand.lettering.words)}” again`}
      description={`It stays where it lies, turned as it is.${movedWords(byHand.moved)}`}
      size="wide"
    >
      <SetAgain byHand={byHand} onDone={() => onOpenChange(false)} />
    </Dialog>
  );
}

function movedWords(moved: number): string {
  if (moved === 0) return "";
  return ` ${counted(moved, "letter was", "letters were")} moved alone by hand, and ${moved === 1 ? "keeps its" : "keep their"} shift while the letter stays the same.`;
}

function SetAgain({ byHand, onDone }: { readonly byHand: LetteringByHand; readonly onDone: () => void }) {
  const { document, edit } = useDesk();
  const { lettering, out } = byHand;
  const writing = useLetteringDraft(() => draftOfLettering(lettering, document.board.width));
  const [putBack, setPutBack] = useState(false);
  const { ready } = writing;

  function send() {
    if (!ready) return;
    const id = newId();
    const next = { ...ready.setting, id: lettering.id };
    edit({
      label: `Set “${shortWords(next.words)}” again`,
      change: (before) => setLetteringAgain(before, { lettering: next, letters: ready.letters, id, putBack }),
      choose: (after) => chooseLettering(after, lettering.id),
    });
    onDone();
  }

  return (
    <LetteringForm writing={writing} action="Set again" canSend={ready !== null} onSend={send} onCancel={onDone}>
      {out > 0 && (
        <Checkbox
          label={`Put back ${counted(out, "letter that was", "letters that were")} taken out by hand`}
          checked={putBack}
          onChange={(event) => setPutBack(event.target.checked)}
        />
      )}
    </LetteringForm>
  );
}

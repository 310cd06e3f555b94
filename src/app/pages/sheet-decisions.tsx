import { lazy, Suspense, useState } from "react";
import type { Note } from "#shared/contracts/notes.ts";
import type { Revision, SheetView } from "#shared/contracts/revisions.ts";
import { asksAtApproval, waitsOnShop } from "#shared/lifecycle/note-states.ts";
import { DecisionButtons } from "@/features/decisions/components/decision-buttons.tsx";
import { StandingWords } from "@/features/sheet/components/standing-words.tsx";
import { standingOf } from "@/features/sheet/model/standing.ts";
import { paths } from "../paths.ts";

// Most readers only look: what a decision needs is fetched when one is begun.
const ApproveDialog = lazy(() =>
  import("@/features/decisions/components/approve-dialog.tsx").then((module) => ({ default: module.ApproveDialog })),
);
const AskDialog = lazy(() =>
  import("@/features/decisions/components/ask-dialog.tsx").then((module) => ({ default: module.AskDialog })),
);

type SheetDecisionsProps = {
  readonly shop: string;
  readonly revision: Revision;
  readonly sheet: SheetView;
  readonly notes: readonly Note[];
  readonly proofAddress: string;
  readonly isDesk: boolean;
  readonly onDecided: () => void;
};

/** The place of decision: in the hand with the number and standing beside it, and the dialog that is open. */
export function SheetDecisions({ shop, revision, sheet, notes, proofAddress, isDesk, onDecided }: SheetDecisionsProps) {
  const [open, setOpen] = useState<"approve" | "ask" | null>(null);
  const pathOfSheet = (revisionId: string) => paths.sheet(shop, revisionId);
  const close = () => setOpen(null);

  function handleDecided() {
    close();
    // The dialog gives the focus back to a button that is gone; the banner says what happened.
    requestAnimationFrame(onDecided);
  }

  return (
    <>
      {!isDesk && (
        <p className="flex items-baseline justify-between gap-3 pb-2 text-sm last:pb-0">
          <span className="font-serif font-bold">
            {sheet.job.number}, revision {revision.letter}
          </span>
          <StandingWords isAlone standing={standingOf(revision, sheet.reader, notes.filter(waitsOnShop).length)} />
        </p>
      )}
      <DecisionButtons
        revision={revision}
        reader={sheet.reader}
        isShort={!isDesk}
        onApprove={() => setOpen("approve")}
        onAsk={() => setOpen("ask")}
      />
      <Suspense fallback={null}>
        {open === "approve" && (
          <ApproveDialog
            shop={shop}
            revision={revision}
            sheet={sheet}
            openNotes={notes.filter(asksAtApproval)}
            proofAddress={proofAddress}
            pathOfSheet={pathOfSheet}
            onClose={close}
            onApproved={handleDecided}
            onAskInstead={() => setOpen("ask")}
          />
        )}
        {open === "ask" && (
          <AskDialog
            shop={shop}
            shopName={sheet.job.shopName}
            revision={revision}
            openNotes={notes.filter(waitsOnShop)}
            pathOfSheet={pathOfSheet}
            onClose={close}
            onAsked={handleDecided}
          />
        )}
      </Suspense>
    </>
  );
}

import type { Revision, SheetView } from "#shared/contracts/revisions.ts";
import { Button } from "@/components/ui/button.tsx";

type DecisionButtonsProps = {
  readonly revision: Revision;
  readonly reader: SheetView["reader"];
  /** In the bar at the foot of a phone, beside the letter. */
  readonly isShort: boolean;
  readonly onApprove: () => void;
  readonly onAsk: () => void;
};

/** The two decisions; for a reader who may not take them, who may. Nothing once it is decided. */
export function DecisionButtons({ revision, reader, isShort, onApprove, onAsk }: DecisionButtonsProps) {
  if (!revision.can.decide) {
    if (revision.state !== "issued") return null;
    return (
      <p className="text-sm text-graphite">
        {reader.side === "shop"
          ? "Only the client's approver decides. You may look and answer notes."
          : "Only the approvers named in the brief decide. Your notes count all the same."}
      </p>
    );
  }
  return (
    <div className="grid grid-cols-2 gap-2.5">
      <Button kind="approve" className="px-1!" onClick={onApprove}>
        {isShort ? "Approve" : `Approve revision ${revision.letter}`}
      </Button>
      <Button className="px-1!" onClick={onAsk}>
        Ask for a revision
      </Button>
    </div>
  );
}

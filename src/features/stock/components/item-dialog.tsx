import { useState } from "react";
import type { StockItem } from "#shared/contracts/stock.ts";
import type { StockKind } from "#shared/contracts/stock-entry.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { ConfirmDialog } from "@/components/ui/confirm-dialog.tsx";
import { Dialog } from "@/components/ui/dialog.tsx";
import { useAddStockItem, useChangeStockItem } from "../api/mutations.ts";
import { blankEntry } from "../model/blank-entry.ts";
import { entryOf } from "../model/written.ts";
import { ItemForm } from "./item-form.tsx";
import { kindWords } from "./kind-words.ts";

type ItemDialogProps = {
  readonly shop: string;
  readonly unit: LengthUnit;
  /** What is added, or the item that is changed. */
  readonly subject: { readonly kind: StockKind } | { readonly item: StockItem };
  readonly onClose: () => void;
  readonly onDone: (words: string) => void;
};

/** A form to add to the stock or to change what is there. It asks before it throws away what was written. */
export function ItemDialog({ shop, unit, subject, onClose, onDone }: ItemDialogProps) {
  const [isChanged, setChanged] = useState(false);
  const [leaving, setLeaving] = useState(false);
  const item = "item" in subject ? subject.item : null;
  const kind = "item" in subject ? subject.item.kind : subject.kind;
  const add = useAddStockItem(shop);
  const change = useChangeStockItem(shop, item?.id ?? "");
  const [start] = useState(() => (item ? entryOf(item) : blankEntry(kind)));
  return (
    <Dialog
      open
      size="wide"
      onOpenChange={() => (isChanged ? setLeaving(true) : onClose())}
      title={item ? `Change ${item.name}` : `Add ${kindWords[kind].one}`}
      {...(item
        ? { description: "Drawings keep what they were drawn with; a mockup shows the change when it is chosen anew." }
        : {})}
    >
      <ItemForm
        shop={shop}
        unit={unit}
        start={start}
        version={item?.version ?? 1}
        action={item ? "Save" : "Add to stock"}
        onChanged={setChanged}
        send={async (entry, version) => {
          const saved = await (item ? change.mutateAsync({ version, entry }) : add.mutateAsync(entry));
          onDone(item ? `${saved.name} is saved.` : `${saved.name} is in stock.`);
        }}
      />
      {leaving && (
        <ConfirmDialog
          open
          onOpenChange={setLeaving}
          title="Close without saving?"
          action="Close it"
          refuse="Go on writing"
          onConfirm={onClose}
        >
          <p>What you wrote about {item ? item.name : kindWords[kind].one} is lost then.</p>
        </ConfirmDialog>
      )}
    </Dialog>
  );
}

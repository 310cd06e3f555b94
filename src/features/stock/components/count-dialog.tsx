import { type FormEvent, useState } from "react";
import type { StockItem } from "#shared/contracts/stock.ts";
import { quantityOnHand } from "#shared/contracts/stock-entry.ts";
import { Button } from "@/components/ui/button.tsx";
import { Dialog } from "@/components/ui/dialog.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { NumberField } from "@/components/ui/number-field.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { useCountStockItem } from "../api/mutations.ts";
import { newerItem } from "../model/newer-item.ts";

type Counted = Extract<StockItem, { kind: "hardware" | "screw" }>;

/** How many of a standoff or a screw are on hand. */
export function CountDialog({
  shop,
  item,
  onClose,
  onDone,
}: {
  readonly shop: string;
  readonly item: Counted;
  readonly onClose: () => void;
  readonly onDone: (words: string) => void;
}) {
  const count = useCountStockItem(shop, item.id);
  const [quantity, setQuantity] = useState<number | null>(item.quantity);
  const [version, setVersion] = useState(item.version);
  const [tried, setTried] = useState(false);
  const outcome = quantityOnHand.safeParse(quantity);
  const newer = newerItem(count.error);

  function handleSubmit(event: FormEvent) {
    event.preventDefault();
    setTried(true);
    if (!outcome.success) return;
    count.mutate(
      { version, quantity },
      {
        onSuccess: () =>
          onDone(quantity === null ? `${item.name} is to be counted.` : `${item.name}: ${quantity} on hand.`),
        onError: (error) => setVersion(newerItem(error)?.version ?? version),
      },
    );
  }
  return (
    <Dialog open onOpenChange={onClose} title={`Count ${item.name}`}>
      <form noValidate onSubmit={handleSubmit} className="space-y-4">
        <NumberField
          label="On hand"
          hint="Leave it empty for not counted."
          className="max-w-60"
          value={quantity}
          onChange={setQuantity}
          error={tried && !outcome.success ? "Write a whole number, 0 or more." : undefined}
        />
        {newer ? (
          <Notice tone="caution" title="Not saved: somebody else changed it meanwhile.">
            {"quantity" in newer &&
              `They left ${newer.quantity === null ? "it uncounted" : `${newer.quantity} on hand`}. Press again to save yours over it.`}
          </Notice>
        ) : (
          count.isError && <Notice tone="error">{messageOf(count.error)}</Notice>
        )}
        <Button type="submit" kind="primary" busy={count.isPending}>
          Save the count
        </Button>
      </form>
    </Dialog>
  );
}

import { useEffect, useRef, useState } from "react";
import type { StockItem } from "#shared/contracts/stock.ts";
import type { StockKind } from "#shared/contracts/stock-entry.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { useSetStockState } from "../api/mutations.ts";
import { CountDialog } from "./count-dialog.tsx";
import { ItemDialog } from "./item-dialog.tsx";
import { RetiredStock } from "./retired-stock.tsx";
import { StockSection } from "./stock-section.tsx";
import { UsualList } from "./usual-list.tsx";

type Counted = Extract<StockItem, { kind: "hardware" | "screw" }>;
type Open =
  | { readonly what: "add"; readonly kind: StockKind }
  | { readonly what: "change"; readonly item: StockItem }
  | { readonly what: "count"; readonly item: Counted };
type Said = { readonly words: string; readonly undo?: StockItem };

/** The kinds of stock one below the other, with everything that can be done to them. */
export function StockDesk({
  shop,
  unit,
  kinds,
  q,
  mayChange,
}: {
  readonly shop: string;
  readonly unit: LengthUnit;
  readonly kinds: readonly StockKind[];
  readonly q: string;
  readonly mayChange: boolean;
}) {
  const [open, setOpen] = useState<Open | null>(null);
  const [said, setSaid] = useState<Said | null>(null);
  const state = useSetStockState(shop);
  const undo = useRef<HTMLButtonElement>(null);
  const close = () => setOpen(null);
  const done = (words: string) => {
    setSaid({ words });
    close();
  };
  // The row that was pressed is gone, and the hand goes on from what can undo it.
  useEffect(() => {
    if (said?.undo) undo.current?.focus();
  }, [said]);

  const setState = (item: StockItem, to: "in stock" | "retired") => {
    setSaid(null);
    state.mutate(
      { itemId: item.id, state: to },
      {
        onSuccess: () =>
          setSaid(
            to === "retired"
              ? { words: `${item.name} is no longer in stock. Drawings that name it stay as they are.`, undo: item }
              : { words: `${item.name} is back in stock.` },
          ),
      },
    );
  };
  const actions = mayChange
    ? {
        onAdd: (kind: StockKind) => setOpen({ what: "add", kind }),
        onChange: (item: StockItem) => setOpen({ what: "change", item }),
        onCount: (item: Counted) => setOpen({ what: "count", item }),
        onTakeOut: (item: StockItem) => setState(item, "retired"),
      }
    : null;
  return (
    <div className="space-y-10">
      {said && (
        <div className="sticky top-2 z-10">
          <Notice tone="done" className="border border-l-4">
            <div className="flex flex-wrap items-center justify-between gap-3">
              <p>{said.words}</p>
              {said.undo && (
                <Button ref={undo} size="small" onClick={() => said.undo && setState(said.undo, "in stock")}>
                  Bring it back
                </Button>
              )}
            </div>
          </Notice>
        </div>
      )}
      {state.isError && <Notice tone="error">{messageOf(state.error)}</Notice>}
      {kinds.map((kind) => (
        <StockSection key={kind} shop={shop} kind={kind} q={q} unit={unit} actions={actions} />
      ))}
      <RetiredStock shop={shop} unit={unit} onBringBack={mayChange ? (item) => setState(item, "in stock") : null} />
      {mayChange && <UsualList shop={shop} onDone={done} />}
      {(open?.what === "add" || open?.what === "change") && (
        <ItemDialog shop={shop} unit={unit} subject={open} onClose={close} onDone={done} />
      )}
      {open?.what === "count" && <CountDialog shop={shop} item={open.item} onClose={close} onDone={done} />}
    </div>
  );
}

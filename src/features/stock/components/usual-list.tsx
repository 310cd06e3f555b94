import { useState } from "react";
import { Button } from "@/components/ui/button.tsx";
import { ConfirmDialog } from "@/components/ui/confirm-dialog.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { counted } from "@/lib/format.ts";
import { useAddUsualStock } from "../api/mutations.ts";

/** Brings in what is missing of the list that shops start with. */
export function UsualList({ shop, onDone }: { readonly shop: string; readonly onDone: (words: string) => void }) {
  const [asking, setAsking] = useState(false);
  const add = useAddUsualStock(shop);
  return (
    <>
      <Button onClick={() => setAsking(true)}>Bring in the usual list</Button>
      {asking && (
        <ConfirmDialog
          open
          onOpenChange={setAsking}
          title="Bring in the usual list?"
          action="Bring it in"
          refuse="Leave the stock as it is"
          danger={false}
          busy={add.isPending}
          error={add.isError ? messageOf(add.error) : null}
          onConfirm={() =>
            add.mutate(undefined, {
              onSuccess: ({ added }) => {
                setAsking(false);
                onDone(
                  added === 0
                    ? "Nothing of the usual list was missing."
                    : `${counted(added, "item was", "items were")} added from the usual list.`,
                );
              },
            })
          }
        >
          <p>
            Sheets, woods, standoffs, screws and adhesives that a shop usually starts with are added where you have none
            of that name. What you changed, renamed or took out stays as it is.
          </p>
        </ConfirmDialog>
      )}
    </>
  );
}

import { Dialog } from "@/components/ui/dialog.tsx";
import { deskKeys } from "./keys-list.ts";

/** What the keys do, for those who would rather not reach for the mouse, and the way for those who listen. */
export function KeysDialog({
  open,
  onOpenChange,
}: {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
}) {
  return (
    <Dialog
      open={open}
      onOpenChange={onOpenChange}
      size="wide"
      title="Keys"
      description="On a Mac, the Command key stands for Ctrl."
    >
      <div className="gap-x-10 md:columns-2">
        {deskKeys.map(({ where, keys }) => (
          <section key={where} className="mb-5 break-inside-avoid">
            <h3 className="mb-1.5 text-sm font-semibold text-ink">{where}</h3>
            <dl className="grid grid-cols-[9rem_1fr] gap-x-4 gap-y-1.5 text-sm">
              {keys.map((key) => (
                <div key={key.keys} className="contents">
                  <dt className="font-semibold text-ink">{key.keys}</dt>
                  <dd className="text-ink">{key.does}</dd>
                </div>
              ))}
            </dl>
          </section>
        ))}
        <section className="break-inside-avoid">
          <h3 className="mb-1.5 text-sm font-semibold text-ink">Without the drawing</h3>
          <p className="text-sm text-ink">
            Choose a layer by its key in the schedule. Its pieces are listed under it: choose some there, set their
            places in the list or all together in the line over the schedule, or use the words of the bar. What was done
            is said in that line.
          </p>
        </section>
      </div>
    </Dialog>
  );
}

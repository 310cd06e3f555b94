import { Dialog } from "@/components/ui/dialog.tsx";

const keys: readonly [string, string][] = [
  ["Arrows", "move what is chosen by 1 mm, with Shift by 10 mm"],
  ["Arrows on a layer in the section", "raise it from barrel to barrel, with Shift by half a millimetre"],
  ["Delete", "removes the chosen pieces or hole"],
  ["Escape", "lets go of what is chosen, or of what is being dragged"],
  ["Ctrl Z, Ctrl Shift Z", "undo, redo"],
  ["+ and −", "look closer and farther"],
  ["0", "the whole board"],
  ["Space and drag", "looks around, as a drag on the bare wall does"],
  ["Shift and press", "adds another layer to what is chosen; in the list of pieces another piece"],
  ["Press twice", "picks one piece out of its layer"],
  ["Alt while dragging", "catches on nothing"],
];

/** What the keys do, for those who would rather not reach for the mouse. */
export function KeysDialog({
  open,
  onOpenChange,
}: {
  readonly open: boolean;
  readonly onOpenChange: (open: boolean) => void;
}) {
  return (
    <Dialog open={open} onOpenChange={onOpenChange} title="Keys">
      <dl className="grid grid-cols-[auto_1fr] gap-x-5 gap-y-2 text-sm">
        {keys.map(([key, does]) => (
          <div key={key} className="contents">
            <dt className="font-semibold text-ink">{key}</dt>
            <dd className="text-ink">{does}</dd>
          </div>
        ))}
      </dl>
    </Dialog>
  );
}

import { useDesk } from "../editor/desk-context.ts";
import { WordButton } from "../panels/cell-controls.tsx";

/** Says, over the elevation, that a press now puts a hole; nothing while a press chooses. */
export function HolesByHand() {
  const { holesByHand, putHolesByHand } = useDesk();
  if (holesByHand === null) return null;
  return (
    <p
      role="status"
      className="absolute top-2 right-2 flex items-center gap-3 border border-indigo bg-sheet px-3 py-1 text-sm text-ink"
    >
      Press where a standoff of {holesByHand} goes. Drag one to move it.
      <WordButton onClick={() => putHolesByHand(null)}>Done</WordButton>
    </p>
  );
}

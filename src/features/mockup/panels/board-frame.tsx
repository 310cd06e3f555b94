import { formatFine } from "#shared/units/format-length.ts";
import { LengthField } from "@/components/ui/length-field.tsx";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import type { BoardWriting } from "../editor/use-board-draft.ts";
import { type FrameDraft, flushDepthOfDraft } from "../model/backer-draft.ts";
import { WordButton } from "./cell-controls.tsx";
import { WoodSelect } from "./stock-fields.tsx";

/** Whether a frame goes round the board, and its wood, measures and corners. */
export function BoardFrame({ writing }: { readonly writing: BoardWriting }) {
  const { document, unit } = useDesk();
  const { draft, set, frameProblemOf } = writing;
  const { frame, isFramed } = draft;
  const change = (more: Partial<FrameDraft>) => set({ frame: { ...frame, ...more } });
  const flush = flushDepthOfDraft(draft);
  const isFlush = frame.depth === flush;

  function choose(framed: boolean) {
    // The first time round it covers the backer that was chosen; later what was written stays.
    set({ isFramed: framed, ...(framed && frame.depth === null ? { frame: { ...frame, depth: flush } } : {}) });
  }

  return (
    <>
      <div className="grid items-start gap-3 sm:grid-cols-2 md:grid-cols-4">
        <Select
          label="Frame is"
          value={isFramed ? "wood" : "none"}
          error={frameProblemOf("isFramed", isFramed)}
          onChange={(event) => choose(event.target.value === "wood")}
        >
          <option value="none">none</option>
          <option value="wood">of wood</option>
        </Select>
        {isFramed && (
          <>
            <WoodSelect
              label="Wood of the frame"
              value={frame.stock}
              drawn={document.frame?.stock ?? frame.stock}
              onChange={(wood) => change({ stock: wood })}
            />
            <LengthField
              label="Width of the frame"
              unit={unit}
              value={frame.width}
              onChange={(width) => change({ width })}
              error={frameProblemOf("width", frame.width)}
              hint="As seen from the front."
            />
            <LengthField
              label="Depth of the frame"
              unit={unit}
              value={frame.depth}
              onChange={(depth) => change({ depth })}
              error={frameProblemOf("depth", frame.depth)}
              hint="From the back of the board."
              fine
            />
            <Select
              label="Corners"
              value={frame.mitred ? "mitred" : "butted"}
              error={frameProblemOf("mitred", frame.mitred)}
              onChange={(event) => change({ mitred: event.target.value === "mitred" })}
            >
              <option value="mitred">mitred</option>
              <option value="butted">butted, uprights through</option>
            </Select>
          </>
        )}
      </div>
      {isFramed && flush !== null && (
        <p className="text-sm text-graphite">
          The face is {formatFine(flush, unit)} over the back of the board.{" "}
          <WordButton
            aria-disabled={isFlush}
            onClick={() => {
              if (!isFlush) change({ depth: flush });
            }}
          >
            {isFlush ? "The frame is flush with the face" : "Make it flush with the face"}
          </WordButton>
        </p>
      )}
    </>
  );
}

import { formatSize } from "#shared/units/format-length.ts";
import { Select } from "@/components/ui/select.tsx";
import { useDesk } from "../editor/desk-context.ts";
import type { BoardWriting } from "../editor/use-board-draft.ts";
import { frameOfDraft } from "../model/backer-draft.ts";
import { measuresOf } from "../model/board-draft.ts";

/** Whether a framed board's width and height are written with its frame or without, and what they come to both ways. */
export function BoardMeasures({ writing }: { readonly writing: BoardWriting }) {
  const { document, unit } = useDesk();
  const { draft, set } = writing;
  const { width, height } = measuresOf(draft, document);
  const round = 2 * (frameOfDraft(draft)?.width ?? 0);
  return (
    <div className="grid items-end gap-3 sm:grid-cols-3">
      <Select
        label="Measures mean"
        value={draft.measures}
        onChange={(event) => set({ measures: event.target.value === "overall" ? "overall" : "body" })}
      >
        <option value="body">the body, without its frame</option>
        <option value="overall">overall, with the frame</option>
      </Select>
      <p role="status" className="pb-2 text-base text-ink tabular-nums sm:col-span-2">
        Body {formatSize(width, height, unit)}, overall {formatSize(width + round, height + round, unit)}.
      </p>
    </div>
  );
}

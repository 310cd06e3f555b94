import { formatExactWithUnit } from "#shared/units/format-exact.ts";
import { useDesk } from "../editor/desk-context.ts";
import { useArrowStep } from "../editor/use-arrow-step.ts";
import { arrowSteps } from "../model/arrow-steps.ts";
import { withCarried } from "../model/carried.ts";
import { whyIdle } from "../model/chosen-words.ts";
import { CellSelect } from "./cell-controls.tsx";
import { CentreMenu } from "./centre-menu.tsx";
import { CopyTools } from "./copy-tools.tsx";
import type { DeskDialog } from "./desk-dialogs.tsx";
import { LineUpPopover } from "./line-up-popover.tsx";
import { ToolGroup } from "./tool-group.tsx";
import { ToolWord } from "./tool-word.tsx";

/** How what is chosen is set out on the board, copied and pasted. */
export function SetOutTools({ onOpen }: { readonly onOpen: (dialog: DeskDialog) => void }) {
  const { document, selection, figures, choose } = useDesk();
  const { pieceIds } = selection;
  const why = whyIdle(document, selection);
  const carried = figures === null ? pieceIds : withCarried(figures, pieceIds);
  const carriesNothing = carried.length === pieceIds.length ? "Nothing stands on what is chosen." : null;

  return (
    <ToolGroup title="Set out">
      <LineUpPopover why={why} />
      <ToolWord why={why} onClick={() => onOpen("step off")}>
        step off
      </ToolWord>
      <CentreMenu why={why} />
      <ToolWord
        why={pieceIds.length === 0 ? why : carriesNothing}
        title="Takes along what stands on it"
        onClick={() => choose({ ...selection, pieceIds: carried })}
      >
        take along
      </ToolWord>
      <CopyTools />
      <ArrowStep />
    </ToolGroup>
  );
}

function ArrowStep() {
  const { unit } = useDesk();
  const [step, chooseStep] = useArrowStep(unit);
  return (
    <span className="flex items-baseline gap-x-1 text-sm text-graphite">
      <span aria-hidden="true">arrows</span>
      <span className="w-18">
        <CellSelect
          aria-label="An arrow key moves by"
          value={step}
          onChange={(event) => chooseStep(Number(event.target.value))}
        >
          {arrowSteps(unit).map((mm) => (
            <option key={mm} value={mm}>
              {formatExactWithUnit(mm, unit)}
            </option>
          ))}
        </CellSelect>
      </span>
    </span>
  );
}

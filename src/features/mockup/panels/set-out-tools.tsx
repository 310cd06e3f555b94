import { useDesk } from "../editor/desk-context.ts";
import { withCarried } from "../model/carried.ts";
import { centrePieces, turnPieces } from "../model/commands/pieces.ts";
import { WordButton } from "./cell-controls.tsx";
import { ToolGroup } from "./tool-group.tsx";

/** How what is chosen is set out on the board. */
export function SetOutTools() {
  const { selection, figures, edit, choose } = useDesk();
  const { pieceIds } = selection;
  const idle = pieceIds.length === 0;
  const carried = figures === null ? pieceIds : withCarried(figures, pieceIds);
  const centre = (way: "across" | "down") =>
    edit({ label: `Centre ${way}`, change: (before) => centrePieces(before, { pieceIds, way }) });
  const turn = (by: number) => edit({ label: "Turn pieces", change: (before) => turnPieces(before, { pieceIds, by }) });

  return (
    <ToolGroup title="Set out">
      <WordButton disabled={idle} onClick={() => centre("across")}>
        centre across
      </WordButton>
      <WordButton disabled={idle} onClick={() => centre("down")}>
        centre down
      </WordButton>
      <WordButton disabled={idle} onClick={() => turn(-15)}>
        turn left 15°
      </WordButton>
      <WordButton disabled={idle} onClick={() => turn(15)}>
        turn right 15°
      </WordButton>
      <WordButton
        disabled={carried.length === pieceIds.length}
        onClick={() => choose({ ...selection, pieceIds: carried })}
      >
        take along what stands on it
      </WordButton>
    </ToolGroup>
  );
}

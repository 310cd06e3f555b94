import type { ReactNode } from "react";
import { TextLink } from "@/components/ui/text-link.tsx";
import { useDesk } from "../editor/desk-context.ts";
import { withCarried } from "../model/carried.ts";
import { centrePieces, turnPieces } from "../model/commands/pieces.ts";
import { WordButton } from "./cell-controls.tsx";
import type { DeskDialog } from "./desk-dialogs.tsx";

type DeskBarProps = {
  readonly client: string;
  readonly title: string;
  readonly jobPath: string;
  readonly cutPlanPath: string;
  readonly onOpen: (dialog: DeskDialog) => void;
};

/** What can be brought in, and how what is chosen is set out. */
export function DeskBar({ client, title, jobPath, cutPlanPath, onOpen }: DeskBarProps) {
  const { selection, figures, edit, choose } = useDesk();
  const { pieceIds } = selection;
  const idle = pieceIds.length === 0;
  const carried = figures === null ? pieceIds : withCarried(figures, pieceIds);
  const centre = (way: "across" | "down") =>
    edit({ label: `Centre ${way}`, change: (before) => centrePieces(before, { pieceIds, way }) });
  const turn = (by: number) => edit({ label: "Turn pieces", change: (before) => turnPieces(before, { pieceIds, by }) });

  return (
    <div className="flex flex-wrap items-center gap-x-5 gap-y-1 border-b border-rule px-4 py-1 sm:px-6">
      <h1
        className="flex max-w-72 min-w-0 gap-1.5 font-sans text-sm text-ink min-[1600px]:max-w-2xl"
        title={`${client}, ${title}`}
      >
        <span className="shrink-0 font-semibold">Mockup of</span>
        <TextLink to={jobPath} className="truncate">
          {client}, {title}
        </TextLink>
      </h1>
      <Group title="Bring in">
        <WordButton onClick={() => onOpen("artwork")}>artwork</WordButton>
        <WordButton onClick={() => onOpen("plate")}>a plate</WordButton>
      </Group>
      <Group title="Set out">
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
      </Group>
      <span className="ml-auto flex items-center gap-2">
        <TextLink to={cutPlanPath} className="text-sm">
          Cut plan
        </TextLink>
        <WordButton onClick={() => onOpen("board")}>Board</WordButton>
        <WordButton onClick={() => onOpen("keys")}>Keys</WordButton>
      </span>
    </div>
  );
}

function Group({ title, children }: { readonly title: string; readonly children: ReactNode }) {
  return (
    <fieldset className="flex flex-wrap items-center gap-x-2">
      <legend className="float-left mr-2 text-sm font-semibold text-ink">{title}</legend>
      {children}
    </fieldset>
  );
}

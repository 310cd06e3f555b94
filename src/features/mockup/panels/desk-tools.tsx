import { useState } from "react";
import type { Job } from "#shared/contracts/jobs.ts";
import type { Finding } from "#shared/dry-fit/finding.ts";
import { openStops } from "#shared/dry-fit/set-aside.ts";
import { nextRevisionLetter } from "#shared/lifecycle/revision-letter.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Button } from "@/components/ui/button.tsx";
import { counted } from "@/lib/format.ts";
import type { Saving } from "../editor/use-autosave.ts";
import type { KeepFailure } from "../editor/use-draft-keeper.ts";
import type { DeskStanding } from "../editor/use-standings.ts";
import { againstBrief } from "../model/against-brief.ts";
import type { History } from "../model/history.ts";
import { WordButton } from "./cell-controls.tsx";
import { IssueDialog } from "./issue-dialog.tsx";
import { SavedState } from "./saved-state.tsx";
import { StepsMenu } from "./steps-menu.tsx";

type DeskToolsProps = {
  readonly shop: string;
  readonly unit: LengthUnit;
  readonly job: Job;
  readonly mayIssue: boolean;
  readonly saving: Saving;
  readonly keepFailure: KeepFailure;
  readonly history: History;
  /** null until the dry fit has run and what is set aside is known. */
  readonly standings: readonly DeskStanding[] | null;
  /** Whether the dry fit is of the drawing as it is now. */
  readonly isCurrent: boolean;
  readonly onUndo: () => void;
  readonly onRedo: () => void;
  readonly onGoToStep: (position: number) => void;
  readonly onIssued: (revisionId: string) => void;
};

/** Saved or not, a step back and forward, and the one main action: to issue the mockup as the next revision. */
export function DeskTools(props: DeskToolsProps) {
  const { shop, unit, job, mayIssue, saving, keepFailure, history, standings, isCurrent } = props;
  const { onUndo, onRedo, onGoToStep, onIssued } = props;
  const [open, setOpen] = useState(false);
  const letter = nextRevisionLetter(job.latest?.letter ?? null);
  const stops = standings && openStops(standings);
  const why = whyNotToIssue({ stops, isCurrent, isEmpty: history.present.layers.length === 0 });
  const lastStep = history.past.at(-1)?.label;
  const nextStep = history.future[0]?.label;

  return (
    <>
      {/* As wide whatever is said, so that the header neither wraps nor moves its tools under the hand. Where the places of the
          shop leave no room, a row with nobody but the reader's name. */}
      <div className="flex w-full items-center justify-end gap-2 lg:w-[calc(100vw-16rem)] min-[85rem]:w-[31rem] 2xl:w-[40rem]">
        <div className="mr-1 min-w-0 flex-1 text-right text-fine leading-[1.1] text-graphite">
          <SavedState autosave={saving.autosave} keepFailure={keepFailure} />
          {mayIssue && why !== null && <p id="why-not-to-issue">{why}</p>}
        </div>
        <WordButton disabled={lastStep === undefined} title={lastStep} onClick={onUndo}>
          Undo
        </WordButton>
        <WordButton disabled={nextStep === undefined} title={nextStep} onClick={onRedo}>
          Redo
        </WordButton>
        <StepsMenu history={history} onGoTo={onGoToStep} />
        {mayIssue && (
          <Button
            kind="primary"
            size="small"
            className="shrink-0"
            disabled={why !== null}
            aria-describedby={why === null ? undefined : "why-not-to-issue"}
            onClick={() => setOpen(true)}
          >
            Issue revision {letter}
          </Button>
        )}
      </div>
      <IssueDialog
        open={open}
        onOpenChange={setOpen}
        shop={shop}
        jobId={job.id}
        letter={letter}
        approvers={job.approvers.map(({ name }) => name)}
        differences={againstBrief(job.brief, history.present, unit)}
        standings={standings ?? []}
        save={saving.saveNow}
        onIssued={onIssued}
      />
    </>
  );
}

/** Why a revision can't be issued now, in words; null when it can. */
function whyNotToIssue({
  stops,
  isCurrent,
  isEmpty,
}: {
  stops: readonly Finding[] | null;
  isCurrent: boolean;
  isEmpty: boolean;
}) {
  if (isEmpty) return "Nothing is on the board yet.";
  if (stops === null) return "The dry fit is running.";
  if (stops.length > 0) return `The dry fit has ${counted(stops.length, "stop")}.`;
  return isCurrent ? null : "The dry fit is running.";
}

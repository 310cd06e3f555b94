import { type ReactNode, useMemo, useRef, useState } from "react";
import type { Job } from "#shared/contracts/jobs.ts";
import type { Mockup } from "#shared/contracts/mockups.ts";
import type { StockItem } from "#shared/contracts/stock.ts";
import { applyMend } from "#shared/dry-fit/apply-mend.ts";
import type { Finding } from "#shared/dry-fit/finding.ts";
import type { Limits } from "#shared/dry-fit/limits.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { BandWording } from "#shared/units/format-band.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import type { DrawingView } from "@/lib/drawing-view.ts";
import { useRoom } from "@/lib/use-room.ts";
import { CanvasPanel } from "../canvas/canvas-panel.tsx";
import { viewAt } from "../canvas/view-of-board.ts";
import { type Desk, DeskContext } from "../editor/desk-context.ts";
import { useDeskAids } from "../editor/use-desk-aids.ts";
import { useKeptWhile } from "../editor/use-kept-while.ts";
import { usePartKeys } from "../editor/use-part-keys.ts";
import { useSafeEditor } from "../editor/use-safe-editor.ts";
import { useSettingAside } from "../editor/use-setting-aside.ts";
import { useStandings } from "../editor/use-standings.ts";
import { useUndoKeys } from "../editor/use-undo-keys.ts";
import { useVoice } from "../editor/use-voice.ts";
import { useDeskPicture } from "../engine/use-desk-picture.ts";
import type { Drag } from "../model/drag.ts";
import { dryFitContextOf } from "../model/dry-fit-context.ts";
import { placeWords } from "../model/place-words.ts";
import { chooseLayer } from "../model/selection.ts";
import { stockChoices } from "../model/stock-choices.ts";
import { CostPanel, type CostPanelProps } from "./cost-panel.tsx";
import { DeskBar } from "./desk-bar.tsx";
import { type DeskDialog, DeskDialogs } from "./desk-dialogs.tsx";
import { DeskTools } from "./desk-tools.tsx";
import { DropGround } from "./drop-ground.tsx";
import { FindingsPanel } from "./findings-panel.tsx";
import { KeptDraftNotice } from "./kept-draft-notice.tsx";
import { LayerDetails } from "./layer-details.tsx";
import { LeaveDialog } from "./leave-dialog.tsx";
import { PiecesPanel } from "./pieces-panel.tsx";
import { PlaceStrip } from "./place-strip.tsx";
import { ReadBackPanel } from "./read-back-panel.tsx";
import { Resting } from "./resting.tsx";
import { SchedulePanel } from "./schedule-panel.tsx";
import { SectionPanel } from "./section-panel.tsx";
import { StaleDialog } from "./stale-dialog.tsx";

export type MockupDeskProps = {
  readonly shop: string;
  readonly unit: LengthUnit;
  readonly personId: string;
  readonly job: Job;
  readonly mockup: Mockup;
  readonly stock: readonly StockItem[];
  /** What the shop's dry fit keeps to. */
  readonly limits: Limits;
  /** The job's page, where artwork is added. */
  readonly jobPath: string;
  readonly cutPlanPath: string;
  /** The page of the prices; null for those who may not see what a sign costs. */
  readonly pricesPath: CostPanelProps["pricesPath"] | null;
  readonly onSaved: (mockup: Mockup) => void;
  readonly onIssued: (revisionId: string) => void;
  /** Puts the tools into the header of the page. */
  readonly renderTools: (tools: ReactNode) => ReactNode;
};

/** The mockup at work: elevation and section above, schedule and dry fit below. */
export function MockupDesk(props: MockupDeskProps) {
  const { shop, unit, personId, job, mockup, limits, jobPath, cutPlanPath, onSaved, onIssued, renderTools } = props;
  const place = useMemo(() => ({ personId, shop, jobId: job.id }), [personId, shop, job.id]);
  const safe = useSafeEditor({ mockup, place, onSaved });
  const { editor, dispatch, saving } = safe;
  const [drag, setDrag] = useState<Drag | null>(null);
  const [view, setView] = useState<DrawingView | null>(null);
  const [finding, setFinding] = useState<Finding | null>(null);
  const [dialog, setDialog] = useState<DeskDialog | null>(null);
  const [files, setFiles] = useState<readonly File[]>([]);
  const [holesOf, putHolesByHand] = useState<string | null>(null);
  const [heights, letterHeights] = useState<BandWording>("nominal");
  const frame = useRef<HTMLDivElement>(null);
  const room = useRoom(frame);
  const document = editor.history.present;
  const stock = useMemo(() => stockChoices(props.stock), [props.stock]);

  const whereItHangs = job.brief.place ?? "inside";
  const context = useMemo(
    () => dryFitContextOf({ unit, brief: job.brief, stock: props.stock }),
    [unit, job.brief, props.stock],
  );
  const { fit, drawn, figures, failure, isCurrent } = useDeskPicture({ document, drag, context, limits, room });
  const standings = useStandings({ shop, jobId: job.id }, drawn?.dryFit.findings ?? null);
  const settingAside = useSettingAside({ shop, jobId: job.id, save: saving.saveNow });
  useUndoKeys(dispatch);
  usePartKeys();
  const { aids, changeAids } = useDeskAids(personId, unit);
  const { said, say } = useVoice(editor.history, () => placeWords(document, editor.selection, unit));

  // What is raised or let in changes heights, which the schedule follows; what is moved on the board does not.
  const isStill = drag?.kind === "pieces" || drag?.kind === "hole";
  const restingFigures = useKeptWhile(figures, isStill);
  const holesByHand = takesHoles(document, editor.selection.layerKey, holesOf) ? holesOf : null;
  const desk = useMemo(
    (): Desk => ({
      document,
      selection: editor.selection,
      unit,
      stock,
      site: { place: whereItHangs, limits },
      briefWords: job.brief.words,
      heights,
      letterHeights,
      figures: restingFigures?.figures ?? null,
      figuresOf: restingFigures?.of ?? document,
      holesByHand,
      putHolesByHand: (key) => {
        putHolesByHand(key);
        if (key !== null) frame.current?.scrollIntoView({ block: "nearest" });
      },
      client: job.client.name,
      copyPlace: { personId, shop, clientId: job.client.id },
      aids,
      changeAids,
      edit: (edit) => dispatch({ kind: "edit", ...edit }),
      choose: (selection) => {
        setFinding(null);
        if (selection.layerKey !== holesByHand) putHolesByHand(null);
        dispatch({ kind: "choose", selection });
      },
      say,
    }),
    [
      document,
      editor.selection,
      unit,
      stock,
      whereItHangs,
      limits,
      job.brief.words,
      heights,
      restingFigures,
      holesByHand,
      job.client,
      personId,
      shop,
      aids,
      changeAids,
      say,
      dispatch,
    ],
  );

  const following = useMemo(
    (): Desk => ({ ...desk, figures: figures?.figures ?? null, figuresOf: figures?.of ?? document }),
    [desk, figures, document],
  );

  function closeDialog() {
    setDialog(null);
    setFiles([]);
  }

  function show(next: Finding) {
    if (next.layerKey !== null) dispatch({ kind: "choose", selection: chooseLayer(document, next.layerKey) });
    setFinding(next);
    if (next.where !== null && room !== null) setView(viewAt(next.where, fit, room));
    frame.current?.scrollIntoView({ block: "nearest" });
  }

  return (
    <DeskContext value={desk}>
      {renderTools(
        <DeskTools
          shop={shop}
          unit={unit}
          job={job}
          mayIssue={mockup.can.issue}
          saving={saving}
          keepFailure={safe.keepFailure}
          history={editor.history}
          standings={standings.standings}
          isCurrent={isCurrent}
          onUndo={() => dispatch({ kind: "undo" })}
          onRedo={() => dispatch({ kind: "redo" })}
          onGoToStep={(position) => dispatch({ kind: "go to step", position })}
          onIssued={onIssued}
        />,
      )}
      <Resting isStill={isStill}>
        <DeskBar
          client={job.client.name}
          title={job.title}
          jobPath={jobPath}
          cutPlanPath={cutPlanPath}
          onOpen={setDialog}
        />
      </Resting>
      {safe.keptDrafts.map((draft) => (
        <KeptDraftNotice
          key={draft.deskId}
          draft={draft}
          mockup={mockup}
          unit={unit}
          onTakeUp={() => safe.takeUp(draft)}
          onThrowAway={() => safe.throwAway(draft)}
        />
      ))}
      <DropGround
        className="grid h-[max(26rem,calc(100dvh-25rem))] grid-cols-[minmax(0,1fr)_minmax(15rem,18.5rem)] border-b border-rule"
        onFiles={(dropped) => {
          setFiles(dropped);
          setDialog("artwork");
        }}
      >
        <CanvasPanel
          drawn={drawn}
          failure={failure}
          drag={drag}
          onDrag={setDrag}
          view={view ?? fit}
          fit={fit}
          room={room}
          onView={(next) => setView(next !== null && next.scale <= fit.scale * 1.001 ? null : next)}
          spot={finding?.where ?? null}
          frame={frame}
        />
        <DeskContext value={following}>
          <SectionPanel view={view ?? fit} drag={drag} onDrag={setDrag} />
        </DeskContext>
      </DropGround>
      <Resting isStill={isStill}>
        <PlaceStrip said={said} />
        <div className="grid min-[1200px]:grid-cols-[minmax(0,1fr)_clamp(17rem,25.5vw,24rem)]">
          <div className="min-w-0">
            <SchedulePanel
              onBoard={() => setDialog("board")}
              onFinish={() => setDialog("finish")}
              onBringIn={() => setDialog("artwork")}
            />
            {props.pricesPath && (
              <CostPanel
                shop={shop}
                unit={unit}
                measures={drawn?.measures ?? null}
                signs={document.quantity}
                stock={props.stock}
                pricesPath={props.pricesPath}
              />
            )}
            <ReadBackPanel />
            <LayerDetails />
            <PiecesPanel />
          </div>
          <FindingsPanel
            dryFit={drawn?.dryFit ?? null}
            mends={drawn?.mends ?? []}
            standings={standings}
            isCurrent={isCurrent}
            shown={finding}
            onShow={show}
            onMend={(mend) =>
              dispatch({ kind: "edit", label: mend.label, change: (before) => applyMend(before, mend) })
            }
            settingAside={settingAside}
            className="border-rule max-[1200px]:border-t min-[1200px]:border-l"
          />
        </div>
      </Resting>
      <DeskDialogs open={dialog} onClose={closeDialog} shop={shop} jobId={job.id} files={files} />
      <StaleDialog
        newer={saving.autosave.state === "stale" ? saving.autosave.newer : null}
        mine={document}
        unit={unit}
        onTheirs={safe.keepTheirs}
        onMine={safe.keepMine}
      />
      <LeaveDialog saving={saving} keepFailure={safe.keepFailure} />
    </DeskContext>
  );
}

/** Whether holes can be put by hand into the layer that they were asked for: it is still the chosen one, and stands off. */
function takesHoles({ layers }: MockupDocument, chosenKey: string | null, key: string | null): boolean {
  const layer = layers.find((one) => one.key === key);
  return layer !== undefined && key === chosenKey && layer.hold.kind === "standoff" && !layer.locked && !layer.hidden;
}

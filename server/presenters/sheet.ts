import type { Revision as RevisionView, SheetView } from "#shared/contracts/revisions.ts";
import { zonesOnBoard } from "#shared/drawing/board-zones.ts";
import { makingWords } from "#shared/drawing/making-words.ts";
import { scheduleRows } from "#shared/drawing/schedule.ts";
import { visibleToClient } from "#shared/lifecycle/revision-states.ts";
import { acknowledgementsOf } from "#shared/mockup/acknowledgements.ts";
import type { Snapshot } from "#shared/mockup/snapshot.ts";
import { signBox } from "#shared/stack/sign-box.ts";
import { type Actor, isStaff } from "../policies/actor.ts";
import { isApprover } from "../policies/revision.ts";
import { revisionFacts } from "../queries/find-revision.ts";
import type { LoadedJob } from "../queries/load-jobs.ts";

/** A revision as a drawing sheet. Everything drawn or computed comes from the frozen snapshot, nothing is worked out anew. */
export function presentSheet(
  actor: Actor,
  {
    loaded,
    revision,
    snapshot,
    readerName,
  }: { loaded: LoadedJob; revision: RevisionView; snapshot: Snapshot; readerName: string },
): SheetView {
  const { job, client, revisions } = loaded;
  const { document, figures, titleBlock, drawing } = snapshot;
  const whole = signBox(document);
  const first = drawing.sheets[0];
  const names = new Map(
    document.layers.flatMap(({ name: layerName, pieces }) =>
      pieces.map(({ id, name }, index) => [id, name || numbered(layerName, { index, of: pieces.length })] as const),
    ),
  );
  return {
    revision,
    job: {
      id: job.id,
      number: job.number,
      title: titleBlock.title,
      client: client.name,
      shopName: titleBlock.owner,
      unit: titleBlock.unit,
    },
    reader: {
      name: readerName,
      side: isStaff(actor) ? "shop" : "client",
      approver: isApprover(actor, revisionFacts(loaded, { state: revision.state })),
    },
    elevation: drawing.elevation,
    section: drawing.section,
    schedule: scheduleRows(document, figures, titleBlock.unit),
    board: { widthMm: whole.width, heightMm: whole.height },
    zones: first ? zonesOnBoard(first) : { columns: [], rows: [] },
    pieces: figures.pieces.map(({ pieceId, layerKey, centroid }) => ({
      id: pieceId,
      name: names.get(pieceId) ?? "",
      layerKey,
      x: centroid.x,
      y: centroid.y,
    })),
    figures: { massG: figures.massG, depthMm: figures.depth.nominal, offWallMm: figures.offWall.nominal },
    making: isStaff(actor) ? makingWords(document, titleBlock.unit) : null,
    words: snapshot.words,
    acknowledgements: acknowledgementsOf({ document, figures, words: snapshot.words, unit: titleBlock.unit }),
    others: revisions
      .filter(({ id, state }) => id !== revision.id && (isStaff(actor) || visibleToClient(state)))
      .map(({ id, letter, state }) => ({ revisionId: id, letter, state })),
  };
}

/** A piece without a name of its own is called after its layer, which the reader finds in the schedule. */
const numbered = (layerName: string, { index, of }: { index: number; of: number }): string =>
  of === 1 ? layerName : `${layerName} ${index + 1}`;

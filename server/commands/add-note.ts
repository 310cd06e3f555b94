import type { Anchor } from "#shared/contracts/notes.ts";
import { zoneOfBoardPoint } from "#shared/drawing/board-zones.ts";
import type { Snapshot } from "#shared/mockup/snapshot.ts";
import { newId } from "../db/new-id.ts";
import { invalid, notAllowed, wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Note } from "../models/note.ts";
import { isInsider, isStaff, nameAt } from "../policies/actor.ts";
import { notePolicy } from "../policies/note.ts";
import { findRevision } from "../queries/find-revision.ts";
import { snapshotOf } from "../queries/snapshot-of.ts";
import { gatherNews } from "./gather-news.ts";
import { logEvent } from "./log-event.ts";
import { refreshJob } from "./refresh-job.ts";
import { signalJob } from "./signal-job.ts";

/** Leaves a note on a revision that takes notes, numbered within its job. */
export async function addNote(
  context: Context,
  {
    revisionId,
    text,
    kind,
    anchor,
    shopOnly,
  }: { revisionId: string; text: string; kind: Note["kind"]; anchor: Anchor; shopOnly: boolean },
): Promise<Note> {
  const { actor, transaction, now } = context;
  const { revision, loaded, facts } = await findRevision(context, revisionId, { lock: true, withSnapshot: true });
  const { job } = loaded;
  if (!isInsider(actor)) throw notAllowed("Sign in to leave a note.");
  if (!notePolicy.add(actor, facts))
    throw wrongState(`Revision ${revision.letter} is ${revision.state} and takes no more notes.`);
  if (shopOnly && !notePolicy.addShopOnly(actor, facts))
    throw notAllowed("Notes for the shop alone are left by the shop.");
  const snapshot = snapshotOf(revision);
  refuseUnknownSpot(anchor, snapshot);
  const sheet = snapshot.drawing.sheets[0];
  const note = await Note.create(
    {
      id: newId(),
      shopId: job.shopId,
      jobId: job.id,
      revisionId,
      number: job.nextNoteNumber,
      kind,
      text,
      anchor,
      zone: anchor.on === "spot" && sheet ? zoneOfBoardPoint(sheet, anchor) : null,
      side: isStaff(actor) ? "shop" : "client",
      shopOnly,
      authorId: actor.personId,
      authorName: nameAt(actor, job.clientId),
      createdAt: now,
    },
    { transaction },
  );
  await job.update({ nextNoteNumber: job.nextNoteNumber + 1 }, { transaction });
  await logEvent(context, {
    shopId: job.shopId,
    jobId: job.id,
    kind: "note added",
    data: { number: note.number, letter: revision.letter },
  });
  if (!shopOnly) await gatherNews(context, loaded, { noteId: note.id, revisionId, what: "left" });
  await signalJob(context, job, { kind: "note", id: note.id, shopOnly });
  await refreshJob(context, job);
  return note;
}

/** A note pinned to a piece or layer that the drawing does not have would point nowhere. */
function refuseUnknownSpot(anchor: Anchor, snapshot: Snapshot): void {
  if (anchor.on === "whole") return;
  const { layers, board } = snapshot.document;
  const { layerKey, pieceId } = anchor;
  const layerKnown = layerKey === null || layerKey === "A" || layers.some(({ key }) => key === layerKey);
  const pieceKnown =
    pieceId === null ||
    layers.some(({ key, pieces }) => (layerKey ?? key) === key && pieces.some(({ id }) => id === pieceId));
  if (!layerKnown || !pieceKnown) throw invalid([{ pointer: "/anchor", detail: "That piece is not on this drawing." }]);
  const margin = Math.max(board.width, board.height);
  const near =
    anchor.x >= -margin && anchor.x <= board.width + margin && anchor.y >= -margin && anchor.y <= board.height + margin;
  if (!near) throw invalid([{ pointer: "/anchor", detail: "That spot is far off the drawing." }]);
}

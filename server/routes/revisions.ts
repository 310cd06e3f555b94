import { Readable } from "node:stream";
import { z } from "zod";
import * as contract from "#shared/contracts/revisions.ts";
import { paintSvg } from "#shared/drawing/svg.ts";
import { listChanges } from "#shared/mockup/changes.ts";
import { approveRevision } from "../commands/approve-revision.ts";
import { askForRevision } from "../commands/ask-for-revision.ts";
import { issueRevision } from "../commands/issue-revision.ts";
import { noteOpening } from "../commands/note-opening.ts";
import { seeNews } from "../commands/see-news.ts";
import { withdrawRevision } from "../commands/withdraw-revision.ts";
import { notFound } from "../http/app-error.ts";
import type { ReadContext } from "../http/context.ts";
import { FileAnswer } from "../http/file-answer.ts";
import { type Routes, read, write } from "../http/route.ts";
import { isInsider, nameAt } from "../policies/actor.ts";
import { revisionPolicy } from "../policies/revision.ts";
import { presentSheet } from "../presenters/sheet.ts";
import { answerFile } from "../queries/answer-file.ts";
import { findCertificateFile, findProofFile } from "../queries/find-files.ts";
import { findJob } from "../queries/find-job.ts";
import { findRevision, revisionFacts } from "../queries/find-revision.ts";
import { cursorOf, places, readCursor } from "../queries/page.ts";
import { revisionView, revisionViews } from "../queries/revision-view.ts";
import { snapshotOf } from "../queries/snapshot-of.ts";

export function registerRevisionRoutes(routes: Routes): void {
  read(routes, contract.listRevisions, async (context, { params, query }) => {
    const loaded = await findJob(context, params.jobId);
    const after = readCursor(query.cursor, z.tuple([places.count]));
    const seen = loaded.revisions
      .filter(
        (revision) =>
          revisionPolicy.see(context.actor, revisionFacts(loaded, revision)) &&
          (!after || revision.sequence < after[0]),
      )
      .reverse();
    const shown = seen.slice(0, query.limit);
    return {
      items: await revisionViews(context, loaded, shown),
      next: nextAfter(seen.length > query.limit, shown.at(-1)?.sequence),
    };
  });

  write(routes, contract.issueRevision, async (context, { params, body }) => {
    const { loaded, revision } = await issueRevision(context, { jobId: params.jobId, ...body });
    return revisionView(context, loaded, revision);
  });

  read(routes, contract.getRevision, async (context, { params }) => viewOf(context, params.revisionId));

  // A reading that leaves a trace: the first look of a client is written down.
  write(routes, contract.getSheet, async (context, { params }) => {
    const found = await findRevision(context, params.revisionId, { withSnapshot: true });
    await noteOpening(context, found);
    await seeNews(context, found);
    const { loaded, revision } = found;
    return presentSheet(context.actor, {
      loaded,
      revision: await revisionView(context, loaded, revision),
      snapshot: snapshotOf(revision),
      readerName: isInsider(context.actor) ? nameAt(context.actor, loaded.job.clientId) : "",
    });
  });

  read(routes, contract.getProof, async (context, { params }) => {
    const { revision, loaded } = await findRevision(context, params.revisionId);
    const file = await findProofFile(context, revision);
    if (!file) throw notFound("PDF");
    return answerFile(context, file, {
      fileName: `${loaded.job.number}-${revision.letter}.pdf`,
      disposition: "inline",
    });
  });

  read(routes, contract.getCertificate, async (context, { params }) => {
    const { revision, loaded } = await findRevision(context, params.revisionId);
    const file = await findCertificateFile(context, revision);
    if (!file) throw notFound("certificate");
    return answerFile(context, file, {
      fileName: `${loaded.job.number}-${revision.letter}-certificate.pdf`,
      disposition: "inline",
    });
  });

  read(routes, contract.getPicture, async (context, { params }) => {
    const { revision } = await findRevision(context, params.revisionId, { withSnapshot: true });
    const { titleBlock, drawing } = snapshotOf(revision);
    const svg = Buffer.from(paintSvg(drawing.picture, { idPrefix: "", title: titleBlock.title }));
    return new FileAnswer({
      stream: Readable.from([svg]),
      byteSize: svg.byteLength,
      mediaType: "image/svg+xml",
      fileName: `${titleBlock.number}-${revision.letter}.svg`,
      disposition: "inline",
      keepForSeconds: 3600,
    });
  });

  write(routes, contract.withdrawRevision, async (context, { params, body }) => {
    await withdrawRevision(context, { revisionId: params.revisionId, ...body });
    return viewOf(context, params.revisionId);
  });

  write(routes, contract.approveRevision, async (context, { params, body }) => {
    await approveRevision(context, { revisionId: params.revisionId, ...body });
    return viewOf(context, params.revisionId);
  });

  write(routes, contract.askForRevision, async (context, { params, body }) => {
    await askForRevision(context, { revisionId: params.revisionId, ...body });
    return viewOf(context, params.revisionId);
  });

  read(routes, contract.compareRevisions, async (context, { params, query }) => {
    const before = await sideOf(context, params.jobId, query.before);
    const after = await sideOf(context, params.jobId, query.after);
    return {
      before: before.side,
      after: after.side,
      changes: listChanges(before.snapshot.document, after.snapshot.document, after.snapshot.titleBlock.unit),
    };
  });
}

function nextAfter(more: boolean, sequence: number | undefined): string | null {
  return more && sequence !== undefined ? cursorOf([sequence]) : null;
}

async function viewOf(context: ReadContext, revisionId: string) {
  const { loaded, revision } = await findRevision(context, revisionId);
  return revisionView(context, loaded, revision);
}

async function sideOf(context: ReadContext, jobId: string, revisionId: string) {
  const { loaded, revision } = await findRevision(context, revisionId, { withSnapshot: true });
  if (loaded.job.id !== jobId) throw notFound("revision");
  const snapshot = snapshotOf(revision);
  const { elevation, section } = snapshot.drawing;
  return { snapshot, side: { revision: await revisionView(context, loaded, revision), elevation, section } };
}

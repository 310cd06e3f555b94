import { writeFile } from "node:fs/promises";
import { join } from "node:path";
import type { Brief } from "#shared/contracts/jobs.ts";
import { acknowledgementsOf } from "#shared/mockup/acknowledgements.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { importFile } from "../../artwork/import-file.ts";
import { addArtwork } from "../../commands/add-artwork.ts";
import { approveRevision } from "../../commands/approve-revision.ts";
import { changeJob } from "../../commands/change-job.ts";
import { finishImport } from "../../commands/finish-import.ts";
import { finishIssue } from "../../commands/finish-issue.ts";
import { issueRevision } from "../../commands/issue-revision.ts";
import { makeCertificate } from "../../commands/make-certificate.ts";
import { openJob } from "../../commands/open-job.ts";
import { saveMockup } from "../../commands/save-mockup.ts";
import { drawProof } from "../../drawing/draw.ts";
import type { Context } from "../../http/context.ts";
import { Decision } from "../../models/decision.ts";
import { Revision } from "../../models/revision.ts";
import { Shop } from "../../models/shop.ts";
import { StoredFile } from "../../models/stored-file.ts";
import { snapshotOf } from "../../queries/snapshot-of.ts";
import { newId } from "../new-id.ts";
import type { DemoArtwork } from "./demo-signs.ts";
import type { DemoIds } from "./load-demo-people.ts";

/** The steps of the round trip, done by the very commands that the application runs. */

export async function demoJob(
  context: Context,
  ids: DemoIds,
  {
    number,
    client: clientName,
    title,
    dueOn,
    brief,
  }: { number: number; client: string; title: string; dueOn: string; brief: Partial<Brief> },
): Promise<string> {
  const client = ids.clients.find(({ name }) => name === clientName);
  const approver = client?.contacts[0];
  if (!client || !approver || context.actor.kind !== "staff")
    throw new Error(`The demo can't open a job for ${clientName}.`);
  await Shop.update({ nextJobNumber: number }, { where: { id: ids.shopId }, transaction: context.transaction });
  const { job } = await openJob(context, { clientId: client.clientId, title, dueOn, personId: context.actor.personId });
  await changeJob(context, job.id, { brief, approverIds: [approver.contactId] });
  return job.id;
}

export async function demoArtwork(
  context: Context,
  { jobId, name, svg }: { jobId: string; name: string; svg: string },
): Promise<DemoArtwork> {
  const path = join(context.services.storage.quarantineDir, `demo-${newId()}`);
  await writeFile(path, svg);
  const artwork = await addArtwork(context, {
    jobId,
    mediaType: "image/svg+xml",
    file: { path, originalName: name, byteSize: Buffer.byteLength(svg) },
  });
  const outcome = await importFile(Buffer.from(svg));
  await finishImport(context, { artworkId: artwork.id, outcome });
  if (!outcome.ok) throw new Error(`The demo's artwork ${name} was refused: ${outcome.refusal.text}`);
  return { artworkId: artwork.id, pieces: outcome.artwork.pieces };
}

export async function demoIssue(
  context: Context,
  { jobId, version, document, message }: { jobId: string; version: number; document: MockupDocument; message: string },
): Promise<string> {
  await saveMockup(context, { jobId, version: version - 1, document });
  const { revision } = await issueRevision(context, { jobId, mockupVersion: version, message });
  const pdf = await drawProof(snapshotOf(revision), revision.snapshotSha256 ?? "");
  await finishIssue(context, { revisionId: revision.id, pdf });
  return revision.id;
}

export async function demoApproval(
  context: Context,
  { revisionId, typedName }: { revisionId: string; typedName: string },
): Promise<void> {
  const { transaction } = context;
  const revision = await Revision.findByPk(revisionId, { transaction, rejectOnEmpty: true });
  const pdf = await StoredFile.findByPk(revision.pdfFileId ?? "", { transaction, rejectOnEmpty: true });
  const { document, figures, words, titleBlock } = snapshotOf(revision);
  await approveRevision(context, {
    revisionId,
    typedName,
    acknowledgedIds: acknowledgementsOf({ document, figures, words, unit: titleBlock.unit }).map(({ id }) => id),
    pdfSha256: pdf.sha256,
    settledNoteIds: [],
    consentToPortfolio: true,
  });
  const decision = await Decision.findOne({ where: { revisionId }, transaction, rejectOnEmpty: true });
  await makeCertificate(context, { decisionId: decision.id });
}

import type { Snapshot } from "#shared/mockup/snapshot.ts";
import { newId } from "../db/new-id.ts";
import type { Context } from "../http/context.ts";
import { Certificate } from "../models/certificate.ts";
import { Decision } from "../models/decision.ts";
import { Job } from "../models/job.ts";
import { Person } from "../models/person.ts";
import { Revision } from "../models/revision.ts";
import { Shop } from "../models/shop.ts";
import { renderCertificate } from "../pdf/certificate-pdf.ts";
import { snapshotOf } from "../queries/snapshot-of.ts";
import { logSystemEvent } from "./log-event.ts";
import { storeBytes } from "./store-file.ts";

/** Makes the certificate of an approval as a file of its own; the issued PDF stays as it was. Made before, it is left as it is. */
export async function makeCertificate(
  context: Pick<Context, "services" | "transaction" | "now">,
  { decisionId }: { decisionId: string },
): Promise<void> {
  const { transaction, now } = context;
  const decision = await Decision.findOne({ where: { id: decisionId, kind: "approved" }, transaction });
  if (!decision) return;
  const { shopId, jobId } = decision;
  // Decisions can't be locked by a role that may not change them, so the job's row stands for them.
  await Job.findByPk(jobId, { transaction, lock: true });
  if (await Certificate.findOne({ where: { decisionId }, transaction })) return;
  const revision = await Revision.findByPk(decision.revisionId, { transaction, rejectOnEmpty: true });
  const person = await Person.findByPk(decision.personId, { transaction, rejectOnEmpty: true });
  const shop = await Shop.findByPk(shopId, { transaction, rejectOnEmpty: true });
  const bytes = await renderCertificate(
    inputOf(decision, { snapshot: snapshotOf(revision), email: person.email, paper: shop.paper }),
  );
  const file = await storeBytes(context, { shopId, bytes, mediaType: "application/pdf" });
  await Certificate.create({ id: newId(), shopId, decisionId, fileId: file.id, createdAt: now }, { transaction });
  await logSystemEvent(context, { shopId, jobId, kind: "certificate made", data: { letter: revision.letter } });
}

function inputOf(
  decision: Decision,
  { snapshot, email, paper }: { snapshot: Snapshot; email: string; paper: Shop["paper"] },
): Parameters<typeof renderCertificate>[0] {
  const { titleBlock } = snapshot;
  return {
    shop: titleBlock.owner,
    client: titleBlock.client,
    title: titleBlock.title,
    number: titleBlock.number,
    revision: titleBlock.revision,
    typedName: decision.typedName ?? "",
    signedInAs: `${decision.byName}, ${email}`,
    acknowledgements: JSON.parse(decision.acknowledgements ?? "[]") as string[],
    decidedAt: `${decision.decidedAt.toISOString().slice(0, 19).replace("T", " ")} UTC`,
    pdfSha256: decision.pdfSha256,
    snapshotSha256: decision.snapshotSha256,
    paper: paper === "A3" ? "A4" : paper === "Tabloid" ? "Letter" : paper,
    date: decision.decidedAt,
  };
}

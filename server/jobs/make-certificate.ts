import type { Snapshot } from "#shared/mockup/snapshot.ts";
import { logSystemEvent } from "../commands/log-event.ts";
import { storeBytes } from "../commands/store-file.ts";
import { newId } from "../db/new-id.ts";
import type { Services } from "../http/context.ts";
import { Certificate } from "../models/certificate.ts";
import { Decision } from "../models/decision.ts";
import { Person } from "../models/person.ts";
import { Revision } from "../models/revision.ts";
import { Shop } from "../models/shop.ts";
import { renderCertificate } from "../pdf/certificate-pdf.ts";
import { snapshotOf } from "../queries/snapshot-of.ts";

/** Makes the certificate of an approval as a file of its own; the issued PDF stays as it was. Once is enough. */
export async function makeCertificate(services: Services, { decisionId }: { decisionId: string }): Promise<void> {
  const decision = await Decision.findOne({ where: { id: decisionId, kind: "approved" } });
  if (!decision || (await Certificate.findOne({ where: { decisionId } }))) return;
  const revision = await Revision.findByPk(decision.revisionId, { rejectOnEmpty: true });
  const person = await Person.findByPk(decision.personId, { rejectOnEmpty: true });
  const shop = await Shop.findByPk(decision.shopId, { rejectOnEmpty: true });
  const bytes = await renderCertificate(
    inputOf(decision, { snapshot: snapshotOf(revision), email: person.email, paper: shop.paper }),
  );
  await services.sequelize.transaction(async (transaction) => {
    const context = { services, transaction, now: new Date() };
    await Decision.findByPk(decisionId, { transaction, lock: true });
    if (await Certificate.findOne({ where: { decisionId }, transaction })) return;
    const file = await storeBytes(context, { shopId: decision.shopId, bytes, mediaType: "application/pdf" });
    await Certificate.create(
      { id: newId(), shopId: decision.shopId, decisionId, fileId: file.id, createdAt: context.now },
      { transaction },
    );
    await logSystemEvent(context, {
      shopId: decision.shopId,
      jobId: decision.jobId,
      kind: "certificate made",
      data: { letter: revision.letter },
    });
  });
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
    email,
    acknowledgements: JSON.parse(decision.acknowledgements ?? "[]") as string[],
    decidedAt: `${decision.decidedAt.toISOString().slice(0, 19).replace("T", " ")} UTC`,
    pdfSha256: decision.pdfSha256,
    snapshotSha256: decision.snapshotSha256,
    paper: paper === "A3" ? "A4" : paper === "Tabloid" ? "Letter" : paper,
    date: decision.decidedAt,
  };
}

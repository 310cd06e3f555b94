import type { ReadContext } from "../http/context.ts";
import { Certificate } from "../models/certificate.ts";
import { Decision } from "../models/decision.ts";
import type { Revision } from "../models/revision.ts";
import { StoredFile } from "../models/stored-file.ts";

/** The issued PDF of a revision that was found before. */
export function findProofFile(
  { transaction }: ReadContext,
  { shopId, pdfFileId }: Revision,
): Promise<StoredFile | null> {
  return pdfFileId ? StoredFile.findOne({ where: { id: pdfFileId, shopId }, transaction }) : Promise.resolve(null);
}

/** The certificate of its approval, once it is made. */
export async function findCertificateFile(
  { transaction }: ReadContext,
  { id, shopId }: Revision,
): Promise<StoredFile | null> {
  const decision = await Decision.findOne({ where: { revisionId: id, shopId, kind: "approved" }, transaction });
  const certificate = decision
    ? await Certificate.findOne({ where: { decisionId: decision.id, shopId }, include: ["file"], transaction })
    : null;
  return certificate?.file ?? null;
}

import { notFound } from "../http/app-error.ts";
import type { ReadContext } from "../http/context.ts";
import { NamedDraft } from "../models/named-draft.ts";

/** The documents can be megabytes: only where one is asked for. */
export const draftColumns = { exclude: ["document"] };

/** A draft of that job with who kept it, else "not found". The caller has asked whether the actor may see it. */
export async function findNamedDraft(
  { shop, transaction }: ReadContext,
  { jobId, draftId, withDocument = false }: { jobId: string; draftId: string; withDocument?: boolean },
): Promise<NamedDraft> {
  const draft = await NamedDraft.findOne({
    where: { id: draftId, shopId: shop?.id ?? "", jobId, removedAt: null },
    ...(withDocument ? {} : { attributes: draftColumns }),
    include: ["keeper"],
    transaction,
  });
  if (!draft) throw notFound("draft");
  return draft;
}

import type { ImportOutcome } from "#shared/artwork/imported-artwork.ts";
import type { Context } from "../http/context.ts";
import { Artwork } from "../models/artwork.ts";
import { logSystemEvent } from "./log-event.ts";

/** Writes down what an artwork became, or why it can't be taken. Once it is no longer importing this changes nothing. */
export async function finishImport(
  context: Pick<Context, "transaction" | "now">,
  { artworkId, outcome }: { artworkId: string; outcome: ImportOutcome },
): Promise<void> {
  const { transaction } = context;
  const row = await Artwork.findOne({ where: { id: artworkId, state: "importing" }, transaction, lock: true });
  if (!row) return;
  const of = { shopId: row.shopId, jobId: row.jobId };
  if (outcome.ok) {
    const { pieces, ...summary } = outcome.artwork;
    await row.update({ state: "ready", summary, pieces: JSON.stringify(pieces) }, { transaction });
    await logSystemEvent(context, { ...of, kind: "artwork ready", data: { name: row.name, pieces: pieces.length } });
  } else {
    await row.update({ state: "refused", refusal: outcome.refusal }, { transaction });
    await logSystemEvent(context, {
      ...of,
      kind: "artwork refused",
      data: { name: row.name, reason: outcome.refusal.text },
    });
  }
}
